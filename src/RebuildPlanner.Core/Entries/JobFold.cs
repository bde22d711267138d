using System.Buffers;
using System.Text.Encodings.Web;
using System.Text.Json;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Entries;

/// <summary>A job as the fold of its entries: they make a job file, and the job file's own reader makes the job, so that one set of rules judges both.</summary>
public static class JobFold
{
    // The bodies are the job file's text already; what is added round them is read by people no less.
    private static readonly JsonWriterOptions _options = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping, SkipValidation = true };

    /// <summary>The job, or the faults that keep its entries from being one.</summary>
    /// <param name="entries">The job's entries in the order in which they were written.</param>
    public static (Job? Job, IReadOnlyList<Fault> Faults) Of(IReadOnlyList<Entry> entries) => JobFileReader.Read(File(entries).Utf8);

    /// <summary>Whether the job is closed.</summary>
    public static bool IsClosed(IReadOnlyList<Entry> entries) => entries.LastOrDefault(entry => entry.Kind == EntryKind.Closed)?.Body == "true";

    /// <summary>The job file that the entries make, and where in it each row's entry stands.</summary>
    internal static (byte[] Utf8, Dictionary<string, Entry> Places) File(IReadOnlyList<Entry> entries)
    {
        Dictionary<string, string> struck = Struck(entries);
        ILookup<EntryKind, Entry> byKind = entries.ToLookup(entry => entry.Kind);
        Dictionary<string, Entry> places = [];
        ArrayBufferWriter<byte> buffer = new();
        using (Utf8JsonWriter json = new(buffer, _options))
        {
            json.WriteStartObject();
            json.WriteString("format", JobWords.Format);
            json.WriteNumber("version", JobWords.Version);
            foreach ((string name, EntryKind kind) in EntryWords.Singles)
            {
                if (byKind[kind].LastOrDefault() is { } last)
                {
                    json.WritePropertyName(name);
                    json.WriteRawValue(last.Body);
                    places[name] = last;
                }
            }

            foreach (IGrouping<string, (string List, EntryKind Kind)> owner in EntryWords.Lists.GroupBy(list => list.List.Contains('.', StringComparison.Ordinal) ? "parts" : ""))
            {
                if (owner.Key.Length > 0)
                {
                    json.WriteStartObject(owner.Key);
                }

                foreach ((string list, EntryKind kind) in owner)
                {
                    WriteList(json, list, byKind[kind], struck, places);
                }

                if (owner.Key.Length > 0)
                {
                    json.WriteEndObject();
                }
            }

            json.WriteEndObject();
        }

        return (buffer.WrittenSpan.ToArray(), places);
    }

    /// <summary>The reasons of struck entries, by key; the first strike counts.</summary>
    public static Dictionary<string, string> Struck(IReadOnlyList<Entry> entries)
    {
        Dictionary<string, string> struck = [];
        foreach (Entry entry in entries.Where(entry => entry.Kind == EntryKind.Strike))
        {
            using JsonDocument body = JsonDocument.Parse(entry.Body);
            struck.TryAdd(body.RootElement.GetProperty("entry").GetString()!, body.RootElement.GetProperty("reason").GetString()!);
        }

        return struck;
    }

    private static void WriteList(
        Utf8JsonWriter json, string list, IEnumerable<Entry> entries, Dictionary<string, string> struck, Dictionary<string, Entry> places)
    {
        json.WriteStartArray(list[(list.IndexOf('.', StringComparison.Ordinal) + 1)..]);
        int row = 0;
        foreach (Entry entry in entries)
        {
            if (!struck.TryGetValue(entry.Key, out string? reason))
            {
                json.WriteRawValue(entry.Body);
            }
            else if (entry.Kind == EntryKind.Reading)
            {
                // A job file keeps struck readings and says why; of other things it has only what stands.
                WriteStruck(json, entry.Body, reason);
            }
            else
            {
                continue;
            }

            places[$"{list}[{row++}]"] = entry;
        }

        json.WriteEndArray();
    }

    private static void WriteStruck(Utf8JsonWriter json, string body, string reason)
    {
        using JsonDocument reading = JsonDocument.Parse(body);
        json.WriteStartObject();
        foreach (JsonProperty field in reading.RootElement.EnumerateObject().Where(field => field.Name != "struck"))
        {
            field.WriteTo(json);
        }

        json.WriteString("struck", reason);
        json.WriteEndObject();
    }
}
