namespace RebuildPlanner.Core.Stacks;

/// <summary>What is settled of a figure before its trials are counted.</summary>
internal sealed record PreparedFigure(TrialFigure Figure, FigureTally Tally, LinearSum? Linear, double LinearVariance, double LowCheck, double HighCheck)
{
    public static PreparedFigure Of(ReadOnlySpan<Source> sources, TrialFigure figure, double[] pilot, bool plain)
    {
        double[] sorted = [.. pilot.Where(double.IsFinite).Order()];
        double low = sorted.Length == 0 ? figure.Value : sorted[(int)(0.025 * (sorted.Length - 1))];
        double high = sorted.Length == 0 ? figure.Value : sorted[(int)Math.Ceiling(0.975 * (sorted.Length - 1))];
        LinearSum? linear = !plain && figure.Row is { } row && LinearSum.Takes(sources, row) ? new LinearSum(sources, row) : null;
        if (linear is { StandardUncertainty: > 0.0 })
        {
            double half = linear.HalfWidth(MonteCarlo.Coverage);
            (double lowCheck, double highCheck) = (figure.Value - half, figure.Value + half);
            return new(figure, Between(Math.Min(low, lowCheck), Math.Max(high, highCheck)), linear, Propagation.VarianceOfLaws(sources, figure.Row!), lowCheck, highCheck);
        }

        double variance = figure.Row is { } known ? Propagation.VarianceOfLaws(sources, known) : 0.0;
        return new(figure, Between(low, high), null, variance, low, high);
    }

    public SampledFigure Begin() => new(Figure, Tally, Linear, LinearVariance, LowCheck, HighCheck);

    // One and a half widths more to either side: a normal's bins are then a sixtieth of its standard deviation.
    private static FigureTally Between(double low, double high)
    {
        double width = high > low ? high - low : Math.Max(1e-9, 1e-9 * Math.Abs(low));
        return new(low - (1.5 * width), high + (1.5 * width));
    }
}
