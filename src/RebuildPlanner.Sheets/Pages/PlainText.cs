using System.Text;

namespace RebuildPlanner.Sheets.Pages;

/// <summary>Text that can be printed: what a job file may hold but no page can show is taken out or made visible.</summary>
public static class PlainText
{
    /// <summary>The text in one line: control characters become blanks, halves of characters the replacement character.</summary>
    public static string Of(string text)
    {
        StringBuilder plain = new(text.Length);
        foreach (Rune rune in text.EnumerateRunes())
        {
            plain.Append(Rune.IsControl(rune) || rune.Value is 0x2028 or 0x2029 or 0xFFFE or 0xFFFF ? new Rune(' ') : rune);
        }

        return plain.ToString();
    }
}
