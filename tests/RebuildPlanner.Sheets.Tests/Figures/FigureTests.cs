using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Figures;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Tests.Figures;

public class FigureTests
{
    private static readonly Job Van = SheetFiles.Sample("van-four.json");

    private static readonly Results VanResults = StageResults.Of(Van, Stage.AsMachined);

    public static TheoryData<string> Samples => [.. SheetFiles.Samples];

    // The dashed circle is the crankpin's path: its radius on paper, by the scale written beside it, is half the stroke.
    [Fact]
    public void The_section_is_to_the_scale_written_on_it()
    {
        Picture section = FiguresPart.Section(SheetFiles.Input(Van), VanResults, VanResults.Cylinders[0])!;

        Assert.Contains(section.Shapes.OfType<Label>(), label => label.Text == "scale 1 : 2");
        Circle path = Assert.Single(section.Shapes.OfType<Circle>(), circle => circle.Pen == Pen.Dashed);
        Assert.Equal(0.5 * 0.5 * 88.0, path.RadiusMm, 1e-9); // stroke 88 mm
        double pinYMm = section.Shapes.OfType<Circle>().Where(circle => circle.RadiusMm == 0.6).Min(circle => circle.Centre.YMm);
        Assert.Equal(0.5 * (140.0 + 44.0), path.Centre.YMm - pinYMm, 1e-9); // rod and throw stand in one line at top dead centre
        double bore = VanResults.Cylinders[0].Bore!.Value;
        double[] bottom = [.. section.Shapes.OfType<Line>().Where(line => line.Pen == Pen.Dashed && line.From.YMm == line.To.YMm).Select(line => line.To.XMm - line.From.XMm)];
        Assert.Contains(bottom, width => Math.Abs(width - (0.5 * bore)) < 1e-9);
    }

    // At 10 : 1 the gasket of 1.21 mm (the middle of 1.20 +0.05/-0.03) is 12.1 mm high, and the crown's edge lies the deck's 0.225 mm lower than the block.
    [Fact]
    public void The_enlarged_edge_is_to_its_scale_too()
    {
        Picture section = FiguresPart.Section(SheetFiles.Input(Van), VanResults, VanResults.Cylinders[0])!;

        Assert.Contains(section.Shapes.OfType<Label>(), label => label.Text == "edge of the crown, scale 10 : 1");
        Polygon gasket = Assert.Single(section.Shapes.OfType<Polygon>(), polygon => polygon.Grey == 0.25);
        double gasketMm = VanResults.Used(What.GasketThickness, "1")!.Value.Value;
        Assert.Equal(1.21, gasketMm, 1e-12);
        Assert.Equal(10.0 * gasketMm, gasket.Corners.Max(corner => corner.YMm) - gasket.Corners.Min(corner => corner.YMm), 1e-9);
        double deckYMm = gasket.Corners.Max(corner => corner.YMm);
        Polygon piston = section.Shapes.OfType<Polygon>().Last(polygon => polygon is { Grey: 0.9, Pen: null });
        Assert.Equal(10.0 * VanResults.Used(What.Deck, "1")!.Value.Value, piston.Corners.Min(corner => corner.YMm) - deckYMm, 1e-9);
    }

