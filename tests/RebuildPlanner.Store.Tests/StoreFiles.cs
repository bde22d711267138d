using System.Text;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Store.Tests;

/// <summary>A store in a folder of its own, gone after the test.</summary>
internal sealed class StoreFiles : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("rebuild-store-").FullName;

    public static DateTimeOffset When { get; } = new(2026, 11, 3, 10, 20, 0, TimeSpan.Zero);

    public string Store => At("jobs.db");

    public string At(string name) => Path.Combine(_folder, name);

    public JobStore Open() => JobStore.Open(Store);

    public void Dispose() => Directory.Delete(_folder, recursive: true);

    public static Job Sample(string name) => JobFileReader.Read(Encoding.UTF8.GetBytes(RepositoryFiles.Text("samples", name))).Job!;

    /// <summary>A job's entries, as an import writes them.</summary>
    public static Entry[] EntriesOf(Job job) => [.. JobEntries.Of(job).Select((entry, index) => new Entry($"{job.Number}/{index}", entry.Kind, entry.Body, When, "T. Arkwell"))];

    public static Entry[] Small(string number = "2026-001") =>
        EntriesOf(JobFileReader.Read(Encoding.UTF8.GetBytes($$"""{ "format": "rebuild-planner-job", "version": 1, "job": { "number": "{{number}}" }, "engine": { "cylinders": 2 } }""")).Job!);

    public static Entry Reading(string key, string value) =>
        new(key, EntryKind.Reading, $$"""{"what":"stroke","value":"{{value}}","stage":"as received"}""", When.AddMinutes(1), "T. Arkwell");

    /// <summary>Adds whatever it is given.</summary>
    public static Func<IReadOnlyList<Entry>, JobStore.Change> Add(params Entry[] entries) => _ => new JobStore.Change(entries, []);
}
