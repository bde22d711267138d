using System.Text.Json;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary>An entry in one line, for who reads along.</summary>
internal static class EntryLine
{
    /// <summary>The line: kind, what it says, and its key.</summary>
    public static string Of(Entry entry) => $"{EntryWords.Kinds.WordFor(entry.Kind)}: {Said(entry)}  [{entry.Key}]";

    /// <summary>What an entry says; a reading's id is its key more often than not, and then it is not said twice.</summary>
    public static string Said(Entry entry)
    {
        using JsonDocument document = JsonDocument.Parse(entry.Body);
        return Said(document.RootElement, entry.Kind == EntryKind.Reading ? "id" : null);
    }

    /// <summary>What a body says: its fields in their order, the plain ones without their names.</summary>
    public static string Said(string body)
    {
        using JsonDocument document = JsonDocument.Parse(body);
        return Said(document.RootElement);
    }

    private static string Said(JsonElement element, string? without = null) => element.ValueKind switch
    {
        JsonValueKind.Object => string.Join(", ", Fields(element, without)),
        JsonValueKind.Array => string.Join("; ", element.EnumerateArray().Select(row => Said(row))),
        JsonValueKind.String => element.GetString()!,
        JsonValueKind.True => "yes",
        JsonValueKind.False => "no",
        _ => element.GetRawText(),
    };

    private static IEnumerable<string> Fields(JsonElement element, string? without)
    {
        foreach (JsonProperty field in element.EnumerateObject())
        {
            if (field.Value.ValueKind != JsonValueKind.Null && field.Name != without)
            {
                yield return Said(field);
            }
        }
    }

    // What a thing is and its figure speak for themselves; of the rest the name is said too.
    private static string Said(JsonProperty field) =>
        field.Name is "what" or "value" or "id" or "name" or "result" ? Said(field.Value) : $"{field.Name} {Said(field.Value)}";
}
