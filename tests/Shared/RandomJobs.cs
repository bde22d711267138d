using System.Globalization;
using CsCheck;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Tests.Shared;

/// <summary>Jobs that may stand in a file, drawn part by part; every word and every line of the closed list comes up.</summary>
internal static class RandomJobs
{
    private static readonly Gen<string> Words = Gen.OneOf("oil", "früh", "a \"b\" c", "tab\there", "line\nbreak", "½ µ ± ³", "</script>", "𝄞", "\\", " ");

    private static readonly Gen<Stage> Stages = Gen.Enum<Stage>();

    private static readonly Gen<Engine> Engines =
        from cylinders in Gen.Int[1, 8]
        from split in Gen.Int[0, 7]
        from vee in Gen.Bool
        from description in Maybe(Words)
        from cycle in Gen.Enum<EngineCycle>()
        from ignition in Gen.Enum<Ignition>()
        from metal in MaybeValue(Gen.Enum<Metal>())
        from stroke in Maybe(Written(EngineRules.Stroke, 60, 90))
        from cam in Maybe(Cams)
        from valves in MaybeValue(Gen.Int[1, 8])
        from fuel in Maybe(Words)
        select MakeEngine(cylinders, split, vee) with
        {
            Description = description,
            Cycle = cycle,
            Ignition = ignition,
            BlockMetal = metal,
            Stroke = stroke,
            RodLength = Text("128 mm ± 0.05 mm", EngineRules.RodLength),
            Cam = cam,
            ValvesPerCylinder = valves,
            Fuel = fuel,
        };

    private static readonly Gen<Gauge> Gauges =
        from kind in Gen.OneOf("burette", "bore gauge", "plunger dial")
        from resolution in Gen.OneOf("0.01", "0.002", "0.1")
        from study in Gen.Bool
        from readings in Gen.Int[2, 50]
        from glass in MaybeValue(Gen.Enum<Glass>())
        let unit = kind == "burette" ? "cc" : "mm"
        let step = Text($"{resolution} {unit}", EngineRules.GaugeStep)
        select new Gauge(
            kind, kind, step, Glass: kind == "burette" ? glass : null, Repeatability: study ? step : null,
            RepeatabilityReadings: study ? readings : null, Calibrated: study ? "2024-02-29" : null);

    public static readonly Gen<Job> Job =
        from engine in Engines
        from gauges in Gauges.Array[0, 3]
        from title in Maybe(Words)
        from price in MaybeValue(Gen.Int[0, 100_000].Select(cents => cents / 100m))
        from onOffer in Gen.Bool
        from readings in Readings(engine).Array[0, 12]
        from stated in Stated(engine).Array[0, 6]
        from limits in Limits(engine).Array[0, 6]
        from cuts in Cuts(engine).Array[0, 6]
        from stage in Stages
        from notes in Words.Array[0, 3]
        select new Job("J-1", engine, Title: title, CustomerContact: title)
        {
            Gauges = [.. gauges.DistinctBy(gauge => gauge.Id)],
            Readings = [.. readings.Select((reading, at) => reading with { Id = at.ToString(CultureInfo.InvariantCulture) })],
            Given = [.. stated],
            Assumed = [.. stated.Take(2)],
            Pistons = [new("std", Crown: Text("3.4 cc dome", WhatTable.Line(What.Crown).Rule), Price: price, OnOffer: onOffer, Pieces: ["P1", "P2"])],
            Gaskets = [new("G", Price: price, Grade: title, OnOffer: onOffer)],
            Fitted = [new(stage, "std", "G"), new(stage, "std", Cylinder: engine.Labels[0], Piece: "P1")],
            Limits = [.. limits],
            Targets = [.. limits.Take(1)],
            Cuts = [.. cuts],
            Processes = [.. cuts.DistinctBy(cut => cut.Kind).Select(cut => new Process(cut.Kind, Text("0.02 mm", CutRules.Tolerance)))],
            Checks = [new("crack test", title, stage, When: "2026-02-18T10:00:00+02:00")],
            Notes = [.. notes],
        };

