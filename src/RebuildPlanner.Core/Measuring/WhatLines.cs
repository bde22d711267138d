using RebuildPlanner.Core.Quantities;
using static RebuildPlanner.Core.Measuring.Belongs;
using static RebuildPlanner.Core.Measuring.PlaceKeys;
using Metal = RebuildPlanner.Core.Measuring.PartMetal;

namespace RebuildPlanner.Core.Measuring;

/// <summary>The lines themselves, in the order of the enumeration.</summary>
/// <remarks>
/// Ranges run from a moped to a large marine diesel: common practice, and generous, since they are there to catch a wrong unit or a lost
/// decimal point and not to judge an engine. A range that starts at zero belongs to what may truly be nothing (a flat head's chamber); one
/// that starts below it, to what may lie on either side (a new seat insert lifts its valve).
/// </remarks>
internal static class WhatLines
{
    private const double Mm3PerCc = 1000.0;

    private static readonly QuantityRule FaceArea = new([QuantityKind.Area], SignWords.None, 100, 250_000);

    private static readonly QuantityRule Opening = new([QuantityKind.Length, QuantityKind.Area], SignWords.None, 20, 600, 300, 300_000);

    public static readonly IReadOnlyList<WhatLine> All =
    [
        Of(What.Bore, "bore", Mm(20, 500), Cylinder, Metal.Block, Depth | Axis, Named.Cylinder),
        Of(What.Stroke, "stroke", Mm(15, 600), Engine, Metal.Steel),
        Of(What.Travel, "travel", Mm(15, 600), Engine, Metal.Steel),
        Of(What.Chamber, "chamber", Cc(0, 5000), Cylinder, Metal.Head, None, Named.Cylinder),
        Of(What.ChamberOpeningArea, "chamber opening area", FaceArea, Cylinder, Metal.Head, None, Named.Cylinder),
        Of(What.ValveSink, "valve sink", Mm(-5, 20), Cylinder, Metal.Head, PlaceKeys.Valve, Named.Cylinder),
        Of(What.ValveHeadDiameter, "valve head diameter", Mm(8, 250), Cylinder, Metal.Steel, PlaceKeys.Valve),
        Of(What.Deck, "deck", Mm(-15, 50, SignWords.Deck), Cylinder, Metal.Block, PinEnd, Named.Cylinder),
        Of(What.Rock, "rock", Mm(0, 2), Cylinder, Metal.Block, None, Named.Cylinder),
        Of(What.Crown, "crown", Cc(-2000, 5000, SignWords.Crown), Cylinder, Metal.Piston, None, Named.CylinderOrPiece),
        Of(What.CrownFill, "crown fill", Cc(0, 10_000), Cylinder, Metal.Block, Drop, Named.Cylinder), // most of the fill stands in the bore
        Of(What.WholeChamber, "whole chamber", Cc(0.5, 15_000), Cylinder, Metal.Head, None, Named.Cylinder),
        Of(What.PlugHole, "plug hole", Cc(0, 100), Cylinder, Metal.Head),
        Of(What.Pocket, "pocket", Cc(0, 1000), Cylinder, Metal.Head, PlaceKeys.Valve),
        Of(What.HeadRecess, "head recess", Mm(0, 50), Cylinder, Metal.Head),
        Of(What.GasketThickness, "gasket thickness", Mm(0, 5), Head, Metal.Steel),
        Of(What.GasketOpening, "gasket opening", Opening, Head, Metal.Steel),
        Of(What.BaseGasket, "base gasket", Mm(0, 10), Cylinder, Metal.Steel),
        Of(What.TopLandHeight, "top land height", Mm(0.5, 80), Cylinder, Metal.Piston, None, Named.PieceAllowed),
        Of(What.TopLandDiameter, "top land diameter", Mm(18, 500), Cylinder, Metal.Piston, None, Named.PieceAllowed),
        Of(What.Wall, "wall", Mm(0.3, 80), Cylinder, Metal.Block, Depth | Clock, Named.Cylinder),
        Of(What.Skirt, "skirt", Mm(18, 500), Cylinder, Metal.Piston, None, Named.CylinderOrPiece),
        Of(What.CompressionHeight, "compression height", Mm(5, 400), Cylinder, Metal.Piston, None, Named.PieceAllowed),
        Of(What.RodLength, "rod length", Mm(30, 1500), Cylinder, Metal.Rod),
        Of(What.PistonPin, "piston pin", Mm(5, 250), Cylinder, Metal.Steel, None, Named.PieceAllowed),
        Of(What.MainJournal, "main journal", Mm(8, 500), Engine, Metal.Steel),
        Of(What.MainHousing, "main housing", Mm(10, 550), Engine, Metal.Block),
        Of(What.RodJournal, "rod journal", Mm(8, 450), Cylinder, Metal.Steel),
        Of(What.RodHousing, "rod housing", Mm(10, 500), Cylinder, Metal.Rod),
        Of(What.Shell, "shell", Mm(0.5, 15), Cylinder, Metal.Steel),
        Of(What.EndFloat, "end float", Mm(0, 3), Engine, Metal.Block),
        Of(What.RodSideClearance, "rod side clearance", Mm(0, 5), Cylinder, Metal.Rod),
        Of(What.RingGap, "ring gap", Mm(0, 8), Cylinder, Metal.Steel, None, Named.Cylinder),
        Of(What.HeadHeight, "head height", Mm(10, 600), Head, Metal.Head),
        Of(What.BlockHeight, "block height", Mm(40, 2000), Bank, Metal.Block),
        Of(What.BarrelHeight, "barrel height", Mm(20, 1500), Cylinder, Metal.Block),
        Of(What.DeckHeight, "deck height", Mm(10, 2000), Bank, Metal.Block),
        Of(What.Flatness, "flatness", Mm(0, 2), Engine, Metal.Block),
        Of(What.LinerProtrusion, "liner protrusion", Mm(-1, 2, SignWords.Protrusion), Cylinder, Metal.Block, Clock, Named.Cylinder),
        Of(What.PistonProtrusion, "piston protrusion", Mm(-20, 10, SignWords.Protrusion), Cylinder, Metal.Block, PinEnd, Named.Cylinder),
        Of(What.CrankRise, "crank rise", Mm(0, 5), Engine, Metal.Block),
        Of(What.Guide, "guide", Mm(3, 60), Cylinder, Metal.Head, PlaceKeys.Valve),
        Of(What.Stem, "stem", Mm(3, 60), Cylinder, Metal.Steel, PlaceKeys.Valve),
        Of(What.SpringHeight, "spring height", Mm(10, 250), Cylinder, Metal.Head, PlaceKeys.Valve),
        Of(What.PistonToValve, "piston to valve", Mm(0, 30), Cylinder, Metal.Head, PlaceKeys.Valve, Named.Cylinder),
    ];

    /// <summary>What a reading must or may name.</summary>
    [Flags]
    private enum Named
    {
        Nothing = 0,
        Cylinder = 1,
        PieceAllowed = 2,
        CylinderOrPiece = Cylinder | PieceAllowed,
    }

    private static WhatLine Of(
        What what, string word, QuantityRule rule, Belongs belongs, Metal metal, PlaceKeys keys = None, Named named = Named.Nothing) =>
        new(what, word, rule, belongs, named.HasFlag(Named.Cylinder), named.HasFlag(Named.PieceAllowed), keys, metal);

    private static QuantityRule Mm(double low, double high, SignWords signs = SignWords.None) =>
        new([QuantityKind.Length], signs, low, high);

    private static QuantityRule Cc(double low, double high, SignWords signs = SignWords.None) =>
        new([QuantityKind.Volume], signs, low * Mm3PerCc, high * Mm3PerCc);
}
