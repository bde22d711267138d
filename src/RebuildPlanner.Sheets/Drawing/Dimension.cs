namespace RebuildPlanner.Sheets.Drawing;

/// <summary>A dimension as on a workshop drawing: two witness lines, a line between them with arrowheads, and the figure.</summary>
public static class Dimension
{
    private const double ArrowMm = 1.8, ArrowHalfWidthMm = 0.35, GapMm = 0.7, PastMm = 1.0, OutsideMm = 3.5, SizePt = 7.5, AboveMm = 0.8;

    // How wide and high a letter of a figure is, near enough to see whether it fits.
    private const double LetterMm = 1.45, LetterHeightMm = 1.9;

    /// <summary>A height, between two levels, dimensioned beside the part.</summary>
    /// <param name="fromXMm">Where the witness lines start, mm.</param>
    /// <param name="topMm">The upper level, mm.</param>
    /// <param name="bottomMm">The lower level, mm.</param>
    /// <param name="lineXMm">Where the dimension line stands, mm.</param>
    /// <param name="text">The figure, or nothing where it is said elsewhere.</param>
    public static IEnumerable<Shape> Vertical(double fromXMm, double topMm, double bottomMm, double lineXMm, string text)
    {
        double side = Math.Sign(lineXMm - fromXMm);
        yield return new Line(new(fromXMm + (side * GapMm), topMm), new(lineXMm + (side * PastMm), topMm), Pen.Fine);
        yield return new Line(new(fromXMm + (side * GapMm), bottomMm), new(lineXMm + (side * PastMm), bottomMm), Pen.Fine);

        // Too close for arrows between them: the arrows stand outside and point inwards, the figure beside the line.
        bool outside = bottomMm - topMm < 2.5 * ArrowMm;
        double over = outside ? OutsideMm : 0.0;
        yield return new Line(new(lineXMm, topMm - over), new(lineXMm, bottomMm + over), Pen.Fine);
        yield return Arrow(new(lineXMm, topMm), 0.0, outside ? 1.0 : -1.0);
        yield return Arrow(new(lineXMm, bottomMm), 0.0, outside ? -1.0 : 1.0);
        if (text.Length == 0)
        {
            yield break;
        }

        double beside = lineXMm + (side * (AboveMm + 0.4));
        Anchor away = side > 0 ? Anchor.Start : Anchor.End;

        // A figure longer than its line stands on its lower end and overhangs the upper, past the ends of the witness lines: level, it would
        // run off the drawing or into the next one.
        double clear = lineXMm + (side > 0 ? PastMm + LetterHeightMm + AboveMm : -(PastMm + AboveMm));
        yield return outside ? new Label(new(beside, topMm - AboveMm), text, SizePt, away)
            : text.Length * LetterMm > bottomMm - topMm ? new Label(new(clear, bottomMm), text, SizePt, Upright: true)
            : new Label(new(lineXMm - AboveMm, 0.5 * (topMm + bottomMm)), text, SizePt, Anchor.Middle, Upright: true);
    }

    /// <summary>A width, between two sides, dimensioned above or below the part.</summary>
    /// <param name="fromYMm">Where the witness lines start, mm.</param>
    /// <param name="leftMm">The left side, mm.</param>
    /// <param name="rightMm">The right side, mm.</param>
    /// <param name="lineYMm">Where the dimension line lies, mm.</param>
    /// <param name="text">The figure.</param>
    public static IEnumerable<Shape> Horizontal(double fromYMm, double leftMm, double rightMm, double lineYMm, string text)
    {
        double side = Math.Sign(lineYMm - fromYMm);
        yield return new Line(new(leftMm, fromYMm + (side * GapMm)), new(leftMm, lineYMm + (side * PastMm)), Pen.Fine);
        yield return new Line(new(rightMm, fromYMm + (side * GapMm)), new(rightMm, lineYMm + (side * PastMm)), Pen.Fine);
        yield return new Line(new(leftMm, lineYMm), new(rightMm, lineYMm), Pen.Fine);
        yield return Arrow(new(leftMm, lineYMm), -1.0, 0.0);
        yield return Arrow(new(rightMm, lineYMm), 1.0, 0.0);
        double aboveMm = text.Length * LetterMm > rightMm - leftMm ? AboveMm + PastMm : AboveMm; // clear of the witness lines where it overhangs them
        yield return new Label(new(0.5 * (leftMm + rightMm), lineYMm - aboveMm), text, SizePt, Anchor.Middle);
    }

    private static Polygon Arrow(Spot tip, double xDirection, double yDirection)
    {
        Spot back = new(tip.XMm - (ArrowMm * xDirection), tip.YMm - (ArrowMm * yDirection));
        return new Polygon(
            [
                tip,
                new(back.XMm - (ArrowHalfWidthMm * yDirection), back.YMm + (ArrowHalfWidthMm * xDirection)),
                new(back.XMm + (ArrowHalfWidthMm * yDirection), back.YMm - (ArrowHalfWidthMm * xDirection)),
            ],
            null, Grey: 0.0);
    }
}
