using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Quantities;

public class SignWordTests
{
    [Theory]
    [InlineData("4.2 cc dish", "Crown", 4200.0)]
    [InlineData("3.4 cc dome", "Crown", -3400.0)]
    [InlineData("0 cc flat", "Crown", 0.0)]
    [InlineData("0.20 mm below", "Deck", 0.2)]
    [InlineData("0.65 mm proud", "Deck", -0.65)]
    [InlineData("0 mm flush", "Deck", 0.0)]
    [InlineData("0.65 mm proud", "Protrusion", 0.65)]
    [InlineData("0.65 mm", "Protrusion", 0.65)]
    [InlineData("0.05 mm below", "Protrusion", -0.05)]
    public void The_word_says_which_side_of_zero(string text, string rule, double value) =>
        Assert.Equal(value, Rules.Read(text, Rules.Named(rule)).Value);

    [Theory]
    [InlineData("46 deg ABDC", "InletCloses", 46)]
    [InlineData("10 deg BBDC", "InletCloses", -10)]
    [InlineData("86 deg BTDC", "ExhaustCloses", 86)]
    [InlineData("20 deg ATDC", "ExhaustCloses", -20)]
    public void A_closing_is_kept_after_bottom_or_before_top(string text, string rule, double degrees) =>
        Assert.Equal(degrees, Rules.Read(text, Rules.Named(rule)).Value * 180.0 / Math.PI, 1e-12);

    [Theory]
    [InlineData("4.2 cc ± 0.1 cc dish", "Crown", 4200.0, 4100.0, 4300.0)]
    [InlineData("3.4 cc +0.05/-0.02 cc dome", "Crown", -3400.0, -3450.0, -3380.0)]
    [InlineData("3.3..3.5 cc dome", "Crown", -3400.0, -3500.0, -3300.0)]
    [InlineData("0.65 mm +0.02/-0.01 mm proud", "Deck", -0.65, -0.67, -0.64)]
    [InlineData("0 mm ± 0.02 mm flush", "Deck", 0.0, -0.02, 0.02)]
    [InlineData("0.05 mm ± 0.08 mm proud", "Deck", -0.05, -0.13, 0.03)]
    public void Limits_turn_over_with_the_figure(string text, string rule, double value, double low, double high)
    {
        Quantity quantity = Rules.Read(text, Rules.Named(rule));

        Assert.Equal(value, quantity.Value);
        Assert.Equal((low, high), quantity.Limits);
    }

    [Fact]
    public void A_zero_that_was_turned_over_is_plain_zero() =>
        Assert.False(double.IsNegative(Rules.Read("0 cc dome", Rules.Crown).Value));

    [Theory]
    [InlineData(SignWords.Crown, 1.0, "dish")]
    [InlineData(SignWords.Crown, -1.0, "dome")]
    [InlineData(SignWords.Crown, 0.0, "flat")]
    [InlineData(SignWords.Deck, -1.0, "proud")]
    [InlineData(SignWords.Protrusion, -1.0, "below")]
    [InlineData(SignWords.AfterBottom, 0.0, "ABDC")]
    [InlineData(SignWords.BeforeTop, -1.0, "ATDC")]
    [InlineData(SignWords.None, -1.0, "")]
    public void The_word_for_a_signed_figure_is_the_one_that_reads_back(SignWords family, double value, string word) =>
        Assert.Equal(word, SignWordTable.Word(family, value));
}
