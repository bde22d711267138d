using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Figures from readings: places averaged, repeats pooled, temperature taken out.</summary>
public sealed class MeasuredFigures
{
    private readonly EngineParts _parts;
    private readonly SourceBook _book;
    private readonly Dictionary<string, Gauge> _gauges;
    private readonly RepeatPools _pools;
    private readonly ILookup<What, CorrectedReading> _readings;
    private readonly Dictionary<(What What, Stage? Stage, Place Owner), Figure> _figures = [];

    /// <summary>Brings every unstruck reading of a job to 20 °C and pools the repeats.</summary>
    public MeasuredFigures(Job job, EngineParts parts, SourceBook book)
    {
        _parts = parts;
        _book = book;
        _gauges = job.Gauges.ToDictionary(gauge => gauge.Id);
        CorrectedReading[] standing =
        [
            .. job.Readings
                .Where(reading => reading.Struck is null)
                .Select(reading => CorrectedReading.Of(reading, MetalOf(job, reading), Gauge(reading), book)),
        ];
        _pools = new RepeatPools(ByPlace(standing), _gauges, book);
        _readings = standing.ToLookup(reading => reading.Reading.What);
    }

    /// <summary>Whether repeats of a thing with a gauge have a spread.</summary>
    public bool HasPool(What what, string? gauge) => _pools.Of(what, gauge) is not null;

    /// <summary>The figure read on a cylinder at a stage, or null.</summary>
    /// <param name="what">The thing.</param>
    /// <param name="cylinder">The cylinder's index.</param>
    /// <param name="stage">The stage, or null for readings that hold throughout.</param>
    /// <param name="crownFillBore">The bore at the stage, for a crown by fill.</param>
    public Figure? At(What what, int cylinder, Stage? stage, Func<Figure?> crownFillBore)
    {
        Figure? own = Narrowest(what, cylinder, stage);
        return (own, what) switch
        {
            (not null, _) => own,
            (null, What.Deck) => Narrowest(What.PistonProtrusion, cylinder, stage) is { } protrusion ? AsDeck(protrusion) : null,
            (null, What.Crown) => CrownByFill(cylinder, stage, crownFillBore),
            _ => null,
        };
    }

    /// <summary>A protrusion is a deck clearance with the other sign.</summary>
    public static Figure AsDeck(Figure protrusion)
    {
        PlacedEstimate[] places = [.. protrusion.Places.Select(place => place with { Estimate = Negative(place.Estimate) })];
        return new Figure(What.Deck, Negative(protrusion.Estimate), protrusion.Kind, protrusion.Stage, protrusion.From, protrusion.Gauge, places)
        {
            RestsOn = [protrusion],
        };

        static Estimate Negative(Estimate estimate) => Estimate.Combine((-1.0, estimate));
    }

    private Figure? Narrowest(What what, int cylinder, Stage? stage)
    {
        CorrectedReading[] relevant =
        [
            .. _readings[what].Where(reading => Covers(reading.Reading, cylinder, stage)),
        ];
        if (relevant.Length == 0)
        {
            return null;
        }

        int narrowest = relevant.Max(reading => reading.Reading.Place.Narrowness);
        CorrectedReading[] counting = [.. relevant.Where(reading => reading.Reading.Place.Narrowness == narrowest)];
        Place first = counting[0].Reading.Place;
        Place owner = new(first.Cylinder, first.Piece, first.Head, first.Bank);
        if (!_figures.TryGetValue((what, stage, owner), out Figure? figure))
        {
            PlacedEstimate[] places =
            [
                .. ByPlace(counting).Select(place =>
                    new PlacedEstimate(place[0].Reading.Place, PlaceEstimate.Of(place, _pools, _gauges, _book))),
            ];
            string? gauges = string.Join(", ", counting.Select(reading => reading.Reading.Gauge).OfType<string>().Distinct());
            figure = new Figure(
                what, PlacedEstimate.Together(what, places), FigureKind.Measured, counting[0].Reading.Stage, null, gauges.Length == 0 ? null : gauges, places)
            {
                IsArea = counting[0].Reading.Value?.Kind == Quantities.QuantityKind.Area,
            };
            _figures.Add((what, stage, owner), figure);
        }

        return figure;
    }

    /// <summary>A reading of a piece counts from the stage its piston went in; any other at its own stage.</summary>
    private bool Covers(Reading reading, int cylinder, Stage? stage)
    {
        if (reading.Place.Piece is not { } piece)
        {
            return reading.Stage == stage && _parts.Covers(reading.Place, cylinder);
        }

        return stage is { } at
            && _parts.Piston(cylinder, at) is { } fitted
            && fitted.Piece == piece
            && (reading.Stage is { } read && read > fitted.Since ? read : fitted.Since) == at;
    }

    private Figure? CrownByFill(int cylinder, Stage? stage, Func<Figure?> crownFillBore)
    {
        if (Narrowest(What.CrownFill, cylinder, stage) is not { } fill || crownFillBore() is not { } bore)
        {
            return null;
        }

        Estimate drop = Estimate.Combine(
        [
            .. _readings[What.CrownFill]
                .Where(reading => Covers(reading.Reading, cylinder, stage))
                .Select(reading => reading.Reading.Drop!)
                .DistinctBy(written => written.Midpoint)
                .Select(written => (1.0 / fill.Places.Count, StatedFigures.EstimateOf(written, What.Drop, ("drop", cylinder, written.Midpoint), _book))),
        ]);
        Estimate crown = DerivedEstimate.Of<CrownByFillFormula>(_book, What.CrownFill, fill.Estimate, bore.Estimate, drop);
        return new Figure(What.Crown, crown, FigureKind.Measured, stage, "crown fill", fill.Gauge, []) { RestsOn = [fill, bore] };
    }

    private static IEnumerable<IReadOnlyList<CorrectedReading>> ByPlace(IEnumerable<CorrectedReading> readings) =>
        readings
            .GroupBy(reading => (reading.Reading.What, reading.Reading.Place, reading.Reading.Stage, reading.Reading.Drop?.Midpoint))
            .Select(place => (IReadOnlyList<CorrectedReading>)[.. place]);

    private Gauge? Gauge(Reading reading) => reading.Gauge is { } id ? _gauges[id] : null;

    private Metal MetalOf(Job job, Reading reading) => WhatTable.Line(reading.What).Metal switch
    {
        PartMetal.Block => job.Engine.BlockMetal ?? Metal.CastIron,
        PartMetal.Head => HeadOf(job, reading.Place).Metal ?? Metal.Aluminium,
        PartMetal.Rod => job.Engine.RodMetal ?? Metal.Steel,
        PartMetal.Piston => Metal.Aluminium,
        _ => Metal.Steel,
    };

    private Head HeadOf(Job job, Place place)
    {
        if (place.Head is { } label)
        {
            return job.Engine.Heads.First(head => head.Label == label);
        }

        int cylinder = place.Cylinder is { } name ? job.Engine.Labels.ToList().IndexOf(name) : 0;
        return _parts.Head(cylinder);
    }

    private readonly struct CrownByFillFormula : IFormula
    {
        public static T Of<T>(ReadOnlySpan<T> figures)
            where T : struct, IScalar<T> => Volumes.OfCrownByFill(figures[0], figures[1], figures[2]);
    }
}
