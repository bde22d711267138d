using RebuildPlanner.Core.JobFile;

namespace RebuildPlanner.Cli;

/// <summary>Reads files, and says what is wrong where one cannot be read or is not what was wanted.</summary>
internal static class InputFile
{
    /// <summary>The file's bytes, or null after the reason has been written.</summary>
    public static byte[]? Read(string path, string wanted, TextWriter error)
    {
        try
        {
            return File.ReadAllBytes(path);
        }
        catch (Exception problem) when (IsOfFiles(problem))
        {
            string why = problem switch
            {
                FileNotFoundException or DirectoryNotFoundException => "there is no such file",
                UnauthorizedAccessException when Directory.Exists(path) => $"that is a folder; {wanted} is wanted",
                UnauthorizedAccessException => "it may not be read by this user",
                _ => problem.Message.TrimEnd('.'),
            };
            error.WriteLine($"{path}: {why}.");
            return null;
        }
    }

    /// <summary>Says every fault found in a file, and what came of it.</summary>
    public static void Say(string path, IReadOnlyList<Fault> faults, string outcome, TextWriter error)
    {
        foreach (Fault fault in faults)
        {
            string place = fault.Path.Length == 0 ? "" : $"{fault.Path}: ";
            string value = fault.Value is null ? "" : $"\"{fault.Value}\": ";
            error.WriteLine($"{path}, line {fault.Line}: {place}{value}{fault.Message}");
        }

        if (faults.Count > 0)
        {
            error.WriteLine(faults.Count == 1 ? $"1 fault; {outcome}." : $"{faults.Count} faults; {outcome}.");
        }
    }

    /// <summary>Whether an exception says that a file cannot be used, rather than that the program is wrong.</summary>
    public static bool IsOfFiles(Exception problem) =>
        problem is IOException or UnauthorizedAccessException or NotSupportedException or ArgumentException;
}
