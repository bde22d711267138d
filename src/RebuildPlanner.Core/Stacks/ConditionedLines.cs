using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>The mean, over what lines share, of the product of what each then has left to chance.</summary>
/// <remarks>
/// A line with nothing to itself would be a step in the draws. One factor that no other such line needs is kept back for it and drawn only from
/// where the line holds, the point weighing as much as that is likely. Source: genzbretz2009 (4.2).
/// </remarks>
internal sealed class ConditionedLines
{
    private const int Points = 4096;

    private readonly IReadOnlyList<LimitedLine> _lines;
    private readonly SharedFactors _shared;
    private readonly PoolScale[] _pools;
    private readonly List<(int Line, Factor Factor)> _keptBack;
    private readonly Factor[] _first;
    private readonly int[] _last;

    public ConditionedLines(ReadOnlySpan<Source> sources, IReadOnlyList<LimitedLine> lines)
    {
        _lines = lines;
        _shared = new(sources, lines);
        _pools = [.. _shared.PoolDegreesOfFreedom.Select(degreesOfFreedom => new PoolScale(degreesOfFreedom))];
        _keptBack = KeepBack();
        _first = [.. _shared.Drawn.Except(_keptBack.Select(kept => kept.Factor))];
        _last = [.. Enumerable.Range(0, lines.Count).Except(_keptBack.Select(kept => kept.Line))];
    }

    /// <summary>The joint probability.</summary>
    public double Average()
    {
        double[] generator = Generator(_pools.Length + _first.Length + _keptBack.Count);
        double[] scales = new double[_pools.Length], offsets = new double[_lines.Count];
        double sum = 0.0;
        for (int point = 1; point <= Points; point++)
        {
            int next = 0;
            for (int pool = 0; pool < scales.Length; pool++)
            {
                scales[pool] = _pools[pool].At(NormalLaw.QuickQuantile(Uniform(generator[next++], point)));
            }

            Array.Clear(offsets);
            foreach (Factor factor in _first)
            {
                factor.AddTo(offsets, factor.Scale(scales) * factor.Quantile(Uniform(generator[next++], point)));
            }

            sum += Weight(offsets, scales, generator.AsSpan(next), point);
        }

        return sum / Points;
    }

    private double Weight(Span<double> offsets, ReadOnlySpan<double> scales, ReadOnlySpan<double> generator, int point)
    {
        double weight = 1.0;
        for (int i = 0; i < _keptBack.Count && weight > 0.0; i++)
        {
            (int line, Factor factor) = _keptBack[i];
            double scale = factor.Scale(scales), slope = factor.On(line) * scale;
            double a = (_lines[line].Low - offsets[line]) / slope, b = (_lines[line].High - offsets[line]) / slope;
            double from = factor.Below(Math.Min(a, b)), part = factor.Below(Math.Max(a, b)) - from;
            weight *= Math.Max(0.0, part);
            factor.AddTo(offsets, scale * factor.Quantile(from + (part * Uniform(generator[i], point))));
        }

        for (int i = 0; i < _last.Length && weight > 0.0; i++)
        {
            int line = _last[i];
            weight *= _shared.Private[line].Inside(_lines[line].Low - offsets[line], _lines[line].High - offsets[line], scales);
        }

        return weight;
    }

    /// <summary>Pairs steep lines with factors, from the last to be met to the first: a factor may not move a line met before its own.</summary>
    private List<(int Line, Factor Factor)> KeepBack()
    {
        HashSet<int> steep = [.. Enumerable.Range(0, _lines.Count).Where(line => !_shared.IsSmooth[line])];
        HashSet<Factor> free = [.. _shared.Drawn];
        List<(int Line, Factor Factor)> pairs = [];
        while (steep.Count > 0)
        {
            (int Line, Factor Factor, double Weight)? best = null;
            foreach (Factor factor in free)
            {
                int[] moved = [.. factor.Lines.Where(steep.Contains)];
                double weight = moved.Length == 1 ? Math.Abs(factor.On(moved[0])) / Size(moved[0]) : 0.0;
                if (weight > (best?.Weight ?? 0.0))
                {
                    best = (moved[0], factor, weight);
                }
            }

            if (best is { } found)
            {
                pairs.Add((found.Line, found.Factor));
                free.Remove(found.Factor);
                steep.Remove(found.Line);
            }
            else
            {
                // Every factor left moves two steep lines or none: one line stays a step, so that another may be smooth.
                steep.Remove(steep.Max());
            }
        }

        pairs.Reverse();
        return pairs;
    }

    private double Size(int line) => Math.Sqrt(_shared.Drawn.Sum(factor => factor.On(line) * factor.On(line)));

    // The tent makes the integrand periodic, which is what such points are good at.
    private static double Uniform(double generator, int point)
    {
        double v = point * generator;
        return Math.Abs((2.0 * (v - Math.Floor(v))) - 1.0);
    }

    /// <summary>The square roots of the primes: Richtmyer's generator.</summary>
    private static double[] Generator(int count)
    {
        List<int> primes = [];
        for (int candidate = 2; primes.Count < count; candidate++)
        {
            if (primes.TrueForAll(prime => candidate % prime != 0))
            {
                primes.Add(candidate);
            }
        }

        return [.. primes.Select(prime => Math.Sqrt(prime))];
    }
}
