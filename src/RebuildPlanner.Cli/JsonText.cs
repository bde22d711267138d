using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace RebuildPlanner.Cli;

/// <summary>Elements of the job file as text, read by people no less than by programs: ± and µ stay themselves.</summary>
internal static class JsonText
{
    private static readonly JsonWriterOptions _options = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>What is written, as text in one line.</summary>
    public static string Write(Action<Utf8JsonWriter> write)
    {
        using MemoryStream stream = new();
        using (Utf8JsonWriter json = new(stream, _options))
        {
            write(json);
        }

        return Encoding.UTF8.GetString(stream.ToArray());
    }

    /// <summary>A text in quotes.</summary>
    public static string Quoted(string text) => $"\"{JsonEncodedText.Encode(text, JavaScriptEncoder.UnsafeRelaxedJsonEscaping)}\"";

    /// <summary>A field of an element that is text, or null where it has none.</summary>
    public static string? Field(string body, string name)
    {
        using JsonDocument document = JsonDocument.Parse(body);
        return Field(document.RootElement, name);
    }

    /// <inheritdoc cref="Field(string, string)"/>
    public static string? Field(JsonElement element, string name) =>
        element.ValueKind == JsonValueKind.Object && element.TryGetProperty(name, out JsonElement value) && value.ValueKind == JsonValueKind.String
            ? value.GetString()
            : null;
}
