using System.Text.Json;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Writes fields and leaves out what is null: the file says nothing twice and nothing that is not known.</summary>
internal sealed class FieldWriter(Utf8JsonWriter json)
{
    public Utf8JsonWriter Json => json;

    public void Text(string name, string? text)
    {
        if (text is not null)
        {
            json.WriteString(name, text);
        }
    }

    /// <summary>A quantity as it was typed, never a rounded rendering of its number.</summary>
    public void Quantity(string name, Quantity? quantity) => Text(name, quantity?.Text);

    public void Word<T>(string name, WordList<T> words, T? meaning)
        where T : struct
    {
        if (meaning is { } known)
        {
            json.WriteString(name, words.WordFor(known));
        }
    }

    public void Number(string name, int? number)
    {
        if (number is { } known)
        {
            json.WriteNumber(name, known);
        }
    }

    public void Number(string name, double? number)
    {
        if (number is { } known)
        {
            json.WriteNumber(name, known);
        }
    }

    public void Number(string name, decimal? number)
    {
        if (number is { } known)
        {
            json.WriteNumber(name, known);
        }
    }

    public void Flag(string name, bool? flag)
    {
        if (flag is { } known)
        {
            json.WriteBoolean(name, known);
        }
    }

    public void Object(string name, Action fields)
    {
        json.WriteStartObject(name);
        fields();
        json.WriteEndObject();
    }

    /// <summary>A list of objects, left out where it is empty.</summary>
    public void Each<T>(string name, EquatableList<T> items, Action<T> fields)
    {
        if (items.Count == 0)
        {
            return;
        }

        json.WriteStartArray(name);
        foreach (T item in items)
        {
            json.WriteStartObject();
            fields(item);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    public void Texts(string name, IEnumerable<string>? texts)
    {
        if (texts is null)
        {
            return;
        }

        json.WriteStartArray(name);
        foreach (string text in texts)
        {
            json.WriteStringValue(text);
        }

        json.WriteEndArray();
    }
}
