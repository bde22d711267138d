using System.Runtime.InteropServices;

namespace RebuildPlanner.Core.JobFile;

/// <summary>What kind of JSON value a node is.</summary>
internal enum JsonKind
{
    Object,
    List,
    Text,
    Number,
    Flag,
    Nothing,
}

/// <summary>One value of a JSON text that still knows where it stood, so that what is wrong can be shown to the one who typed it.</summary>
/// <remarks>The framework's own document drops positions once parsed; a fault without its line sends the reader hunting.</remarks>
internal sealed class JsonTree
{
    private const int ShownLength = 60;

    private readonly JsonTree? _parent;
    private readonly string? _name;
    private readonly int _index;
    private List<JsonField>? _fields;
    private List<JsonTree>? _items;

    private JsonTree(JsonTree? parent, string? name, int index, JsonKind kind, string text, JsonSpot spot)
    {
        (_parent, _name, _index, Kind, Text, Spot) = (parent, name, index, kind, text, spot);
    }

    public JsonKind Kind { get; }

    /// <summary>The text without quotes and escapes, the number as typed, or true or false.</summary>
    public string Text { get; }

    public JsonSpot Spot { get; }

    /// <summary>Fields of an object in file order, the same name perhaps twice.</summary>
    public ReadOnlySpan<JsonField> Fields => CollectionsMarshal.AsSpan(_fields);

    public IReadOnlyList<JsonTree> Items => _items ?? (IReadOnlyList<JsonTree>)[];

    /// <summary>Such as <c>readings[3].value</c>, counted from 0; empty for the whole file.</summary>
    public string Path => _parent is null ? "" : _name is null ? $"{_parent.Path}[{_index}]" : PathOf(_name, _parent);

    /// <summary>What stood there, short enough for a message.</summary>
    public string Shown => Kind switch
    {
        JsonKind.Object => "{ … }",
        JsonKind.List => "[ … ]",
        JsonKind.Nothing => "null",
        _ => Short(Text),
    };

    public static JsonTree Under(JsonTree? parent, JsonField? field, JsonKind kind, string text, JsonSpot spot)
    {
        JsonTree node = new(parent, field?.Name, parent?._items?.Count ?? 0, kind, text, spot);
        if (field is not null)
        {
            field.Value = node;
        }
        else if (parent is not null)
        {
            (parent._items ??= []).Add(node);
        }

        return node;
    }

    /// <summary>Begins a field, whose value comes next.</summary>
    public JsonField Begin(string name, JsonSpot spot)
    {
        JsonField field = new(name, spot);
        (_fields ??= []).Add(field);
        return field;
    }

    public string PathOf(string field) => PathOf(field, this);

    /// <summary>A text cut to what a message can bear, never between the halves of one character.</summary>
    public static string Short(string text)
    {
        if (text.Length <= ShownLength)
        {
            return text;
        }

        int end = char.IsHighSurrogate(text[ShownLength - 1]) ? ShownLength - 1 : ShownLength;
        return text[..end] + "…";
    }

    private static string PathOf(string field, JsonTree owner) =>
        owner._parent is null ? Short(field) : $"{owner.Path}.{Short(field)}";
}

/// <summary>Where a token begins.</summary>
/// <param name="Line">Line from 1.</param>
/// <param name="Offset">Byte from 0: the order of faults on one line.</param>
internal readonly record struct JsonSpot(int Line, int Offset);

/// <summary>A field of an object: its name, where that stood, and its value.</summary>
internal sealed class JsonField(string name, JsonSpot spot)
{
    public string Name => name;

    public JsonSpot Spot => spot;

    /// <summary>Whether whoever reads the object has asked for it.</summary>
    public bool IsKnown { get; set; }

    /// <summary>Null only where the text breaks off before the value.</summary>
    public JsonTree? Value { get; set; }
}
