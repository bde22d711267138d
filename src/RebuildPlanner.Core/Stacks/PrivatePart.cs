namespace RebuildPlanner.Core.Stacks;

/// <summary>What a line owes to doubts no other line has: given all the others, its lines are independent through this.</summary>
/// <remarks>
/// The two widest rectangles are exact, the rest joins the normal: a rectangle under 0.3 of the normal beside it moves a probability by less than
/// 3e-5 when so merged.
/// </remarks>
internal sealed class PrivatePart
{
    private const double Merged = 0.3;

    private readonly double _wide;
    private readonly double _narrow;
    private readonly double _variance;
    private readonly (int Pool, double Variance)[] _pooled;

    public PrivatePart(IEnumerable<double> halfWidths, double variance, (int Pool, double Variance)[] pooled)
    {
        double[] sorted = [.. halfWidths.OrderDescending()];
        _wide = sorted.Length > 0 ? sorted[0] : 0.0;
        _narrow = sorted.Length > 1 ? sorted[1] : 0.0;
        _variance = variance + (sorted.Skip(2).Sum(halfWidth => halfWidth * halfWidth) / 3.0);
        _pooled = pooled;
    }

    /// <summary>The probability of a private offset between two limits, given the scales of the pools.</summary>
    public double Inside(double low, double high, ReadOnlySpan<double> scales)
    {
        double variance = _variance;
        foreach ((int pool, double own) in _pooled)
        {
            variance += own * scales[pool] * scales[pool];
        }

        double wide = _wide, narrow = _narrow;
        if (narrow * narrow < Merged * Merged * variance)
        {
            variance += narrow * narrow / 3.0;
            narrow = 0.0;
        }

        if (narrow == 0.0 && wide * wide < Merged * Merged * variance)
        {
            variance += wide * wide / 3.0;
            wide = 0.0;
        }

        if (wide == 0.0 && variance == 0.0)
        {
            return low <= 0.0 && high >= 0.0 ? 1.0 : 0.0;
        }

        double sigma = Math.Sqrt(variance);
        return Math.Max(0.0, Below(high, wide, narrow, sigma) - Below(low, wide, narrow, sigma));
    }

    private static double Below(double x, double wide, double narrow, double sigma)
    {
        double reach = wide + narrow + (NormalRamp.Reach * sigma);
        if (x >= reach || x <= -reach)
        {
            return x > 0.0 ? 1.0 : 0.0;
        }

        if (wide == 0.0)
        {
            return NormalRamp.At(0, x, sigma);
        }

        return narrow == 0.0
            ? (NormalRamp.At(1, x + wide, sigma) - NormalRamp.At(1, x - wide, sigma)) / (2.0 * wide)
            : (NormalRamp.At(2, x + wide + narrow, sigma) - NormalRamp.At(2, x + wide - narrow, sigma)
                - NormalRamp.At(2, x - wide + narrow, sigma) + NormalRamp.At(2, x - wide - narrow, sigma)) / (4.0 * wide * narrow);
    }
}
