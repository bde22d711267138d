using System.Globalization;

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
            string empty = Builds.Publish(Builds.Project(folder, "empty", "EmptyProgram", "EmptyProject"), Path.Combine(folder, "empty-out"), "--self-contained", "false", "-p:PublishReadyToRun=true");
            string job = Path.Combine(folder, "vee-eight.json");
            File.WriteAllText(job, EightCylinderJob.Text());
            double Nothing() => ByTurns.Milliseconds("dotnet", Path.Combine(empty, "empty.dll"));
            if (Builds.Native(Path.Combine(folder, "native")) is { } native)
            {
                Measure("native", Nothing, () => ByTurns.Milliseconds(native, "results", "--file", job));
            }

            string ahead = Builds.OnRuntime(Path.Combine(folder, "ahead"));
            Measure("on the runtime", Nothing, () => ByTurns.Milliseconds("dotnet", ahead, "results", "--file", job));
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    private static void Measure(string build, Func<double> empty, Func<double> ours)
    {
        (double emptyMs, double oursMs) = ByTurns.Medians(Warm, Runs, empty, ours);
        Console.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"process: results {build} {oursMs:0.0} ms, dotnet empty {emptyMs:0.0} ms, medians of {Runs}; ratio {oursMs / emptyMs:0.00} (wanted ≤ {Wanted:0})"));
    }
}
