using System.Buffers;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Entries;

/// <summary>A job taken apart into what its entries say, each the job file's own element in one line.</summary>
public static class JobEntries
{
    private static readonly JsonWriterOptions _options = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>Kind and body of each entry, in an order that folds back to the job.</summary>
    public static IReadOnlyList<(EntryKind Kind, string Body)> Of(Job job)
    {
        using JsonDocument file = JsonDocument.Parse(JobFileWriter.Write(job));
        List<(EntryKind, string)> entries = [];
        foreach ((string name, EntryKind kind) in EntryWords.Singles)
        {
            if (file.RootElement.TryGetProperty(name, out JsonElement single))
            {
                entries.Add((kind, Body(single)));
            }
        }

        foreach ((string list, EntryKind kind) in EntryWords.Lists)
        {
            if (Find(file.RootElement, list) is { } rows)
            {
                entries.AddRange(rows.EnumerateArray().Select(row => (kind, Body(row))));
            }
        }

        return entries;
    }

    /// <summary>An element in one line, fields in their order.</summary>
    public static string Body(JsonElement element)
    {
        ArrayBufferWriter<byte> buffer = new();
        using (Utf8JsonWriter json = new(buffer, _options))
        {
            element.WriteTo(json);
        }

        return Encoding.UTF8.GetString(buffer.WrittenSpan);
    }

    private static JsonElement? Find(JsonElement root, string path)
    {
        JsonElement found = root;
        foreach (string name in path.Split('.'))
        {
            if (!found.TryGetProperty(name, out found))
            {
                return null;
            }
        }

        return found;
    }
}
