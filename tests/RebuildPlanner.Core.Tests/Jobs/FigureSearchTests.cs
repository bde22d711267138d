using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.Tests.Jobs;

public class FigureSearchTests
{
    private const string Area = """{ "what": "chamber opening area", "value": "50 cm2 ± 1 cm2" }""";

    [Fact]
    public void Within_a_stage_measured_beats_given_beats_assumed()
    {
        Job job = Workbench.Engine(
            2,
            """ "readings": [ { "what": "chamber", "cylinder": "1", "value": "35 cc", "stage": "as received" } ] """,
            """ "given": [ { "what": "chamber", "cylinder": "1", "value": "36 cc ± 1 cc", "stage": "as received" }, { "what": "crown", "value": "2 cc ± 1 cc dish", "stage": "as received" } ] """,
            """ "assumed": [ { "what": "chamber", "value": "37 cc ± 1 cc", "stage": "as received" }, { "what": "crown", "value": "3 cc ± 1 cc dish", "stage": "as received" } ] """);

        Assert.Equal((FigureKind.Measured, 35e3), Kind(job, Stage.AsReceived, What.Chamber));
        Assert.Equal((FigureKind.Given, 2e3), Kind(job, Stage.AsReceived, What.Crown));
        Assert.Equal((FigureKind.Assumed, 37e3), Kind(job, Stage.AsReceived, What.Chamber, cylinder: 1));
    }

    [Fact]
    public void A_later_stage_counts_before_an_earlier_one_and_both_before_what_holds_throughout()
    {
        Job job = Workbench.Single(
            """ "given": [ { "what": "chamber", "value": "30 cc ± 1 cc" }, { "what": "chamber", "value": "31 cc ± 1 cc", "stage": "as received" }, { "what": "chamber", "value": "32 cc ± 1 cc", "stage": "as machined" } ] """);

        Assert.Equal(30e3, Workbench.Find(job, Stage.Before, What.Chamber)!.Estimate.Value);
        Assert.Equal(31e3, Workbench.Find(job, Stage.AsReceived, What.Chamber)!.Estimate.Value);
        Assert.Equal(31e3, Workbench.Find(job, Stage.Planned, What.Chamber)!.Estimate.Value);
        Assert.Equal(32e3, Workbench.Find(job, Stage.AsMachined, What.Chamber)!.Estimate.Value);
    }

    [Fact]
    public void A_planned_figure_counts_after_machining_only_if_the_plan_was_taken()
    {
        const string Given = """ "given": [ { "what": "crown", "value": "1 cc ± 1 cc dish", "stage": "as received" }, { "what": "crown", "value": "2 cc ± 1 cc dish", "stage": "planned" } ] """;
        Job open = Workbench.Single(Given);
        Job taken = Workbench.Single(Given, """ "cuts": [ { "what": "deck cut", "value": "0.1 mm", "stage": "planned" } ] """);

        Assert.Equal(1e3, Workbench.Find(open, Stage.AsMachined, What.Crown)!.Estimate.Value);
        Assert.Equal(2e3, Workbench.Find(taken, Stage.AsMachined, What.Crown)!.Estimate.Value);
        Assert.Equal(2e3, Workbench.Find(open, Stage.Planned, What.Crown)!.Estimate.Value);
    }

    [Fact]
    public void A_skim_carries_the_chamber_through_the_area_of_its_opening()
    {
        Job job = Workbench.Single(
            $$""" "given": [ { "what": "chamber", "value": "40 cc ± 0.3 cc", "stage": "as received" }, {{Area}} ] """,
            """ "cuts": [ { "what": "head skim", "value": "0.20 mm ± 0.02 mm", "stage": "as machined" } ] """);

        Assert.Equal((FigureKind.Computed, 39e3), Kind(job, Stage.AsMachined, What.Chamber)); // 40 cc − 50 cm² × 0.02 cm
        Assert.Equal((FigureKind.Given, 40e3), Kind(job, Stage.AsReceived, What.Chamber));
    }

