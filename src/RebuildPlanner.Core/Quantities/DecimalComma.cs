using System.Text;

namespace RebuildPlanner.Core.Quantities;

/// <summary>Finds commas inside numbers and says how the same is written with a point.</summary>
/// <remarks>A comma is never guessed at: 84,512 read as eighty-four thousand, or 1,050 as one, would be a bored-out block.</remarks>
internal static class DecimalComma
{
    public static string? Problem(string text)
    {
        if (!text.Contains(',', StringComparison.Ordinal))
        {
            return null;
        }

        StringBuilder written = new();
        bool comma = false, thousands = false;
        for (int i = 0; i < text.Length;)
        {
            int end = EndOfRun(text, i);
            if (end == i)
            {
                written.Append(text[i++]);
                continue;
            }

            string run = text[i..end];
            int commas = run.Count(c => c == ',');
            comma |= commas > 0;
            bool hasPoint = run.Contains('.', StringComparison.Ordinal);
            thousands |= commas > 1 || (commas > 0 && hasPoint);

            // Of two different marks the last is the decimal one; several commas alone can only set thousands apart.
            written.Append(commas == 0 ? run
                : hasPoint && run.LastIndexOf(',') > run.LastIndexOf('.') ? run.Replace(".", "", StringComparison.Ordinal).Replace(',', '.')
                : hasPoint || commas > 1 ? run.Replace(",", "", StringComparison.Ordinal)
                : run.Replace(',', '.'));
            i = end;
        }

        return !comma ? null
            : thousands ? $"Thousands are not set apart and the decimal mark is a point: write {written}."
            : $"The decimal mark is a point, not a comma: write {written}.";
    }

    // Digits with single marks between or before them; the two points of a range end a run.
    private static int EndOfRun(string text, int start)
    {
        int i = start;
        while (i < text.Length && (char.IsAsciiDigit(text[i])
            || (text[i] is '.' or ',' && i + 1 < text.Length && char.IsAsciiDigit(text[i + 1]) && (i == 0 || text[i - 1] != '.'))))
        {
            i++;
        }

        return i;
    }
}
