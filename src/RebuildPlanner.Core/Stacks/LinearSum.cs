namespace RebuildPlanner.Core.Stacks;

/// <summary>The exact law of a linear sum of doubts: what a figure's offset from its value is believed to be.</summary>
/// <remarks>
/// Rectangles stay rectangles, normals join to one, and the terms of a pool are one t with the pool's ν. The widest one or two rectangles are set
/// apart where they dominate: the law of the rest, Z, is then averaged over them in closed form, so a narrow Z costs no more than a wide one.
/// Source: gilpelaez1951, jcgm100 (G.1), jcgm101 (5.4). Valid for: independent sources. Error: 1e-7 in a probability, 1e-6 of a half-width.
/// </remarks>
public sealed class LinearSum
{
    private readonly Components _parts;
    private readonly double[] _apart;
    private readonly UpperTail _rest;

    /// <summary>Makes the sum of a row.</summary>
    /// <param name="sources">The model's sources.</param>
    /// <param name="row">The figure's row, its unit per unit of each source.</param>
    public LinearSum(ReadOnlySpan<Source> sources, ReadOnlySpan<double> row)
    {
        if (!Takes(sources, row))
        {
            throw new ArgumentException("The sum of a triangular, arcsine or curvilinear trapezoid doubt is drawn, not inverted.", nameof(row));
        }

        StandardUncertainty = Propagation.StandardUncertainty(sources, row);
        _parts = Components.Of(sources, row);
        int apart = WidestApart(_parts);
        _apart = _parts.HalfWidths[..apart];
        _rest = TailOf(_parts.Without(apart), _apart);
    }

