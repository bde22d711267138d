namespace RebuildPlanner.Core.Stacks;

/// <summary>What is settled of a figure before its trials are counted.</summary>
internal sealed record PreparedFigure(TrialFigure Figure, FigureTally Tally, LinearSum? Linear, bool Controls, double HalfWidth, double LowCheck, double HighCheck)
{
    public static PreparedFigure Of(ReadOnlySpan<Source> sources, TrialFigure figure, double[] pilot, bool plain)
    {
        double[] sorted = Array.FindAll(pilot, double.IsFinite);
        Array.Sort(sorted);
        double low = sorted.Length == 0 ? figure.Value : sorted[(int)(0.025 * (sorted.Length - 1))];
        double high = sorted.Length == 0 ? figure.Value : sorted[(int)Math.Ceiling(0.975 * (sorted.Length - 1))];
        LinearSum? linear = figure.Row is { } row && LinearSum.Takes(sources, row) ? new LinearSum(sources, row) : null;
        if (linear is not { StandardUncertainty: > 0.0 })
        {
            return new(figure, Between(low, high), null, false, 0.0, low, high);
        }

        // A control that has no end within the interval is of no use; the straight line is still there, to be found wanting.
        double half = linear.HalfWidth(MonteCarlo.Coverage);
        bool ends = double.IsFinite(figure.Bent(half));
        (double lowCheck, double highCheck) = ends ? (figure.Bent(-half), figure.Bent(half)) : (low, high);
        return new(figure, Between(Math.Min(low, lowCheck), Math.Max(high, highCheck)), linear, ends && !plain, half, lowCheck, highCheck)
        {
            Variance = Propagation.VarianceOfLaws(sources, figure.Row!),
            LeastFreedom = Propagation.LeastFreedom(sources, figure.Row!),
        };
    }

    /// <summary>The variance of the linear part, without bound where a pool has two degrees of freedom or fewer.</summary>
    public double Variance { get; private init; }

    /// <summary>The fewest degrees of freedom of a part.</summary>
    public double LeastFreedom { get; private init; } = double.PositiveInfinity;

    public SampledFigure Begin() => new(this);

    // One and a half widths more to either side: a normal's bins are then a sixtieth of its standard deviation.
    private static FigureTally Between(double low, double high)
    {
        double width = high > low ? high - low : Math.Max(1e-9, 1e-9 * Math.Abs(low));
        return new(low - (1.5 * width), high + (1.5 * width));
    }
}
