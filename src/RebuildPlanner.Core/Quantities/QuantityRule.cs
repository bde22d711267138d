namespace RebuildPlanner.Core.Quantities;

/// <summary>What may stand at one place of a job file: kinds, closing words and the range outside which it must be a slip.</summary>
/// <param name="Kinds">The kinds allowed; more than one where the unit decides (an opening as diameter or traced area).</param>
/// <param name="Signs">The closing words.</param>
/// <param name="SaneLow">The least signed value, coherent unit, that is not refused as a slip.</param>
/// <param name="SaneHigh">The greatest signed value that is not refused as a slip.</param>
/// <param name="AreaLow">As <paramref name="SaneLow"/> where an area is written in place of a diameter.</param>
/// <param name="AreaHigh">As <paramref name="SaneHigh"/> where an area is written in place of a diameter.</param>
public sealed record QuantityRule(
    IReadOnlyList<QuantityKind> Kinds, SignWords Signs, double SaneLow, double SaneHigh, double AreaLow = 0.0, double AreaHigh = 0.0);
