namespace RebuildPlanner.Core.Stacks;

/// <summary>The law one doubt follows.</summary>
public enum SourceShape
{
    /// <summary>No doubt in the distribution, only worst limits: what the larger of two doubts has already covered.</summary>
    None,

    /// <summary>No limits were written: counted as exact, yet never enough for proof.</summary>
    Unstated,

    /// <summary>Rectangular between −u√3 and +u√3.</summary>
    Rectangular,

    /// <summary>Normal with standard deviation u.</summary>
    Normal,

    /// <summary>One normal of a pool of repeats: t with the pool's degrees of freedom, one scale for the whole pool.</summary>
    Pooled,
}

/// <summary>One independent doubt, centred on zero. Its identity is its index in the model: correlation is nothing but a shared source.</summary>
/// <param name="Shape">The law it follows.</param>
/// <param name="StandardUncertainty">u, in the unit of the figure it acts on; for a pool s/√n, the t enters later.</param>
/// <param name="DegreesOfFreedom">ν, infinite unless it is of a pool.</param>
/// <param name="Pool">The pool's number, or −1.</param>
/// <param name="WorstLow">The lowest it may be, ≤ 0.</param>
/// <param name="WorstHigh">The highest it may be, ≥ 0.</param>
/// <remarks>Source: jcgm100 (4.2, 4.3), jcgm101 (6.4).</remarks>
public readonly record struct Source(
    SourceShape Shape, double StandardUncertainty, double DegreesOfFreedom, int Pool, double WorstLow, double WorstHigh)
{
    /// <summary>A rectangular doubt of the given half-width.</summary>
    public static Source Rectangular(double halfWidth) =>
        new(SourceShape.Rectangular, halfWidth / Math.Sqrt(3.0), double.PositiveInfinity, -1, -halfWidth, halfWidth);

    /// <summary>The doubt of a length, area or volume written without limits: nothing is known of it but that it may matter.</summary>
    public static Source Unstated { get; } = new(SourceShape.Unstated, 0.0, double.PositiveInfinity, -1, 0.0, 0.0);

    /// <summary>A normal doubt whose spread is known exactly; its worst limits are ±3u by agreement.</summary>
    public static Source Normal(double standardUncertainty) =>
        new(SourceShape.Normal, standardUncertainty, double.PositiveInfinity, -1, -3.0 * standardUncertainty, 3.0 * standardUncertainty);

    /// <summary>The doubt of a mean of repeats whose spread comes from a pool.</summary>
    public static Source Pooled(double standardUncertainty, int pool, double degreesOfFreedom, double worstLow, double worstHigh) =>
        new(SourceShape.Pooled, standardUncertainty, degreesOfFreedom, pool, worstLow, worstHigh);

    /// <summary>A doubt that counts in the worst case alone.</summary>
    public static Source WorstOnly(double worstLow, double worstHigh) =>
        new(SourceShape.None, 0.0, double.PositiveInfinity, -1, worstLow, worstHigh);
}
