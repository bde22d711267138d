using System.Globalization;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>One object of the file, read field by field: what was asked for is known, and whatever is left at the end is not.</summary>
/// <remarks>So the list of known fields is nowhere written twice: it is what the code that reads them asks for.</remarks>
internal sealed class Fields
{
    // As many as a reading is asked for.
    private const int UsualAsked = 32;

    // A job has hundreds of objects of a few fields each: looking along them costs less than a table for every one.
    private const int MostLookedAlong = 16;

    private readonly Dictionary<string, JsonField>? _byName;
    private readonly List<(string Name, bool Refused)> _asked = new(UsualAsked);

    private Fields(JsonTree node, FaultList faults)
    {
        (Node, Faults) = (node, faults);
        ReadOnlySpan<JsonField> fields = node.Fields;
        _byName = fields.Length > MostLookedAlong ? [] : null;
        for (int index = 0; index < fields.Length; index++)
        {
            JsonField field = fields[index];
            if (Written(field.Name, fields[..index]) is { } first)
            {
                field.IsKnown = true;
                faults.Add(
                    field.Spot, node.PathOf(field.Name), field.Value?.Shown,
                    $"the field '{JsonTree.Short(field.Name)}' stands here twice, first on line {first.Spot.Line}; keep one");
            }
            else
            {
                _byName?.Add(field.Name, field);
            }
        }
    }

    public JsonTree Node { get; }

    public FaultList Faults { get; }

    /// <summary>The fields of an object, or null and a fault where something else stands.</summary>
    public static Fields? Open(JsonTree node, FaultList faults, string noun)
    {
        if (node.Kind == JsonKind.Object)
        {
            return new(node, faults);
        }

        faults.Add(node, $"{noun} is an object, {{ … }}");
        return null;
    }

    /// <summary>The value of a field; null where it is left out or written as null, which means the same.</summary>
    public JsonTree? Take(string name, bool required = false)
    {
        _asked.Add((name, false));
        if (Written(name, Node.Fields) is { } field)
        {
            field.IsKnown = true;
            if (field.Value is { Kind: not JsonKind.Nothing } value)
            {
                return value;
            }
        }

        if (required)
        {
            Faults.Missing(Node, name, $"'{name}' is missing and is needed here");
        }

        return null;
    }

    /// <summary>The value of a field that has no business here: known by name, so the answer can say why.</summary>
    public void Refuse(string name, string why)
    {
        if (TakeRefused(name) is { } value)
        {
            Faults.Add(value, why);
        }
    }

    /// <summary>The value of a field that does not go with what is described here.</summary>
    public void NotToldOf(string thing, string name)
    {
        if (TakeRefused(name) is { } value)
        {
            Faults.Add(value, $"'{name}' is not told of {thing}");
        }
    }

    public string? Text(string name, bool required = false)
    {
        JsonTree? value = Take(name, required);
        return value is null || Is(value, JsonKind.Text, "text in double quotes") ? value?.Text : null;
    }

    /// <summary>A text by which something is called: not empty, no blanks around it that an eye would miss.</summary>
    public string? Label(string name, bool required = false) => Take(name, required) is { } value ? LabelOf(value) : null;

    public string? LabelOf(JsonTree value)
    {
        if (!Is(value, JsonKind.Text, "text in double quotes"))
        {
            return null;
        }

        if (value.Text.Length > 0 && value.Text.AsSpan().Trim().Length == value.Text.Length)
        {
            return value.Text;
        }

        Faults.Add(value, "a name is not empty and has no blanks before or after it");
        return null;
    }

    public T? Word<T>(string name, WordList<T> words, bool required = false)
        where T : struct
    {
        if (Take(name, required) is not { } value)
        {
            return null;
        }

        if (value.Kind == JsonKind.Text && words.Find(value.Text) is { } meaning)
        {
            return meaning;
        }

        Faults.Add(value, value.Kind == JsonKind.Text ? Wording.Unknown("word", value.Text, words.Words) : $"this must be one of {Wording.Listed(words.Words)}");
        return null;
    }

