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

    /// <summary>Triangular between −u√6 and +u√6, as the sum of two equal rectangles.</summary>
    Triangular,

    /// <summary>Arcsine between −u√2 and +u√2: what swings between two ends.</summary>
    Arcsine,

    /// <summary>A rectangle whose own ends are known only within limits.</summary>
    CurvilinearTrapezoid,
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

    /// <summary>A triangular doubt of the given half-width.</summary>
    public static Source Triangular(double halfWidth) =>
        new(SourceShape.Triangular, halfWidth / Math.Sqrt(6.0), double.PositiveInfinity, -1, -halfWidth, halfWidth);

    /// <summary>An arcsine doubt of the given half-width.</summary>
    public static Source Arcsine(double halfWidth) =>
        new(SourceShape.Arcsine, halfWidth / Math.Sqrt(2.0), double.PositiveInfinity, -1, -halfWidth, halfWidth);

    /// <summary>A rectangular doubt of the given half-width, its ends known within ± <paramref name="inexact"/>.</summary>
    /// <remarks>u² = a²/3 + d²/9. Source: jcgm101 (6.4.3.4).</remarks>
    public static Source CurvilinearTrapezoid(double halfWidth, double inexact) => new(
        SourceShape.CurvilinearTrapezoid, Math.Sqrt((halfWidth * halfWidth / 3.0) + (inexact * inexact / 9.0)), double.PositiveInfinity, -1,
        -halfWidth - inexact, halfWidth + inexact);

    /// <summary>Whether the doubt is drawn in a trial: it has a law and a spread.</summary>
    public bool IsDrawn => Shape is not (SourceShape.None or SourceShape.Unstated) && StandardUncertainty > 0.0;

    /// <summary>A doubt that counts in the worst case alone.</summary>
    public static Source WorstOnly(double worstLow, double worstHigh) =>
        new(SourceShape.None, 0.0, double.PositiveInfinity, -1, worstLow, worstHigh);
}
