using System.Runtime.Intrinsics;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>A tile of trials: what every doubt comes to in each of them. A doubt that many figures share is drawn once.</summary>
public sealed class TrialTile
{
    /// <summary>How many trials a tile has: few enough that all doubts of an engine stay in the nearest memory.</summary>
    public const int Trials = 256;

    private const double TwoPi = 2.0 * Math.PI;

    private readonly Source[] _sources;
    private readonly int[] _rowOf;
    private readonly int[] _poolOf;
    private readonly double[] _draws;
    private readonly (int Pool, double DegreesOfFreedom)[] _pools;
    private readonly double[] _factors;

    /// <summary>Makes room for the doubts of a model.</summary>
    public TrialTile(ReadOnlySpan<Source> sources)
    {
        _sources = [.. sources];
        _rowOf = new int[sources.Length];
        _poolOf = new int[sources.Length];
        List<(int Pool, double)> pools = [];
        int rows = 0;
        for (int s = 0; s < sources.Length; s++)
        {
            _rowOf[s] = sources[s].IsDrawn ? rows++ : -1;
            _poolOf[s] = -1;
            if (_sources[s] is { IsDrawn: true, Shape: SourceShape.Pooled, DegreesOfFreedom: < double.PositiveInfinity } pooled)
            {
                int known = pools.FindIndex(pool => pool.Pool == pooled.Pool);
                _poolOf[s] = known < 0 ? pools.Count : known;
                if (known < 0)
                {
                    pools.Add((pooled.Pool, pooled.DegreesOfFreedom));
                }
            }
        }

        _draws = new double[rows * Trials];
        _pools = [.. pools];
        _factors = new double[pools.Count * Trials];
    }

    /// <summary>What a doubt comes to in each trial, in the unit of what it acts on; empty for one that is not drawn.</summary>
    public ReadOnlySpan<double> Of(int source) => _rowOf[source] < 0 ? [] : _draws.AsSpan(_rowOf[source] * Trials, Trials);

    /// <summary>Draws the next trials.</summary>
    /// <remarks>Source: jcgm101 (6.4). Valid for: every shape of source. Error: that of <see cref="NormalDraws"/>.</remarks>
    public void Draw(ref RandomLanes random)
    {
        for (int pool = 0; pool < _pools.Length; pool++)
        {
            ChiSquareDraws.Fill(_factors.AsSpan(pool * Trials, Trials), _pools[pool].DegreesOfFreedom, ref random);
        }

        for (int s = 0; s < _sources.Length; s++)
        {
            if (_rowOf[s] >= 0)
            {
                Draw(_sources[s], _poolOf[s], _draws.AsSpan(_rowOf[s] * Trials, Trials), ref random);
            }
        }
    }

    private void Draw(in Source source, int pool, Span<double> draws, ref RandomLanes random)
    {
        double u = source.StandardUncertainty;
        switch (source.Shape)
        {
            case SourceShape.Rectangular:
                FillUniform(draws, -u * Math.Sqrt(3.0), 2.0 * u * Math.Sqrt(3.0), ref random);
                break;
            case SourceShape.Triangular:
                double half = 0.5 * u * Math.Sqrt(6.0);
                Span<double> second = stackalloc double[Trials];
                FillUniform(draws, -half, 2.0 * half, ref random);
                FillUniform(second, -half, 2.0 * half, ref random);
                for (int at = 0; at < draws.Length; at++)
                {
                    draws[at] += second[at];
                }

                break;
            case SourceShape.Arcsine:
                FillUniform(draws, 0.0, TwoPi, ref random);
                foreach (ref double draw in draws)
                {
                    draw = u * Math.Sqrt(2.0) * Math.Sin(draw);
                }

                break;
            case SourceShape.CurvilinearTrapezoid:
                FillTrapezoid(draws, source.WorstHigh, Inexact(source), ref random);
                break;
            default:
                NormalDraws.Fill(draws, ref random);
                Scale(draws, u, pool >= 0 ? _factors.AsSpan(pool * Trials, Trials) : []);
                break;
        }
    }

    // u² = a²/3 + d²/9 and a + d is the worst limit: one root of the two is d.
    private static double Inexact(in Source source)
    {
        double most = source.WorstHigh, variance = source.StandardUncertainty * source.StandardUncertainty;
        return 0.75 * (most - Math.Sqrt(Math.Max(0.0, (4.0 * variance) - (most * most / 3.0))));
    }

    private static void FillUniform(Span<double> draws, double from, double width, ref RandomLanes random)
    {
        for (int at = 0; at < draws.Length; at += Lanes.Count)
        {
            ((random.NextUniform() * width) + Vector512.Create(from)).CopyTo(draws[at..]);
        }
    }

    // The ends stand at −w and +w about a middle that is known: w is a rectangle of its own, from a − d to a + d.
    private static void FillTrapezoid(Span<double> draws, double most, double inexact, ref RandomLanes random)
    {
        Span<double> ends = stackalloc double[Trials];
        FillUniform(ends, most - (2.0 * inexact), 2.0 * inexact, ref random);
        FillUniform(draws, -1.0, 2.0, ref random);
        for (int at = 0; at < draws.Length; at++)
        {
            draws[at] *= ends[at];
        }
    }

    private static void Scale(Span<double> draws, double u, ReadOnlySpan<double> factors)
    {
        for (int at = 0; at < draws.Length; at += Lanes.Count)
        {
            Vector512<double> scaled = Vector512.Create<double>(draws[at..]) * u;
            (factors.IsEmpty ? scaled : scaled * Vector512.Create(factors[at..])).CopyTo(draws[at..]);
        }
    }
}