    [Fact]
    public void A_skimmed_chamber_without_its_opening_is_missing_and_says_so()
    {
        Results results = StageResults.Of(
            Workbench.Single(
                """ "readings": [ { "what": "chamber", "cylinder": "1", "value": "40 cc", "stage": "as received" } ] """,
                """ "given": [ { "what": "bore", "value": "81 mm ± 0.01 mm" } ] """,
                """ "cuts": [ { "what": "head skim", "value": "0.20 mm", "stage": "as machined" } ] """),
            Stage.AsMachined);

        Assert.Null(results.Cylinders[0].Chamber);
        Assert.Contains(new MissingFigure("chamber", "1"), results.Missing);
        Assert.Contains(results.Cautions, caution => caution is { Code: "reading-ended", Figure: "chamber" });
    }

    [Fact]
    public void Sunk_valves_add_their_discs_to_the_chamber()
    {
        Job job = Workbench.Single(
            """
            "given": [ { "what": "chamber", "value": "40 cc ± 0.3 cc", "stage": "as received" },
              { "what": "valve head diameter", "valve": "inlet", "value": "40 mm ± 0.1 mm" }, { "what": "valve head diameter", "valve": "exhaust", "value": "34 mm ± 0.1 mm" } ]
            """,
            """ "cuts": [ { "what": "valve seat", "valve": "inlet", "value": "0.5 mm ± 0.05 mm", "stage": "as machined" } ] """);

        // π/4 · 4² cm² · 0.05 cm = 0.6283 cc, by hand.
        Assert.Equal(40_628.3, Workbench.Find(job, Stage.AsMachined, What.Chamber)!.Estimate.Value, 0.05);
    }

    [Fact]
    public void A_machined_cut_takes_the_place_of_the_same_cut_planned()
    {
        Job job = Workbench.Single(
            $$""" "given": [ { "what": "chamber", "value": "40 cc ± 0.3 cc", "stage": "as received" }, {{Area}} ] """,
            """ "cuts": [ { "what": "head skim", "value": "0.30 mm", "stage": "planned" }, { "what": "head skim", "value": "0.20 mm", "stage": "as machined" } ] """);

        Assert.Equal(38.5e3, Workbench.Find(job, Stage.Planned, What.Chamber)!.Estimate.Value, 1e-6);
        Assert.Equal(39e3, Workbench.Find(job, Stage.AsMachined, What.Chamber)!.Estimate.Value, 1e-6);
    }

    [Fact]
    public void Another_piston_carries_the_deck_by_the_compression_heights_and_ends_the_crown()
    {
        Job job = PistonChange(""" "compressionHeight": "30.4 mm ± 0.02 mm", """);

        // 0.20 + 30.0 − 30.4 = 0.20 mm proud.
        Figure deck = Workbench.Find(job, Stage.AsMachined, What.Deck)!;
        Assert.Equal(FigureKind.Computed, deck.Kind);
        Assert.Equal(-0.20, deck.Estimate.Value, 1e-12);
        Assert.Null(Workbench.Find(job, Stage.AsMachined, What.Crown));
    }

    [Fact]
    public void Another_piston_without_its_compression_height_leaves_the_deck_missing()
    {
        Job job = PistonChange("");

        Assert.Null(Workbench.Find(job, Stage.AsMachined, What.Deck));
        Assert.Equal(0.20, Workbench.Find(job, Stage.AsReceived, What.Deck)!.Estimate.Value, 1e-12);
    }

