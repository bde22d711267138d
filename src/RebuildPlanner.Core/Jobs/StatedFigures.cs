using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Figures not measured: given, assumed, of a part's catalogue entry, or the engine's own fields.</summary>
/// <remarks>One physical part is one input: what belongs to a crank, bank or head is shared by its cylinders, all else is each cylinder's own.</remarks>
public sealed class StatedFigures(Job job, EngineParts parts, SourceBook book)
{
    /// <summary>The estimate of a written quantity: rectangular between its limits, exact and never enough for proof without them.</summary>
    /// <param name="written">What was written.</param>
    /// <param name="what">What its doubt counts under.</param>
    /// <param name="identity">The physical thing it is a figure of.</param>
    /// <param name="book">Where the doubts are kept.</param>
    public static Estimate EstimateOf(Quantity written, What what, object identity, SourceBook book)
    {
        bool blocks = written.Kind is QuantityKind.Length or QuantityKind.Area or QuantityKind.Volume;
        return written.HalfWidth switch
        {
            > 0.0 and double halfWidth =>
                new Estimate(written.Midpoint, [new Term(book.Shared((what, identity), Source.Rectangular(halfWidth)), 1.0, what)]),
            null when written.Value != 0.0 && blocks =>
                new Estimate(written.Value, [new Term(book.Shared((what, identity), Source.Unstated), 1.0, what)]),
            _ => Estimate.Exact(written.Midpoint),
        };
    }

    /// <summary>The figure given for a cylinder at a stage, an entry before a part's own.</summary>
    public Figure? Given(What what, int cylinder, Stage stage) =>
        Entry(job.Given, FigureKind.Given, what, cylinder, stage) ?? OfPart(what, cylinder, stage);

    /// <summary>The figure assumed for a cylinder at a stage.</summary>
    public Figure? Assumed(What what, int cylinder, Stage stage) => Entry(job.Assumed, FigureKind.Assumed, what, cylinder, stage);

    /// <summary>The figure that holds throughout: given, of the engine's own fields, or assumed.</summary>
    public Figure? Throughout(What what, int cylinder) =>
        Entry(job.Given, FigureKind.Given, what, cylinder, null)
        ?? OfEngine(what, cylinder)
        ?? Entry(job.Assumed, FigureKind.Assumed, what, cylinder, null);

    private Figure? Entry(EquatableList<StatedFigure> entries, FigureKind kind, What what, int cylinder, Stage? stage)
    {
        (StatedFigure Entry, int Index)[] relevant =
        [
            .. entries.Select((entry, index) => (entry, index)).Where(candidate =>
                candidate.entry.What == what && candidate.entry.Stage == stage && Covers(candidate.entry.Place, cylinder, stage)),
        ];
        if (relevant.Length == 0)
        {
            return what == What.Deck && Entry(entries, kind, What.PistonProtrusion, cylinder, stage) is { } protrusion
                ? MeasuredFigures.AsDeck(protrusion)
                : null;
        }

        int narrowest = relevant.Max(candidate => candidate.Entry.Place.Narrowness);
        PlacedEstimate[] places =
        [
            .. relevant
                .Where(candidate => candidate.Entry.Place.Narrowness == narrowest)
                .GroupBy(candidate => candidate.Entry.Place)
                .Select(place => place.Last())
                .Select(candidate => new PlacedEstimate(
                    candidate.Entry.Place,
                    EstimateOf(candidate.Entry.Value, what, (kind, candidate.Index, Owner(what, candidate.Entry, cylinder)), book))),
        ];
        StatedFigure last = relevant.Last(candidate => candidate.Entry.Place.Narrowness == narrowest).Entry;
        return new Figure(what, PlacedEstimate.Together(what, places), kind, stage, last.From, null, places)
        {
            IsArea = last.Value.Kind == QuantityKind.Area,
            Written = places.Length == 1 ? last.Value.Text : null,
        };
    }

    private bool Covers(Place place, int cylinder, Stage? stage) =>
        parts.Covers(place, cylinder)
        && (place.Piece is null || parts.Piston(cylinder, stage ?? parts.Stages[^1])?.Piece == place.Piece);

    private string Owner(What what, StatedFigure entry, int cylinder)
    {
        if (entry.Common)
        {
            return "common";
        }

        return WhatTable.Line(what).Belongs switch
        {
            Belongs.Engine => "engine",
            Belongs.Bank => parts.Bank(cylinder),
            Belongs.Head => parts.Head(cylinder).Label,
            _ => parts.Label(cylinder),
        };
    }

    private Figure? OfPart(What what, int cylinder, Stage stage)
    {
        if (what is What.GasketThickness or What.GasketOpening)
        {
            return parts.Gasket(cylinder, stage) is { } gasket && gasket.Since == stage
                && (what == What.GasketThickness ? gasket.Part.Thickness : gasket.Part.Opening) is { } written
                ? FigureOf(written, ("gasket", gasket.Id, parts.Head(cylinder).Label), $"gasket {gasket.Id}")
                : null;
        }

        return parts.Piston(cylinder, stage) is { } piston && piston.Since == stage && PistonField(piston.Part, what) is { } field
            ? FigureOf(field, ("piston", piston.Id, piston.Part.Common ? "common" : parts.Label(cylinder)), $"piston {piston.Id}")
            : null;

        Figure FigureOf(Quantity written, object identity, string from) =>
            new(what, EstimateOf(written, what, identity, book), FigureKind.Given, stage, from, null, [])
            {
                IsArea = written.Kind == QuantityKind.Area,
                Written = written.Text,
            };
    }

    private static Quantity? PistonField(PistonSet piston, What what) => what switch
    {
        What.Crown => piston.Crown,
        What.CompressionHeight => piston.CompressionHeight,
        What.Skirt => piston.Skirt,
        What.TopLandHeight => piston.TopLandHeight,
        What.TopLandDiameter => piston.TopLandDiameter,
        _ => null,
    };

    private Figure? OfEngine(What what, int cylinder)
    {
        (Quantity? written, object owner) = what switch
        {
            What.Stroke => (job.Engine.Stroke, (object)"engine"),
            What.RodLength => (job.Engine.RodLength, parts.Label(cylinder)),
            What.PinOffset => (job.Engine.PinOffset, parts.Label(cylinder)),
            _ => (null, "engine"),
        };
        return written is null
            ? null
            : new Figure(what, EstimateOf(written, what, ("engine", owner), book), FigureKind.Given, null, "engine", null, []) { Written = written.Text };
    }
}
