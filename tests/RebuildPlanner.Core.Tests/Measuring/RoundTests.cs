using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Core.Tests.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Measuring;

public class RoundTests
{
    public static TheoryData<string> Blanks =>
        [.. Directory.GetFiles(RepositoryFiles.At("templates"), "*.json").Where(IsJob).Select(path => Path.GetFileName(path)!).Order(StringComparer.Ordinal)];

    [Fact]
    public void There_are_eight_blank_jobs() => Assert.Equal(8, Blanks.Count);

    [Theory]
    [InlineData("single.json", Layout.Single, 1, 1, EngineCycle.FourStroke, Ignition.Spark)]
    [InlineData("inline-four-overhead-cam.json", Layout.Inline, 4, 1, EngineCycle.FourStroke, Ignition.Spark)]
    [InlineData("inline-six.json", Layout.Inline, 6, 1, EngineCycle.FourStroke, Ignition.Spark)]
    [InlineData("vee-six.json", Layout.Vee, 6, 2, EngineCycle.FourStroke, Ignition.Spark)]
    [InlineData("vee-eight-pushrod.json", Layout.Vee, 8, 2, EngineCycle.FourStroke, Ignition.Spark)]
    [InlineData("flat-four.json", Layout.Flat, 4, 2, EngineCycle.FourStroke, Ignition.Spark)]
    [InlineData("two-stroke-twin.json", Layout.Inline, 2, 1, EngineCycle.TwoStroke, Ignition.Spark)]
    [InlineData("diesel-four.json", Layout.Inline, 4, 1, EngineCycle.FourStroke, Ignition.Compression)]
    public void A_blank_job_is_the_engine_its_name_says(string file, Layout layout, int cylinders, int banks, EngineCycle cycle, Ignition ignition)
    {
        Job job = Blank(file);

        Assert.Equal(
            (layout, cylinders, banks, banks, cycle, ignition),
            (job.Engine.Layout, job.Engine.Cylinders, job.Engine.Banks.Count, job.Engine.Heads.Count, job.Engine.Cycle, job.Engine.Ignition));
        Assert.Empty(job.Readings);
        Assert.NotEmpty(job.Limits);
        Assert.Null(job.Engine.Stroke);
    }

    // The reader of job files is the judge of what a reading may be of.
    [Theory]
    [MemberData(nameof(Blanks))]
    public void Every_place_can_be_read_and_then_none_is_left(string file)
    {
        Job blank = Blank(file);
        Job read = blank with { Readings = [.. Round.Of(blank.Engine).Select(place => ReadingAt(place, Stage.AsReceived))] };

        (Job? back, IReadOnlyList<Fault> faults) = JobFileReader.Read(JobFileWriter.Write(read));

        Assert.Empty(faults);
        Assert.Empty(Round.Left(back!, Stage.AsReceived));
        Assert.Equal(Round.Of(blank.Engine), Round.Left(back!, Stage.AsMachined));
    }

    [Fact]
    public void A_thing_is_read_on_every_cylinder_before_the_next_and_the_rock_with_its_deck()
    {
        IReadOnlyList<RoundPlace> round = Round.Of(Blank("inline-four-overhead-cam.json").Engine);

        Assert.Equal(
            [
                "bore 1 Top Thrust", "bore 1 Top AlongCrank", "bore 1 Middle Thrust", "bore 1 Middle AlongCrank", "bore 1 Bottom Thrust",
                "bore 1 Bottom AlongCrank", "bore 2 Top Thrust",
            ],
            round.Take(7).Select(Said));
        Assert.Equal(
            ["deck 1 Front", "deck 1 Rear", "rock 1", "deck 2 Front"], round.SkipWhile(place => place.What != What.Deck).Take(4).Select(Said));
        Assert.Equal(round.Count, round.Distinct().Count());
        Assert.Equal(round.OrderByDescending(place => place.ForRatio), round); // what the ratio rests on comes first
    }

    // A piston changed or a bore left to the piston: without the compression heights there is no ratio, without the skirt no displacement.
    [Theory]
    [InlineData(What.CompressionHeight, "30.0 mm", Stage.AsReceived, """ "readings": [ { "what": "deck", "cylinder": "1", "value": "0.2 mm below", "stage": "as received" } ] """)]
    [InlineData(What.Skirt, "81.46 mm", Stage.AsMachined, """ "cuts": [ { "what": "bore", "stage": "as machined" } ] """)]
    public void Ratio_rests_on_the_pistons_own_sizes_once_pistons_are_changed(What what, string size, Stage stage, string work)
    {
        Job without = Workbench.Single(
            work, """ "parts": { "pistons": [ { "id": "old" }, { "id": "new", "compressionHeight": "30.4 mm", "wantedClearance": "0.04 mm" } ] } """,
            """ "fitted": [ { "stage": "as received", "piston": "old" }, { "stage": "as machined", "piston": "new" } ] """);
        Quantity read = QuantityText.Read(size, WhatTable.Line(what).Rule, out _)!;
        Job with = without with { Readings = [.. without.Readings, new Reading(what, new Place(Cylinder: "1"), read, [], Stage: stage)] };

        Assert.Null(RatioOf(without));
        Assert.NotNull(RatioOf(with));
        Assert.All(Round.Of(with.Engine).Where(place => place.What == what), place => Assert.True(place.ForRatio));

        static double? RatioOf(Job job) => Workbench.Value(job, Stage.AsMachined, Core.Cylinders.Output.CompressionRatio);
    }

