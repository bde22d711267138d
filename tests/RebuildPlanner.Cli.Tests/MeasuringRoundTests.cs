using System.Text;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Cli.Tests;

/// <summary>Someone at the bench, typing.</summary>
public sealed class MeasuringRoundTests : IDisposable
{
    private readonly Scratch _scratch = new();

    public MeasuringRoundTests() => Screen.At(_scratch["data"], "start", "M-1", "--from", "two-stroke-twin");

    public void Dispose() => _scratch.Dispose();

    [Fact]
    public void Places_are_asked_in_the_order_of_the_round_and_bare_figures_take_the_gauges_unit()
    {
        Screen screen = Type("bore gauge", "54.02", "54.01", "2.1265 in", "q");

        Assert.Equal(["54.02 mm", "54.01 mm", "2.1265 in"], Readings().Select(reading => reading.Value!.Text));
        Assert.Equal(
            Round.Of(Job().Engine).Take(3).Select(place => place.Place), Readings().Select(reading => reading.Place));
        Assert.All(Readings(), reading => Assert.Equal(("bore gauge", Stage.AsReceived), (reading.Gauge, reading.Stage)));
        Assert.Contains("3 readings written.", screen.Output, StringComparison.Ordinal);
        Assert.Contains("last 54.02 mm", screen.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_wrong_entry_is_asked_again_and_nothing_of_it_is_written()
    {
        Screen screen = Type("bore gage", "bore gauge", "54,02", "540.2 cc", "54.02", "q");

        Assert.Equal("54.02 mm", Assert.Single(Readings()).Value!.Text);
        Assert.Contains("did you mean bore gauge?", screen.Error, StringComparison.Ordinal);
        Assert.Contains("The decimal mark is a point", screen.Error, StringComparison.Ordinal);
        Assert.Equal(3, screen.Output.Split("bore, cylinder 1, top, thrust (").Length - 1);
    }

    [Fact]
    public void A_place_is_left_for_later_and_gone_back_to()
    {
        Type("bore gauge", "", "54.01", "b", "54.011", "", "b", "b", "q");

        Assert.Equal(["54.01 mm", "54.011 mm"], Readings().Select(reading => reading.Value!.Text)); // the same place twice: a repeat
        Assert.Equal(BoreAxis.AlongCrank, Readings()[0].Place.Axis);
        Assert.Equal(Readings()[0].Place, Readings()[1].Place);
    }

    [Fact]
    public void A_reading_gone_back_to_is_struck_when_a_reason_is_written()
    {
        Type("bore gauge", "54.2", "b", "54.02", "typed a digit short", "q");

        Assert.Equal([("54.2 mm", "typed a digit short"), ("54.02 mm", null)], Readings().Select(reading => (reading.Value!.Text, reading.Struck)));
    }

    [Fact]
    public void R_reads_the_place_before_again()
    {
        Type("bore gauge", "54.02", "r", "54.021", "", "q");

        Assert.Equal(Readings()[0].Place, Readings()[1].Place);
        Assert.All(Readings(), reading => Assert.Null(reading.Struck));
    }

    [Fact]
    public void A_burette_is_read_at_start_and_end_and_refilled_and_the_spread_is_shown()
    {
        Screen screen = Type([.. SkipTo(What.Chamber), "burette", "22.4", "0 22.4", "0 20.0 + 0 2.8", "q"]);

        Reading[] chambers = [.. Readings().Where(reading => reading.What == What.Chamber)];
        Assert.Equal([1, 2], chambers.Select(reading => reading.Fills.Count));
        Assert.Contains("a burette is read twice: write start and end, such as \"0 22.4\"", screen.Error, StringComparison.Ordinal);
        Assert.Contains("chambers: 2 of 2 read, spread 0.40 cm³", screen.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_deck_takes_its_word_after_a_bare_figure()
    {
        Screen screen = Type([.. SkipTo(What.Deck), "depth dial", "0.52", "0.52 below", "0.10 mm proud", "q"]);

        Assert.Equal(["0.52 mm below", "0.10 mm proud"], Readings().Where(reading => reading.What == What.Deck).Select(reading => reading.Value!.Text));
        Assert.Contains("below, proud or flush", screen.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void A_crown_fill_asks_how_far_down_the_crown_stands_once_a_cylinder()
    {
        Type([.. SkipTo(What.CrownFill), "burette", "6", "0 14.2", "6.5 mm", "0 15.4", "q"]);

        Assert.Equal([("6 mm", "1"), ("6.5 mm", "2")], Readings().Where(reading => reading.What == What.CrownFill).Select(reading => (reading.Drop!.Text, reading.Place.Cylinder!)));
    }

    [Fact]
    public void The_end_of_input_ends_the_round_with_everything_written()
    {
        Screen screen = Type("bore gauge", "54.02");

        Assert.Equal(0, screen.ExitCode);
        Assert.Single(Readings());
        Assert.Contains("1 readings written.", screen.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void Read_to_the_end_nothing_is_left()
    {
        Job job = Job();
        List<string> typed = [];
        HashSet<What> met = [];
        HashSet<string> drops = [];
        foreach (RoundPlace place in Round.Of(job.Engine))
        {
            if (met.Add(place.What))
            {
                typed.Add("-");
            }

            WhatLine line = WhatTable.Line(place.What);
            if (place.What == What.CrownFill && drops.Add(place.Place.Cylinder!))
            {
                typed.Add("6 mm");
            }

            double middle = 0.5 * (line.Rule.SaneLow + line.Rule.SaneHigh);
            string figure = Core.Quantities.QuantityPrint.Text(middle, line.Rule.Kinds[0], null, Core.Quantities.UnitSystem.Metric, line.Rule.Signs);
            typed.Add(line.Rule.Kinds[0] == Core.Quantities.QuantityKind.Volume ? "0 20" : figure);
        }

        Screen screen = Type([.. typed]);

        Assert.Equal("", screen.Error);
        Assert.Contains("Nothing is left to read.", screen.Output, StringComparison.Ordinal);
        Assert.Empty(Round.Left(Job(), Stage.AsReceived));
    }

    /// <summary>The answers that leave everything before a thing for later; a thing met again (rock after each deck) is not asked for its gauge twice.</summary>
    private string[] SkipTo(What thing)
    {
        HashSet<What> met = [];
        return [.. Round.Of(Job().Engine).TakeWhile(place => place.What != thing).SelectMany(place => met.Add(place.What) ? ["-", ""] : new[] { "" })];
    }

    private Screen Type(params string[] lines) => Screen.Typed(_scratch["data"], lines, "measure", "M-1", "--stage", "as received");

    private Job Job() => JobFileReader.Read(Encoding.UTF8.GetBytes(Screen.At(_scratch["data"], "export", "M-1").Output)).Job!;

    private Reading[] Readings() => [.. Job().Readings];
}
