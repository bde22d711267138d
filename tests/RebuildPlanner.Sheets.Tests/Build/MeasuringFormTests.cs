using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Sheets.Tests.Build;

public class MeasuringFormTests
{
    private static readonly Job VeeEight = SheetFiles.Read(RepositoryFiles.Text("templates", "vee-eight-pushrod.json"));

    private static readonly Sheet Form = MeasuringForm.Of(SheetFiles.Input(VeeEight), Stage.AsReceived, Round.Of(VeeEight.Engine));

    [Fact]
    public void Things_stand_in_the_order_of_the_round() => Assert.Equal(
        Round.Of(VeeEight.Engine).Select(place => WhatWords.Of(place.What)).Distinct(),
        Form.Blocks.OfType<Heading>().Where(heading => heading.Level == 3).Select(heading => heading.Text.Split(',')[0]));

    [Fact]
    public void A_bore_has_a_row_a_depth_and_three_readings_an_axis_and_the_gauge()
    {
        Table bores = TableUnder("bore");

        Assert.Equal(8 * 3, bores.Rows.Count);
        Assert.Equal(
            ["where", "thrust 1", "thrust 2", "thrust 3", "along crank 1", "along crank 2", "along crank 3", "gauge"], bores.Columns.Select(column => column.Title));
        Assert.Equal(["cyl 1, top", "cyl 1, middle", "cyl 1, bottom", "cyl 2, top"], bores.Rows.Take(4).Select(row => row[0]));
        Assert.All(bores.Rows.SelectMany(row => row.Skip(1)), Assert.Empty);
    }

    [Fact]
    public void A_chamber_has_room_for_start_and_end_a_refill_the_temperature_and_a_repeat()
    {
        Table chambers = TableUnder("chamber");

        Assert.Equal(["where", "start", "end", "refill start", "refill end", "°C", "gauge"], chambers.Columns.Select(column => column.Title));
        Assert.Equal(["cyl 1", "", "cyl 2", ""], chambers.Rows.Take(4).Select(row => row[0]));
        Assert.Contains(TableUnder("crown fill").Columns, column => column.Title == "drop");
    }

    [Fact]
    public void Lengths_are_asked_in_the_shops_unit_and_volumes_as_every_burette_has_them()
    {
        string[] heads = [.. MeasuringForm.Of(SheetFiles.Input(VeeEight, Core.Quantities.UnitSystem.Inch), Stage.AsReceived, Round.Of(VeeEight.Engine)).Blocks.OfType<Heading>().Select(heading => heading.Text)];

        Assert.Contains("bore, in", heads);
        Assert.Contains("chamber, cm³", heads);
    }

    [Fact]
    public void The_shops_gauges_are_on_it_with_room_for_more()
    {
        Table gauges = (Table)Form.Blocks[Form.Blocks.ToList().FindIndex(block => block is Heading { Text: "Gauges used" }) + 1];

        Assert.Equal(["micrometer", "bore gauge", "depth dial", "burette", "", "", ""], gauges.Rows.Select(row => row[0]));
    }

    [Fact]
    public void What_was_read_is_not_asked_again_where_only_the_rest_is_wanted()
    {
        Job van = SheetFiles.Sample("van-four.json");

        Sheet rest = MeasuringForm.Of(SheetFiles.Input(van), Stage.AsReceived, Round.Left(van, Stage.AsReceived));

        Assert.DoesNotContain(rest.Blocks.OfType<Heading>(), heading => heading.Text.StartsWith("bore,", StringComparison.Ordinal));
        Assert.Contains(rest.Blocks.OfType<Heading>(), heading => heading.Text.StartsWith("rod length,", StringComparison.Ordinal));
    }

    private static Table TableUnder(string thing) => Form.Blocks
        .SkipWhile(block => !(block is Heading heading && heading.Text.StartsWith(thing + ",", StringComparison.Ordinal))).OfType<Table>().First();
}
