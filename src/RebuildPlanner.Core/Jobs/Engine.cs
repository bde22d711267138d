using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Two or four strokes a cycle.</summary>
public enum EngineCycle
{
    /// <summary>Four.</summary>
    FourStroke,

    /// <summary>Two.</summary>
    TwoStroke,
}

/// <summary>How the charge is lit.</summary>
public enum Ignition
{
    /// <summary>By spark.</summary>
    Spark,

    /// <summary>By compression.</summary>
    Compression,
}

/// <summary>How the cylinders stand.</summary>
public enum Layout
{
    /// <summary>One cylinder.</summary>
    Single,

    /// <summary>In one row.</summary>
    Inline,

    /// <summary>In a vee.</summary>
    Vee,

    /// <summary>Flat, opposed.</summary>
    Flat,
}

/// <summary>A metal whose expansion is known.</summary>
public enum Metal
{
    /// <summary>Cast iron, of which engines have the grey kind: 11.4e-6 /K.</summary>
    CastIron,

    /// <summary>The same by its exact name, kept as it was written.</summary>
    GreyIron,

    /// <summary>Steel, 11.7e-6 /K.</summary>
    Steel,

    /// <summary>Aluminium, 21.5e-6 /K.</summary>
    Aluminium,
}

/// <summary>A row of cylinders that share a deck.</summary>
/// <param name="Label">Its name.</param>
/// <param name="Cylinders">The labels of its cylinders.</param>
public sealed record Bank(string Label, EquatableList<string> Cylinders);

/// <summary>A cylinder head.</summary>
/// <param name="Label">Its name.</param>
/// <param name="Cylinders">The labels of its cylinders.</param>
/// <param name="Metal">What it is cast of.</param>
/// <param name="IntakeFaceAngle">Tilt of the intake face, rad.</param>
public sealed record Head(string Label, EquatableList<string> Cylinders, Metal? Metal = null, Quantity? IntakeFaceAngle = null);

/// <summary>Where the camshaft is and how it is driven, and when the valves close.</summary>
/// <param name="Overhead">True overhead, false in the block, null not said.</param>
/// <param name="Drive">Belt, chain or gear.</param>
/// <param name="SprocketPitchDiameter">Of the crank sprocket.</param>
/// <param name="RunAngles">Between each driving-side run and the head's movement.</param>
/// <param name="InletCloses">After bottom dead centre.</param>
/// <param name="ExhaustCloses">Before top dead centre; what traps the charge of a two-stroke.</param>
/// <param name="At">"seat", or the lift at which the closing is stated.</param>
/// <param name="RockerRatio">Valve lift over cam lift.</param>
/// <param name="PushrodTilt">From the bore axis.</param>
public sealed record Cam(
    bool? Overhead = null, CamDrive? Drive = null, Quantity? SprocketPitchDiameter = null, EquatableList<Quantity>? RunAngles = null,
    Quantity? InletCloses = null, Quantity? ExhaustCloses = null, string? At = null, Quantity? RockerRatio = null, Quantity? PushrodTilt = null);

/// <summary>What turns the camshaft.</summary>
public enum CamDrive
{
    /// <summary>A toothed belt.</summary>
    Belt,

    /// <summary>A chain.</summary>
    Chain,

    /// <summary>Gears.</summary>
    Gear,
}

/// <summary>The engine as its owner and its maker describe it.</summary>
/// <param name="Cylinders">How many, 1 to 24.</param>
/// <param name="Labels">Their names, in order.</param>
/// <param name="Banks">The banks; filled with one named "block" where the file leaves it out.</param>
/// <param name="Heads">The heads; filled with one a bank, named as the bank ("head" for a single one), where the file leaves them out.</param>
public sealed record Engine(
    int Cylinders, EquatableList<string> Labels, EquatableList<Bank> Banks, EquatableList<Head> Heads,
    string? Description = null, EngineCycle Cycle = EngineCycle.FourStroke, Ignition Ignition = Ignition.Spark, Layout Layout = Layout.Inline,
    Quantity? VeeAngle = null, Metal? BlockMetal = null, Quantity? Stroke = null, Quantity? RodLength = null, Metal? RodMetal = null,
    Quantity? PinOffset = null, Quantity? OriginalBore = null, Quantity? ClaimedDisplacement = null, Cam? Cam = null,
    int? ValvesPerCylinder = null, string? Injection = null, string? Induction = null, Quantity? Boost = null, Quantity? Altitude = null,
    string? Fuel = null);
