namespace RebuildPlanner.Sheets.Pages;

/// <summary>A sheet of paper, upright.</summary>
/// <param name="Word">Its name.</param>
/// <param name="WidthMm">Width, mm.</param>
/// <param name="HeightMm">Height, mm.</param>
public sealed record Paper(string Word, double WidthMm, double HeightMm)
{
    /// <summary>210 mm × 297 mm. Source: iso216.</summary>
    public static Paper A4 { get; } = new("A4", 210.0, 297.0);

    /// <summary>8.5 in × 11 in. Source: ansi-y14-1.</summary>
    public static Paper Letter { get; } = new("Letter", 215.9, 279.4);

    /// <summary>Every paper known.</summary>
    public static IReadOnlyList<Paper> All { get; } = [A4, Letter];

    /// <summary>The paper of a word, or null.</summary>
    public static Paper? Find(string word) => All.FirstOrDefault(paper => string.Equals(paper.Word, word, StringComparison.OrdinalIgnoreCase));

    /// <summary>Left and right margin, mm: the left one bears a punch.</summary>
    public const double LeftMm = 20.0, RightMm = 15.0;

    /// <summary>Upper and lower margin, mm; the foot stands within the lower one.</summary>
    public const double TopMm = 15.0, BottomMm = 20.0;

    /// <summary>Width between the margins, mm.</summary>
    public double TextWidthMm => WidthMm - LeftMm - RightMm;

    /// <summary>The lowest a block may reach, mm from the top.</summary>
    public double FloorMm => HeightMm - BottomMm;
}