    /// <summary>Whether the sum of a row is of shapes whose laws are added here.</summary>
    public static bool Takes(ReadOnlySpan<Source> sources, ReadOnlySpan<double> row)
    {
        for (int s = 0; s < sources.Length; s++)
        {
            if (row[s] != 0.0 && sources[s].Shape is SourceShape.Triangular or SourceShape.Arcsine or SourceShape.CurvilinearTrapezoid)
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>The first-order standard uncertainty u, in the figure's unit; of a pool s counts, not the wider t.</summary>
    public double StandardUncertainty { get; }

    /// <summary>The probability that the figure is at or below its value plus an offset, without unit.</summary>
    /// <param name="offset">The offset x, in the figure's unit, any real or ±∞.</param>
    /// <remarks>P(Σ c·source ≤ x). Source: gilpelaez1951. Valid for: every x. Error: 1e-7.</remarks>
    public double Below(double offset) => offset < 0.0 ? Above(-offset) : 1.0 - Above(offset);

    /// <summary>The probability that the figure lies between two offsets from its value, without unit.</summary>
    /// <param name="low">The lower offset, in the figure's unit, or −∞.</param>
    /// <param name="high">The upper offset, or +∞.</param>
    /// <remarks>P(low ≤ Σ c·source ≤ high). Source: jcgm106 (7). Valid for: every pair; 0 where low &gt; high. Error: 1e-7.</remarks>
    public double Inside(double low, double high)
    {
        if (!(low <= high))
        {
            return 0.0;
        }

        double inside = low > 0.0 ? Above(low) - Above(high)
            : high < 0.0 ? Above(-high) - Above(-low)
            : 1.0 - Above(high) - Above(-low);
        return Math.Clamp(inside, 0.0, 1.0);
    }

    /// <summary>Half the width of the interval about the value that holds the figure with the given probability, in the figure's unit.</summary>
    /// <param name="coverage">The probability wanted, between 0 and 1; both tails are equal.</param>
    /// <remarks>h with P(|Σ c·source| ≤ h) = coverage. Source: jcgm101 (5.3). Valid for: 0 &lt; coverage &lt; 1. Error: 1e-6 relative.</remarks>
    public double HalfWidth(double coverage = 0.95)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(coverage);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(coverage, 1.0);
        return _parts.Unit == 0.0 ? 0.0 : _parts.Unit * UnitHalfWidth(0.5 * (1.0 - coverage));
    }

    private double UnitHalfWidth(double tail)
    {
        // False position between an offset too near and one too far, the kept end's weight halved where it stays (Illinois).
        double low = 0.0, lowMiss = 0.5 - tail;
        double high = 2.0 * StandardUncertainty / _parts.Unit, highMiss = UnitAbove(high) - tail;
        while (highMiss > 0.0)
        {
            (low, lowMiss) = (high, highMiss);
            high *= 1.5;
            highMiss = UnitAbove(high) - tail;
        }

        int kept = 0;
        for (int round = 0; round < 100 && high - low > 1e-9 * high; round++)
        {
            double middle = round % 8 == 7 ? 0.5 * (low + high) : ((low * highMiss) - (high * lowMiss)) / (highMiss - lowMiss);
            double miss = UnitAbove(middle) - tail;
            if (Math.Abs(miss) < 1e-8 * tail)
            {
                return middle;
            }

            if (miss > 0.0)
            {
                (low, lowMiss) = (middle, miss);
                highMiss *= kept == 1 ? 0.5 : 1.0;
                kept = 1;
            }
            else
            {
                (high, highMiss) = (middle, miss);
                lowMiss *= kept == -1 ? 0.5 : 1.0;
                kept = -1;
            }
        }

        return 0.5 * (low + high);
    }

    private double Above(double offset)
    {
        if (_parts.Unit == 0.0 || double.IsPositiveInfinity(offset))
        {
            return 0.0;
        }

        return UnitAbove(offset / _parts.Unit);
    }

    private double UnitAbove(double x)
    {
        double above;
        if (_apart.Length == 0)
        {
            above = _rest.At(0, x);
        }
        else if (_apart.Length == 1)
        {
            double a = _apart[0];
            above = (Ramp(x + a) - Ramp(x - a)) / (2.0 * a);
        }
        else
        {
            double a = _apart[0], b = _apart[1];
            above = (Bow(x + a + b) - Bow(x + a - b) - Bow(x - a + b) + Bow(x - a - b)) / (4.0 * a * b);
        }

        return Math.Clamp(above, 0.0, 1.0);
    }

    // ∫₀^s P(Z > r) dr, with P(Z > −r) = 1 − P(Z > r) below zero.
    private double Ramp(double s) => _rest.At(1, Math.Abs(s)) - Math.Max(0.0, -s);

    // ∫₀^s Ramp.
    private double Bow(double s) => s >= 0.0 ? _rest.At(2, s) : (0.5 * s * s) - _rest.At(2, -s);

    /// <summary>How many of the widest rectangles to set apart: as many as are wider than all the rest together reaches.</summary>
    private static int WidestApart(Components parts)
    {
        double reach = 3.0 * parts.StandardDeviation;
        foreach ((double scale, double degreesOfFreedom) in parts.Pools)
        {
            reach += scale * (3.0 + (4.0 / degreesOfFreedom));
        }

        int apart = 0;
        for (int i = parts.HalfWidths.Length - 1; i >= 0; i--)
        {
            if (i < 2 && apart == 0 && parts.HalfWidths[i] >= reach)
            {
                apart = i + 1;
            }

            reach += parts.HalfWidths[i];
        }

        return apart;
    }

    private static UpperTail TailOf(Components rest, ReadOnlySpan<double> apart) =>
        (rest.HalfWidths.Length, rest.StandardDeviation, rest.Pools) switch
        {
            (0, 0.0, []) => new NoTail(),
            (1, 0.0, []) => new RectangleTail(rest.HalfWidths[0]),
            (0, _, []) => new NormalTail(rest.StandardDeviation),
            (0, 0.0, [var pool]) => new StudentTail(pool.Scale, pool.DegreesOfFreedom),
            _ => new InvertedTail(rest, apart),
        };
}
