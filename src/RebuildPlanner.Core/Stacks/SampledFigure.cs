namespace RebuildPlanner.Core.Stacks;

/// <summary>One figure as the trials show it: mean, spread, limits, probabilities.</summary>
/// <remarks>
/// Where the figure is nearly its linear part, bent as a ratio bends, that part's law is known exactly and only the difference is counted:
/// P(Y ≤ y) = P(L ≤ y) + [share of Y ≤ y − share of L ≤ y], a control variate. Source: jcgm101 (7.5 to 7.7), glasserman2003 (4.1). Valid for: ten blocks or more.
/// Error: told beside each limit, from the blocks.
/// </remarks>
public sealed class SampledFigure
{
    private readonly TrialFigure _figure;
    private readonly FigureTally _tally;
    private readonly LinearSum? _linear;
    private readonly bool _controls;
    private readonly double _linearVariance, _halfWidth, _leastFreedom, _lowCheck, _highCheck;
    private BlockSpread _mean, _difference, _spread, _controlledSpread, _low, _lowDifference, _high, _highDifference;
    private long _without;
    private (double, double)? _usual;

    internal SampledFigure(PreparedFigure prepared)
    {
        (_figure, _tally, _linear, _controls) = (prepared.Figure, prepared.Tally, prepared.Linear, prepared.Controls);
        (_linearVariance, _halfWidth, _leastFreedom) = (prepared.Variance, prepared.HalfWidth, prepared.LeastFreedom);
        (_lowCheck, _highCheck) = (prepared.LowCheck, prepared.HighCheck);
    }

    /// <summary>The limits of the linear part alone, the interval first order gives; null where there is none.</summary>
    public (double Low, double High)? FirstOrder => _linear is null ? null : (_figure.Value - _halfWidth, _figure.Value + _halfWidth);

    /// <summary>How many trials there were.</summary>
    public long Trials { get; private set; }

    /// <summary>Share of the trials that gave no figure.</summary>
    public double Without => Trials == 0 ? 0.0 : (double)_without / Trials;

    /// <summary>Whether the exact linear part was used: the blocks say that it helps.</summary>
    public bool IsControlled =>
        _controls && _without == 0 && _lowDifference.ErrorOfMean <= _low.ErrorOfMean && _highDifference.ErrorOfMean <= _high.ErrorOfMean;

    /// <summary>The mean, coherent unit.</summary>
    public double Mean => _figure.Value + (IsControlled ? _difference.Mean : _mean.Mean);

    /// <summary>The standard deviation, coherent unit; without bound where a pool has two degrees of freedom or fewer.</summary>
    public double StandardUncertainty => double.IsPositiveInfinity(_linearVariance) ? double.PositiveInfinity
        : IsControlled ? _controlledSpread.Mean : _spread.Mean;

    /// <summary>How sure its ends must be: half a unit of the last digit wanted of its u, first order's where there is one.</summary>
    public double Tolerance(int digits) => MonteCarlo.Tolerance(_linear?.StandardUncertainty ?? StandardUncertainty, digits);

    /// <summary>The limits of the interval that holds the figure with a probability, as much left out below as above.</summary>
    public (double Low, double High) Symmetric(double coverage = MonteCarlo.Coverage) => coverage == MonteCarlo.Coverage ? _usual ??= Ends(coverage) : Ends(coverage);

    /// <summary>The limits of the narrowest interval that holds the figure with a probability.</summary>
    /// <remarks>Source: jcgm101 (5.3.4, 7.7.2). Valid for: one summit. Error: that of counting, greatest where the density is level.</remarks>
    public (double Low, double High) Shortest(double coverage = MonteCarlo.Coverage)
    {
        const int Steps = 100;
        (double Low, double High) shortest = (double.NegativeInfinity, double.PositiveInfinity);
        for (int step = 0; step <= Steps; step++)
        {
            double left = (1.0 - coverage) * step / Steps;
            (double low, double high) = (At(left), At(left + coverage));
            if (high - low < shortest.High - shortest.Low)
            {
                shortest = (low, high);
            }
        }

        return shortest;
    }

    /// <summary>The probability that the figure is at or below a number.</summary>
    public double Below(double y)
    {
        double share = _tally.FigureBelow(y) / Trials;
        double below = IsControlled ? _linear!.Below(_figure.Unbent(y)) + share - (_tally.LinearBelow(y) / Trials) : share;
        return Math.Clamp(below, 0.0, 1.0);
    }

    /// <summary>The probability that the figure lies between two numbers; a trial without a figure lies nowhere.</summary>
    public double Inside(double low, double high)
    {
        double below = double.IsPositiveInfinity(high) ? 1.0 - Without : Below(high);
        return Math.Clamp(below - (double.IsNegativeInfinity(low) ? 0.0 : Below(low)), 0.0, 1.0);
    }

    /// <summary>Shares of the trials in equal parts between two numbers, for a picture.</summary>
    public double[] Shares(double from, double to, int parts)
    {
        double[] below = [.. Enumerable.Range(0, parts + 1).Select(part => _tally.FigureBelow(from + ((to - from) * part / parts)) / Trials)];
        return [.. below.Skip(1).Zip(below, (after, before) => after - before)];
    }