    // What is drawn is measured off the drawing again: chamber and crown by volume, deck and pin offset by length, all at the scale written on it.
    [Theory]
    [MemberData(nameof(Samples))]
    public void Chamber_crown_deck_and_pin_are_drawn_as_they_are(string sample)
    {
        Job job = SheetFiles.Sample(sample);
        Results results = StageResults.Of(job, LastStage.Of(job));
        foreach (CylinderResult cylinder in results.Cylinders.Where(cylinder => cylinder.ClearanceVolume is not null))
        {
            Picture section = FiguresPart.Section(SheetFiles.Input(job), results, cylinder)!;
            string written = Assert.Single(section.Shapes.OfType<Label>(), label => label.Text.StartsWith("scale 1 : ", StringComparison.Ordinal)).Text;
            double scale = 1.0 / double.Parse(written[10..], System.Globalization.CultureInfo.InvariantCulture), bore = cylinder.Bore!.Value;
            double Used(What what) => results.Used(what, cylinder.Cylinder)?.Value.Value ?? 0.0;

            Polygon head = section.Shapes.OfType<Polygon>().First(polygon => polygon.Corners.Count == 8);
            double faceYMm = head.Corners[2].YMm, roofYMm = head.Corners[4].YMm, deckYMm = faceYMm + (Used(What.GasketThickness) * scale);
            Assert.Equal(cylinder.Chamber!.Value, 0.25 * Math.PI * bore * bore * (faceYMm - roofYMm) / scale, 1e-6); // mm³; the drawing's own rounding is a double's

            Polygon piston = section.Shapes.OfType<Polygon>().First(polygon => polygon is { Corners.Count: 8, Grey: 0.9, Pen: not null });
            Assert.Equal(Used(What.Deck), (piston.Corners[0].YMm - deckYMm) / scale, 1e-9);
            double wellMm = (piston.Corners[3].XMm - piston.Corners[2].XMm) / scale, depthMm = (piston.Corners[2].YMm - piston.Corners[1].YMm) / scale;
            Assert.Equal(cylinder.Crown!.Value, 0.25 * Math.PI * wellMm * wellMm * depthMm, 1e-6);

            Circle path = Assert.Single(section.Shapes.OfType<Circle>(), circle => circle.Pen == Pen.Dashed);
            Circle pin = section.Shapes.OfType<Circle>().Where(circle => circle.RadiusMm == 0.6).MinBy(circle => circle.Centre.YMm)!;
            Assert.Equal(Used(What.PinOffset), (pin.Centre.XMm - path.Centre.XMm) / scale, 1e-9);
        }
    }

    [Fact]
    public void Each_dimension_says_its_own_figure_and_so_do_the_words_for_who_cannot_see_it()
    {
        Picture section = FiguresPart.Section(SheetFiles.Input(Van), VanResults, VanResults.Cylinders[0])!;

        string[] upright = [.. section.Shapes.OfType<Label>().Where(label => label.Upright && label.Text.Length > 1).Select(label => label.Text).Order(StringComparer.Ordinal)];
        Assert.Equal([$"rod {VanResults.Used(What.RodLength, "1")!.Written}", $"stroke {VanResults.Used(What.Stroke, "1")!.Written}"], upright);
        Assert.All(upright, said => Assert.Contains(said, section.Alternative, StringComparison.Ordinal));
        Label gap = Assert.Single(section.Shapes.OfType<Label>(), label => label.Text.StartsWith("C  ", StringComparison.Ordinal));
        Assert.Contains(gap.Text[3..], section.Alternative, StringComparison.Ordinal);
    }

