using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Measuring;

public class WhatTableTests
{
    // The closed list as the job file's description gives it, in its order.
    private const string ClosedList =
        "bore, stroke, travel, chamber, chamber opening area, valve sink, valve head diameter, deck, rock, crown, crown fill, "
        + "whole chamber, plug hole, pocket, head recess, gasket thickness, gasket opening, base gasket, top land height, top land diameter, wall, skirt, "
        + "compression height, rod length, piston pin, main journal, main housing, rod journal, rod housing, shell, end float, "
        + "rod side clearance, ring gap, head height, block height, barrel height, deck height, flatness, liner protrusion, "
        + "piston protrusion, crank rise, guide, stem, spring height, piston to valve";

    [Fact]
    public void The_words_are_the_closed_list_and_no_more() =>
        Assert.Equal(ClosedList.Split(", "), WhatTable.Lines.Select(line => line.Word));

    [Fact]
    public void Every_line_stands_at_its_own_place() =>
        Assert.All(WhatTable.Lines, line => Assert.Same(line, WhatTable.Line(line.What)));

    [Fact]
    public void A_word_finds_its_line_and_a_near_one_does_not()
    {
        Assert.Equal(What.GasketOpening, WhatTable.Find("gasket opening")!.What);
        Assert.Null(WhatTable.Find("gasket openings"));
        Assert.Null(WhatTable.Find("Bore"));
        Assert.Null(WhatTable.Find("out-of-round"));
    }

    [Fact]
    public void Every_range_has_room_and_every_signed_line_has_room_on_both_sides() => Assert.All(WhatTable.Lines, line =>
    {
        Assert.True(line.Rule.SaneLow < line.Rule.SaneHigh, line.Word);
        Assert.True(line.Rule.Signs == SignWords.None || (line.Rule.SaneLow < 0.0 && line.Rule.SaneHigh > 0.0), line.Word);
    });

    [Theory]
    [InlineData(SignWords.Deck, "deck")]
    [InlineData(SignWords.Crown, "crown")]
    [InlineData(SignWords.Protrusion, "liner protrusion, piston protrusion")]
    public void Closing_words_belong_to_these_alone(SignWords signs, string words) =>
        Assert.Equal(words.Split(", "), WhatTable.Lines.Where(line => line.Rule.Signs == signs).Select(line => line.Word));

    [Theory]
    [InlineData(Belongs.Engine, "stroke, travel, main journal, main housing, end float, flatness, crank rise")]
    [InlineData(Belongs.Bank, "block height, deck height")]
    [InlineData(Belongs.Head, "gasket thickness, gasket opening, head height")]
    public void One_physical_part_is_one_input(Belongs belongs, string words) =>
        Assert.Equal(words.Split(", "), WhatTable.Lines.Where(line => line.Belongs == belongs).Select(line => line.Word));

    [Theory]
    [InlineData(PlaceKeys.Depth, "bore, wall")]
    [InlineData(PlaceKeys.Axis, "bore")]
    [InlineData(PlaceKeys.PinEnd, "deck, piston protrusion")]
    [InlineData(PlaceKeys.Clock, "wall, liner protrusion")]
    [InlineData(PlaceKeys.Drop, "crown fill")]
    [InlineData(PlaceKeys.Valve, "valve sink, valve head diameter, pocket, guide, stem, spring height, piston to valve")]
    public void Places_are_told_apart_by_these_keys(PlaceKeys key, string words) =>
        Assert.Equal(words.Split(", "), WhatTable.Lines.Where(line => line.Keys.HasFlag(key)).Select(line => line.Word));

    [Fact]
    public void Pieces_are_pistons_and_their_pins() => Assert.Equal(
        ["crown", "top land height", "top land diameter", "skirt", "compression height", "piston pin"],
        WhatTable.Lines.Where(line => line.MayBePiece).Select(line => line.Word));

    [Fact]
    public void A_reading_of_these_must_name_its_cylinder() => Assert.Equal(
        ["bore", "chamber", "chamber opening area", "valve sink", "deck", "rock", "crown", "crown fill", "whole chamber", "wall", "skirt",
         "ring gap", "liner protrusion", "piston protrusion", "piston to valve"],
        WhatTable.Lines.Where(line => line.NeedsCylinder).Select(line => line.Word));

    // From a 50 cc moped (38 mm × 42 mm) to a medium-speed marine diesel (460 mm × 580 mm).
    [Theory]
    [InlineData("bore", "38.0 mm")]
    [InlineData("bore", "460 mm")]
    [InlineData("stroke", "42 mm")]
    [InlineData("stroke", "580 mm")]
    [InlineData("chamber", "4.8 cc")]
    [InlineData("chamber", "0 cc")]
    [InlineData("deck", "0.008 in proud")]
    [InlineData("crown", "12.5 cc dome")]
    [InlineData("gasket opening", "3.386 in")]
    [InlineData("gasket opening", "58.1 cm2")]
    [InlineData("wall", "0.180 in")]
    [InlineData("liner protrusion", "0.08 mm")]
    [InlineData("valve sink", "-0.4 mm")]
    [InlineData("ring gap", "14 thou")]
    public void Takes_what_engines_have(string word, string text)
    {
        Assert.NotNull(QuantityText.Read(text, WhatTable.Find(word)!.Rule, out string? problem));
        Assert.Null(problem);
    }

    [Theory]
    [InlineData("bore", "3.327 mm", "3.327 in would fit")]
    [InlineData("gasket thickness", "40 mm", "40 thou would fit")]
    [InlineData("stroke", "3.48 mm", "3.48 in would fit")]
    [InlineData("ring gap", "14 in", "14 thou would fit")]
    public void Names_the_unit_that_was_probably_meant(string word, string text, string fragment)
    {
        Assert.Null(QuantityText.Read(text, WhatTable.Find(word)!.Rule, out string? problem));
        Assert.Contains(fragment, problem, StringComparison.Ordinal);
    }
}
