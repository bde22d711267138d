using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Jobs;

/// <summary>What each kind of figure carries of doubt; the expected numbers are worked by hand beside each.</summary>
public class DoubtTests
{
    private const string Gauges =
        """
        "gauges": [ { "id": "mic", "kind": "micrometer", "resolution": "0.001 mm", "limitOfError": "0.004 mm" },
          { "id": "bg", "kind": "bore gauge", "resolution": "0.002 mm", "limitOfError": "0.003 mm", "setWith": "mic" },
          { "id": "bur", "kind": "burette", "resolution": "0.2 cc", "limitOfError": "0.1 cc" },
          { "id": "own", "kind": "burette", "resolution": "0.02 cc", "limitOfError": "0.1 cc", "repeatability": "0.3 cc", "repeatabilityReadings": 11 } ]
        """;

    [Fact]
    public void A_single_length_carries_half_a_step_and_the_errors_of_its_gauge_and_the_one_it_was_set_with() => AssertDoubt(
        [Bore("84.000 mm", "bg")],
        What.Bore, Math.Sqrt(((0.001 * 0.001) + (0.003 * 0.003) + (0.004 * 0.004)) / 3));

    // Two places halve neither shared error; each place's own half step averages out.
    [Fact]
    public void Places_average_resolution_but_not_the_limit_of_error() => AssertDoubt(
        [Bore("84.000 mm", "mic", "top"), Bore("84.010 mm", "mic", "bottom")],
        What.Bore, Math.Sqrt((0.004 * 0.004 / 3) + (2 * 0.25 * 0.0005 * 0.0005 / 3)));

    // Two scale readings a fill of ± 0.1 each, and the limit of error once a fill: two fills double it.
    [Theory]
    [InlineData(""" "from": "0 cc", "to": "40.0 cc" """, 1)]
    [InlineData(""" "fills": [ { "from": "0 cc", "to": "25.0 cc" }, { "from": "0 cc", "to": "15.0 cc" } ] """, 2)]
    public void A_burette_reads_twice_a_fill_and_errs_once_a_fill(string volume, int fills) => AssertDoubt(
        [$$""" { "what": "chamber", "cylinder": "1", {{volume}}, "gauge": "bur", "stage": "as received" } """],
        What.Chamber, 1000 * Math.Sqrt(((2 * fills * 0.1 * 0.1) + (fills * fills * 0.1 * 0.1)) / 3));

    // Repeats 40.0 and 40.6: s = 0.3·√2, mean of two s/√2 = 0.3, more than the resolution 0.0816, which is then left out.
    [Fact]
    public void Repeats_that_scatter_more_than_the_scale_take_its_place() => AssertDoubt(
        [Chamber("40.0", "bur"), Chamber("40.6", "bur")], What.Chamber, 1000 * Math.Sqrt(0.09 + (0.01 / 3)));

    // Repeats 40.0 and 40.0: s = 0, so the resolution stays.
    [Fact]
    public void Repeats_that_agree_do_not_beat_the_scale() => AssertDoubt(
        [Chamber("40.0", "bur"), Chamber("40.0", "bur")], What.Chamber, 1000 * Math.Sqrt((0.02 / 3) + (0.01 / 3)));

    // Only cylinder 1 is repeated, cylinder 2 takes the same s for its single reading: s = 0.3·√2 and no √n.
    [Fact]
    public void A_place_read_once_takes_the_spread_of_the_pool() => AssertDoubt(
        [Chamber("40.0", "bur"), Chamber("40.6", "bur"), Chamber("41.0", "bur", "2")],
        What.Chamber, 1000 * Math.Sqrt(0.18 + (0.01 / 3)), cylinder: 1);

    // Own study 0.3 with ν 10, repeats 40.0 and 40.6 with SS 0.18 and ν 1: s² = (0.9 + 0.18)/11.
    [Fact]
    public void A_gauges_own_study_is_pooled_with_the_repeats() => AssertDoubt(
        [Chamber("40.0", "own"), Chamber("40.6", "own")],
        What.Chamber, 1000 * Math.Sqrt((1.08 / 11 / 2) + (0.01 / 3)));