    [Fact]
    public void A_figure_that_holds_throughout_outlives_a_change_of_parts_but_not_a_cut()
    {
        Job job = Workbench.Single(
            """ "assumed": [ { "what": "top land height", "value": "5 mm ± 0.5 mm" }, { "what": "deck", "value": "0.30 mm ± 0.02 mm below" } ] """,
            """ "given": [ { "what": "bore", "value": "81 mm ± 0.01 mm" } ] """,
            """ "parts": { "pistons": [ { "id": "old", "compressionHeight": "30.0 mm" }, { "id": "new", "compressionHeight": "30.4 mm" } ] } """,
            """ "fitted": [ { "stage": "as received", "piston": "old" }, { "stage": "as machined", "piston": "new" } ] """,
            """ "cuts": [ { "what": "deck cut", "value": "0.1 mm ± 0.01 mm", "stage": "as machined" } ] """);

        Assert.Equal(5.0, Workbench.Find(job, Stage.AsMachined, What.TopLandHeight)!.Estimate.Value);
        Assert.Equal(0.2, Workbench.Find(job, Stage.AsMachined, What.Deck)!.Estimate.Value, 1e-12); // 0.30 less the cut alone
    }

    [Fact]
    public void A_bore_that_is_honed_to_its_piston_is_not_left_at_the_boring_size()
    {
        Job job = Workbench.Single(
            """ "parts": { "pistons": [ { "id": "os", "oversizeBore": "81.50 mm", "skirt": "81.46 mm ± 0.005 mm", "wantedClearance": "0.05 mm" } ] } """,
            """ "fitted": [ { "stage": "planned", "piston": "os" } ] """,
            """ "cuts": [ { "what": "bore", "cylinder": "1", "value": "81.41 mm", "stage": "planned" }, { "what": "hone", "cylinder": "1", "stage": "planned" } ] """);

        Assert.Equal(81.51, Workbench.Find(job, Stage.Planned, What.Bore)!.Estimate.Value, 1e-9); // skirt 81.46 + clearance 0.05
    }

