using System.Buffers;
using System.Globalization;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Entries;

/// <summary>A job as the fold of its entries: they make a job file, and the job file's own reader makes the job, so that one set of rules judges both.</summary>
public static class JobFold
{
    // What stands round the rows, at most.
    private const int Frame = 512;

    // The bodies are the job file's text already; what is added round them is read by people no less.
    private static readonly JsonWriterOptions _options = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping, SkipValidation = true };

    /// <summary>The job, or the faults that keep its entries from being one.</summary>
    /// <param name="entries">The job's entries in the order in which they were written.</param>
    public static (Job? Job, IReadOnlyList<Fault> Faults) Of(IReadOnlyList<Entry> entries) => JobFileReader.Read(File(entries).Utf8.Span);

    /// <summary>Whether the job is closed.</summary>
    public static bool IsClosed(IReadOnlyList<Entry> entries) => entries.LastOrDefault(entry => entry.Kind == EntryKind.Closed)?.Body == "true";

    /// <summary>The job file that the entries make, and where in it each row's entry stands.</summary>
    /// <remarks>Bodies are the file's own text: they are set side by side as they are, and only the reader judges them.</remarks>
    internal static (ReadOnlyMemory<byte> Utf8, Dictionary<string, Entry> Places) File(IReadOnlyList<Entry> entries)
    {
        Dictionary<string, string> struck = Struck(entries);
        ILookup<EntryKind, Entry> byKind = entries.ToLookup(entry => entry.Kind);
        Dictionary<string, Entry> places = [];
        ArrayBufferWriter<byte> file = new(Frame + entries.Sum(entry => entry.Body.Length + 1));
        Write(file, string.Create(CultureInfo.InvariantCulture, $"{{\"format\":\"{JobWords.Format}\",\"version\":{JobWords.Version}"));
        foreach ((string name, EntryKind kind) in EntryWords.Singles)
        {
            if (byKind[kind].LastOrDefault() is { } last)
            {
                Write(file, $",\"{name}\":{last.Body}");
                places[name] = last;
            }
        }

        string owner = "";
        foreach ((string list, EntryKind kind) in EntryWords.Lists)
        {
            int dot = list.IndexOf('.', StringComparison.Ordinal);
            string opens = dot < 0 ? "" : list[..dot];
            Write(file, owner == opens ? "," : (owner.Length > 0 ? "}," : ",") + (opens.Length > 0 ? $"\"{opens}\":{{" : ""));
            owner = opens;
            Write(file, $"\"{list[(dot + 1)..]}\":[");
            WriteRows(file, list, byKind[kind], struck, places);
            Write(file, "]");
        }

        Write(file, owner.Length > 0 ? "}}" : "}");
        return (file.WrittenMemory, places);
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

    private static void WriteRows(
        ArrayBufferWriter<byte> file, string list, IEnumerable<Entry> entries, Dictionary<string, string> struck, Dictionary<string, Entry> places)
    {
        int row = 0;
        foreach (Entry entry in entries)
        {
            bool isStruck = struck.TryGetValue(entry.Key, out string? reason);
            if (isStruck && entry.Kind != EntryKind.Reading)
            {
                continue;
            }

            Write(file, row > 0 ? "," : "");
            if (isStruck)
            {
                // A job file keeps struck readings and says why; of other things it has only what stands.
                WriteStruck(file, entry.Body, reason!);
            }
            else
            {
                Write(file, entry.Body);
            }

            places[$"{list}[{row++}]"] = entry;
        }
    }

    private static void WriteStruck(ArrayBufferWriter<byte> file, string body, string reason)
    {
        using JsonDocument reading = JsonDocument.Parse(body);
        using Utf8JsonWriter json = new(file, _options);
        json.WriteStartObject();
        foreach (JsonProperty field in reading.RootElement.EnumerateObject().Where(field => field.Name != "struck"))
        {
            field.WriteTo(json);
        }

        json.WriteString("struck", reason);
        json.WriteEndObject();
    }

    private static void Write(ArrayBufferWriter<byte> file, string text) => Encoding.UTF8.GetBytes(text, file);
}
