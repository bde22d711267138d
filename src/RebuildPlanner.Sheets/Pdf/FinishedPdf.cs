using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;

namespace RebuildPlanner.Sheets.Pdf;

/// <summary>Finishes what the library saved: its own packet of metadata, and the same names for the same fonts every time.</summary>
/// <remarks>
/// The library draws the tags of font subsets by lot and does not escape its metadata. Its file is plain: objects one after the other, one
/// table of where each begins, one trailer. So it is taken apart at that table and put together again. Source: iso32000 (7.5).
/// </remarks>
internal static partial class FinishedPdf
{
    // Every byte is one character and back again, so that text can be searched without touching what is not text.
    private static readonly Encoding _bytes = Encoding.Latin1;

    /// <summary>The finished file.</summary>
    /// <param name="saved">What the library saved.</param>
    /// <param name="metadata">The packet that takes the place of its metadata.</param>
    public static byte[] Of(byte[] saved, byte[] metadata)
    {
        string text = _bytes.GetString(saved);
        int table = int.Parse(text.AsSpan(text.LastIndexOf("startxref", StringComparison.Ordinal) + 9).Trim().TrimEnd("%EOF").Trim(), CultureInfo.InvariantCulture);
        Match head = TableHead().Match(text, table);
        int count = int.Parse(head.Groups[1].ValueSpan, CultureInfo.InvariantCulture), entries = table + head.Length;
        int[] starts = new int[count];
        for (int number = 1; number < count; number++)
        {
            starts[number] = int.Parse(text.AsSpan(entries + (number * EntryLength), 10), CultureInfo.InvariantCulture);
        }

        int[] inFile = [.. Enumerable.Range(1, count - 1).OrderBy(number => starts[number])];
        Dictionary<string, string> tags = [];
        StringBuilder finished = new(text.Length);
        finished.Append(text, 0, starts[inFile[0]]);
        for (int place = 0; place < inFile.Length; place++)
        {
            int number = inFile[place], end = place + 1 < inFile.Length ? starts[inFile[place + 1]] : table;
            string body = text[starts[number]..end];
            starts[number] = finished.Length;
            finished.Append(IsMetadata(body) ? Metadata(number, metadata) : Retagged(body, tags));
        }

        int newTable = finished.Length;
        finished.Append(CultureInfo.InvariantCulture, $"xref\n0 {count}\n").Append(text, entries, EntryLength);
        foreach (int start in starts.Skip(1))
        {
            finished.Append(CultureInfo.InvariantCulture, $"{start:D10} 00000 n\r\n");
        }

        int trailer = entries + (count * EntryLength), trailerEnd = text.LastIndexOf("startxref", StringComparison.Ordinal);
        finished.Append(text, trailer, trailerEnd - trailer).Append(CultureInfo.InvariantCulture, $"startxref\n{newTable}\n%%EOF\n");
        return _bytes.GetBytes(finished.ToString());
    }

    private const int EntryLength = 20;

    private static bool IsMetadata(string body) => Dictionary(body).Contains("/Type/Metadata", StringComparison.Ordinal);

    private static ReadOnlySpan<char> Dictionary(string body) =>
        body.IndexOf("stream\n", StringComparison.Ordinal) is > 0 and int stream ? body.AsSpan(0, stream) : body;

    private static string Metadata(int number, byte[] packet) => string.Create(
        CultureInfo.InvariantCulture,
        $"{number} 0 obj\n<</Type/Metadata/Subtype/XML/Length {packet.Length}>>\nstream\n{_bytes.GetString(packet)}\nendstream\nendobj\n");

    /// <summary>Font objects alone hold subset tags; each is renamed in order of its first mention.</summary>
    private static string Retagged(string body, Dictionary<string, string> tags) =>
        !Dictionary(body).Contains("/Font", StringComparison.Ordinal) || Dictionary(body).Length != body.Length
            ? body
            : SubsetTag().Replace(body, match =>
            {
                if (!tags.TryGetValue(match.Value, out string? tag))
                {
                    tags.Add(match.Value, tag = $"/SHEET{(char)('A' + tags.Count)}+");
                }

                return tag;
            });

    [GeneratedRegex(@"\Gxref\s+0 (\d+)\s*?\n")]
    private static partial Regex TableHead();

    [GeneratedRegex(@"/[A-Z]{6}\+")]
    private static partial Regex SubsetTag();
}
