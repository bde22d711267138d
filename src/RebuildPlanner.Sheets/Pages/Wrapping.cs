using System.Text;

namespace RebuildPlanner.Sheets.Pages;

/// <summary>Breaks text into lines of a width.</summary>
/// <param name="ruler">What measures a line.</param>
public sealed class Wrapping(ITextRuler ruler)
{
    /// <summary>The lines; one empty line for no text.</summary>
    /// <param name="text">The text; a line break in it is kept.</param>
    /// <param name="sizePt">Type size, pt.</param>
    /// <param name="bold">Whether bold.</param>
    /// <param name="widthMm">The width, mm; a word wider than that is broken within.</param>
    public IReadOnlyList<string> Lines(string text, double sizePt, bool bold, double widthMm)
    {
        List<string> lines = [];
        foreach (string paragraph in text.ReplaceLineEndings("\n").Split('\n'))
        {
            StringBuilder line = new();
            foreach (string word in PlainText.Of(paragraph).Split(' ', StringSplitOptions.RemoveEmptyEntries))
            {
                string wider = line.Length == 0 ? word : $"{line} {word}";
                if (Fits(wider))
                {
                    line.Clear().Append(wider);
                    continue;
                }

                if (line.Length > 0)
                {
                    lines.Add(line.ToString());
                }

                string rest = word;
                while (!Fits(rest))
                {
                    int end = Longest(rest);
                    lines.Add(rest[..end]);
                    rest = rest[end..];
                }

                line.Clear().Append(rest);
            }

            lines.Add(line.ToString());
        }

        return lines;

        bool Fits(string candidate) => ruler.WidthMm(candidate, sizePt, bold) <= widthMm;

        // At least one character, never half of one.
        int Longest(string word)
        {
            int low = 1, high = word.Length - 1;
            while (low < high)
            {
                int middle = (low + high + 1) / 2;
                (low, high) = Fits(word[..middle]) ? (middle, high) : (low, middle - 1);
            }

            return char.IsHighSurrogate(word[low - 1]) ? low == 1 ? 2 : low - 1 : low;
        }
    }

    /// <summary>The width of the widest line that must not be broken: of each word, or of the whole text.</summary>
    public double WidestMm(string text, double sizePt, bool bold, bool byWords)
    {
        char[] breaks = byWords ? [' ', '\n'] : ['\n'];
        double widest = 0.0;
        foreach (string part in text.ReplaceLineEndings("\n").Split(breaks))
        {
            widest = Math.Max(widest, ruler.WidthMm(PlainText.Of(part), sizePt, bold));
        }

        return widest;
    }
}
