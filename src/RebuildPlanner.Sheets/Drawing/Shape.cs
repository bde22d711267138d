namespace RebuildPlanner.Sheets.Drawing;

/// <summary>A plain shape on paper: millimetres from the drawing's upper left corner, x to the right, y down.</summary>
public abstract record Shape;

/// <summary>A point on paper, mm.</summary>
public readonly record struct Spot(double XMm, double YMm);

/// <summary>How a line is drawn; black only, so that a copy of a copy still shows it.</summary>
/// <param name="WidthMm">Width, mm.</param>
/// <param name="DashMm">Length of dash and gap alike, mm; 0 for a full line.</param>
public readonly record struct Pen(double WidthMm, double DashMm = 0.0)
{
    /// <summary>Outlines of parts.</summary>
    public static Pen Outline { get; } = new(0.35);

    /// <summary>Hatching, dimension lines, rules.</summary>
    public static Pen Fine { get; } = new(0.13);

    /// <summary>What is not there but could be: other positions, stand-in shapes.</summary>
    public static Pen Dashed { get; } = new(0.18, 1.2);

    /// <summary>Axes of symmetry.</summary>
    public static Pen Axis { get; } = new(0.13, 3.0);
}

/// <summary>A straight line.</summary>
public sealed record Line(Spot From, Spot To, Pen Pen) : Shape;

/// <summary>A closed outline.</summary>
/// <param name="Corners">Its corners in order.</param>
/// <param name="Pen">Its outline, or null.</param>
/// <param name="Grey">Fill from 0 black to 1 white, or null for none.</param>
public sealed record Polygon(IReadOnlyList<Spot> Corners, Pen? Pen, double? Grey = null) : Shape
{
    /// <summary>A rectangle with its sides along the paper's.</summary>
    public static Polygon Rectangle(double leftMm, double topMm, double rightMm, double bottomMm, Pen? pen, double? grey = null) =>
        new([new(leftMm, topMm), new(rightMm, topMm), new(rightMm, bottomMm), new(leftMm, bottomMm)], pen, grey);
}

/// <summary>A circle.</summary>
public sealed record Circle(Spot Centre, double RadiusMm, Pen? Pen, double? Grey = null) : Shape;

/// <summary>Where a label's point lies along its text.</summary>
public enum Anchor
{
    /// <summary>At its start.</summary>
    Start,

    /// <summary>At its middle.</summary>
    Middle,

    /// <summary>At its end.</summary>
    End,
}

/// <summary>A line of text; its point lies on the baseline.</summary>
/// <param name="At">The point.</param>
/// <param name="Text">The text.</param>
/// <param name="SizePt">Type size, pt.</param>
/// <param name="Anchor">Where along the text the point lies.</param>
/// <param name="Bold">Whether bold.</param>
/// <param name="Upright">Whether it reads upwards, turned a quarter to the left.</param>
public sealed record Label(Spot At, string Text, double SizePt, Anchor Anchor = Anchor.Start, bool Bold = false, bool Upright = false) : Shape;
