using System.Diagnostics;
using System.Globalization;
using System.Text;
using RebuildPlanner.Core.JobFile;
using Job = RebuildPlanner.Core.Jobs.Job;

namespace RebuildPlanner.Cli.Tests;

/// <summary>Whole processes that write into one store: killed in the middle, or eight at once.</summary>
public sealed class WriterTests : IDisposable
{
    private readonly Scratch _scratch = new();

    /// <summary>How often a writer is killed: hundreds in every run, thousands on request. The run under a comma proves the comma, not the disk.</summary>
    private static int Kills { get; } = int.Parse(
        Environment.GetEnvironmentVariable("REBUILD_KILLS") ?? (Environment.GetEnvironmentVariable("COMMA_DECIMAL_PASS") == "1" ? "10" : "200"), CultureInfo.InvariantCulture);

    private string Store => _scratch["jobs.db"];

    public void Dispose() => _scratch.Dispose();

    // A kill, or a Ctrl-C, may fall anywhere: into the start, between readings, into a commit. What was acknowledged is there, and at most one more.
    [Fact]
    public void Whatever_was_acknowledged_is_there_after_a_kill()
    {
        const int Lanes = 2;
        int acknowledged = 0;
        Parallel.For(0, Lanes, lane =>
        {
            string store = _scratch[$"lane-{lane}.db"];
            Run(store, "start", "K-1", "--from", "single");
            Random random = new(17 + lane);
            HashSet<string> said = [];
            for (int kill = 0; kill < Kills / Lanes; kill++)
            {
                using Process writer = Start(store, $"{lane}-{kill}", 0);

                // Up to about a dozen readings, or a moment after the first if they come slowly.
                int wanted = random.Next(0, 12);
                List<string> keys = [];
                while (keys.Count < wanted && writer.StandardOutput.ReadLine() is { } key)
                {
                    keys.Add(key);
                }

                Thread.Sleep(random.Next(0, wanted == 0 ? 200 : 15));
                Stop(writer, byKey: kill % 4 == 3);
                keys.AddRange(writer.StandardOutput.ReadToEnd().Split('\n', StringSplitOptions.RemoveEmptyEntries));
                writer.WaitForExit();
                said.UnionWith(keys);
            }

            string[] there = [.. Exported(store, "K-1").Readings.Select(reading => reading.Id!)];
            Assert.Empty(said.Except(there));
            Assert.InRange(there.Length, said.Count, said.Count + (Kills / Lanes)); // a reading may be written and the writer killed before it says so
            Assert.Equal("sound: 1 jobs\n", Run(store, "store", "check").Output);
            Interlocked.Add(ref acknowledged, said.Count);
        });
        Assert.True(acknowledged > Kills, $"{acknowledged} readings were acknowledged in {Kills} kills");
    }

    [Fact]
    public void Eight_write_at_once_and_nothing_is_lost()
    {
        const int Writers = 8, Each = 12;
        Run(Store, "start", "K-1", "--from", "single");

        Process[] writers = [.. Enumerable.Range(0, Writers).Select(number => Start(Store, $"w{number}", Each))];
        string[] said = [.. writers.Select(writer => writer.StandardOutput.ReadToEnd())];

        Assert.All(writers, writer =>
        {
            writer.WaitForExit();
            Assert.True(writer.ExitCode == 0, writer.StandardError.ReadToEnd());
            writer.Dispose();
        });
        string[] keys = [.. said.SelectMany(text => text.Split('\n', StringSplitOptions.RemoveEmptyEntries))];
        Assert.Equal(Writers * Each, keys.Length);
        Assert.Equal(keys.Order(StringComparer.Ordinal), Exported(Store, "K-1").Readings.Select(reading => reading.Id!).Order(StringComparer.Ordinal));
        Assert.Equal("sound: 1 jobs\n", Run(Store, "store", "check").Output);
    }

    // A key at the terminal is a signal the program may act on; a kill is none.
    private static void Stop(Process writer, bool byKey)
    {
        if (!byKey || OperatingSystem.IsWindows())
        {
            writer.Kill();
            return;
        }

        using Process key = Process.Start("kill", ["-INT", writer.Id.ToString(CultureInfo.InvariantCulture)]);
        key.WaitForExit();
        Assert.True(writer.WaitForExit(TimeSpan.FromSeconds(30)), "Ctrl-C did not end the writer");
    }

    private static Process Start(string store, string name, int count) => Process.Start(new ProcessStartInfo(
        "dotnet", [Path.Combine(AppContext.BaseDirectory, "RebuildPlanner.Writer.dll"), store, "K-1", name, count.ToString(CultureInfo.InvariantCulture)])
    {
        RedirectStandardOutput = true,
        RedirectStandardError = true,
    })!;

    private static Screen Run(string store, params string[] args) => Screen.Of([.. args, "--store", store]);

    private static Job Exported(string store, string number) => JobFileReader.Read(Encoding.UTF8.GetBytes(Run(store, "export", number).Output)).Job!;
}
