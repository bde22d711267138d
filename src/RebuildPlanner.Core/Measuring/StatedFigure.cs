using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Measuring;

/// <summary>A figure not measured: given by maker or customer, or assumed.</summary>
/// <param name="What">What it is of.</param>
/// <param name="Place">Which part; nothing named means all.</param>
/// <param name="Value">The figure as written.</param>
/// <param name="From">Who gave it.</param>
/// <param name="Stage">The stage it holds from, or null for a figure that holds throughout.</param>
/// <param name="Common">One input for all its cylinders, where each would have its own.</param>
public sealed record StatedFigure(What What, Place Place, Quantity Value, string? From = null, Stage? Stage = null, bool Common = false);
