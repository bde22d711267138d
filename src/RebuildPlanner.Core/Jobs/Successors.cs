using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>What ends a figure at a stage, and the figure computed in its place.</summary>
public sealed class Successors(Job job, EngineParts parts, SourceBook book, Func<What, int, Stage, Figure?> find)
{
    private static readonly CutKind[] _boreCuts = [CutKind.Hone, CutKind.Bore, CutKind.Sleeve];

    private readonly CutAmounts _amounts = new(job, parts, book);

    /// <summary>Whether a cylinder was bored, honed or sleeved at a stage, which gives it a size even where none was known before.</summary>
    public bool IsBored(int cylinder, Stage stage) => _boreCuts.Any(kind => parts.Cuts(kind, cylinder, stage).Any());

    /// <summary>Whether what was done at a stage ends an earlier figure.</summary>
    /// <param name="earlier">The figure, of an earlier stage or holding throughout.</param>
    /// <param name="cylinder">The cylinder's index.</param>
    /// <param name="stage">The stage at which something may have been done.</param>
    public bool Ends(Figure earlier, int cylinder, Stage stage)
    {
        return earlier.What switch
        {
            What.Bore or What.Wall => Bored(),
            What.Chamber => HeadWorked(),
            What.Deck => Decked() || Piston() || Reached(),
            What.Crown or What.Skirt or What.CompressionHeight or What.TopLandHeight or What.TopLandDiameter or What.Rock => Piston(),
            What.RingGap => Piston() || Bored(),
            What.GasketThickness or What.GasketOpening => Gasket(),
            What.WholeChamber => Bored() || HeadWorked() || Decked() || Piston() || Gasket() || Reached(),
            What.PistonToValve => HeadWorked() || Decked() || Piston() || Gasket(),
            What.HeadHeight => Made(CutKind.HeadSkim),
            What.BlockHeight or What.DeckHeight or What.BarrelHeight or What.LinerProtrusion => Decked(),
            What.Flatness => Made(CutKind.HeadSkim) || Decked(),
            _ => false,
        };

        // Asked only where the figure depends on the answer: a crank rise is itself a figure, and must not ask for itself.
        bool Made(CutKind kind) => parts.Cuts(kind, cylinder, stage).Any();
        bool Bored() => IsBored(cylinder, stage);
        bool HeadWorked() => Made(CutKind.HeadSkim) || Made(CutKind.ValveSeat);
        bool Decked() => Made(CutKind.DeckCut) || Rise(cylinder, stage) is not null;

        // A figure that holds throughout was stated of whatever parts are in: metal removed ends it, another part does not.
        bool Staged() => earlier.Stage is not null;
        bool Piston() => Staged() && PistonChanged(cylinder, stage);
        bool Gasket() => Staged() && parts.Gasket(cylinder, stage)?.Since == stage;
        bool Reached() => Staged() && Changed(cylinder, stage).Any();
    }

    /// <summary>The figure carried through what was done at a stage, or null where a figure for it is missing.</summary>
    /// <param name="what">The thing.</param>
    /// <param name="earlier">Its figure before, or null; a bore needs none.</param>
    /// <param name="cylinder">The cylinder's index.</param>
    /// <param name="stage">The stage.</param>
    public Figure? Carry(What what, Figure? earlier, int cylinder, Stage stage) => (what, earlier) switch
    {
        (What.Bore, _) => FinishedBore(cylinder, stage),
        (What.Chamber, not null) => Chamber(earlier, cylinder, stage),
        (What.Deck, not null) => Deck(earlier, cylinder, stage),
        (What.HeadHeight, not null) => Less(earlier, stage, [.. _amounts.Of(CutKind.HeadSkim, cylinder, stage)]),
        (What.DeckHeight or What.BarrelHeight, not null) => Less(earlier, stage, [.. _amounts.Of(CutKind.DeckCut, cylinder, stage)]),
        (What.BlockHeight, not null) => Less(
            earlier, stage, [.. _amounts.Of(CutKind.DeckCut, cylinder, stage), .. Rise(cylinder, stage) is { } rise ? [rise] : Array.Empty<Figure>()]),
        _ => null,
    };

