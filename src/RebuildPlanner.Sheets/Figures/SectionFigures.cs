using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Sheets.Figures;

/// <summary>What a section is drawn from: the figures that counted for one cylinder, as numbers to draw and as words to print.</summary>
internal sealed class SectionFigures
{
    private readonly Results _results;
    private readonly CylinderResult _cylinder;
    private readonly UnitSystem _system;

    /// <summary>Looks up one cylinder's figures.</summary>
    /// <param name="results">The results.</param>
    /// <param name="cylinder">The cylinder.</param>
    /// <param name="compressionHeightMm">Pin to crown of its piston, mm, or null.</param>
    /// <param name="system">The units printed in.</param>
    public SectionFigures(Results results, CylinderResult cylinder, double? compressionHeightMm, UnitSystem system)
    {
        (_results, _cylinder, _system) = (results, cylinder, system);
        BoreMm = cylinder.Bore!.Value;
        StrokeMm = Mm(What.Stroke) ?? Mm(What.Travel)!.Value;
        RodMm = Mm(What.Stroke) is null ? null : Mm(What.RodLength);
        PinOffsetMm = RodMm is null ? 0.0 : Mm(What.PinOffset) ?? 0.0;
        DeckMm = Mm(What.Deck) ?? 0.0;
        GasketMm = Mm(What.GasketThickness);
        OpeningMm = _results.Used(What.GasketOpening, cylinder.Cylinder)?.Value is { Kind: QuantityKind.Length } opening ? opening.Value : null;
        TopLandHeightMm = Mm(What.TopLandHeight);
        TopLandDiameterMm = Mm(What.TopLandDiameter);
        RecessMm = Mm(What.HeadRecess) ?? 0.0;
        HasCompressionHeight = compressionHeightMm is not null;

        // Common practice, for a piston of which nothing is written: pin to crown about four tenths of the bore.
        CompressionHeightMm = compressionHeightMm ?? (0.4 * BoreMm);
        double areaMm2 = 0.25 * Math.PI * BoreMm * BoreMm;
        ChamberMm = (cylinder.Chamber?.Value ?? 0.0) / areaMm2;
        CrownMm3 = cylinder.Crown?.Value ?? 0.0;
        TravelMm = RodMm is { } rod
            ? SliderCrank.Travel(new Real(StrokeMm), new Real(rod), new Real(PinOffsetMm)).Value
            : StrokeMm;
        ReachMm = RodMm is { } length ? SliderCrank.Reach(new Real(StrokeMm), new Real(length), new Real(PinOffsetMm)).Value : 0.0;
    }

    public double BoreMm { get; }

    public double StrokeMm { get; }

    public double? RodMm { get; }

    public double PinOffsetMm { get; }

    public double DeckMm { get; }

    public double? GasketMm { get; }

    public double? OpeningMm { get; }

    public double? TopLandHeightMm { get; }

    public double? TopLandDiameterMm { get; }

    public double RecessMm { get; }

    public bool HasCompressionHeight { get; }

    public double CompressionHeightMm { get; }

    /// <summary>Height of a disc of the bore that holds as much as the chamber, mm.</summary>
    public double ChamberMm { get; }

    public double CrownMm3 { get; }

    public double TravelMm { get; }

    public double ReachMm { get; }

    /// <summary>Crown to head where they are closest, mm, or null.</summary>
    public double? GapMm => _cylinder.PistonToHead?.Value;

    /// <summary>Whether the cylinder's bore, stroke and deck are known, without which there is nothing to draw.</summary>
    public static bool Suffice(Results results, CylinderResult cylinder) =>
        cylinder.Bore is not null && (results.Used(What.Stroke, cylinder.Cylinder) ?? results.Used(What.Travel, cylinder.Cylinder)) is not null;

    /// <summary>Whether the figure is there to be dimensioned.</summary>
    public bool Has(What what) => _results.Used(what, _cylinder.Cylinder) is not null;

    /// <summary>A figure as it is printed: as written where it was given or assumed, else rounded with its doubt.</summary>
    public string Text(What what)
    {
        ProvenanceLine line = _results.Used(what, _cylinder.Cylinder)!;
        return line.Written ?? QuantityPrint.Text(line.Value.Value, line.Value.Kind, line.Value.StandardUncertainty, _system, Signs(what));
    }

    /// <summary>A result as it is printed.</summary>
    public string Text(ResultQuantity quantity) => QuantityPrint.Text(quantity.Value, quantity.Kind, quantity.StandardUncertainty, _system);

    private static SignWords Signs(What what) => (int)what < WhatTable.Lines.Count ? WhatTable.Line(what).Rule.Signs : SignWords.None;

    private double? Mm(What what) => _results.Used(what, _cylinder.Cylinder)?.Value.Value;
}
