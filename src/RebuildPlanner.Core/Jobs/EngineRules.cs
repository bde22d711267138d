using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Jobs;

/// <summary>How the quantities outside the list of <c>what</c> are written: the engine's own fields, gauges, parts.</summary>
/// <remarks>Ranges are common practice and generous, as in <see cref="WhatTable"/>: they catch slips, they do not judge.</remarks>
public static class EngineRules
{
    /// <summary>Twice the crank throw.</summary>
    public static QuantityRule Stroke => WhatTable.Line(What.Stroke).Rule;

    /// <summary>Rod, centre to centre.</summary>
    public static QuantityRule RodLength => WhatTable.Line(What.RodLength).Rule;

    /// <summary>Pin offset, &gt; 0 towards the side the crankpin moves to after top dead centre.</summary>
    public static QuantityRule PinOffset { get; } = Mm(-50, 50);

    /// <summary>The maker's bore.</summary>
    public static QuantityRule OriginalBore => WhatTable.Line(What.Bore).Rule;

    /// <summary>The displacement claimed, of all cylinders: from a model engine's to 24 of the largest.</summary>
    public static QuantityRule ClaimedDisplacement { get; } = new([QuantityKind.Volume], SignWords.None, 1e4, 3e9);

    /// <summary>Between the banks of a vee.</summary>
    public static QuantityRule VeeAngle { get; } = Deg(0, 180);

    /// <summary>Tilt of the intake face from perpendicular-to-deck towards horizontal.</summary>
    public static QuantityRule IntakeFaceAngle { get; } = Deg(-60, 90);

    /// <summary>Pitch diameter of the crank sprocket.</summary>
    public static QuantityRule SprocketPitchDiameter { get; } = Mm(10, 500);

    /// <summary>Between a driving-side run and the head's movement.</summary>
    public static QuantityRule RunAngle { get; } = Deg(0, 90);

    /// <summary>Inlet closing, kept after bottom dead centre.</summary>
    public static QuantityRule InletCloses { get; } = Deg(-60, 150, SignWords.AfterBottom);

    /// <summary>Exhaust closing, kept before top dead centre; a four-stroke's lies after it.</summary>
    public static QuantityRule ExhaustCloses { get; } = Deg(-90, 150, SignWords.BeforeTop);

    /// <summary>The lift at which a closing is stated.</summary>
    public static QuantityRule TimingLift { get; } = Mm(0, 10);

    /// <summary>Valve lift over cam lift.</summary>
    public static QuantityRule RockerRatio { get; } = new([QuantityKind.Ratio], SignWords.None, 0.5, 3);

    /// <summary>Pushrod from the bore axis.</summary>
    public static QuantityRule PushrodTilt { get; } = Deg(0, 60);

    /// <summary>Boost, gauge.</summary>
    public static QuantityRule Boost { get; } = new([QuantityKind.Pressure], SignWords.None, 0, 1000);

    /// <summary>Height above the sea, −500 m to 6000 m, kept in mm like every length.</summary>
    public static QuantityRule Altitude { get; } = Mm(-500_000, 6_000_000);

    /// <summary>A gauge's resolution, limit of error or repeatability, in the unit of what it reads.</summary>
    /// <remarks>One range has to serve four units, so that it catches only what fits none: 1e-6 mm to 1e5 mm³.</remarks>
    public static QuantityRule GaugeStep { get; } =
        new([QuantityKind.Length, QuantityKind.Volume, QuantityKind.Angle, QuantityKind.Pressure], SignWords.None, 0, 1e5);

    /// <summary>Temperature of gauge and part at a reading: a cold shop to a part out of the washer.</summary>
    public static QuantityRule Temperature { get; } = new([QuantityKind.Temperature], SignWords.None, -40, 150);

    /// <summary>How far the crown stands below the deck for a crown fill.</summary>
    public static QuantityRule Drop { get; } = Mm(0, 200);

    /// <summary>Where the liquid stands in a burette.</summary>
    public static QuantityRule BuretteScale { get; } = new([QuantityKind.Volume], SignWords.None, 0, 5e6);

    /// <summary>Bore less skirt that a piston set wants.</summary>
    public static QuantityRule WantedClearance { get; } = Mm(0, 3);

    /// <summary>The bore a piston set is made for.</summary>
    public static QuantityRule OversizeBore => WhatTable.Line(What.Bore).Rule;

    /// <summary>The range of piston protrusion a gasket grade is for.</summary>
    public static QuantityRule GasketProtrusion => WhatTable.Line(What.PistonProtrusion).Rule;

    private static QuantityRule Mm(double low, double high) => new([QuantityKind.Length], SignWords.None, low, high);

    private static QuantityRule Deg(double low, double high, SignWords signs = SignWords.None) =>
        new([QuantityKind.Angle], signs, double.DegreesToRadians(low), double.DegreesToRadians(high));
}