    /// <summary>Deck clearance from block height, base gasket, crank, rod and compression height, where no deck figure exists.</summary>
    public Figure? DeckStack(int cylinder, Stage stage)
    {
        if (find(What.BlockHeight, cylinder, stage) is not { } block
            || find(What.CompressionHeight, cylinder, stage) is not { } compression
            || ReachOf(cylinder, stage) is not { } reach)
        {
            return null;
        }

        Figure? baseGasket = find(What.BaseGasket, cylinder, stage);
        Estimate deck = Estimate.Combine(
            (1.0, block.Estimate), (1.0, baseGasket?.Estimate ?? Estimate.Zero), (-1.0, reach.Estimate), (-1.0, compression.Estimate));
        return new Figure(What.Deck, deck, FigureKind.Computed, stage, "deck stack", null, [])
        {
            RestsOn = [block, compression, .. reach.RestsOn, .. baseGasket is null ? [] : new[] { baseGasket }],
        };
    }

    private Figure? FinishedBore(int cylinder, Stage stage)
    {
        // The last tool decides: what was bored before it was honed is only the boring size.
        CutKind made = _boreCuts.First(kind => parts.Cuts(kind, cylinder, stage).Any());
        (int index, Cut cut) = parts.Cuts(made, cylinder, stage).Last();
        if (cut.Value is not null)
        {
            return new Figure(What.Bore, _amounts.Of(index, cut, cylinder), FigureKind.Computed, stage, CutWords.Of(made), null, []);
        }

        if (parts.Piston(cylinder, stage)?.Part is not { } piston)
        {
            return null;
        }

        // The size is a setting: the skirt decides it, but the bore's doubt is the process alone (it is measured against the finished size).
        double? skirtMm = find(What.Skirt, cylinder, stage)?.Estimate.Value;
        double? sizeMm = skirtMm is { } skirt && piston.WantedClearance is { } clearance ? skirt + clearance.Midpoint : piston.OversizeBore?.Midpoint;
        return sizeMm is { } size
            ? new Figure(
                What.Bore, _amounts.Setting(size, made, What.Bore, ("bored", parts.Label(cylinder), stage)), FigureKind.Computed, stage, CutWords.Of(made), null, [])
            : null;
    }

    private Figure? Chamber(Figure earlier, int cylinder, Stage stage)
    {
        Figure[] skims = [.. _amounts.Of(CutKind.HeadSkim, cylinder, stage)];
        List<(double, Estimate)> sum = [(1.0, earlier.Estimate)];
        List<Figure> restsOn = [earlier, .. skims];
        if (skims.Length > 0)
        {
            if (find(What.ChamberOpeningArea, cylinder, stage) is not { } area)
            {
                return null;
            }

            Estimate skim = Estimate.Combine([.. skims.Select(figure => (1.0, figure.Estimate))]);
            sum.Add((-1.0, DerivedEstimate.Of<Product>(book, What.HeadSkim, area.Estimate, skim)));
            restsOn.Add(area);
        }

        foreach ((int index, Cut cut) in parts.Cuts(CutKind.ValveSeat, cylinder, stage))
        {
            foreach (Valve valve in cut.Place.Valve is { } one ? [one] : Enum.GetValues<Valve>())
            {
                if (OfValve(What.ValveHeadDiameter, valve) is not { } diameter)
                {
                    return null;
                }

                Estimate sink = OfValve(What.ValveSink, valve) ?? _amounts.Of(index, cut, cylinder);
                sum.Add((ValvesOf(valve), DerivedEstimate.Of<DiscVolume>(book, What.ValveSink, diameter, sink)));
            }
        }

        return new Figure(What.Chamber, Estimate.Combine([.. sum]), FigureKind.Computed, stage, "head skim and seat work", null, [])
        {
            RestsOn = restsOn,
        };

        Estimate? OfValve(What what, Valve valve)
        {
            Figure? figure = find(what, cylinder, stage);
            if (what == What.ValveSink && figure?.Stage != stage)
            {
                return null;
            }

            return figure?.Places.FirstOrDefault(place => place.Place.Valve == valve)?.Estimate
                ?? (figure is { Places: [] or [{ Place.Valve: null }] } ? figure.Estimate : null);
        }
    }

    // Of an odd number the inlet has one more, as three- and five-valve heads are built.
    private int ValvesOf(Valve valve)
    {
        int all = job.Engine.ValvesPerCylinder ?? 2;
        return valve == Valve.Inlet ? (all + 1) / 2 : all / 2;
    }