    [Fact]
    public void Without_a_gauge_the_digits_written_are_the_resolution() => AssertDoubt(
        [""" { "what": "bore", "cylinder": "1", "value": "3.307 in", "stage": "as received" } """],
        What.Bore, 0.0254 / 2 / Math.Sqrt(3));

    // ISO 385 limits of error, class AS and B (from memory): rectangular, so u = limit/√3 beside two half steps.
    [Theory]
    [InlineData("0.02", "0.02")]
    [InlineData("0.02", "0.05")]
    [InlineData("0.1", "0.05")]
    [InlineData("0.1", "0.1")]
    [InlineData("0.2", "0.1")]
    [InlineData("0.2", "0.2")]
    public void A_burette_of_ISO_385_carries_its_class_limit(string step, string limit)
    {
        double d = double.Parse(step, System.Globalization.CultureInfo.InvariantCulture), e = double.Parse(limit, System.Globalization.CultureInfo.InvariantCulture);
        Job job = Workbench.Engine(
            1, $$""" "gauges": [ { "id": "b", "kind": "burette", "resolution": "{{step}} cc", "limitOfError": "{{limit}} cc" } ] """,
            """ "readings": [ { "what": "chamber", "cylinder": "1", "from": "0 cc", "to": "9.5 cc", "gauge": "b", "stage": "as received" } ] """);

        Assert.Equal(1000 * Math.Sqrt(((e * e) + (d * d / 2)) / 3), Doubt(job, What.Chamber), 1e-9);
    }

    [Fact]
    public void The_micrometers_error_cancels_in_the_clearance_of_a_bore_gauge_set_with_it()
    {
        Job job = Workbench.Engine(
            1, Gauges,
            $$""" "readings": [ {{Bore("84.000 mm", "bg")}}, { "what": "skirt", "cylinder": "1", "value": "83.950 mm", "gauge": "mic", "stage": "as received" } ] """,
            """ "limits": [ { "what": "bore clearance", "min": "0.040 mm", "max": "0.060 mm", "stage": "as received" } ] """);

        Verdict verdict = StageResults.Of(job, Stage.AsReceived).Verdicts[0];

        // Left are ± 0.003 of the bore gauge and the half steps ± 0.001 and ± 0.0005: at most 0.0045, so 0.050 is surely within ± 0.010.
        Assert.Equal((VerdictState.Within, 1.0), (verdict.State, verdict.Probability!.Value));
        Assert.Equal(0.0045, Spread(job), 1e-12);

        static double Spread(Job job)
        {
            StageModel model = new(job, Stage.AsReceived);
            LinearFigure clearance = new StageFigures(model).Linear(
                (1, model.Search.Find(What.Bore, 0)!.Estimate), (-1, model.Search.Find(What.Skirt, 0)!.Estimate));
            return (clearance.Worst.High - clearance.Worst.Low) / 2;
        }
    }

    // Both ends read 84.000 with half steps of ± 0.0005: a taper of 0 with u = 0.0005·√(2/3), the micrometer's error gone.
    [Fact]
    public void Equal_readings_do_not_prove_a_bore_without_taper()
    {
        Job job = Workbench.Engine(1, Gauges, $"\"readings\": [ {Bore("84.000 mm", "mic")}, {Bore("84.000 mm", "mic", "bottom")} ]");

        ResultQuantity taper = StageResults.Of(job, Stage.AsReceived).Cylinders[0].Taper!;

        Assert.Equal(0.0, taper.Value);
        Assert.Equal(0.0005 * Math.Sqrt(2.0 / 3), taper.StandardUncertainty!.Value, 1e-12);
    }

    [Fact]
    public void One_crank_is_one_doubt_and_rods_are_each_their_own()
    {
        StageModel model = new(Workbench.Engine(3), Stage.AsReceived);

        Assert.Single(Sources(model, Input.Stroke));
        Assert.Equal(3, Sources(model, Input.RodLength).Count);
        Assert.Single(Sources(model, Input.GasketThickness));
        Assert.Equal(3, Sources(model, Input.Chamber).Count);
    }

