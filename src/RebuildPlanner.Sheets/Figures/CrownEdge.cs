using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Figures;

/// <summary>The edge of the crown at top dead centre, enlarged: head, gasket, deck and piston, where tenths of a millimetre decide.</summary>
internal static class CrownEdge
{
    private const double TopMm = 20.0, MostGapMm = 26.0, MostOverhangMm = 13.0, BlockMm = 20.0, HeadMm = 11.0, WordsPt = 8.0;

    // How far a recess, or a piston that meets the head, may be drawn into the head: not over its name.
    private const double MostInHeadMm = 5.5;

    private static readonly double[] _enlargements = [50.0, 20.0, 10.0, 5.0, 2.0, 1.0];

    /// <summary>The shapes between two edges of the drawing and how far down they reach; null without gasket or deck.</summary>
    public static (IReadOnlyList<Shape> Shapes, double BottomMm)? Draw(
        SectionFigures figures, CylinderResult cylinder, SheetWording words, double leftMm, double rightMm)
    {
        if (figures.GasketMm is not { } gasketMm || !figures.Has(What.Deck))
        {
            return null;
        }

        double overhangMm = Math.Max(0.0, 0.5 * ((figures.OpeningMm ?? figures.BoreMm) - figures.BoreMm));
        double gapMm = figures.GapMm ?? (gasketMm + figures.DeckMm);
        double scale = _enlargements.FirstOrDefault(
            size => (gasketMm + Math.Abs(figures.DeckMm)) * size <= MostGapMm && overhangMm * size <= MostOverhangMm && Math.Max(figures.RecessMm, figures.RecessMm - gapMm) * size <= MostInHeadMm,
            _enlargements[^1]);
        double edgeXMm = leftMm + 26.0, wallXMm = Math.Min(edgeXMm + 22.0, rightMm), faceYMm = TopMm + HeadMm, deckYMm = faceYMm + (gasketMm * scale);
        double crownYMm = deckYMm + (figures.DeckMm * scale), bottomMm = Math.Max(deckYMm, crownYMm) + BlockMm;
        double pistonXMm = edgeXMm - Math.Clamp(0.5 * (figures.BoreMm - (figures.TopLandDiameterMm ?? figures.BoreMm)) * scale, 0.7, 12.0);
        double gasketXMm = Math.Clamp(edgeXMm + (0.5 * ((figures.OpeningMm ?? figures.BoreMm) - figures.BoreMm) * scale), pistonXMm, wallXMm - 2.0);

        double roofYMm = faceYMm - (figures.RecessMm * scale);
        Spot[] head =
        [
            new(leftMm, TopMm), new(wallXMm, TopMm), new(wallXMm, faceYMm), new(edgeXMm, faceYMm), new(edgeXMm, roofYMm), new(leftMm, roofYMm),
        ];
        Spot[] block = [new(edgeXMm, deckYMm), new(wallXMm, deckYMm), new(wallXMm, bottomMm), new(edgeXMm, bottomMm)];
        List<Shape> shapes =
        [
            .. Hatching.Of(head, 2.2, 45.0), new Line(new(edgeXMm, faceYMm), new(wallXMm, faceYMm), Pen.Outline),
            new Line(new(edgeXMm, roofYMm), new(edgeXMm, faceYMm), Pen.Outline), new Line(new(leftMm, roofYMm), new(edgeXMm, roofYMm), Pen.Outline),
            .. Hatching.Of(block, 2.2, -45.0), new Line(new(edgeXMm, deckYMm), new(wallXMm, deckYMm), Pen.Outline),
            new Line(new(edgeXMm, deckYMm), new(edgeXMm, bottomMm), Pen.Outline),
            Polygon.Rectangle(gasketXMm, faceYMm, wallXMm, deckYMm, Pen.Outline, 0.25),
            .. Piston(figures, leftMm, pistonXMm, crownYMm, bottomMm, scale),
            .. Name(words.Of(Phrase.SectionHeadPart), leftMm + 14.0, TopMm + 4.0), .. Name(words.Of(Phrase.SectionBlockPart), edgeXMm + 11.0, bottomMm - 7.0),
            .. Name(words.Of(Phrase.SectionPistonPart), leftMm + 10.0, bottomMm - 3.0),
            new Label(new(leftMm, 3.5), words.Of(Phrase.SectionDetail, ("scale", CylinderSection.Ratio(scale))), WordsPt, Bold: true),
        ];

        double outXMm = wallXMm + 5.0;
        shapes.AddRange(Dimension.Vertical(wallXMm, faceYMm, deckYMm, outXMm, "A"));
        Note("A", words.Of(Phrase.SectionGasket, ("value", figures.Text(What.GasketThickness))), 8.0);
        double closestYMm = roofYMm + (gapMm * scale);

        // Inside the bore, where there is neither gasket nor hatching behind the letter.
        shapes.AddRange(Dimension.Vertical(edgeXMm, Math.Min(deckYMm, crownYMm), Math.Max(deckYMm, crownYMm), edgeXMm - 7.0, "B"));
        if (Math.Abs(closestYMm - crownYMm) > 0.15)
        {
            // The piston rocks or stands askew: where it comes closest is dashed.
            shapes.Add(new Line(new(leftMm, closestYMm), new(pistonXMm, closestYMm), Pen.Dashed));
        }

        // Where by the figures the piston meets the head, the crown lies above the roof.
        shapes.AddRange(Dimension.Vertical(leftMm + 12.0, Math.Min(roofYMm, closestYMm), Math.Max(roofYMm, closestYMm), leftMm + 6.0, "C"));
        Note("B", words.Of(Phrase.SectionDeck, ("value", figures.Text(What.Deck))), 12.0);
        if (cylinder.PistonToHead is { } gap)
        {
            Note("C", words.Of(Phrase.SectionGap, ("value", figures.Text(gap))), 16.0);
        }

        return (shapes, bottomMm + 2.0);

        // The figures stand in a list above, since the gaps they belong to are too narrow to write in.
        void Note(string letter, string text, double yMm) => shapes.Add(new Label(new(leftMm, yMm), $"{letter}  {text}", WordsPt));
    }