    [Fact]
    public void A_struck_reading_and_one_of_another_stage_leave_their_place_open()
    {
        Job blank = Blank("single.json");
        RoundPlace first = Round.Of(blank.Engine)[0];
        Reading reading = ReadingAt(first, Stage.AsReceived);

        Assert.DoesNotContain(first, Round.Left(blank with { Readings = [reading] }, Stage.AsReceived));
        Assert.Contains(first, Round.Left(blank with { Readings = [reading with { Struck = "gauge slipped" }] }, Stage.AsReceived));
        Assert.Contains(first, Round.Left(blank with { Readings = [reading] }, Stage.AsMachined));
    }

    [Fact]
    public void A_diesel_is_read_by_protrusion_and_a_two_stroke_has_no_valves()
    {
        What[] diesel = Things("diesel-four.json"), twoStroke = Things("two-stroke-twin.json"), petrol = Things("inline-six.json");

        Assert.Contains(What.PistonProtrusion, diesel);
        Assert.DoesNotContain(What.Deck, diesel);
        Assert.Contains(What.Deck, twoStroke);
        Assert.DoesNotContain(What.Guide, twoStroke);
        Assert.Contains(What.Guide, petrol);
    }

    [Fact]
    public void A_deck_is_not_asked_for_where_the_protrusion_was_read_nor_a_crown_fill_where_the_crown_was()
    {
        Job blank = Blank("single.json");
        Place end = new(Cylinder: "1", At: At.Front);
        Job job = blank with
        {
            Readings =
            [
                new Reading(What.PistonProtrusion, end, Quantity(What.PistonProtrusion), [], Stage: Stage.AsReceived),
                new Reading(What.Crown, new Place(Cylinder: "1"), Quantity(What.Crown), [], Stage: Stage.AsReceived),
            ],
        };

        IReadOnlyList<RoundPlace> left = Round.Left(job, Stage.AsReceived);

        Assert.DoesNotContain(left, place => place.What == What.Deck || place.Place == end);
        Assert.Contains(left, place => place.What == What.PistonProtrusion && place.Place.At == At.Rear);
        Assert.DoesNotContain(left, place => place.What == What.CrownFill);
    }

    [Fact]
    public void What_was_measured_on_a_piece_counts_where_the_piece_is_fitted()
    {
        Job job = Workbench.Single(
            """ "parts": { "pistons": [ { "id": "set", "pieces": [ "P1", "P2" ] } ] } """,
            """ "fitted": [ { "stage": "as machined", "piston": "set", "cylinder": "1", "piece": "P2" } ] """,
            """ "readings": [ { "what": "skirt", "piece": "PIECE", "value": "80.95 mm", "stage": "as machined" } ] """.Replace("PIECE", "P2", StringComparison.Ordinal));

        Assert.DoesNotContain(Round.Left(job, Stage.AsMachined), place => place.What == What.Skirt);
        Assert.Contains(
            Round.Left(job with { Readings = [job.Readings[0] with { Place = new Place(Piece: "P1") }] }, Stage.AsMachined), place => place.What == What.Skirt);
    }

    [Fact]
    public void The_only_head_is_the_same_place_named_or_not()
    {
        Job job = Workbench.Single(""" "readings": [ { "what": "gasket thickness", "head": "head", "value": "1.20 mm", "stage": "as received" } ] """);

        Assert.DoesNotContain(Round.Left(job, Stage.AsReceived), place => place.What == What.GasketThickness);
    }

    private static bool IsJob(string path) => File.ReadAllText(path).Contains($"\"{JobWords.Format}\"", StringComparison.Ordinal);

    private static Job Blank(string file) => Workbench.Read(RepositoryFiles.Text("templates", file));

    private static What[] Things(string file) => [.. Round.Of(Blank(file).Engine).Select(place => place.What).Distinct()];

    private static string Said(RoundPlace place) =>
        string.Join(' ', new object?[] { WhatWords.Of(place.What), place.Place.Cylinder, place.Place.At, place.Place.Axis }.OfType<object>());

    private static Reading ReadingAt(RoundPlace place, Stage stage) => new(
        place.What, place.Place, Quantity(place.What), [],
        Drop: WhatTable.Line(place.What).Keys.HasFlag(PlaceKeys.Drop) ? QuantityText.Read("6 mm", EngineRules.Drop, out _) : null, Stage: stage);

    /// <summary>A figure in the middle of what is sane for the thing.</summary>
    private static Quantity Quantity(What what)
    {
        QuantityRule rule = WhatTable.Line(what).Rule;
        string text = QuantityPrint.Text(0.5 * (rule.SaneLow + rule.SaneHigh), rule.Kinds[0], null, UnitSystem.Metric, rule.Signs).Replace("cm³", "cc", StringComparison.Ordinal);
        Quantity? quantity = QuantityText.Read(text, rule, out string? problem);
        Assert.True(quantity is not null, $"{text}: {problem}");
        return quantity;
    }
}
