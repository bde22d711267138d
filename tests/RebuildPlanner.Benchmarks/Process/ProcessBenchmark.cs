using System.Diagnostics;
using System.Globalization;
using System.Runtime.InteropServices;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Benchmarks;

/// <summary><c>rebuild results</c> as a whole process against a .NET program that does nothing: what the command itself costs whoever types it.</summary>
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
            string empty = Publish(EmptyProject(folder), Path.Combine(folder, "empty-out"), "empty");
            string ours = Publish(
                RepositoryFiles.At("src", "RebuildPlanner.Cli", "RebuildPlanner.Cli.csproj"), Path.Combine(folder, "rebuild-out"), "rebuild");
            string job = Path.Combine(folder, "vee-eight.json");
            File.WriteAllText(job, EightCylinderJob.Text());
            Measure(() => Milliseconds(empty), () => Milliseconds(ours, "results", "--file", job));
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    private static void Measure(Func<double> empty, Func<double> ours)
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
            $"process: results {ourMedian:0.0} ms, empty program {emptyMedian:0.0} ms, medians of {Runs}; ratio {ourMedian / emptyMedian:0.00} (wanted ≤ {Wanted:0})"));
        Console.WriteLine(string.Create(
            CultureInfo.InvariantCulture, $"process: fastest {ourTimes.Min():0.0} ms against {emptyTimes.Min():0.0} ms; ratio {ourTimes.Min() / emptyTimes.Min():0.00}"));
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

    /// <summary>Both are compiled ahead and lean on the installed runtime, as a shop would get them.</summary>
    private static string Publish(string project, string to, string name)
    {
        Tool.Output(
            "dotnet", "publish", project, "-c", "Release", "-r", Machine(), "--self-contained", "false",
            "-p:PublishReadyToRun=true", "-o", to, "-v", "quiet", "-nologo");
        return Path.Combine(to, OperatingSystem.IsWindows() ? $"{name}.exe" : name);
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
