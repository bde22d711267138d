using System.Globalization;
using System.Text.Json;
using CsCheck;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Core.Tests.Jobs;

namespace RebuildPlanner.Core.Tests.Measuring;

/// <summary>What the round still asks for: never what the figures have already, and never what the reader would refuse.</summary>
public class RoundLeftTests
{
    private const string Set = """ "parts": { "pistons": [ { "id": "set", "crown": "4.2 cc ± 0.1 cc dish", "pieces": [ "P1", "P2" ] } ] } """;

    private static readonly Gen<(Job Job, RoundPlace[] Read)> AnyHalfDone =
        from cylinders in Gen.Int[1, 24]
        from labels in Gen.Shuffle(Enumerable.Range(1, cylinders).Select(number => number.ToString(CultureInfo.InvariantCulture)).ToArray())
        from twoStroke in Gen.Bool
        from compression in Gen.Bool
        from vee in Gen.Bool
        let job = EngineOf(labels, twoStroke, compression, vee && cylinders > 1)
        let round = Round.Of(job.Engine)
        from read in Gen.Bool.Array[round.Count]
        select (job, round.Where((_, index) => read[index]).ToArray());

    [Fact]
    public void What_is_left_is_the_round_less_what_was_read() => AnyHalfDone.Sample(
        half => Assert.Equal(
            Round.Of(half.Job.Engine).Except(half.Read), Round.Left(With(half.Job, Stage.AsReceived, half.Read), Stage.AsReceived)),
        iter: 100);

    [Fact]
    public void Cylinders_go_in_the_order_of_their_labels_in_every_round() => AnyHalfDone.Sample(
        half => Assert.All(
            Round.Of(half.Job.Engine).Where(place => place.Place.Cylinder is not null).GroupBy(place => place.What),
            thing => Assert.Equal(half.Job.Engine.Labels, thing.Select(place => place.Place.Cylinder!).Distinct())),
        iter: 100);

    [Fact]
    public void An_engine_of_twenty_four_cylinders_is_read_through_without_fault_and_nothing_is_left()
    {
        Job blank = EngineOf([.. Enumerable.Range(1, 24).Select(number => number.ToString(CultureInfo.InvariantCulture))], false, false, vee: true);
        IReadOnlyList<RoundPlace> round = Round.Of(blank.Engine);

        Job read = Workbench.Read(Text(With(blank, Stage.AsMachined, round)));

        Assert.Equal(24 * 6, round.Count(place => place.What == What.Bore));
        Assert.Equal(round.Count, read.Readings.Count);
        Assert.Empty(Round.Left(read, Stage.AsMachined));
    }

    // Deck and protrusion of one cylinder and stage are refused together, so the round goes on in the word it was begun in.
    [Theory]
    [InlineData("spark", """ "readings": [ { "what": "piston protrusion", "cylinder": "1", "at": "front", "value": "0.2 mm proud", "stage": "as received" } ] """)]
    [InlineData("compression", """ "readings": [ { "what": "deck", "cylinder": "2", "at": "rear", "value": "0.2 mm below", "stage": "as received" } ] """)]
    [InlineData("compression", """ "given": [ { "what": "deck", "value": "0.2 mm below", "stage": "as received" } ] """)]
    [InlineData("spark", """ "assumed": [ { "what": "piston protrusion", "cylinder": "2", "value": "0.2 mm proud", "stage": "as received" } ] """)]
    [InlineData("spark", """ "readings": [ { "what": "piston protrusion", "cylinder": "1", "at": "front", "value": "0.2 mm proud", "stage": "as received", "struck": "dial slipped" } ] """)]
    public void What_is_left_is_never_what_the_reader_would_refuse(string ignition, string begun)
    {
        Job job = Workbench.Engine(2, $$""" "engine": { "cylinders": 2, "ignition": "{{ignition}}" } """, """ "given": [] """, begun);
        IReadOnlyList<RoundPlace> left = Round.Left(job, Stage.AsReceived);

        Job read = Workbench.Read(Text(With(job, Stage.AsReceived, left)));

        Assert.Equal(2, read.Engine.Labels.Count(label => AskedOrRead(read, label) == 2)); // both ends of both pins
        Assert.Empty(Round.Left(read, Stage.AsReceived));

        static int AskedOrRead(Job job, string cylinder) => job.Readings.Count(reading =>
            reading is { What: What.Deck or What.PistonProtrusion, Struck: null } && reading.Place.Cylinder == cylinder);
    }

    [Theory]
    [InlineData("rod length", "140 mm", What.RodLength)]
    [InlineData("top land height", "5 mm", What.TopLandHeight)]
    public void A_reading_that_names_no_cylinder_is_of_them_all_as_the_figures_take_it(string word, string value, What what)
    {
        Job job = Workbench.Engine(3, $$""" "readings": [ { "what": "{{word}}", "value": "{{value}}", "stage": "as received" } ] """);

        Assert.All(Enumerable.Range(0, 3), cylinder => Assert.Equal(FigureKind.Measured, Workbench.Find(job, Stage.AsReceived, what, cylinder)!.Kind));
        Assert.DoesNotContain(Round.Left(job, Stage.AsReceived), place => place.What == what);
    }

