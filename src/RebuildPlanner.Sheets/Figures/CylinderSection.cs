using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Figures;

/// <summary>A section through one cylinder at top dead centre, drawn to scale from its own figures, with the edge of the crown enlarged beside it.</summary>
/// <remarks>
/// On the engine y runs down from the block's deck, x to the right of the bore's axis, mm. What no figure says (walls, head, skirt, bearings)
/// is drawn as a stand-in in proportion to the bore. Scales are those of ISO 5455. Source: iso5455.
/// </remarks>
public static class CylinderSection
{
    private const double WidthMm = 174.0, MainWidthMm = 104.0, MostHeightMm = 180.0, TopMm = 12.0, WordsPt = 8.0;

    // Paper per engine, the largest first.
    private static readonly double[] _reductions = [1.0, 0.5, 0.2, 0.1, 0.05, 0.02];

    /// <summary>The cylinder whose section says most: the one with the least gap, else the first that can be drawn; null where none can.</summary>
    public static CylinderResult? Choose(Results results) =>
        results.Cylinders.Where(cylinder => SectionFigures.Suffice(results, cylinder))
            .OrderBy(cylinder => cylinder.PistonToHead?.Value ?? double.PositiveInfinity).FirstOrDefault();

    /// <summary>The figure of a cylinder that can be drawn, or null.</summary>
    /// <param name="results">The results.</param>
    /// <param name="cylinder">The cylinder.</param>
    /// <param name="compressionHeightMm">Pin to crown of its piston, mm, or null where it is not recorded.</param>
    /// <param name="system">The units printed in.</param>
    /// <param name="words">The words.</param>
    public static Picture? Draw(Results results, CylinderResult cylinder, double? compressionHeightMm, UnitSystem system, SheetWording words)
    {
        if (!SectionFigures.Suffice(results, cylinder))
        {
            return null;
        }

        SectionFigures figures = new(results, cylinder, compressionHeightMm, system);
        double aboveMm = (figures.GasketMm ?? 0.0) + figures.ChamberMm + (0.16 * figures.BoreMm);
        double crankMm = figures.DeckMm + figures.CompressionHeightMm + figures.ReachMm;
        double belowMm = figures.RodMm is null ? figures.DeckMm + figures.TravelMm + (0.6 * figures.BoreMm) : crankMm + (0.5 * figures.StrokeMm) + (0.1 * figures.BoreMm);
        double widestMm = Math.Max(1.36 * figures.BoreMm, figures.StrokeMm);
        double scale = _reductions.FirstOrDefault(
            reduction => (aboveMm + belowMm) * reduction + TopMm + 4.0 <= MostHeightMm && widestMm * reduction <= MainWidthMm - 34.0, _reductions[^1]);
        double axisXMm = 14.0 + (0.5 * (MainWidthMm - 20.0)), deckYMm = TopMm + (aboveMm * scale);
        Spot At(double xMm, double yMm) => new(axisXMm + (xMm * scale), deckYMm + (yMm * scale));

        List<Shape> shapes =
        [
            .. Castings(figures, At), .. Piston(figures, At), .. Crank(figures, At, crankMm),
            new Line(At(0.0, -aboveMm - (3.0 / scale)), At(0.0, belowMm), Pen.Axis),
            .. Sizes(figures, results, cylinder, At, aboveMm, crankMm, words),
            new Label(new(0.0, 3.5), words.Of(Phrase.SectionScale, ("scale", Ratio(scale))), WordsPt, Bold: true),
        ];
        double heightMm = TopMm + ((aboveMm + belowMm) * scale) + 3.0;
        if (CrownEdge.Draw(figures, cylinder, words, MainWidthMm + 6.0, WidthMm) is { } edge)
        {
            shapes.AddRange(edge.Shapes);
            heightMm = Math.Max(heightMm, edge.BottomMm);
        }

        return new Picture(
            WidthMm, heightMm, words.Of(Phrase.SectionHead, ("cylinder", cylinder.Cylinder)), Alternative(figures, cylinder, words), shapes);
    }

    /// <summary>A scale as drawings write it: "1 : 2", "5 : 1".</summary>
    internal static string Ratio(double scale) => scale >= 1.0 ? FormattableString.Invariant($"{scale:0} : 1") : FormattableString.Invariant($"1 : {1.0 / scale:0}");

