namespace RebuildPlanner.Core.Quantities;

/// <summary>A quantity as the workshop wrote it, and its number in the coherent unit of its kind, with the sign of the trade.</summary>
/// <param name="Text">What was typed, unchanged.</param>
/// <param name="Kind">Its kind, which names the unit of the numbers below.</param>
/// <param name="Value">The nominal value, signed; for <c>lo..hi</c> the midpoint.</param>
/// <param name="Limits">The limits as written, signed and in order, or null where none were written.</param>
/// <param name="LastDigit">What one step of the last digit written is worth, &gt; 0: the resolution when no gauge is named.</param>
public sealed record Quantity(string Text, QuantityKind Kind, double Value, (double Low, double High)? Limits, double LastDigit)
{
    /// <summary>The best value: the middle of the limits, or the value itself without limits.</summary>
    public double Midpoint => Limits is { } limits ? (limits.Low + limits.High) / 2.0 : Value;

    /// <summary>Half the width of the limits, ≥ 0, or null where none were written.</summary>
    public double? HalfWidth => Limits is { } limits ? (limits.High - limits.Low) / 2.0 : null;
}
