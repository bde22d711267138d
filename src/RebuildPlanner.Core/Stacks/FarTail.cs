namespace RebuildPlanner.Core.Stacks;

/// <summary>The tail so far out that only the pools' t laws reach there, each shifted a little by all the rest.</summary>
/// <remarks>
/// Σ over pools of the mean of the pool's own tail at d − w, w drawn from the rest of the sum by the three-point rule with the rest's variance and
/// fourth moment: one large part makes a heavy-tailed sum large. Valid for: d ≥ 7 σ of the rest and 10 + 40/ν scales. Error: 1e-7.
/// </remarks>
internal sealed class FarTail
{
    private readonly (ClosedTail Own, double Shift, double SideWeight)[] _pools;

    public FarTail(Components parts)
    {
        double variance = parts.StandardDeviation * parts.StandardDeviation, excess = 0.0;
        foreach (double halfWidth in parts.HalfWidths)
        {
            double square = halfWidth * halfWidth;
            variance += square / 3.0;
            excess -= 2.0 / 15.0 * square * square;
        }

        // A pool without a variance of its own cannot be given one here; the distance from which this is used allows for that.
        double pooled = parts.Pools.Sum(Variance);
        _pools = [.. parts.Pools.Select(pool =>
        {
            double rest = variance + pooled - Variance(pool);
            double kurtosis = rest > 0.0 ? 3.0 + (excess / (rest * rest)) : 3.0;
            return ((ClosedTail)new StudentTail(pool.Scale, pool.DegreesOfFreedom), Math.Sqrt(kurtosis * rest), 0.5 / kurtosis);
        })];
    }

    /// <summary>W of the given order, up to what is the same at every far offset.</summary>
    public double At(int order, double offset)
    {
        double sum = 0.0;
        foreach ((ClosedTail own, double shift, double side) in _pools)
        {
            sum += ((1.0 - (2.0 * side)) * own.At(order, offset))
                + (side * (own.At(order, offset - shift) + own.At(order, offset + shift)));
        }

        return sum;
    }

    private static double Variance((double Scale, double DegreesOfFreedom) pool) =>
        pool.DegreesOfFreedom > 2.0 ? pool.Scale * pool.Scale * pool.DegreesOfFreedom / (pool.DegreesOfFreedom - 2.0) : 0.0;
}
