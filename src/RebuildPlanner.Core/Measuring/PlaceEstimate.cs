using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Measuring;

/// <summary>The estimate of one place from its readings: mean, scatter or resolution, and the gauges' shared limits of error.</summary>
public static class PlaceEstimate
{
    /// <summary>Makes the estimate.</summary>
    /// <param name="readings">All unstruck readings of the place, at least one.</param>
    /// <param name="pools">The pools of the job.</param>
    /// <param name="gauges">The gauges by id.</param>
    /// <param name="book">Where the doubts are kept.</param>
    /// <remarks>
    /// u is the larger of s/√n and √m·(d/2)/√3, never both: repeats already contain the resolution. Source: iso14253-2.
    /// The worst limits take both. Readings with several gauges at one place are weighted by their number.
    /// </remarks>
    public static Estimate Of(
        IReadOnlyList<CorrectedReading> readings, RepeatPools pools, IReadOnlyDictionary<string, Gauge> gauges, SourceBook book)
    {
        List<Term> terms = [];
        foreach (IGrouping<string?, CorrectedReading> repeats in readings.GroupBy(reading => reading.Reading.Gauge))
        {
            double weight = (double)repeats.Count() / readings.Count;
            Gauge? gauge = repeats.Key is { } id ? gauges[id] : null;
            AddScatterAndResolution([.. repeats], gauge, pools, weight, book, terms);
            AddLimitsOfError([.. repeats], gauge, gauges, weight, book, terms);
        }

        foreach (CorrectedReading reading in readings)
        {
            terms.AddRange(reading.TemperatureTerms.Select(term => term with { Coefficient = term.Coefficient / readings.Count }));
        }

        return new Estimate(readings.Average(reading => reading.Value), terms);
    }

    private static void AddScatterAndResolution(
        CorrectedReading[] repeats, Gauge? gauge, RepeatPools pools, double weight, SourceBook book, List<Term> terms)
    {
        What what = repeats[0].Reading.What;
        double count = repeats.Length;
        double mean = repeats.Average(reading => reading.Value);
        RepeatPool? pool = pools.Of(what, repeats[0].Reading.Gauge);
        double scatter = pool is null ? 0.0 : pool.StandardDeviation / Math.Sqrt(count);

        double halfStep = Resolution(repeats, gauge) / 2.0;
        int scaleReadings = repeats.Max(reading => ScaleReadings(reading, gauge));
        double resolution = Math.Sqrt(scaleReadings) * halfStep / Math.Sqrt(3.0);

        double worstScatter = pool is null ? 0.0 : Math.Max(3.0, StudentT.Quantile(0.975, pool.DegreesOfFreedom)) * scatter;
        double worstLow = Math.Min(repeats.Min(reading => reading.Value) - mean, -worstScatter);
        double worstHigh = Math.Max(repeats.Max(reading => reading.Value) - mean, worstScatter);
        double worstResolution = scaleReadings * halfStep;

        if (pool is not null && scatter >= resolution)
        {
            Add(Source.Pooled(scatter, pool.Number, pool.DegreesOfFreedom, worstLow, worstHigh));
            Add(Source.WorstOnly(-worstResolution, worstResolution));
            return;
        }

        for (int scaleReading = 0; scaleReading < scaleReadings; scaleReading++)
        {
            Add(Source.Rectangular(halfStep));
        }

        Add(Source.WorstOnly(worstLow, worstHigh));

        void Add(Source source)
        {
            if (source.WorstLow < 0.0 || source.WorstHigh > 0.0)
            {
                terms.Add(new Term(book.Add(source), weight, what));
            }
        }
    }

    /// <summary>A limit of error counts once a length and once a fill, and a gauge set with another has that one's too.</summary>
    private static void AddLimitsOfError(
        CorrectedReading[] repeats, Gauge? gauge, IReadOnlyDictionary<string, Gauge> gauges, double weight, SourceBook book, List<Term> terms)
    {
        double fills = repeats.Average(reading => reading.Fills * reading.Factor);
        for (Gauge? link = gauge; link is not null; link = link.SetWith is { } setting ? gauges[setting] : null)
        {
            if (link.LimitOfError?.Midpoint is > 0.0 and double limit)
            {
                int source = book.Shared(("limit of error", link.Id), Source.Rectangular(limit));
                terms.Add(new Term(source, weight * fills, repeats[0].Reading.What));
            }
        }
    }

    private static int ScaleReadings(CorrectedReading reading, Gauge? gauge) =>
        gauge is { IsBurette: true } || reading.Reading.Fills.Count > 0 ? 2 * reading.Fills : 1;

    private static double Resolution(CorrectedReading[] repeats, Gauge? gauge)
    {
        if (gauge?.Resolution is { } resolution)
        {
            return resolution.Midpoint;
        }

        return repeats.Min(reading => reading.Reading.Value?.LastDigit
            ?? reading.Reading.Fills.Min(fill => Math.Min(fill.From.LastDigit, fill.To.LastDigit)));
    }
}