    private static Gen<Cam> Cams =>
        from overhead in MaybeValue(Gen.Bool)
        from drive in MaybeValue(Gen.Enum<CamDrive>())
        from closes in Maybe(Gen.Int[1, 80].Select(degrees => Text($"{degrees} deg ABDC", EngineRules.InletCloses)))
        from at in Maybe(Gen.OneOf("seat", "1 mm", "0.050 in"))
        from angles in Maybe(Gen.Int[0, 30].Select(degrees => Text($"{degrees} deg", EngineRules.RunAngle)).Array[0, 2])
        select new Cam(overhead, drive, null, angles is null ? null : [.. angles], closes, null, at);

    private static Gen<Reading> Readings(Engine engine) =>
        from line in Gen.OneOf([.. WhatTable.Lines.Where(line => line.What != What.PistonProtrusion)])
        from place in Places(line, engine)
        from value in Written(line.Rule)
        from fills in Gen.Int[0, 2]
        from torque in MaybeValue(Gen.Bool)
        from stage in MaybeValue(Stages)
        from struck in Maybe(Gen.Const("slipped, see note"))
        from reader in Maybe(Words)
        let drop = line.What == What.CrownFill ? Text("5 mm ± 0.02 mm", EngineRules.Drop) : null
        select line.What is What.Chamber && fills > 0
            ? new Reading(line.What, place, null, MakeFills(fills), fills == 1, drop, null, null, torque, stage, struck, By: reader)
            : new Reading(line.What, place, value, [], false, drop, null, null, torque, stage, struck, By: reader);

    private static Gen<StatedFigure> Stated(Engine engine) =>
        from line in Gen.OneOf([.. WhatTable.Lines.Where(line => line.What is not (What.PistonProtrusion or What.CrownFill))])
        from place in Places(line, engine)
        from value in Written(line.Rule)
        from source in Maybe(Words)
        from stage in MaybeValue(Stages)
        from common in Gen.Bool
        select new StatedFigure(line.What, place, value, source, stage, common);

    private static Gen<Place> Places(WhatLine line, Engine engine) =>
        from cylinder in Gen.OneOf([.. engine.Labels])
        from bank in Gen.OneOf([.. engine.Banks.Select(bank => bank.Label)])
        from head in Gen.OneOf([.. engine.Heads.Select(head => head.Label)])
        from depth in MaybeValue(Gen.OneOf(At.Top, At.Middle, At.Bottom))
        from end in MaybeValue(Gen.OneOf(At.Front, At.Rear))
        from axis in MaybeValue(Gen.Enum<BoreAxis>())
        from valve in MaybeValue(Gen.Enum<Valve>())
        from hours in MaybeValue(Gen.Double[0.001, 12.0])
        from piece in Gen.Bool
        select new Place(
            line.Belongs == Belongs.Cylinder && !(line.MayBePiece && piece) ? cylinder : null,
            line.MayBePiece && piece ? "P1" : null,
            line.Belongs == Belongs.Head ? head : null,
            line.Belongs == Belongs.Bank ? bank : null,
            line.Keys.HasFlag(PlaceKeys.Depth) ? depth : line.Keys.HasFlag(PlaceKeys.PinEnd) ? end : null,
            line.Keys.HasFlag(PlaceKeys.Axis) ? axis : null,
            line.Keys.HasFlag(PlaceKeys.Valve) ? valve : null,
            line.Keys.HasFlag(PlaceKeys.Clock) ? hours : null);

    private static Gen<Limit> Limits(Engine engine) =>
        from subject in Gen.OneOf([.. Subjects.All])
        from bound in Written(subject.Rule)
        from least in Gen.Bool
        from both in Gen.Bool
        from level in MaybeValue(Gen.Double[0.501, 0.999])
        from stage in MaybeValue(Stages)
        from one in Gen.Bool
        let mayName = subject.What is { } what
            ? WhatTable.Line(what).Belongs == Belongs.Cylinder
            : subject.Derived is not (Derived.ChamberSpread or Derived.RatioSpread)
        select new Limit(
            subject, least || both ? bound : null, !least || both ? bound : null, level, stage,
            one && mayName ? new Place(Cylinder: engine.Labels[0]) : Place.Everywhere);

