using RebuildPlanner.Sheets.Drawing;

namespace RebuildPlanner.Sheets.Pages;

/// <summary>What a stretch of a page is, for a reader that cannot see it.</summary>
public enum Role
{
    /// <summary>A title.</summary>
    Heading1,

    /// <summary>A part's heading.</summary>
    Heading2,

    /// <summary>A heading within a part.</summary>
    Heading3,

    /// <summary>A paragraph.</summary>
    Paragraph,

    /// <summary>A list.</summary>
    List,

    /// <summary>One of its points.</summary>
    ListItem,

    /// <summary>A table.</summary>
    Table,

    /// <summary>A row.</summary>
    Row,

    /// <summary>The head of a column or row.</summary>
    HeadCell,

    /// <summary>A cell.</summary>
    Cell,

    /// <summary>A figure, which has an alternative text.</summary>
    Figure,

    /// <summary>Ornament, page numbers, repeated heads: said once or not at all.</summary>
    Artifact,
}

/// <summary>One step of drawing a sheet, page by page, in reading order.</summary>
public abstract record Mark;

/// <summary>A new page begins.</summary>
public sealed record PageMark : Mark;

/// <summary>A stretch with a role begins.</summary>
/// <param name="Role">The role.</param>
/// <param name="Alternative">A figure's words.</param>
/// <param name="Box">A figure's place on the page, mm: left, top, width, height.</param>
public sealed record BeginMark(Role Role, string? Alternative = null, (double LeftMm, double TopMm, double WidthMm, double HeightMm) Box = default) : Mark;

/// <summary>The innermost stretch ends.</summary>
public sealed record EndMark : Mark;

/// <summary>A bookmark to the present page.</summary>
/// <param name="Text">Its words.</param>
/// <param name="Level">1 is outermost.</param>
public sealed record BookmarkMark(string Text, int Level) : Mark;

/// <summary>A shape, in millimetres from the page's upper left corner.</summary>
public sealed record ShapeMark(Shape Shape) : Mark;