    [Fact]
    public void The_pin_stands_where_the_piston_of_that_cylinder_has_it()
    {
        Job job = SheetFiles.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "H" }, "engine": { "cylinders": 2, "stroke": "78 mm", "rodLength": "130 mm" },
              "given": [ { "what": "bore", "value": "81 mm" } ],
              "parts": { "pistons": [ { "id": "low", "compressionHeight": "30 mm" }, { "id": "high", "compressionHeight": "40 mm" } ] },
              "fitted": [ { "stage": "as received", "piston": "low", "cylinder": "1" }, { "stage": "as received", "piston": "high", "cylinder": "2" } ] }
            """);
        Results results = StageResults.Of(job, Stage.AsReceived);

        double[] pins =
        [
            .. results.Cylinders.Select(cylinder =>
            {
                Shape[] shapes = [.. FiguresPart.Section(SheetFiles.Input(job), results, cylinder)!.Shapes];
                double crownYMm = shapes.OfType<Polygon>().First(polygon => polygon is { Grey: 0.9, Corners.Count: 8 }).Corners[0].YMm;
                return shapes.OfType<Circle>().Where(circle => circle.RadiusMm == 0.6).Min(circle => circle.Centre.YMm) - crownYMm;
            }),
        ];

        Assert.Equal([15.0, 20.0], pins, (a, b) => Math.Abs(a - b) < 1e-9); // at 1 : 2
    }

    [Fact]
    public void The_section_is_of_the_cylinder_with_the_least_gap()
    {
        Results results = StageResults.Of(SheetFiles.Sample("hill-climb-vee-eight.json"), Stage.AsMachined);

        CylinderResult chosen = CylinderSection.Choose(results)!;

        Assert.Equal(results.Cylinders.Min(cylinder => cylinder.PistonToHead!.Value), chosen.PistonToHead!.Value);
    }

    [Fact]
    public void Without_a_rod_the_piston_is_drawn_alone_and_without_a_bore_nothing_is()
    {
        Job piston = SheetFiles.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "P" }, "engine": { "cylinders": 1, "stroke": "78 mm" },
              "given": [ { "what": "bore", "value": "81 mm" } ] }
            """);
        Results results = StageResults.Of(piston, Stage.AsReceived);

        Picture section = FiguresPart.Section(SheetFiles.Input(piston), results, results.Cylinders[0])!;

        Assert.DoesNotContain(section.Shapes.OfType<Circle>(), circle => circle.Pen == Pen.Dashed);
        Results boreless = StageResults.Of(piston with { Given = [] }, Stage.AsReceived);
        Assert.Null(FiguresPart.Section(SheetFiles.Input(piston), boreless, boreless.Cylinders[0]));
        Assert.Null(CylinderSection.Choose(boreless));
        Assert.Null(VolumeBars.Draw(boreless, UnitSystem.Metric, SheetWording.Original));
    }

    // The white box of a row is its chamber, the black one its gasket: lengths on one scale, whatever the units printed.
    [Theory]
    [InlineData(UnitSystem.Metric)]
    [InlineData(UnitSystem.Inch)]
    public void Bars_are_as_long_as_the_volumes_they_stand_for(UnitSystem units)
    {
        Picture bars = VolumeBars.Draw(VanResults, units, SheetWording.Original)!;

        double[] chambers = Lengths(bars, 1.0, skipLegend: 4), gaskets = Lengths(bars, 0.0, skipLegend: 1);
        double perMm3 = chambers[0] / VanResults.Cylinders[0].Chamber!.Value;
        for (int cylinder = 0; cylinder < 4; cylinder++)
        {
            Assert.Equal(VanResults.Cylinders[cylinder].Gasket!.Value * perMm3, gaskets[cylinder], 1e-9);
        }

        // Chamber, deck, crown and top land are white boxes alike (the latter hatched): four a row, in that order.
        Assert.Equal(VanResults.Cylinders[3].Chamber!.Value * perMm3, chambers[12], 1e-9);
        Assert.Equal(VanResults.Cylinders[3].Crown!.Value * perMm3, chambers[14], 1e-9);
    }

    // The figures along the axis say what a length is worth; chamber and clearance volume are held to that.
    [Theory]
    [InlineData(UnitSystem.Metric, 1000.0)]
    [InlineData(UnitSystem.Inch, 16387.064)]
    public void The_axis_counts_the_unit_printed(UnitSystem units, double mm3PerUnit)
    {
        Picture bars = VolumeBars.Draw(VanResults, units, SheetWording.Original)!;

        (double XMm, double Number)[] ticks =
        [
            .. bars.Shapes.OfType<Label>().Where(label => label.Anchor == Anchor.Middle)
                .Select(label => (label.At.XMm, double.Parse(label.Text, System.Globalization.CultureInfo.InvariantCulture))),
        ];
        Assert.True(ticks.Length >= 4);
        double zeroXMm = ticks.Single(tick => tick.Number == 0.0).XMm, perUnit = (ticks[^1].XMm - ticks[0].XMm) / (ticks[^1].Number - ticks[0].Number);
        Assert.All(ticks, tick => Assert.Equal(zeroXMm + (tick.Number * perUnit), tick.XMm, 1e-9));
        Assert.Equal(VanResults.Cylinders[0].Chamber!.Value / mm3PerUnit * perUnit, Lengths(bars, 1.0, skipLegend: 4)[0], 1e-9);
        Line[] marks = [.. bars.Shapes.OfType<Line>().Where(line => line.Pen.WidthMm == 0.7)];
        Assert.Equal(VanResults.Cylinders.Select(cylinder => zeroXMm + (cylinder.ClearanceVolume!.Value / mm3PerUnit * perUnit)), marks.Select(mark => mark.From.XMm), (a, b) => Math.Abs(a - b) < 1e-9);
    }

    // Deck and crown are hatched, one this way and one that, as no colour would tell them apart in a copy.
    [Fact]
    public void Deck_and_crown_are_hatched_opposite_ways()
    {
        Shape[] legend = [.. VolumeBars.Draw(VanResults, UnitSystem.Metric, SheetWording.Original)!.Shapes];

        int Sign(string part)
        {
            int at = Array.FindIndex(legend, shape => shape is Label label && label.Text == part);
            Line line = Assert.IsType<Line>(legend[at - 1]);
            return Math.Sign((line.To.YMm - line.From.YMm) * (line.To.XMm - line.From.XMm));
        }

        Assert.Equal((-1, 1), (Sign("deck"), Sign("crown"))); // y runs down: the deck's rise to the right
    }

    [Fact]
    public void What_takes_volume_away_runs_to_the_left_of_zero()
    {
        Results results = StageResults.Of(SheetFiles.Sample("hill-climb-vee-eight.json"), Stage.AsMachined);

        Picture bars = VolumeBars.Draw(results, UnitSystem.Metric, SheetWording.Original)!;

        double zeroXMm = Assert.Single(bars.Shapes.OfType<Line>(), line => line.Pen == Pen.Outline).From.XMm;
        Assert.All(results.Cylinders, cylinder => Assert.True(cylinder.Crown!.Value < 0.0)); // domes
        Assert.Equal(2 * 8, bars.Shapes.OfType<Polygon>().Count(box => box.Corners.Max(corner => corner.XMm) <= zeroXMm + 1e-9 && box.Corners.Min(corner => corner.YMm) > 6.0));
        Assert.Contains(bars.Shapes.OfType<Label>(), label => label.Text == "chamber missing");
    }

    // Every part known takes volume away here, so the bar would reach the right edge.
    [Fact]
    public void What_is_missing_is_written_behind_the_bar_and_inside_the_figure()
    {
        Job dome = SheetFiles.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "D" }, "engine": { "cylinders": 1 },
              "given": [ { "what": "bore", "value": "81 mm" }, { "what": "crown", "value": "9 cc dome" } ] }
            """);

        Picture bars = VolumeBars.Draw(StageResults.Of(dome, Stage.AsReceived), UnitSystem.Metric, SheetWording.Original)!;

        Label missing = Assert.Single(bars.Shapes.OfType<Label>(), label => label.Text == "chamber, gasket, deck missing");
        Assert.InRange(missing.At.XMm, 0.0, bars.WidthMm - 39.0); // 39.0 mm wide as set
        double zeroXMm = Assert.Single(bars.Shapes.OfType<Line>(), line => line.Pen == Pen.Outline).From.XMm;
        Assert.True(missing.At.XMm > zeroXMm); // and behind the bar, not on it
    }

    [Fact]
    public void A_whole_chamber_of_which_no_part_is_known_has_no_bars()
    {
        Job whole = SheetFiles.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "W" }, "engine": { "cylinders": 1, "stroke": "78 mm" },
              "given": [ { "what": "bore", "value": "81 mm" }, { "what": "whole chamber", "value": "52 cc" }, { "what": "plug hole", "value": "1 cc" } ] }
            """);
        Results results = StageResults.Of(whole, Stage.AsReceived);

        Assert.NotNull(results.Cylinders[0].ClearanceVolume);
        Assert.Null(VolumeBars.Draw(results, UnitSystem.Metric, SheetWording.Original));
    }

    // 0.68 of the bore is where the wall drawn as a stand-in ends; found by random jobs.
    [Fact]
    public void A_gasket_opening_wider_than_the_wall_draws_no_gasket_outside_it()
    {
        Job wide = SheetFiles.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "O" }, "engine": { "cylinders": 1, "stroke": "78 mm" },
              "given": [ { "what": "bore", "value": "81 mm" }, { "what": "gasket thickness", "value": "1 mm" }, { "what": "gasket opening", "value": "320 mm" } ] }
            """);
        Results results = StageResults.Of(wide, Stage.AsReceived);

        Picture section = FiguresPart.Section(SheetFiles.Input(wide), results, results.Cylinders[0])!;

        Assert.Equal(320.0, results.Used(What.GasketOpening, "1")!.Value.Value);
        Assert.All(section.Shapes.SelectMany(SheetFiles.Extremes), spot => Assert.InRange(spot.XMm, 0.0, section.WidthMm));
    }

    // Gasket 1.2 mm, deck 0.5 mm proud, recess 0.8 mm: 1.5 mm of gap, and as much is drawn under the letter that says so.
    [Fact]
    public void A_recess_in_the_head_is_part_of_the_gap_that_is_drawn()
    {
        Job recessed = SheetFiles.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "R" }, "engine": { "cylinders": 1, "stroke": "78 mm" },
              "given": [ { "what": "bore", "value": "81 mm" }, { "what": "gasket thickness", "value": "1.2 mm" }, { "what": "deck", "value": "0.5 mm proud" },
                { "what": "head recess", "value": "0.8 mm" }, { "what": "gasket opening", "value": "82 mm" } ] }
            """);
        Results results = StageResults.Of(recessed, Stage.AsReceived);

        Picture section = FiguresPart.Section(SheetFiles.Input(recessed), results, results.Cylinders[0])!;

        Assert.Equal(1.5, results.Cylinders[0].PistonToHead!.Value, 1e-9);
        Polygon gasket = Assert.Single(section.Shapes.OfType<Polygon>(), polygon => polygon.Grey == 0.25);
        double faceYMm = gasket.Corners.Min(corner => corner.YMm), scale = (gasket.Corners.Max(corner => corner.YMm) - faceYMm) / 1.2;
        Label letter = Assert.Single(section.Shapes.OfType<Label>(), label => label.Text == "C");
        Line dimension = section.Shapes.OfType<Line>().First(line => line.From.XMm == line.To.XMm && line.Pen == Pen.Fine && Math.Abs(line.From.XMm - letter.At.XMm) < 2.0);
        Assert.Equal(faceYMm - (0.8 * scale), dimension.From.YMm, 1e-9);
        Assert.Equal(1.5 * scale, dimension.To.YMm - dimension.From.YMm, 1e-9);
    }

    // By these figures the crown lies 1.6 mm above the head's face, and the drawing says so rather than turn the gap about.
    [Fact]
    public void A_piston_that_meets_the_head_is_drawn_into_it_and_dimensioned_from_the_face_up()
    {
        Job meets = SheetFiles.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "M" }, "engine": { "cylinders": 1, "stroke": "78 mm" },
              "given": [ { "what": "bore", "value": "81 mm" }, { "what": "gasket thickness", "value": "0.4 mm" }, { "what": "deck", "value": "2 mm proud" }, { "what": "gasket opening", "value": "88 mm" } ] }
            """);
        Results results = StageResults.Of(meets, Stage.AsReceived);

        Picture section = FiguresPart.Section(SheetFiles.Input(meets), results, results.Cylinders[0])!;

        Polygon gasket = Assert.Single(section.Shapes.OfType<Polygon>(), polygon => polygon.Grey == 0.25);
        double faceYMm = gasket.Corners.Min(corner => corner.YMm), scale = (gasket.Corners.Max(corner => corner.YMm) - faceYMm) / 0.4;
        Polygon piston = section.Shapes.OfType<Polygon>().Last(polygon => polygon is { Grey: 0.9, Pen: null });
        Assert.Equal(faceYMm - (1.6 * scale), piston.Corners.Min(corner => corner.YMm), 1e-9);
        Label letter = Assert.Single(section.Shapes.OfType<Label>(), label => label.Text == "C");
        Assert.True(letter.At.YMm < faceYMm);
        Label head = Assert.Single(section.Shapes.OfType<Label>(), label => label.Text == "head");
        Assert.True(head.At.YMm < faceYMm - (1.6 * scale)); // the piston is not drawn over its name

        // B stands in the bore, clear of the gasket however near that comes.
        Label deck = Assert.Single(section.Shapes.OfType<Label>(), label => label.Text == "B");
        Assert.True(deck.At.XMm < gasket.Corners.Min(corner => corner.XMm) - 5.0);
    }

    [Fact]
    public void A_name_too_long_for_a_bar_is_cut_between_whole_characters()
    {
        Results results = VanResults with { Cylinders = [VanResults.Cylinders[0] with { Cylinder = "😀😀😀😀😀😀😀" }, VanResults.Cylinders[1] with { Cylinder = "left 1" }] };

        Picture bars = VolumeBars.Draw(results, UnitSystem.Metric, SheetWording.Original)!;

        Assert.Equal(["😀😀😀😀😀…", "left 1"], bars.Shapes.OfType<Label>().Where(label => label.Bold).Select(label => label.Text));
    }

    // Level, it would run out of the drawing on the left, and on the right into the enlarged edge.
    [Fact]
    public void A_dimension_longer_than_its_line_stands_upright_from_its_lower_end_clear_of_the_witness_lines()
    {
        foreach ((double lineXMm, double fromXMm) in new[] { (10.0, 30.0), (30.0, 10.0) })
        {
            Shape[] shapes = [.. Dimension.Vertical(fromXMm, 100.0, 110.0, lineXMm, "stroke 60 mm ± 0.05 mm")];

            Label figure = Assert.Single(shapes.OfType<Label>());
            Assert.Equal((true, Anchor.Start, 110.0), (figure.Upright, figure.Anchor, figure.At.YMm));
            double[] witness = [.. shapes.OfType<Line>().Where(line => line.From.YMm == line.To.YMm).SelectMany(line => new[] { line.From.XMm, line.To.XMm })];
            Assert.True(lineXMm < fromXMm ? figure.At.XMm < witness.Min() : figure.At.XMm - 1.9 > witness.Max()); // upright letters stand left of their line, 1.9 mm high
        }
    }

    [Theory]
    [MemberData(nameof(Samples))]
    public void Nothing_is_drawn_outside_the_figure(string sample)
    {
        Job job = SheetFiles.Sample(sample);
        Results results = StageResults.Of(job, LastStage.Of(job));
        Picture[] pictures =
        [
            VolumeBars.Draw(results, UnitSystem.Metric, SheetWording.Original)!,
            .. results.Cylinders.Select(cylinder => FiguresPart.Section(SheetFiles.Input(job), results, cylinder)!),
        ];

        Assert.All(pictures, picture => Assert.All(
            picture.Shapes.SelectMany(SheetFiles.Extremes),
            spot => Assert.True(spot.XMm >= -0.01 && spot.XMm <= picture.WidthMm + 0.01 && spot.YMm >= -0.01 && spot.YMm <= picture.HeightMm + 0.01, $"{picture.Title}: {spot}")));
    }

    private static double[] Lengths(Picture picture, double grey, int skipLegend) =>
        [.. picture.Shapes.OfType<Polygon>().Where(box => box.Grey == grey).Skip(skipLegend).Select(box => box.Corners.Max(corner => corner.XMm) - box.Corners.Min(corner => corner.XMm))];
}