    /// <summary>A part's name, with the hatching left out behind it.</summary>
    private static IEnumerable<Shape> Name(string name, double xMm, double yMm)
    {
        double halfMm = 0.5 + (0.75 * name.Length); // no letter of this size is wider than 1.5 mm on average
        yield return Polygon.Rectangle(xMm - halfMm, yMm - 2.4, xMm + halfMm, yMm + 0.9, null, 1.0);
        yield return new Label(new(xMm, yMm), name, 7.5, Anchor.Middle);
    }

    private static IEnumerable<Shape> Piston(SectionFigures figures, double leftMm, double edgeXMm, double crownYMm, double bottomMm, double scale)
    {
        double grooveYMm = crownYMm + ((figures.TopLandHeightMm ?? double.PositiveInfinity) * scale);
        bool groove = grooveYMm + 5.0 < bottomMm;
        List<Spot> outline = [new(leftMm, crownYMm), new(edgeXMm, crownYMm)];
        if (groove)
        {
            outline.AddRange([new(edgeXMm, grooveYMm), new(edgeXMm - 5.0, grooveYMm), new(edgeXMm - 5.0, grooveYMm + 3.0), new(edgeXMm, grooveYMm + 3.0)]);
        }

        outline.AddRange([new(edgeXMm, bottomMm), new(leftMm, bottomMm)]);
        yield return new Polygon(outline, null, 0.9);
        for (int corner = 0; corner + 2 < outline.Count; corner++)
        {
            yield return new Line(outline[corner], outline[corner + 1], Pen.Outline);
        }
    }
}
