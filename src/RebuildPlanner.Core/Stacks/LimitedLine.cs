namespace RebuildPlanner.Core.Stacks;

/// <summary>One figure with its limits, as offsets from its value in the figure's unit.</summary>
/// <param name="Row">The figure's row, its unit per unit of each source.</param>
/// <param name="Low">The least offset allowed, or −∞.</param>
/// <param name="High">The greatest offset allowed, or +∞.</param>
public readonly record struct LimitedLine(ReadOnlyMemory<double> Row, double Low, double High);
