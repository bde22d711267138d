using System.Diagnostics;

namespace RebuildPlanner.Benchmarks;

/// <summary>Other programs: run, waited for, and their output given back.</summary>
internal static class Tool
{
    /// <summary>Standard output of a program.</summary>
    /// <exception cref="InvalidOperationException">It failed; the message holds what it said.</exception>
    public static string Output(string program, params string[] arguments)
    {
        (int code, string output, string error) = Run(program, arguments);
        return code == 0 ? output : throw new InvalidOperationException($"{program} ended with {code}.\n{output}\n{error}");
    }

    /// <summary>Exit code and both outputs of a program.</summary>
    public static (int Code, string Output, string Error) Run(string program, params string[] arguments)
    {
        using Process process = Process.Start(new ProcessStartInfo(program, arguments)
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        })!;

        // Both pipes are read at once: a full one would stop the program while the other is waited for.
        Task<string> error = process.StandardError.ReadToEndAsync();
        string output = process.StandardOutput.ReadToEnd();
        process.WaitForExit();
        return (process.ExitCode, output, error.Result);
    }
}