    [Fact]
    public void Two_heads_have_two_gaskets_of_one_part_number_and_common_parts_one_crown()
    {
        StageModel model = new(
            Workbench.Read(
                """
                { "format": "rebuild-planner-job", "version": 1, "job": { "number": "T" },
                  "engine": { "cylinders": 4, "layout": "vee", "stroke": "80 mm ± 0.1 mm",
                    "banks": [ { "label": "left", "cylinders": ["1","2"] }, { "label": "right", "cylinders": ["3","4"] } ] },
                  "parts": { "pistons": [ { "id": "p", "crown": "3 cc ± 0.2 cc dish", "common": true } ],
                             "gaskets": [ { "id": "g", "thickness": "1 mm ± 0.05 mm", "opening": "85 mm ± 0.1 mm" } ] },
                  "fitted": [ { "stage": "as received", "piston": "p", "gasket": "g" } ] }
                """),
            Stage.AsReceived);

        Assert.Equal(2, Sources(model, Input.GasketThickness).Count);
        Assert.Single(Sources(model, Input.Crown));
    }

    // Rectangular about the midpoint: 0.80 +0.06/−0.02 is 0.82 ± 0.04.
    [Fact]
    public void Unequal_limits_count_about_their_middle()
    {
        Figure figure = Workbench.Find(
            Workbench.Single(""" "given": [ { "what": "gasket thickness", "value": "0.80 mm +0.06/-0.02 mm" } ] """), Stage.AsReceived, What.GasketThickness)!;

        Assert.Equal(0.82, figure.Estimate.Value, 1e-12);
    }

    // A temperature without limits is ± 1 °C: 84 mm of iron by a steel gauge, 84·0.3e-6/√3 from it and α's ± 10 % over 5 °C.
    [Fact]
    public void A_temperature_brings_its_own_doubt()
    {
        Job job = Workbench.Engine(
            1, """ "engine": { "cylinders": 1, "stroke": "78 mm ± 0.04 mm", "blockMetal": "cast iron" } """,
            """ "gauges": [ { "id": "g", "kind": "bore gauge", "resolution": "0.000001 mm", "limitOfError": "0 mm" } ] """,
            """ "readings": [ { "what": "bore", "cylinder": "1", "value": "84 mm", "gauge": "g", "temperature": "25 C", "stage": "as received" } ] """);
        Figure bore = Workbench.Find(job, Stage.AsReceived, What.Bore)!;

        Assert.Equal(84 + (84 * 5 * 0.3e-6), bore.Estimate.Value, 1e-12);
        double temperature = 84 * 0.3e-6, iron = 84 * 5 * 1.14e-6, steel = 84 * 5 * 1.17e-6;
        Assert.Equal(Math.Sqrt(((temperature * temperature) + (iron * iron) + (steel * steel)) / 3), Doubt(job, What.Bore), 1e-9);
    }

    private static void AssertDoubt(string[] readings, What what, double expected, int cylinder = 0)
    {
        Job job = Workbench.Engine(2, Gauges, $"\"readings\": [ {string.Join(", ", readings)} ]");

        Assert.Equal(expected, Doubt(job, what, cylinder), 1e-9);
    }

    private static double Doubt(Job job, What what, int cylinder = 0)
    {
        StageModel model = new(job, Stage.AsReceived);
        LinearFigure figure = new StageFigures(model).Linear((1, model.Search.Find(what, cylinder)!.Estimate));
        return Propagation.StandardUncertainty(model.Model.Sources, [.. figure.Row]);
    }

    private static HashSet<int> Sources(StageModel model, Input input) =>
    [
        .. Enumerable.Range(0, model.Model.Cylinders.Count).SelectMany(cylinder => model.Model.EstimateOf(cylinder, input).Terms.Select(term => term.Source)),
    ];

    private static string Bore(string value, string gauge, string at = "top") =>
        $$""" { "what": "bore", "cylinder": "1", "at": "{{at}}", "axis": "thrust", "value": "{{value}}", "gauge": "{{gauge}}", "stage": "as received" } """;

    private static string Chamber(string to, string gauge, string cylinder = "1") =>
        $$""" { "what": "chamber", "cylinder": "{{cylinder}}", "from": "0 cc", "to": "{{to}} cc", "gauge": "{{gauge}}", "stage": "as received" } """;
}
