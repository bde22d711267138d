using System.Globalization;

namespace RebuildPlanner.Benchmarks;

/// <summary>
/// Opening a job and paging the list on a store of ten thousand jobs and a million readings against one of ten jobs; and one <c>measure</c>
/// against a process that does nothing but insert a row with the same durability.
/// </summary>
internal static class StoreBenchmark
{
    private const int Few = 10, Many = 10_000, Warm = 3, Runs = 25;
    private const double WantedGrowth = 2.0, WantedOverBare = 1.5;

    /// <summary>Runs it.</summary>
    public static void Run()
    {
        string folder = Directory.CreateTempSubdirectory("rebuild-benchmark-").FullName;
        try
        {
            if (Builds.Native(Path.Combine(folder, "native")) is not { } native)
            {
                return;
            }

            string few = Path.Combine(folder, "few.db"), many = Path.Combine(folder, "many.db");
            FilledStore.Make(few, Few);
            FilledStore.Make(many, Many);
            Say($"store: {Many} jobs, {new FileInfo(many).Length / 1e6:0} MB");
            Grown("one job opened", store => ByTurns.Milliseconds(native, "show", "7", "--store", store), few, many);
            Grown("a page listed", store => ByTurns.Milliseconds(native, "jobs", "--store", store), few, many);
            Grown("a job in the middle found by text", store => ByTurns.Milliseconds(native, "jobs", "--text", "Engine 7", "--store", store), few, many, wanted: null);

            string bare = Path.Combine(Builds.Publish(Builds.Project(folder, "bare", "BareInsert", "BareInsertProject"), Path.Combine(folder, "bare-out"), "-p:PublishAot=true"), OperatingSystem.IsWindows() ? "bare.exe" : "bare");
            string rows = Path.Combine(folder, "bare.db");
            foreach (string store in new[] { few, many })
            {
                (double bareMs, double measureMs) = ByTurns.Medians(
                    Warm, Runs, () => ByTurns.Milliseconds(bare, rows),
                    () => ByTurns.Milliseconds(native, "measure", "7", "stroke", "88.0 mm", "--stage", "as received", "--store", store));
                Say($"store: one measure {measureMs:0.0} ms, a bare insert {bareMs:0.0} ms, medians of {Runs}; ratio {measureMs / bareMs:0.00} (wanted ≤ {WantedOverBare}) in {Path.GetFileNameWithoutExtension(store)}");
            }
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    // A text within a name is found by going through the jobs, and no index helps: time in step with their number is all that is asked.
    private static void Grown(string what, Func<string, double> time, string few, string many, double? wanted = WantedGrowth)
    {
        (double fewMs, double manyMs) = ByTurns.Medians(Warm, Runs, () => time(few), () => time(many));
        Say($"store: {what} {manyMs:0.0} ms of {Many} jobs, {fewMs:0.0} ms of {Few}, medians of {Runs}; ratio {manyMs / fewMs:0.00}{(wanted is { } most ? $" (wanted ≤ {most:0})" : "")}");
    }

    private static void Say(FormattableString text) => Console.WriteLine(text.ToString(CultureInfo.InvariantCulture));
}