    public Quantity? Quantity(string name, QuantityRule rule, bool required = false) =>
        Take(name, required) is { } value ? QuantityOf(value, rule) : null;

    public Quantity? QuantityOf(JsonTree value, QuantityRule rule)
    {
        bool bareIsRight = rule.Kinds.Contains(QuantityKind.Ratio);
        if (value.Kind == JsonKind.Number && !bareIsRight)
        {
            Faults.Add(value, $"a number here carries its unit; write {Wording.WithUnit(value.Text, rule)}");
            return null;
        }

        if (value.Kind != JsonKind.Text && value.Kind != JsonKind.Number)
        {
            Faults.Add(value, $"a quantity is text in double quotes such as {Wording.WithUnit("84.5", rule)}");
            return null;
        }

        Quantity? quantity = QuantityText.Read(value.Text, rule, out string? problem);
        if (problem is not null)
        {
            Faults.Add(value, problem);
        }

        return quantity;
    }

    public bool? Flag(string name)
    {
        JsonTree? value = Take(name);
        return value is not null && Is(value, JsonKind.Flag, "true or false, without quotes") ? value.Text == "true" : null;
    }

    public int? Whole(string name, int least, int most, bool required = false)
    {
        if (Number(name, $"a whole number from {least} to {most}", required) is not { } number)
        {
            return null;
        }

        if (double.IsInteger(number) && number >= least && number <= most)
        {
            return (int)number;
        }

        Faults.Add(Take(name)!, $"this is a whole number from {least} to {most}");
        return null;
    }

    /// <summary>A bare JSON number.</summary>
    public double? Number(string name, string right, bool required = false)
    {
        if (Take(name, required) is not { } value || !Is(value, JsonKind.Number, right + ", without quotes"))
        {
            return null;
        }

        double? number = NumberIn(value);
        if (number is null)
        {
            Faults.Add(value, $"this must be {right}");
        }

        return number;
    }

    /// <summary>The number a JSON number or a text says, or null where it says none.</summary>
    public static double? NumberIn(JsonTree value) =>
        value.Kind is JsonKind.Number or JsonKind.Text
        && double.TryParse(value.Text, NumberStyles.Float, CultureInfo.InvariantCulture, out double number) && double.IsFinite(number)
            ? number
            : null;

    public IReadOnlyList<JsonTree> List(string name)
    {
        JsonTree? value = Take(name);
        return value is not null && Is(value, JsonKind.List, "a list, [ … ]") ? value.Items : [];
    }

    public Fields? Object(string name, bool required = false) =>
        Take(name, required) is { } value ? Open(value, Faults, $"'{name}'") : null;

    public void Missing(string name, string message) => Faults.Missing(Node, name, message);

    /// <summary>Names every field that nobody asked for.</summary>
    public void Close()
    {
        foreach (JsonField field in Node.Fields)
        {
            if (!field.IsKnown)
            {
                string[] left = [.. _asked.Select(asked => asked.Name).Distinct().Where(name => Written(name, Node.Fields) is null && !_asked.Contains((name, true)))];
                Faults.Add(field.Spot, Node.PathOf(field.Name), field.Value?.Shown, Wording.Unknown("field", field.Name, left));
            }
        }
    }

    private JsonTree? TakeRefused(string name)
    {
        _asked.Add((name, true));
        return Take(name);
    }

    private JsonField? Written(string name, ReadOnlySpan<JsonField> among)
    {
        if (_byName is not null)
        {
            return _byName.GetValueOrDefault(name);
        }

        foreach (JsonField field in among)
        {
            if (field.Name == name)
            {
                return field;
            }
        }

        return null;
    }

    private bool Is(JsonTree value, JsonKind kind, string right)
    {
        if (value.Kind == kind)
        {
            return true;
        }

        Faults.Add(value, $"this must be {right}");
        return false;
    }
}