    /// <summary>Twice the standard deviations of mean, spread and both limits: how far the trials may still be from their end.</summary>
    internal (double Mean, double Spread, double Low, double High) TwiceErrors()
    {
        bool controlled = IsControlled;
        double mean = controlled ? _difference.ErrorOfMean : _mean.ErrorOfMean;
        double spread = controlled ? _controlledSpread.ErrorOfMean : _spread.ErrorOfMean;

        // Where no trial fell between figure and control there is still one that might have.
        double least = 1.0 / Trials;
        double low = Math.Max(least, (controlled ? _lowDifference : _low).ErrorOfMean) / Density(_lowCheck);
        double high = Math.Max(least, (controlled ? _highDifference : _high).ErrorOfMean) / Density(_highCheck);

        // A mean has a standard deviation only above two degrees of freedom, a standard deviation one of its own only above four.
        return (_leastFreedom > 2.0 ? 2.0 * mean : 0.0, _leastFreedom > 4.0 ? 2.0 * spread : 0.0, 2.0 * low, 2.0 * high);
    }

    /// <summary>Takes a block of trials in.</summary>
    internal void Add(in BlockSums sums, int trials)
    {
        double n = trials;
        Trials += trials;
        _without += sums.Without;
        double mean = sums.Sum / n, difference = sums.Difference / n;
        _mean.Add(mean);
        _difference.Add(difference);
        _spread.Add(Math.Sqrt(Math.Max(0.0, (sums.SumOfSquares - (n * mean * mean)) / (n - 1.0))));
        _controlledSpread.Add(Math.Sqrt(Math.Max(0.0, _linearVariance + (sums.DifferenceOfSquares / n) - (difference * difference))));
        _low.Add(sums.BelowLow / n);
        _high.Add(sums.BelowHigh / n);
        _lowDifference.Add((sums.BelowLow - sums.LinearBelowLow) / n);
        _highDifference.Add((sums.BelowHigh - sums.LinearBelowHigh) / n);
    }

    private (double Low, double High) Ends(double coverage) => (At(0.5 * (1.0 - coverage)), At(0.5 * (1.0 + coverage)));

    private double Density(double y)
    {
        // A few bins to either side: wide enough to hold counts, narrow enough to be level.
        double reach = 8.0 * _tally.BinWidth;
        double density = _linear is not null
            ? (_linear.Below(_figure.Unbent(y + reach)) - _linear.Below(_figure.Unbent(y - reach))) / (2.0 * reach)
            : (_tally.FigureBelow(y + reach) - _tally.FigureBelow(y - reach)) / (2.0 * reach * Trials);
        return density > 0.0 ? density : 1.0 / Trials / reach;
    }

    /// <summary>The number below which the figure lies with a probability.</summary>
    private double At(double probability)
    {
        double low = _tally.From, high = _tally.To;
        if (probability <= 0.0)
        {
            return Edge(first: true);
        }

        if (probability >= 1.0)
        {
            return Edge(first: false);
        }

        // From a bracket about the expected place, halved or drawn in by false position (Illinois).
        double expected = probability < 0.5 ? _lowCheck : _highCheck, reach = 4.0 * _tally.BinWidth;
        double left = Math.Clamp(expected - reach, low, high), right = Math.Clamp(expected + reach, low, high);
        double missLeft = Below(left) - probability, missRight = Below(right) - probability;
        while (missLeft > 0.0 && left > low)
        {
            (right, missRight) = (left, missLeft);
            left = Math.Max(low, left - (reach *= 2.0));
            missLeft = Below(left) - probability;
        }

        while (missRight < 0.0 && right < high)
        {
            (left, missLeft) = (right, missRight);
            right = Math.Min(high, right + (reach *= 2.0));
            missRight = Below(right) - probability;
        }

        if (missLeft >= 0.0 || missRight <= 0.0)
        {
            return missLeft >= 0.0 ? left : right;
        }

        int kept = 0;
        for (int round = 0; round < 60 && right - left > 1e-3 * _tally.BinWidth; round++)
        {
            double middle = round % 4 == 3 ? 0.5 * (left + right) : ((left * missRight) - (right * missLeft)) / (missRight - missLeft);
            double miss = Below(middle) - probability;
            if (Math.Abs(miss) < 1e-8)
            {
                return middle;
            }

            if (miss < 0.0)
            {
                (left, missLeft) = (middle, miss);
                missRight *= kept == -1 ? 0.5 : 1.0;
                kept = -1;
            }
            else
            {
                (right, missRight) = (middle, miss);
                missLeft *= kept == 1 ? 0.5 : 1.0;
                kept = 1;
            }
        }

        return 0.5 * (left + right);
    }

    // The outermost bin that holds a trial.
    private double Edge(bool first)
    {
        int[] counts = _tally.Figure;
        int bin = first ? Array.FindIndex(counts, count => count > 0) : Array.FindLastIndex(counts, count => count > 0) + 1;
        return _tally.From + (Math.Clamp(bin - 1, 0, FigureTally.Bins) * _tally.BinWidth);
    }
}
