using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Measuring;

/// <summary>One filling from a burette: where the liquid stood before and after.</summary>
/// <param name="From">Start of the fill.</param>
/// <param name="To">End of the fill, not less than the start.</param>
public sealed record Fill(Quantity From, Quantity To);

/// <summary>One reading, never overwritten: a wrong one is struck out with a reason and stays.</summary>
/// <param name="What">What was measured.</param>
/// <param name="Place">Where.</param>
/// <param name="Value">What was read, or null where fills are given.</param>
/// <param name="Fills">Burette fills, empty where a value is given.</param>
/// <param name="FromToWritten">A single fill written as <c>from</c> and <c>to</c> on the reading itself, so that it is written back so.</param>
/// <param name="Drop">How far below the deck the piston stood for a crown fill.</param>
/// <param name="Gauge">The gauge's id.</param>
/// <param name="Temperature">Of gauge and part alike.</param>
/// <param name="TorquePlate">Measured with the torque plate on.</param>
/// <param name="Stage">When in the job.</param>
/// <param name="Struck">Why it was struck out, or null where it stands.</param>
/// <param name="Id">Its identity for importing again.</param>
/// <param name="By">Who read it.</param>
/// <param name="When">When, as written.</param>
public sealed record Reading(
    What What, Place Place, Quantity? Value, EquatableList<Fill> Fills, bool FromToWritten = false, Quantity? Drop = null, string? Gauge = null,
    Quantity? Temperature = null, bool? TorquePlate = null, Stage? Stage = null, string? Struck = null, string? Id = null,
    string? By = null, string? When = null);
