using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Jobs;

/// <summary>A set of pistons fitted or on offer.</summary>
public sealed record PistonSet(
    string Id, Quantity? OversizeBore = null, Quantity? Crown = null, Quantity? CompressionHeight = null, Quantity? WantedClearance = null,
    Quantity? Skirt = null, Quantity? TopLandHeight = null, Quantity? TopLandDiameter = null, bool Common = false, decimal? Price = null,
    bool OnOffer = true, EquatableList<string>? Pieces = null);

/// <summary>A head gasket fitted or on offer.</summary>
public sealed record GasketChoice(
    string Id, Quantity? Opening = null, Quantity? Thickness = null, decimal? Price = null, string? Grade = null, Quantity? Protrusion = null,
    bool OnOffer = true);

/// <summary>Which part is in the engine from a stage on.</summary>
/// <param name="Stage">From when.</param>
/// <param name="Piston">Piston set, or null.</param>
/// <param name="Gasket">Gasket, or null.</param>
/// <param name="Cylinder">For one cylinder alone.</param>
/// <param name="Head">For one head alone.</param>
/// <param name="Piece">Which piece of the set.</param>
public sealed record Fitted(
    Stage Stage, string? Piston = null, string? Gasket = null, string? Cylinder = null, string? Head = null, string? Piece = null);