    [Fact]
    public void A_block_height_read_anew_reaches_the_deck_stack()
    {
        Job job = Workbench.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "T" },
              "engine": { "cylinders": 1, "stroke": "80 mm", "rodLength": "130 mm" },
              "given": [ { "what": "compression height", "value": "30 mm" }, { "what": "block height", "value": "200.5 mm", "stage": "as received" },
                { "what": "block height", "value": "200.3 mm", "stage": "as machined" } ] }
            """);

        Assert.Equal(0.3, Workbench.Find(job, Stage.AsMachined, What.Deck)!.Estimate.Value, 1e-9);
    }

    [Fact]
    public void A_part_refitted_under_the_same_id_keeps_what_was_measured_on_it()
    {
        Job job = Workbench.Single(
            """ "readings": [ { "what": "crown", "cylinder": "1", "value": "3.3 cc dish", "stage": "as received" } ] """,
            """ "parts": { "pistons": [ { "id": "std", "crown": "3.0 cc ± 0.2 cc dish" } ] } """,
            """ "fitted": [ { "stage": "as received", "piston": "std" }, { "stage": "as machined", "piston": "std" } ] """);

        Assert.Equal((FigureKind.Measured, 3.3e3), Kind(job, Stage.AsMachined, What.Crown));
    }

    [Fact]
    public void A_cut_of_an_earlier_rebuild_ends_no_figure_of_this_job()
    {
        Job job = Workbench.Single(""" "cuts": [ { "what": "head skim", "value": "0.20 mm ± 0.02 mm", "stage": "before" } ] """);

        Assert.Equal((FigureKind.Given, 36e3), Kind(job, Stage.AsReceived, What.Chamber));
    }

    [Fact]
    public void Another_gasket_ends_what_was_read_of_the_old_one()
    {
        Job job = Workbench.Single(
            """ "readings": [ { "what": "gasket thickness", "value": "1.31 mm", "stage": "as received" } ] """,
            """ "given": [ { "what": "bore", "value": "81 mm ± 0.01 mm" } ] """,
            """ "parts": { "gaskets": [ { "id": "old", "thickness": "1.3 mm ± 0.05 mm" }, { "id": "new", "opening": "83 mm ± 0.2 mm" } ] } """,
            """ "fitted": [ { "stage": "as received", "gasket": "old" }, { "stage": "as machined", "gasket": "new" } ] """);

        Assert.Equal((FigureKind.Measured, 1.31), Kind(job, Stage.AsReceived, What.GasketThickness));
        Assert.Null(Workbench.Find(job, Stage.AsMachined, What.GasketThickness));
    }

    [Fact]
    public void A_piece_brings_its_own_readings_to_the_cylinder_it_goes_into()
    {
        Job job = Workbench.Engine(
            2,
            """ "readings": [ { "what": "crown", "piece": "P2", "value": "3.4 cc dish", "stage": "as received" }, { "what": "crown", "piece": "P1", "value": "3.1 cc dish", "stage": "as received" } ] """,
            """ "parts": { "pistons": [ { "id": "os", "crown": "3.0 cc ± 0.2 cc dish", "pieces": ["P1", "P2"] } ] } """,
            """ "fitted": [ { "stage": "as machined", "piston": "os", "cylinder": "1", "piece": "P2" }, { "stage": "as machined", "piston": "os", "cylinder": "2", "piece": "P1" } ] """);

        Assert.Equal((FigureKind.Measured, 3.4e3), Kind(job, Stage.AsMachined, What.Crown));
        Assert.Equal((FigureKind.Measured, 3.1e3), Kind(job, Stage.AsMachined, What.Crown, cylinder: 1));
    }

    [Fact]
    public void Boring_ends_the_worn_bore_and_leaves_the_finished_size()
    {
        Job job = Workbench.Single(
            """ "readings": [ { "what": "bore", "cylinder": "1", "at": "top", "axis": "thrust", "value": "81.06 mm", "stage": "as received" }, { "what": "wall", "cylinder": "1", "clock": 3, "value": "5.1 mm", "stage": "as received" } ] """,
            """ "cuts": [ { "what": "bore", "cylinder": "1", "value": "81.50 mm", "stage": "planned" } ] """,
            """ "process": [ { "what": "bore", "tolerance": "0.008 mm" } ] """);
        Figure bore = Workbench.Find(job, Stage.Planned, What.Bore)!;

        Assert.Equal((FigureKind.Computed, 81.5), (bore.Kind, bore.Estimate.Value));
        Assert.Single(bore.Estimate.Terms); // the process tolerance alone, no gauge's error
        Assert.Null(Workbench.Find(job, Stage.Planned, What.Wall));
        Assert.Equal(81.06, Workbench.Find(job, Stage.AsReceived, What.Bore)!.Estimate.Value);
    }

    [Fact]
    public void A_deck_nowhere_measured_comes_from_the_deck_stack()
    {
        Job job = Workbench.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "T" },
              "engine": { "cylinders": 1, "stroke": "80 mm ± 0.02 mm", "rodLength": "130 mm ± 0.02 mm" },
              "given": [ { "what": "block height", "value": "200.5 mm ± 0.05 mm" }, { "what": "compression height", "value": "30 mm ± 0.02 mm" },
                { "what": "base gasket", "value": "0.2 mm ± 0.02 mm" } ] }
            """);

        // 200.5 + 0.2 − (130 + 40) − 30 = 0.7 mm below.
        Figure deck = Workbench.Find(job, Stage.AsReceived, What.Deck)!;
        Assert.Equal(0.7, deck.Estimate.Value, 1e-9);
        Assert.Equal("deck stack", deck.From);
    }

    [Fact]
    public void A_new_rod_and_a_line_bore_carry_the_deck()
    {
        Job job = Workbench.Single(
            """
            "given": [ { "what": "deck", "value": "0.50 mm ± 0.02 mm below", "stage": "as received" }, { "what": "rod length", "value": "132 mm ± 0.02 mm", "stage": "as received" },
              { "what": "rod length", "value": "132.2 mm ± 0.02 mm", "stage": "as machined" } ]
            """,
            """ "cuts": [ { "what": "line bore", "value": "0.05 mm ± 0.01 mm", "stage": "as machined" }, { "what": "deck cut", "value": "0.10 mm ± 0.01 mm", "stage": "as machined" } ] """);

        // 0.50 − 0.20 (longer rod) − 0.05 (crank rise) − 0.10 (deck cut) = 0.15 mm below.
        Assert.Equal(0.15, Workbench.Find(job, Stage.AsMachined, What.Deck)!.Estimate.Value, 1e-9);
    }

    [Fact]
    public void The_gap_uses_the_end_of_the_pin_with_the_least_deck_less_the_rock()
    {
        Job job = Workbench.Single(
            """
            "readings": [ { "what": "deck", "cylinder": "1", "at": "front", "value": "0.10 mm below", "stage": "as received" },
              { "what": "deck", "cylinder": "1", "at": "rear", "value": "0.30 mm below", "stage": "as received" },
              { "what": "rock", "cylinder": "1", "value": "0.04 mm", "stage": "as received" } ]
            """,
            """ "given": [ { "what": "gasket thickness", "value": "1.2 mm ± 0.05 mm" }, { "what": "bore", "value": "81 mm ± 0.01 mm" }, { "what": "head recess", "value": "0.5 mm ± 0.1 mm" } ] """);

        Assert.Equal(1.2 + 0.10 + 0.5 - 0.04, Workbench.Value(job, Stage.AsReceived, Output.PistonToHead)!.Value, 1e-12);
        Assert.Equal(Math.PI / 4 * 81 * 81 * 0.20, Workbench.Value(job, Stage.AsReceived, Output.Deck)!.Value, 1e-9);
    }

    [Fact]
    public void A_piston_protrusion_is_a_deck_above_the_block()
    {
        Job job = Workbench.Single(
            """ "readings": [ { "what": "piston protrusion", "cylinder": "1", "value": "0.65 mm", "stage": "as received" } ] """);

        Assert.Equal(-0.65, Workbench.Find(job, Stage.AsReceived, What.Deck)!.Estimate.Value);
    }

    [Fact]
    public void A_whole_chamber_filled_is_the_clearance_and_its_parts_are_the_cross_check()
    {
        Job job = Workbench.Single(
            """ "readings": [ { "what": "whole chamber", "cylinder": "1", "from": "0 cc", "to": "46.0 cc", "stage": "as received" } ] """,
            """
            "given": [
              { "what": "bore", "value": "81 mm ± 0.01 mm" }, { "what": "chamber", "value": "36 cc ± 0.3 cc" },
              { "what": "gasket thickness", "value": "1.2 mm ± 0.05 mm" }, { "what": "gasket opening", "value": "54 cm2 ± 0.2 cm2" },
              { "what": "deck", "value": "0 mm ± 0.03 mm flush" }, { "what": "crown", "value": "1.0 cc ± 0.2 cc dish" }, { "what": "plug hole", "value": "1.5 cc ± 0.1 cc" } ]
            """);

        Assert.Equal(44.5e3, Workbench.Value(job, Stage.AsReceived, Output.ClearanceVolume)!.Value, 1e-9);
        Assert.Equal(44.5e3 - (36e3 + (5400 * 1.2) + 1e3), Workbench.Value(job, Stage.AsReceived, Output.CrossCheck)!.Value, 1e-9);
    }

    [Fact]
    public void A_crown_by_fill_takes_off_the_bore_above_it()
    {
        Job job = Workbench.Single(
            """ "readings": [ { "what": "crown fill", "cylinder": "1", "from": "0 cc", "to": "55.0 cc", "drop": "10 mm ± 0.02 mm", "stage": "as received" } ] """,
            """ "given": [ { "what": "bore", "value": "81 mm ± 0.01 mm" } ] """);

        // 55 − π/4 · 8.1² · 1.0 = 3.470 cc dish, by hand.
        Assert.Equal(3470, Workbench.Find(job, Stage.AsReceived, What.Crown)!.Estimate.Value, 0.5);
    }

    [Fact]
    public void A_struck_reading_counts_for_nothing()
    {
        Job job = Workbench.Single(
            """ "readings": [ { "what": "chamber", "cylinder": "1", "value": "41 cc", "stage": "as received", "struck": "air under the plate" }, { "what": "chamber", "cylinder": "1", "value": "39 cc", "stage": "as received" } ] """);

        Assert.Equal(39e3, Workbench.Find(job, Stage.AsReceived, What.Chamber)!.Estimate.Value);
    }

    [Fact]
    public void One_missing_chamber_leaves_the_other_cylinders_their_results()
    {
        Results results = StageResults.Of(
            Workbench.Engine(
                2,
                """
                "given": [ { "what": "bore", "value": "81 mm ± 0.01 mm" }, { "what": "chamber", "cylinder": "2", "value": "36 cc ± 0.3 cc" },
                  { "what": "gasket thickness", "value": "1.2 mm ± 0.05 mm" }, { "what": "gasket opening", "value": "82.5 mm ± 0.2 mm" },
                  { "what": "deck", "value": "0.2 mm ± 0.03 mm below" }, { "what": "crown", "value": "0 cc flat" } ]
                """,
                """ "limits": [ { "what": "compression ratio", "max": "12", "stage": "as received" } ] """),
            Stage.AsReceived);

        Assert.Equal([new MissingFigure("chamber", "1")], results.Missing);
        Assert.Null(results.Cylinders[0].CompressionRatio);
        Assert.NotNull(results.Cylinders[1].CompressionRatio);
        Assert.Equal(("chamber", VerdictState.NotProven, null), (results.Verdicts[0].Settle, results.Verdicts[0].State, results.Verdicts[0].Probability));
        Assert.Equal(("chamber", VerdictState.NotProven), (results.Verdicts[^1].Settle, results.Verdicts[^1].State));
        Assert.Contains(results.Cautions, caution => caution.Code == "top-land-left-out");
    }

    // Common practice: a three-litre V6 is 500 cm³ a cylinder.
    [Fact]
    public void A_three_litre_vee_six_has_half_a_litre_a_cylinder()
    {
        Results results = StageResults.Of(
            Workbench.Read(
                """
                { "format": "rebuild-planner-job", "version": 1, "job": { "number": "T" },
                  "engine": { "cylinders": 6, "layout": "vee", "veeAngle": "60 deg", "stroke": "79.58 mm ± 0.02 mm", "claimedDisplacement": "3.0 L",
                    "banks": [ { "label": "left", "cylinders": ["1","3","5"] }, { "label": "right", "cylinders": ["2","4","6"] } ] },
                  "given": [ { "what": "bore", "value": "89.44 mm ± 0.02 mm" } ] }
                """),
            Stage.AsReceived);

        Assert.All(results.Cylinders, cylinder => Assert.Equal(500e3, cylinder.SweptVolume!.Value, 500.0));
        Assert.Equal(3e6, results.Displacement!.Value, 3000.0);
        Assert.DoesNotContain(results.Cautions, caution => caution.Code == "claimed-displacement-differs");
    }

    [Fact]
    public void A_claimed_displacement_that_is_wrong_is_said()
    {
        Results results = StageResults.Of(
            Workbench.Single(""" "engine": { "cylinders": 1, "stroke": "78 mm ± 0.04 mm", "claimedDisplacement": "420 cc" } """), Stage.AsReceived);

        Assert.Contains(results.Cautions, caution => caution.Code == "claimed-displacement-differs");
    }

    private static Job PistonChange(string newHeight) => Workbench.Single(
        """ "given": [ { "what": "deck", "value": "0.20 mm ± 0.02 mm below", "stage": "as received" }, { "what": "crown", "value": "4 cc ± 0.1 cc dish", "stage": "as received" } ] """,
        $$""" "parts": { "pistons": [ { "id": "old", "compressionHeight": "30.0 mm ± 0.02 mm" }, { {{newHeight}} "id": "new" } ] } """,
        """ "fitted": [ { "stage": "as received", "piston": "old" }, { "stage": "as machined", "piston": "new" } ] """);

    private static (FigureKind Kind, double Value) Kind(Job job, Stage stage, What what, int cylinder = 0)
    {
        Figure figure = Workbench.Find(job, stage, what, cylinder)!;
        return (figure.Kind, figure.Estimate.Value);
    }
}
