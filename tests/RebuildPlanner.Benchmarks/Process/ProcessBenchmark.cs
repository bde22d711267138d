using System.Diagnostics;
using System.Globalization;
using System.Runtime.InteropServices;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Benchmarks;

/// <summary><c>rebuild results</c> as a whole process against <c>dotnet</c> running a program that does nothing.</summary>
/// <remarks>Native, as a shop would install it, and compiled ahead but leaning on the installed runtime, which still compiles much at every start.</remarks>
internal static class ProcessBenchmark
{
    private const double Wanted = 3.0;
    private const int Warm = 3, Runs = 25;

    /// <summary>Runs it.</summary>
    public static void Run()
    {
        string folder = Directory.CreateTempSubdirectory("rebuild-benchmark-").FullName;
        try
        {
            string commandLine = RepositoryFiles.At("src", "RebuildPlanner.Cli", "RebuildPlanner.Cli.csproj");
            string empty = Publish(EmptyProject(folder), Path.Combine(folder, "empty-out"), "--self-contained", "false", "-p:PublishReadyToRun=true");
            string ahead = Publish(commandLine, Path.Combine(folder, "ahead-out"), "--self-contained", "false", "-p:PublishReadyToRun=true");
            string job = Path.Combine(folder, "vee-eight.json");
            File.WriteAllText(job, EightCylinderJob.Text());
            double Nothing() => Milliseconds("dotnet", Path.Combine(empty, "empty.dll"));
            if (Native(commandLine, Path.Combine(folder, "native-out")) is { } native)
            {
                Measure("native", Nothing, () => Milliseconds(native, "results", "--file", job));
            }
            else
            {
                Console.WriteLine("process: no native build, skipped. It needs clang and the headers of zlib (packages clang, zlib1g-dev).");
            }

            Measure("on the runtime", Nothing, () => Milliseconds("dotnet", Path.Combine(ahead, "rebuild.dll"), "results", "--file", job));
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    private static void Measure(string build, Func<double> empty, Func<double> ours)
    {
        List<double> emptyTimes = [], ourTimes = [];
        for (int run = -Warm; run < Runs; run++)
        {
            // By turns, so that a busy spell of the machine falls on both.
            double nothing = empty(), results = ours();
            if (run >= 0)
            {
                emptyTimes.Add(nothing);
                ourTimes.Add(results);
            }
        }

        double emptyMedian = Median(emptyTimes), ourMedian = Median(ourTimes);
        Console.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"process: results {build} {ourMedian:0.0} ms, dotnet empty {emptyMedian:0.0} ms, medians of {Runs}; ratio {ourMedian / emptyMedian:0.00} (wanted ≤ {Wanted:0})"));
    }

    private static double Milliseconds(string program, params string[] arguments)
    {
        long start = Stopwatch.GetTimestamp();
        (int code, string _, string error) = Tool.Run(program, arguments);
        double time = Stopwatch.GetElapsedTime(start).TotalMilliseconds;

        // 1 is a verdict outside: an answer like any other.
        return code is 0 or 1 ? time : throw new InvalidOperationException($"{program} ended with {code}.\n{error}");
    }

    private static string EmptyProject(string folder)
    {
        string project = Directory.CreateDirectory(Path.Combine(folder, "empty")).FullName;
        File.WriteAllText(Path.Combine(project, "Program.cs"), Resource("EmptyProgram"));
        string path = Path.Combine(project, "empty.csproj");
        File.WriteAllText(path, Resource("EmptyProject"));
        return path;
    }

    private static string Publish(string project, string to, params string[] how)
    {
        Tool.Output("dotnet", ["publish", project, "-c", "Release", "-r", Machine(), .. how, "-o", to, "-v", "quiet", "-nologo"]);
        return to;
    }

    private static string? Native(string project, string to)
    {
        try
        {
            return Path.Combine(Publish(project, to, "-p:PublishAot=true"), OperatingSystem.IsWindows() ? "rebuild.exe" : "rebuild");
        }
        catch (InvalidOperationException)
        {
            return null;
        }
    }

    // Not the SDK's own identifier, which on some distributions names the distribution.
    private static string Machine() =>
        (OperatingSystem.IsWindows() ? "win-" : OperatingSystem.IsMacOS() ? "osx-" : "linux-")
        + RuntimeInformation.OSArchitecture.ToString().ToLowerInvariant();

    private static string Resource(string name)
    {
        using StreamReader reader = new(typeof(ProcessBenchmark).Assembly.GetManifestResourceStream(name)!);
        return reader.ReadToEnd();
    }

    private static double Median(List<double> times)
    {
        double[] sorted = [.. times.Order()];
        return sorted.Length % 2 == 1 ? sorted[sorted.Length / 2] : 0.5 * (sorted[(sorted.Length / 2) - 1] + sorted[sorted.Length / 2]);
    }
}