    private Figure? Deck(Figure earlier, int cylinder, Stage stage)
    {
        Stage? before = parts.Before(stage);
        List<(double, Estimate)> change = [];
        List<Figure> restsOn = [earlier];
        if (earlier.Stage is not null && PistonChanged(cylinder, stage))
        {
            Figure? old = before is { } previous ? find(What.CompressionHeight, cylinder, previous) : null;
            if (old is null || find(What.CompressionHeight, cylinder, stage) is not { } fresh)
            {
                return null;
            }

            Add(1.0, old);
            Add(-1.0, fresh);
        }

        foreach (Figure cut in _amounts.Of(CutKind.DeckCut, cylinder, stage))
        {
            Add(-1.0, cut);
        }

        if (Rise(cylinder, stage) is { } rise)
        {
            Add(-1.0, rise);
        }

        What[] changed = earlier.Stage is null ? [] : [.. Changed(cylinder, stage)];
        if (changed.Contains(What.BaseGasket) && before is { } earlierStage)
        {
            Add(1.0, find(What.BaseGasket, cylinder, stage)!);
            Add(-1.0, find(What.BaseGasket, cylinder, earlierStage)!);
        }

        if ((changed.Contains(What.RodLength) || changed.Contains(What.Stroke)) && before is { } then)
        {
            if (ReachOf(cylinder, then) is not { } oldReach || ReachOf(cylinder, stage) is not { } newReach)
            {
                return null;
            }

            Add(1.0, oldReach);
            Add(-1.0, newReach);
        }

        return new Figure(What.Deck, With(earlier.Estimate), FigureKind.Computed, stage, "deck carried through the work", null, [])
        {
            Least = With(earlier.Least),
            RestsOn = restsOn,
        };

        void Add(double sign, Figure figure)
        {
            change.Add((sign, figure.Estimate));
            restsOn.Add(figure);
        }

        Estimate With(Estimate old) => Estimate.Combine([(1.0, old), .. change]);
    }

    private static Figure Less(Figure earlier, Stage stage, Figure[] removed) =>
        new(
            earlier.What,
            Estimate.Combine([(1.0, earlier.Estimate), .. removed.Select(cut => (-1.0, cut.Estimate))]),
            FigureKind.Computed, stage, "less the cut", null, [])
        {
            RestsOn = [earlier, .. removed],
        };

    private Figure? ReachOf(int cylinder, Stage stage)
    {
        if (find(What.Stroke, cylinder, stage) is not { } stroke || find(What.RodLength, cylinder, stage) is not { } rod)
        {
            return null;
        }

        Figure? offset = find(What.PinOffset, cylinder, stage);
        Estimate reach = DerivedEstimate.Of<ReachFormula>(
            book, What.RodLength, stroke.Estimate, rod.Estimate, offset?.Estimate ?? Estimate.Zero);
        return new Figure(What.RodLength, reach, FigureKind.Computed, stage, null, null, []) { RestsOn = [stroke, rod] };
    }

    /// <summary>Rod, crank or base gasket that became another at a stage: stated anew there, or measured at two stages.</summary>
    private IEnumerable<What> Changed(int cylinder, Stage stage)
    {
        if (parts.Before(stage) is not { } before)
        {
            yield break;
        }

        foreach (What what in new[] { What.Stroke, What.RodLength, What.BaseGasket })
        {
            Figure? now = find(what, cylinder, stage), then = find(what, cylinder, before);
            if (now?.Stage == stage && then is not null && (now.Kind != FigureKind.Measured || then.Stage is not null))
            {
                yield return what;
            }
        }
    }

    // A piston put in where none was recorded is another one too: what was read before it was read on something else.
    private bool PistonChanged(int cylinder, Stage stage) => parts.Piston(cylinder, stage)?.Since == stage;

    /// <summary>How far the crank rises at a stage: as read, or by all its line bores.</summary>
    private Figure? Rise(int cylinder, Stage stage)
    {
        if (find(What.CrankRise, cylinder, stage) is { } read && read.Stage == stage)
        {
            return read;
        }

        Figure[] bores = [.. _amounts.Of(CutKind.LineBore, cylinder, stage)];
        return bores.Length == 0
            ? null
            : bores[0] with { Estimate = Estimate.Combine([.. bores.Select(bore => (1.0, bore.Estimate))]), RestsOn = bores.Length == 1 ? [] : bores };
    }

    private readonly struct Product : IFormula
    {
        public static T Of<T>(ReadOnlySpan<T> figures)
            where T : struct, IScalar<T> => figures[0] * figures[1];
    }

    private readonly struct DiscVolume : IFormula
    {
        public static T Of<T>(ReadOnlySpan<T> figures)
            where T : struct, IScalar<T> => Volumes.OfCylinder(figures[0], figures[1]);
    }

    private readonly struct ReachFormula : IFormula
    {
        public static T Of<T>(ReadOnlySpan<T> figures)
            where T : struct, IScalar<T> => SliderCrank.Reach(figures[0], figures[1], figures[2]);
    }
}
