using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>What one block of trials says of one figure: moments of the figure and of its difference from the linear part, and counts below two checkpoints.</summary>
internal struct BlockSums
{
    /// <summary>Σ(y − value) and Σ(y − value)².</summary>
    public double Sum, SumOfSquares;

    /// <summary>Σ(y − l) and Σ(y² − l²), both less the value.</summary>
    public double Difference, DifferenceOfSquares;

    /// <summary>How many trials of the figure, and of its linear part, lie at or below the lower and the upper checkpoint.</summary>
    public int BelowLow, BelowHigh, LinearBelowLow, LinearBelowHigh;

    /// <summary>How many trials gave no figure.</summary>
    public int Without;
}

/// <summary>Counts of one figure and its linear part in equal bins, the ends open.</summary>
internal sealed class FigureTally
{
    /// <summary>How many bins between the open ends.</summary>
    public const int Bins = 1024;

    private readonly double _from, _perUnit;

    /// <summary>Makes empty counts.</summary>
    /// <param name="from">Where the first bin begins.</param>
    /// <param name="to">Where the last one ends.</param>
    public FigureTally(double from, double to) => (_from, _perUnit, To) = (from, Bins / (to - from), to);

    /// <summary>Where the first bin begins.</summary>
    public double From => _from;

    /// <summary>Where the last bin ends.</summary>
    public double To { get; }

    /// <summary>Counts of the figure: below the bins, each bin, above.</summary>
    public int[] Figure { get; } = new int[Bins + 2];

    /// <summary>Counts of the linear part, bent.</summary>
    public int[] Linear { get; } = new int[Bins + 2];

    private readonly int[] _figureBefore = new int[Bins + 3], _linearBefore = new int[Bins + 3];

    /// <summary>Width of a bin.</summary>
    public double BinWidth => 1.0 / _perUnit;

    /// <summary>Adds a tile's trials.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    public void Add(ReadOnlySpan<double> trials, double offset, int[] counts)
    {
        Span<double> places = stackalloc double[Vector512<double>.Count];
        Vector512<double> shift = Vector512.Create(((offset - _from) * _perUnit) + 1.0), most = Vector512.Create(Bins + 1.0);
        for (int at = 0; at < trials.Length; at += Vector512<double>.Count)
        {
            // Held to the open ends first; what is no number is counted apart, before.
            Vector512<double> place = (Vector512.Create<double>(trials[at..]) * _perUnit) + shift;
            Vector512.Min(Vector512.Max(place, Vector512<double>.Zero), most).CopyTo(places);
            foreach (double held in places)
            {
                counts[(int)held]++;
            }
        }
    }

    /// <summary>Takes another's counts in and leaves it empty.</summary>
    public void TakeFrom(FigureTally other)
    {
        for (int bin = 0; bin < Bins + 2; bin++)
        {
            Figure[bin] += other.Figure[bin];
            Linear[bin] += other.Linear[bin];
        }

        Array.Clear(other.Figure);
        Array.Clear(other.Linear);
    }

    /// <summary>Adds the counts up from below, so that they can be asked for.</summary>
    public void AddUp()
    {
        for (int bin = 0; bin < Bins + 2; bin++)
        {
            _figureBefore[bin + 1] = _figureBefore[bin] + Figure[bin];
            _linearBefore[bin + 1] = _linearBefore[bin] + Linear[bin];
        }
    }

    /// <summary>How many trials of the figure lie at or below a place, the bin that holds it taken as even.</summary>
    public double FigureBelow(double y) => Below(Figure, _figureBefore, y);

    /// <summary>How many of the bent linear part do.</summary>
    public double LinearBelow(double y) => Below(Linear, _linearBefore, y);

    private double Below(int[] counts, int[] before, double y)
    {
        double place = Math.Clamp(((y - _from) * _perUnit) + 1.0, 0.0, Bins + 2.0);
        int bin = Math.Min((int)place, Bins + 1);

        // An open end has no width to share out: nothing of it counts before it, all of it after.
        return bin is 0 or Bins + 1 ? before[bin] : before[bin] + ((place - bin) * counts[bin]);
    }
}
