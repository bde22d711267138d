using System.Runtime.Intrinsics;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>The tail of a sum with no closed form, by inverting its characteristic function.</summary>
/// <remarks>
/// W₀(d) = ½ − (1/π)∫₀^∞ sin(td)/t·φ(t) dt and its integrals over d. The product φ is formed once at the nodes and serves every offset.
/// Source: gilpelaez1951. Valid for: laws symmetric about zero. Error: 1e-7 in a probability, mostly far less.
/// </remarks>
internal sealed class InvertedTail : UpperTail
{
    // Where the envelope of φ(t) has fallen this far, the rest of the integral is left off.
    private const double LeftOff = 1e-8;

    // Panels of sixteen points are exact to 1e-10 up to this change of phase across one.
    private const double PhaseOfPanel = 22.0;

    // Offsets are served by grids that reach 1, 4, 16 … times the near one, so that the common near offsets stay cheap.
    private const double Growth = 4.0;
    private const int GridsKept = 8;

    private readonly Components _parts;
    private readonly StudentTCharacteristic[] _pools;
    private readonly double _lastT;
    private readonly double _span;
    private readonly double _near;
    private readonly double _far;
    private readonly FarTail _beyond;
    private readonly FourierGrid?[] _grids = new FourierGrid?[GridsKept];

    /// <summary>Makes the tail of the parts.</summary>
    /// <param name="parts">What is summed.</param>
    /// <param name="apart">Half-widths of the rectangles that the caller adds by itself; they too damp what lies beyond the last t.</param>
    public InvertedTail(Components parts, ReadOnlySpan<double> apart)
    {
        _parts = parts;
        _pools = [.. parts.Pools.Select(pool => new StudentTCharacteristic(pool.DegreesOfFreedom))];
        double widths = 0.0, variance = parts.StandardDeviation * parts.StandardDeviation;
        foreach (double halfWidth in parts.HalfWidths)
        {
            widths += halfWidth;
            variance += halfWidth * halfWidth / 3.0;
        }

        // Two heavy tails mix: the sum of their own tails is right to 1e-7 only from 150 scales on. One alone, or lighter ones, are so much sooner.
        bool heavy = parts.Pools.Count(pool => pool.DegreesOfFreedom <= 2.0) > 1;
        double pooledReach = 0.0, pooledVariance = 0.0, pooledPhase = 0.0;
        foreach ((double scale, double degreesOfFreedom) in parts.Pools)
        {
            pooledReach += scale * (heavy ? 150.0 : 10.0 + (40.0 / degreesOfFreedom));
            pooledVariance += scale * scale;
            pooledPhase += scale * Math.Min(6.0, Math.Sqrt(degreesOfFreedom));
        }

        _far = pooledReach > 0.0
            ? (7.0 * Math.Sqrt(variance)) + pooledReach
            : Math.Min(widths + (6.5 * parts.StandardDeviation), 11.0 * Math.Sqrt(variance));
        _near = Math.Min(_far, 3.0 * Math.Sqrt(variance + pooledVariance));
        _span = widths + (6.0 * parts.StandardDeviation) + pooledPhase;
        _beyond = new FarTail(parts);
        _lastT = FindLastT(apart);
    }

    /// <inheritdoc/>
    public override double At(int order, double offset)
    {
        if (offset <= _far)
        {
            return Grid(offset).Tail(order, offset);
        }

        if (double.IsPositiveInfinity(offset))
        {
            return 0.0;
        }

        double past = offset - _far;
        double first = order > 0 ? Grid(_far).Tail(1, _far) : 0.0;
        return order switch
        {
            0 => _beyond.At(0, offset),
            1 => first + _beyond.At(1, offset) - _beyond.At(1, _far),
            _ => Grid(_far).Tail(2, _far) + (first * past)
                + _beyond.At(2, offset) - _beyond.At(2, _far) - (_beyond.At(1, _far) * past),
        };
    }

    private FourierGrid Grid(double offset)
    {
        int index = 0;
        double reach = _near;
        while (reach < offset && index < GridsKept - 1)
        {
            reach *= Growth;
            index++;
        }

        reach = index == GridsKept - 1 ? _far : Math.Min(reach, _far);
        return _grids[index] ??= new FourierGrid(_lastT, PhaseOfPanel / (reach + _span), Fill);
    }

    private void Fill(ReadOnlySpan<double> t, Span<double> phi)
    {
        double variance = _parts.StandardDeviation * _parts.StandardDeviation;
        for (int i = 0; i < t.Length; i++)
        {
            double value = variance > 0.0 ? Math.Exp(-0.5 * variance * t[i] * t[i]) : 1.0;
            for (int pool = 0; pool < _pools.Length; pool++)
            {
                value *= _pools[pool].At(_parts.Pools[pool].Scale * t[i]);
            }

            phi[i] = value;
        }

        foreach (double halfWidth in _parts.HalfWidths)
        {
            for (int i = 0; i < t.Length; i += Lanes.Count)
            {
                Vector512<double> x = halfWidth * Vector512.Create(t[i..]);
                (Vector512.Create<double>(phi[i..]) * LaneSine.Sin(x) / x).CopyTo(phi[i..]);
            }
        }
    }

    private double FindLastT(ReadOnlySpan<double> apart)
    {
        double low = 0.0, high = 1.0;
        while (!IsSpent(high, apart))
        {
            (low, high) = (high, 2.0 * high);
        }

        for (int halving = 0; halving < 4; halving++)
        {
            double middle = 0.5 * (low + high);
            (low, high) = IsSpent(middle, apart) ? (low, middle) : (middle, high);
        }

        return high;
    }

    /// <summary>Whether ∫_t^∞ |φ|/t can be left off: envelope over its power of decay.</summary>
    private bool IsSpent(double t, ReadOnlySpan<double> apart)
    {
        double here = LogEnvelope(t, apart);
        if (here > Math.Log(LeftOff) + 5.0)
        {
            return false;
        }

        double power = Math.Max(1.0, (here - LogEnvelope(1.25 * t, apart)) / Math.Log(1.25));
        return here < Math.Log(LeftOff * power);
    }

    private double LogEnvelope(double t, ReadOnlySpan<double> apart)
    {
        double sum = -0.5 * _parts.StandardDeviation * _parts.StandardDeviation * t * t;
        foreach (double halfWidth in apart)
        {
            sum += LogSinc(halfWidth * t);
        }

        foreach (double halfWidth in _parts.HalfWidths)
        {
            sum += LogSinc(halfWidth * t);
        }

        for (int pool = 0; pool < _pools.Length; pool++)
        {
            sum += Math.Log(Math.Max(1e-300, _pools[pool].At(_parts.Pools[pool].Scale * t)));
        }

        return sum;
    }

    // |sin x/x| ≤ exp(−x²/6) below π and ≤ 1/x everywhere.
    private static double LogSinc(double x) => x < 2.0 ? -x * x / 6.0 : -Math.Log(x);
}