    private static IEnumerable<Shape> Castings(SectionFigures figures, Func<double, double, Spot> at)
    {
        double boreMm = 0.5 * figures.BoreMm, wallMm = 0.68 * figures.BoreMm, faceMm = -(figures.GasketMm ?? 0.0);
        double roofMm = faceMm - figures.ChamberMm, topMm = roofMm - (0.16 * figures.BoreMm), endMm = figures.DeckMm + figures.TravelMm + (0.3 * figures.BoreMm);
        Spot[] head =
        [
            at(-wallMm, topMm), at(wallMm, topMm), at(wallMm, faceMm), at(boreMm, faceMm), at(boreMm, roofMm), at(-boreMm, roofMm),
            at(-boreMm, faceMm), at(-wallMm, faceMm),
        ];
        foreach (Shape shape in Cut(head, 45.0))
        {
            yield return shape;
        }

        // The wall is a stand-in: an opening wider than that leaves no gasket to draw.
        double openingMm = Math.Min(0.5 * (figures.OpeningMm ?? figures.BoreMm), wallMm);
        foreach (double side in new[] { -1.0, 1.0 })
        {
            Spot[] block = [at(side * boreMm, 0.0), at(side * wallMm, 0.0), at(side * wallMm, endMm), at(side * boreMm, endMm)];
            foreach (Shape shape in Cut(block, -45.0))
            {
                yield return shape;
            }

            if (figures.GasketMm is not null)
            {
                yield return new Polygon([at(side * openingMm, faceMm), at(side * wallMm, faceMm), at(side * wallMm, 0.0), at(side * openingMm, 0.0)], null, 0.0);
            }
        }
    }

    private static IEnumerable<Shape> Cut(Spot[] outline, double angleDeg) =>
        [new Polygon(outline, null, 1.0), .. Hatching.Of(outline, 2.2, angleDeg), new Polygon(outline, Pen.Outline)];

    private static IEnumerable<Shape> Piston(SectionFigures figures, Func<double, double, Spot> at)
    {
        double edgeMm = 0.49 * figures.BoreMm, crownMm = figures.DeckMm, skirtMm = crownMm + figures.CompressionHeightMm + (0.3 * figures.BoreMm);
        double wellMm = 0.36 * figures.BoreMm, wellDepthMm = figures.CrownMm3 / (Math.PI * wellMm * wellMm);

        // The crown's own shape is known by its volume only: a flat well or a flat dome of that volume.
        yield return new Polygon(
            [
                at(-edgeMm, crownMm), at(-wellMm, crownMm), at(-wellMm, crownMm + wellDepthMm), at(wellMm, crownMm + wellDepthMm), at(wellMm, crownMm),
                at(edgeMm, crownMm), at(edgeMm, skirtMm), at(-edgeMm, skirtMm),
            ],
            Pen.Outline, 0.9);
        double bottomMm = crownMm + figures.TravelMm;
        yield return new Line(at(-0.5 * figures.BoreMm, bottomMm), at(0.5 * figures.BoreMm, bottomMm), Pen.Dashed);
    }

    private static IEnumerable<Shape> Crank(SectionFigures figures, Func<double, double, Spot> at, double crankMm)
    {
        double pinMm = figures.DeckMm + figures.CompressionHeightMm, throwMm = 0.5 * figures.StrokeMm, scaleMm = at(1.0, 0.0).XMm - at(0.0, 0.0).XMm;
        Spot pin = at(figures.PinOffsetMm, pinMm);
        if (figures.RodMm is { } rodMm)
        {
            // Crank and rod lie on one line at top dead centre; with an offset pin that line leans.
            double sine = figures.PinOffsetMm / (rodMm + throwMm), cosine = Math.Sqrt(1.0 - (sine * sine));
            double bigXMm = throwMm * sine, bigYMm = crankMm - (throwMm * cosine), halfMm = 0.07 * figures.BoreMm;
            Spot big = at(bigXMm, bigYMm);
            yield return new Polygon(
                [
                    at(figures.PinOffsetMm - halfMm, pinMm), at(figures.PinOffsetMm + halfMm, pinMm), at(bigXMm + (1.5 * halfMm), bigYMm),
                    at(bigXMm - (1.5 * halfMm), bigYMm),
                ],
                Pen.Outline, 1.0);
            yield return new Circle(at(0.0, crankMm), throwMm * scaleMm, Pen.Dashed);
            yield return new Circle(big, 0.26 * figures.BoreMm * scaleMm, Pen.Outline, 1.0);
            yield return new Circle(big, 0.18 * figures.BoreMm * scaleMm, Pen.Outline, 0.9);
            yield return new Circle(at(0.0, crankMm), 0.8, null, 0.0);
            yield return new Circle(big, 0.6, null, 0.0);
        }

        yield return new Circle(pin, 0.15 * figures.BoreMm * scaleMm, Pen.Outline, 1.0);
        yield return new Circle(pin, 0.1 * figures.BoreMm * scaleMm, Pen.Outline, 0.9);
        yield return new Circle(pin, 0.6, null, 0.0);
    }