    private static Gen<Cut> Cuts(Engine engine) =>
        from kind in Gen.Enum<CutKind>()
        from stage in Stages
        from sized in Gen.Bool
        let bores = kind is CutKind.Bore or CutKind.Hone or CutKind.Sleeve
        let value = Text(bores ? "82.5 mm ± 0.01 mm" : "0.2 mm", CutRules.Value(kind))
        select new Cut(
            kind,
            kind switch
            {
                CutKind.HeadSkim => new Place(Head: engine.Heads[0].Label),
                CutKind.DeckCut => new Place(Bank: engine.Banks[0].Label),
                CutKind.LineBore => Place.Everywhere,
                CutKind.ValveSeat => new Place(Cylinder: engine.Labels[0], Valve: Valve.Inlet),
                _ => new Place(Cylinder: engine.Labels[0]),
            },
            bores && !sized ? null : value, stage);

    private static Engine MakeEngine(int cylinders, int split, bool vee)
    {
        string[] labels = [.. Enumerable.Range(1, cylinders).Select(number => $"“{number}” µ")];
        bool several = vee && cylinders > 1;
        int first = several ? 1 + (split % (cylinders - 1)) : cylinders;
        Bank[] banks = several ? [new("left", [.. labels[..first]]), new("right", [.. labels[first..]])] : [new("block", [.. labels])];
        Layout layout = several ? (split % 2 == 0 ? Layout.Vee : Layout.Flat) : cylinders == 1 ? Layout.Single : Layout.Inline;
        return new(cylinders, [.. labels], [.. banks], [.. banks.Select(bank => new Head(bank.Label, bank.Cylinders, Metal.Aluminium))], Layout: layout);
    }

    private static EquatableList<Fill> MakeFills(int count) =>
        [.. Enumerable.Repeat(new Fill(Text("0.2 cc", EngineRules.BuretteScale), Text("21.4 cc", EngineRules.BuretteScale)), count)];

    private static Gen<Quantity> Written(QuantityRule rule)
    {
        double low = Math.Max(rule.SaneLow, 0.0), high = Math.Min(rule.SaneHigh, low + 100_000.0);
        double perUnit = rule.Kinds[0] == QuantityKind.Volume ? 1000.0 : 1.0;
        return Written(rule, low / perUnit, high / perUnit);
    }

    private static Gen<Quantity> Written(QuantityRule rule, double low, double high) =>
        from share in Gen.Double[0.25, 0.75]
        from limits in Gen.Bool
        let number = Math.Round(low + (share * (high - low)), 3).ToString("0.000", CultureInfo.InvariantCulture)
        let unit = rule.Kinds[0] switch
        {
            QuantityKind.Volume => " cc",
            QuantityKind.Area => " mm2",
            QuantityKind.Pressure => " kPa",
            QuantityKind.Ratio => "",
            _ => " mm",
        }
        let word = rule.Signs switch
        {
            SignWords.Crown => " dish",
            SignWords.Deck => " below",
            SignWords.Protrusion => " proud",
            _ => "",
        }
        select Text($"{number}{unit}{(limits ? $" ± 0.001{unit}" : "")}{word}", rule);

    private static Quantity Text(string text, QuantityRule rule) =>
        QuantityText.Read(text, rule, out string? problem) ?? throw new InvalidOperationException($"{text}: {problem}");

    private static Gen<T?> Maybe<T>(Gen<T> gen)
        where T : class =>
        from there in Gen.Bool
        from value in gen
        select there ? value : null;

    private static Gen<T?> MaybeValue<T>(Gen<T> gen)
        where T : struct =>
        from there in Gen.Bool
        from value in gen
        select there ? value : (T?)null;
}
