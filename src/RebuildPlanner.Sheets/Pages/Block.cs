using RebuildPlanner.Sheets.Drawing;

namespace RebuildPlanner.Sheets.Pages;

/// <summary>One piece of a sheet, in reading order: what it says, not where it lands.</summary>
public abstract record Block;

/// <summary>A heading, which is also a bookmark and stays with what follows it.</summary>
/// <param name="Text">Its words.</param>
/// <param name="Level">1 for the sheet's title, 2 for its parts, 3 within them.</param>
public sealed record Heading(string Text, int Level) : Block;

/// <summary>How a paragraph is set.</summary>
public enum Style
{
    /// <summary>The usual size.</summary>
    Body,

    /// <summary>The usual size, bold.</summary>
    Strong,

    /// <summary>Notes and captions.</summary>
    Small,

    /// <summary>The one sentence a customer reads.</summary>
    Answer,
}

/// <summary>A paragraph, wrapped to the width there is.</summary>
public sealed record Paragraph(string Text, Style Style = Style.Body) : Block;

/// <summary>A list of points.</summary>
public sealed record Points(IReadOnlyList<string> Items) : Block;

/// <summary>Names and what stands behind them, in two columns of pairs.</summary>
public sealed record Facts(IReadOnlyList<(string Name, string Value)> Pairs) : Block;

/// <summary>A figure with its caption; it never breaks.</summary>
public sealed record Illustration(Picture Picture, string Caption) : Block;

/// <summary>Blocks in a frame, kept on one page.</summary>
public sealed record Framed(IReadOnlyList<Block> Blocks) : Block;

/// <summary>Blocks kept on one page.</summary>
public sealed record Together(IReadOnlyList<Block> Blocks) : Block;

/// <summary>Lines to sign on, each with what is signed.</summary>
public sealed record Signatures(IReadOnlyList<string> Labels) : Block;

/// <summary>What follows starts on a new page.</summary>
public sealed record NewPage : Block;

/// <summary>A column of a table.</summary>
/// <param name="Title">Its head.</param>
/// <param name="IsText">Text, set from the left and wrapped; else a figure, set to the right and never broken.</param>
/// <param name="WidthMm">A width to keep, mm, as for writing by hand; null for what the cells need.</param>
public sealed record Column(string Title, bool IsText = false, double? WidthMm = null);

/// <summary>A table; it breaks between rows, and its head is repeated on each page.</summary>
/// <param name="Columns">The columns.</param>
/// <param name="Rows">The rows, a cell for each column.</param>
/// <param name="RowMm">The least height of a row, mm; with one, every cell is boxed, to be written in by hand.</param>
public sealed record Table(IReadOnlyList<Column> Columns, IReadOnlyList<IReadOnlyList<string>> Rows, double RowMm = 0.0) : Block;

/// <summary>A file that travels inside the sheet.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Description">What it is.</param>
/// <param name="Content">Its bytes.</param>
public sealed record Attachment(string Name, string Description, byte[] Content);

/// <summary>A whole sheet: what it says and what is said of it.</summary>
/// <param name="Title">Its title, as a reader of PDF shows it.</param>
/// <param name="Author">The shop.</param>
/// <param name="Subject">What it is about.</param>
/// <param name="Date">The day it was issued.</param>
/// <param name="Foot">What stands at the foot of every page, before its number.</param>
/// <param name="PageOf">The page's number in words, with {page} and {pages}.</param>
/// <param name="Paper">The paper.</param>
/// <param name="Blocks">The blocks in reading order.</param>
/// <param name="Attachment">The file inside, or null.</param>
public sealed record Sheet(
    string Title, string Author, string Subject, DateOnly Date, string Foot, string PageOf, Paper Paper, IReadOnlyList<Block> Blocks,
    Attachment? Attachment = null);