    [Theory]
    [InlineData("stroke", "88 mm", What.Stroke)]
    [InlineData("end float", "0.1 mm", What.EndFloat)]
    [InlineData("gasket opening", "86 mm", What.GasketOpening)]
    public void What_all_cylinders_share_is_read_when_it_was_read_at_each_of_them(string word, string value, What what)
    {
        string At(string cylinder) => $$"""{ "what": "{{word}}", "cylinder": "{{cylinder}}", "value": "{{value}}", "stage": "as received" }""";

        Assert.Contains(Round.Left(Workbench.Engine(2, $"\"readings\": [ {At("1")} ]"), Stage.AsReceived), place => place.What == what);
        Assert.DoesNotContain(Round.Left(Workbench.Engine(2, $"\"readings\": [ {At("1")}, {At("2")} ]"), Stage.AsReceived), place => place.What == what);
    }

    [Theory]
    [InlineData("")]
    [InlineData("\"head\": \"front\",")]
    public void A_gasket_read_at_the_only_cylinder_of_its_head_is_that_heads_and_no_others(string head)
    {
        Job job = Workbench.Engine(
            2,
            """ "engine": { "cylinders": 2, "heads": [ { "label": "front", "cylinders": ["1"] }, { "label": "rear", "cylinders": ["2"] } ] } """,
            $$""" "readings": [ { "what": "gasket thickness", {{head}} "cylinder": "1", "value": "1.2 mm", "stage": "as received" } ] """);

        Assert.Equal(["rear"], Round.Left(job, Stage.AsReceived).Where(place => place.What == What.GasketThickness).Select(place => place.Place.Head!));
    }

    [Fact]
    public void Flatness_at_a_cylinder_says_neither_head_nor_block_and_leaves_both_open()
    {
        Job job = Workbench.Single(""" "readings": [ { "what": "flatness", "cylinder": "1", "value": "0.04 mm", "stage": "as received" } ] """);

        Assert.Equal(
            [new Place(Head: "head"), new Place(Bank: "block")],
            Round.Left(job, Stage.AsReceived).Where(place => place.What == What.Flatness).Select(place => place.Place));
    }

    // Pistons are measured when they come in and fitted later: the figures take such a reading from the fitting on.
    [Theory]
    [InlineData("\"stage\": \"planned\",")]
    [InlineData("\"stage\": \"as received\",")]
    [InlineData("")]
    public void A_piece_measured_before_it_is_fitted_is_not_asked_for_again(string stage)
    {
        Job job = Workbench.Single(
            Set, """ "fitted": [ { "stage": "as machined", "piston": "set", "cylinder": "1", "piece": "P2" } ] """,
            $$""" "readings": [ { "what": "skirt", "piece": "P2", {{stage}} "value": "80.95 mm" } ] """);

        Assert.Equal(FigureKind.Measured, Workbench.Find(job, Stage.AsMachined, What.Skirt)!.Kind);
        Assert.DoesNotContain(Round.Left(job, Stage.AsMachined), place => place.What == What.Skirt);
        Assert.Contains(Round.Left(job, Stage.AsReceived), place => place.What == What.Skirt);
    }

    [Fact]
    public void A_crown_the_maker_states_is_still_asked_for()
    {
        Job job = Workbench.Single(Set, """ "fitted": [ { "stage": "as received", "piston": "set" } ] """);

        Assert.Contains(Round.Left(job, Stage.AsReceived), place => place.What == What.CrownFill);
    }

    [Fact]
    public void A_deck_read_without_its_end_leaves_both_ends_to_be_read()
    {
        Job job = Workbench.Single(""" "given": [] """, """ "readings": [ { "what": "deck", "cylinder": "1", "value": "0.2 mm below", "stage": "as received" } ] """);

        Assert.Equal([At.Front, At.Rear], Round.Left(job, Stage.AsReceived).Where(place => place.What == What.Deck).Select(place => place.Place.At!.Value));
    }

    private static Job EngineOf(string[] labels, bool twoStroke, bool compression, bool vee)
    {
        int half = labels.Length / 2;
        string banks = vee
            ? $$""", "layout": "vee", "banks": [ { "label": "left", "cylinders": {{JsonSerializer.Serialize(labels[..half])}} }, { "label": "right", "cylinders": {{JsonSerializer.Serialize(labels[half..])}} } ] """
            : "";
        return Workbench.Engine(
            labels.Length,
            $$""" "engine": { "cylinders": {{labels.Length}}, "labels": {{JsonSerializer.Serialize(labels)}}, "cycle": "{{(twoStroke ? "two-stroke" : "four-stroke")}}", "ignition": "{{(compression ? "compression" : "spark")}}" {{banks}} } """,
            """ "given": [] """);
    }

    private static Job With(Job job, Stage stage, IEnumerable<RoundPlace> places) => job with { Readings = [.. job.Readings, .. places.Select(place => ReadingAt(place, stage))] };

    private static string Text(Job job) => System.Text.Encoding.UTF8.GetString(JobFileWriter.Write(job));

    private static Reading ReadingAt(RoundPlace place, Stage stage)
    {
        WhatLine line = WhatTable.Line(place.What);
        double middle = 0.5 * (line.Rule.SaneLow + line.Rule.SaneHigh);
        string text = QuantityPrint.Text(middle, line.Rule.Kinds[0], null, UnitSystem.Metric, line.Rule.Signs);
        return new(
            place.What, place.Place, QuantityText.Read(text, line.Rule, out _)!, [],
            Drop: line.Keys.HasFlag(PlaceKeys.Drop) ? QuantityText.Read("6 mm", EngineRules.Drop, out _) : null, Stage: stage);
    }
}
