using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Measuring;

/// <summary>One pool: the spread of repeats of one thing with one gauge, over the whole engine.</summary>
/// <param name="Number">The pool's number.</param>
/// <param name="StandardDeviation">s of a single reading, coherent unit.</param>
/// <param name="DegreesOfFreedom">ν ≥ 1.</param>
public sealed record RepeatPool(int Number, double StandardDeviation, int DegreesOfFreedom);

/// <summary>The pools of a job: every unstruck repeat counts, at all stages, and a gauge's own study with its count.</summary>
/// <remarks>s² = Σ(n − 1)s²/Σ(n − 1). Source: jcgm100 (H.3.6, pooled variance). Valid for: one scatter for one gauge on one kind of place.</remarks>
public sealed class RepeatPools
{
    private readonly Dictionary<(What What, string? Gauge), RepeatPool> _pools = [];

    /// <summary>Pools the repeats.</summary>
    /// <param name="places">The readings of each place, brought to 20 °C.</param>
    /// <param name="gauges">The gauges by id.</param>
    /// <param name="book">Where pools are numbered.</param>
    public RepeatPools(
        IEnumerable<IReadOnlyList<CorrectedReading>> places, IReadOnlyDictionary<string, Gauge> gauges, SourceBook book)
    {
        Dictionary<(What What, string? Gauge), (double SumOfSquares, int Freedom)> sums = [];
        foreach (IReadOnlyList<CorrectedReading> place in places)
        {
            foreach (IGrouping<string?, CorrectedReading> repeats in place.GroupBy(reading => reading.Reading.Gauge))
            {
                (What, string?) key = (place[0].Reading.What, repeats.Key);
                double mean = repeats.Average(reading => reading.Value);
                (double sum, int freedom) = sums.GetValueOrDefault(key);
                sums[key] = (sum + repeats.Sum(reading => (reading.Value - mean) * (reading.Value - mean)), freedom + repeats.Count() - 1);
            }
        }

        foreach (((What what, string? id), (double sum, int freedom)) in sums)
        {
            double sumOfSquares = sum;
            int degrees = freedom;
            if (id is not null && gauges[id] is { Repeatability: { } own, RepeatabilityReadings: { } count })
            {
                sumOfSquares += (count - 1) * own.Midpoint * own.Midpoint;
                degrees += count - 1;
            }

            if (degrees > 0)
            {
                _pools.Add((what, id), new RepeatPool(book.NewPool(), Math.Sqrt(sumOfSquares / degrees), degrees));
            }
        }
    }

    /// <summary>The pool of a thing and a gauge, or null where nothing was repeated and the gauge brings no study.</summary>
    public RepeatPool? Of(What what, string? gauge) => _pools.GetValueOrDefault((what, gauge));
}
