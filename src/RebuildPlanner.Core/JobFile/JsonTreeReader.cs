using System.Text;
using System.Text.Json;
using System.Text.Unicode;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads JSON text into a <see cref="JsonTree"/>, or the one fault at which it stops being JSON.</summary>
/// <remarks>One pass and a stack of its own: lines are counted from token to token, so the time is linear in the bytes.</remarks>
internal ref struct JsonTreeReader
{
    // Deeper than any job file by far; a bound at all keeps a hostile text from eating memory.
    private const int DeepestNesting = 32;
    private const int Remembered = 127;

    private readonly ReadOnlySpan<byte> _utf8;
    private readonly Stack<JsonTree> _open = new();
    private readonly string?[] _seen = new string?[Remembered];
    private Utf8JsonReader _reader;
    private JsonTree? _root;
    private JsonField? _field;
    private JsonSpot _spot = new(1, 0);

    private JsonTreeReader(ReadOnlySpan<byte> utf8)
    {
        _utf8 = utf8;
        _reader = new(utf8, new JsonReaderOptions
        {
            CommentHandling = JsonCommentHandling.Skip,
            AllowTrailingCommas = true,
            MaxDepth = DeepestNesting,
        });
    }

    /// <summary>The tree, or null and a fault.</summary>
    public static JsonTree? Read(ReadOnlySpan<byte> utf8, out Fault? fault)
    {
        // Some editors put a byte order mark in front; it says nothing that UTF-8 does not say already.
        ReadOnlySpan<byte> text = utf8.StartsWith("\uFEFF"u8) ? utf8[3..] : utf8;
        if (!Utf8.IsValid(text))
        {
            fault = new(LineOfBadByte(text), "", null, "the file is not valid UTF-8 from this line on; save it as UTF-8");
            return null;
        }

        JsonTreeReader reader = new(text);
        fault = reader.ReadAll();
        return fault is null ? reader._root : null;
    }

    private Fault? ReadAll()
    {
        try
        {
            while (_reader.Read())
            {
                TakeToken();
            }

            return null;
        }
        catch (JsonException broken)
        {
            return Broken((int)(broken.LineNumber ?? 0) + 1);
        }
        catch (InvalidOperationException)
        {
            // The framework finds half a surrogate pair only when the text is asked for.
            return new(
                _spot.Line, Place(), null, "the text holds half a character (a lone \\uD800..\\uDFFF escape); write the character itself");
        }
    }

    private void TakeToken()
    {
        MoveTo((int)_reader.TokenStartIndex);
        switch (_reader.TokenType)
        {
            case JsonTokenType.PropertyName:
                _field = _open.Peek().Begin(Text(), _spot);
                break;
            case JsonTokenType.StartObject:
                _open.Push(Add(JsonKind.Object, ""));
                break;
            case JsonTokenType.StartArray:
                _open.Push(Add(JsonKind.List, ""));
                break;
            case JsonTokenType.EndObject or JsonTokenType.EndArray:
                _open.Pop();
                break;
            case JsonTokenType.String:
                Add(JsonKind.Text, Text());
                break;
            case JsonTokenType.Number:
                Add(JsonKind.Number, Encoding.UTF8.GetString(_reader.ValueSpan));
                break;
            case JsonTokenType.Null:
                Add(JsonKind.Nothing, "null");
                break;
            default:
                Add(JsonKind.Flag, _reader.TokenType == JsonTokenType.True ? "true" : "false");
                break;
        }
    }

    // Field names, stages, gauges and cylinders come again in every reading; each is made once, or again when another has taken its place.
    private string Text()
    {
        ReadOnlySpan<byte> written = _reader.ValueSpan;
        int slot = (written.Length + (written.Length == 0 ? 0 : (31 * written[0]) + (7 * written[^1]))) % Remembered;
        return _seen[slot] is { } seen && _reader.ValueTextEquals(seen) ? seen : _seen[slot] = _reader.GetString()!;
    }

    private JsonTree Add(JsonKind kind, string text)
    {
        JsonTree node = JsonTree.Under(_open.Count > 0 ? _open.Peek() : null, _field, kind, text, _spot);
        _root ??= node;
        _field = null;
        return node;
    }

    private void MoveTo(int offset) => _spot = new(_spot.Line + _utf8[_spot.Offset..offset].Count((byte)'\n'), offset);

    private readonly Fault Broken(int line) => new(line, Place(), null, $"this is not JSON: {Expected()}");

    private readonly string Place() =>
        _field is not null ? _open.Peek().PathOf(_field.Name) : _open.Count > 0 ? _open.Peek().Path : "";

    // Said from what was open and what came last; the framework's own sentence speaks of tokens and bytes.
    private readonly string Expected()
    {
        if (_open.Count == 0)
        {
            return _root is null ? "the file must be one object, { … }" : "nothing but blanks may follow the object that is the file";
        }

        if (_open.Count >= DeepestNesting)
        {
            return $"it is nested more than {DeepestNesting} deep";
        }

        JsonTree open = _open.Peek();
        if (_field is { } field)
        {
            return $"after \"{JsonTree.Short(field.Name)}\" a colon and a value were expected: "
                + "text in double quotes, a number, true, false, null, an object or a list";
        }

        string begun = $"opened on line {open.Spot.Line}";
        return open.Kind == JsonKind.List
            ? $"a value, a comma between two values, or the ] of the list {begun} was expected"
            : $"a field name in double quotes and a colon, a comma between two fields, or the }} of the object {begun} was expected";
    }

    private static int LineOfBadByte(ReadOnlySpan<byte> utf8)
    {
        int line = 1;
        while (Rune.DecodeFromUtf8(utf8, out Rune rune, out int length) == System.Buffers.OperationStatus.Done)
        {
            line += rune.Value == '\n' ? 1 : 0;
            utf8 = utf8[length..];
        }

        return line;
    }
}
