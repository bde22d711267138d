using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Nodes;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Entries;

/// <summary>What can be done to a job: its entries and an input give new entries, or faults. Nothing is written here, and nothing changes what was.</summary>
public static class JobVerbs
{
    private static readonly JsonSerializerOptions _relaxed = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>Adds entries; the faults are those of the job with them, each with the new entry it lies with and its place told from there on.</summary>
    /// <param name="entries">The job's entries.</param>
    /// <param name="added">The new ones, in order.</param>
    /// <returns>The job with them, or faults; the entry of a fault that lies with none of the new ones is null.</returns>
    public static (Job? Job, IReadOnlyList<(Fault Fault, Entry? Of)> Faults) Add(IReadOnlyList<Entry> entries, params IReadOnlyList<Entry> added)
    {
        (ReadOnlyMemory<byte> file, Dictionary<string, Entry> places) = JobFold.File([.. entries, .. added]);
        (Job? job, IReadOnlyList<Fault> faults) = JobFileReader.Read(file.Span);
        KeyValuePair<string, Entry>[] fresh = faults.Count == 0 ? [] : [.. places.Where(place => added.Contains(place.Value))];
        return (job, [.. faults.Select(fault => Told(fault, fresh))]);
    }

    /// <summary>The body of a strike.</summary>
    /// <param name="entries">The job's entries.</param>
    /// <param name="key">The key of the entry to strike.</param>
    /// <param name="reason">Why.</param>
    /// <param name="problem">What is wrong, or null.</param>
    public static string? Strike(IReadOnlyList<Entry> entries, string key, string reason, out string? problem)
    {
        Entry? struck = entries.FirstOrDefault(entry => entry.Key == key);
        problem = struck is null ? $"there is no entry {key} in this job"
            : struck.Kind is EntryKind.Job or EntryKind.Customer or EntryKind.Engine or EntryKind.Strike or EntryKind.Closed or EntryKind.Sheet
                ? $"an entry of {EntryWords.Kinds.WordFor(struck.Kind)} is not struck; write a new one, and the last counts"
            : JobFold.Struck(entries).TryGetValue(key, out string? before) ? $"entry {key} is struck already: {before}"
            : string.IsNullOrWhiteSpace(reason) ? "an entry is struck with a reason; write why"
            : null;
        return problem is null ? new JsonObject { ["entry"] = key, ["reason"] = reason }.ToJsonString(_relaxed) : null;
    }

    /// <summary>Job, customer or engine with one field set: the entry that then counts.</summary>
    /// <param name="entries">The job's entries.</param>
    /// <param name="path">Such as <c>customer.name</c> or <c>engine.cam.inletCloses</c>.</param>
    /// <param name="value">The field's JSON, or null to take it out.</param>
    /// <param name="problem">What is wrong, or null.</param>
    public static (EntryKind Kind, string Body)? Set(IReadOnlyList<Entry> entries, string path, string? value, out string? problem)
    {
        string[] names = path.Split('.');
        (string Name, EntryKind Kind) single = EntryWords.Singles.FirstOrDefault(known => known.Name == names[0]);
        if (single.Name is null || names.Length < 2)
        {
            problem = $"{path}: a field is named from job, customer or engine on, such as customer.name";
            return null;
        }

        JsonObject root = entries.LastOrDefault(entry => entry.Kind == single.Kind) is { } last ? JsonNode.Parse(last.Body)!.AsObject() : [];
        JsonObject owner = root;
        foreach (string name in names[1..^1])
        {
            if (owner[name] is not JsonObject inner)
            {
                owner[name] = inner = [];
            }

            owner = inner;
        }

        owner[names[^1]] = value is null ? null : JsonNode.Parse(value);
        problem = null;
        return (single.Kind, root.ToJsonString(_relaxed));
    }

    private static (Fault Fault, Entry? Of) Told(Fault fault, KeyValuePair<string, Entry>[] fresh)
    {
        foreach ((string place, Entry entry) in fresh)
        {
            if (fault.Path == place || fault.Path.StartsWith(place + ".", StringComparison.Ordinal))
            {
                return (fault with { Path = fault.Path[place.Length..].TrimStart('.') }, entry);
            }
        }

        return (fault, null);
    }
}