    private static List<Shape> Sizes(
        SectionFigures figures, Results results, CylinderResult cylinder, Func<double, double, Spot> at, double aboveMm, double crankMm, SheetWording words)
    {
        double halfMm = 0.5 * figures.BoreMm, wallMm = 0.68 * figures.BoreMm;
        Spot left = at(-halfMm, -aboveMm), right = at(halfMm, -aboveMm);
        string bore = words.Of(Phrase.SectionBore, ("value", figures.Text(cylinder.Bore!)));
        List<Shape> sizes = [.. Dimension.Horizontal(left.YMm, left.XMm, right.XMm, left.YMm - 3.5, bore)];
        double outsideXMm = at(Math.Max(wallMm, 0.5 * figures.StrokeMm), 0.0).XMm;
        string stroke = words.Of(Phrase.SectionStroke, ("value", figures.Text(results.Used(What.Stroke, cylinder.Cylinder) is null ? What.Travel : What.Stroke)));
        if (figures.RodMm is { } rodMm)
        {
            double throwMm = 0.5 * figures.StrokeMm;
            sizes.AddRange(Dimension.Vertical(at(0.0, 0.0).XMm, at(0.0, crankMm - throwMm).YMm, at(0.0, crankMm + throwMm).YMm, outsideXMm + 7.0, stroke));
            double pinYMm = at(0.0, figures.DeckMm + figures.CompressionHeightMm).YMm;
            double bigYMm = at(0.0, crankMm - (throwMm * figures.ReachMm / (rodMm + throwMm))).YMm;
            sizes.AddRange(Dimension.Vertical(
                at(0.0, 0.0).XMm, pinYMm, bigYMm, at(-Math.Max(wallMm, throwMm), 0.0).XMm - 7.0, words.Of(Phrase.SectionRod, ("value", figures.Text(What.RodLength)))));
        }
        else
        {
            double topYMm = at(0.0, figures.DeckMm).YMm, bottomYMm = at(0.0, figures.DeckMm + figures.TravelMm).YMm;
            sizes.AddRange(Dimension.Vertical(at(wallMm, 0.0).XMm, topYMm, bottomYMm, outsideXMm + 7.0, stroke));
        }

        return sizes;
    }

    private static string Alternative(SectionFigures figures, CylinderResult cylinder, SheetWording words)
    {
        List<string> said = [words.Of(Phrase.SectionBore, ("value", figures.Text(cylinder.Bore!)))];
        Say(Phrase.SectionStroke, figures.Has(What.Stroke) ? What.Stroke : What.Travel);
        Say(Phrase.SectionRod, What.RodLength);
        Say(Phrase.SectionDeck, What.Deck);
        Say(Phrase.SectionGasket, What.GasketThickness);
        Say(Phrase.SectionOpening, What.GasketOpening);
        Say(Phrase.SectionTopLand, What.TopLandHeight);
        if (cylinder.PistonToHead is { } gap)
        {
            said.Add(words.Of(Phrase.SectionGap, ("value", figures.Text(gap))));
        }

        return string.Join(", ", said) + ".";

        void Say(Phrase phrase, What what)
        {
            if (figures.Has(what))
            {
                said.Add(words.Of(phrase, ("value", figures.Text(what))));
            }
        }
    }
}
