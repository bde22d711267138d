using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Quantities;

public class QuantityTextTests
{
    [Theory]
    [InlineData("84.512 mm", 84.512)]
    [InlineData("  84.512mm ", 84.512)]
    [InlineData(".020 in", 0.508)]
    [InlineData("1/32 in", 0.79375)]
    [InlineData("4 1/32 in", 102.39375)]
    [InlineData("4 1/32\"", 102.39375)]
    [InlineData("3.327 in", 84.5058)]
    [InlineData("40 thou", 1.016)]
    [InlineData("0 mm", 0.0)]
    public void Numbers_are_the_double_nearest_to_what_was_written(string text, double millimetres)
    {
        Quantity quantity = Rules.Read(text, Rules.Length);

        Assert.Equal(millimetres, quantity.Value);
        Assert.Equal(text, quantity.Text);
        Assert.Null(quantity.Limits);
    }

    [Theory]
    [InlineData("1.05 mm ± 0.03 mm", 1.05, 1.02, 1.08)]
    [InlineData("1.05 ± 0.03 mm", 1.05, 1.02, 1.08)]
    [InlineData("1.05±0.03mm", 1.05, 1.02, 1.08)]
    [InlineData("1.05 mm +/- 0.03 mm", 1.05, 1.02, 1.08)]
    [InlineData("1.05 mm +0.05/-0.02 mm", 1.05, 1.03, 1.10)]
    [InlineData("1.05 mm +0.05 mm/-0.02 mm", 1.05, 1.03, 1.10)]
    [InlineData("1.05 mm +0.05 mm / −0.02 mm", 1.05, 1.03, 1.10)]
    [InlineData("1.05 +0.05/-0.02 mm", 1.05, 1.03, 1.10)]
    [InlineData("1.05 mm +0.05 mm/-0", 1.05, 1.05, 1.10)]
    [InlineData("1.05 mm +0/-0.02 mm", 1.05, 1.03, 1.05)]
    [InlineData("1.02..1.08 mm", 1.05, 1.02, 1.08)]
    [InlineData("1.02 mm..1.08 mm", 1.05, 1.02, 1.08)]
    [InlineData("1.02 .. 1.08 mm", 1.05, 1.02, 1.08)]
    [InlineData("3.327 in ± 0.5 thou", 84.5058, 84.4931, 84.5185)]
    [InlineData("1 in ± 1/64 in", 25.4, 25.003125, 25.796875)]
    [InlineData("88 mm ± 0", 88.0, 88.0, 88.0)]
    [InlineData("88 mm ± 0 mm", 88.0, 88.0, 88.0)]
    [InlineData("0.01 mm ± 0.02 mm", 0.01, -0.01, 0.03)]
    public void Limits_are_the_doubles_nearest_to_the_decimal_sums(string text, double value, double low, double high)
    {
        Quantity quantity = Rules.Read(text, Rules.Length);

        Assert.Equal(value, quantity.Value);
        Assert.Equal((low, high), quantity.Limits);
    }

    [Theory]
    [InlineData("84.51 mm", 0.01)]
    [InlineData("84.510 mm", 0.001)]
    [InlineData("84 mm", 1.0)]
    [InlineData("3.327 in", 0.0254)]
    [InlineData("4 1/32 in", 0.79375)]
    [InlineData("1/64 in", 0.396875)]
    [InlineData("40 thou", 0.0254)]
    [InlineData("1.0..1.08 mm", 0.01)]
    [InlineData("1.02..1.1 mm", 0.01)]
    [InlineData("1.05 mm ± 0.001 mm", 0.01)]
    public void The_last_digit_is_worth_one_step_of_the_figure_as_written(string text, double millimetres) =>
        Assert.Equal(millimetres, Rules.Read(text, Rules.Length).LastDigit);

    [Fact]
    public void A_minus_sign_is_read_where_the_range_goes_below_zero()
    {
        Assert.Equal(-0.8, Rules.Read("-0.8 mm", Rules.SignedLength).Value);
        Assert.Equal(-0.8, Rules.Read("−0.8 mm", Rules.SignedLength).Value);
        Assert.Equal((-0.2, 0.1), Rules.Read("-0.2..0.1 mm", Rules.SignedLength).Limits);
    }

    [Fact]
    public void The_unit_decides_between_an_opening_diameter_and_its_traced_area()
    {
        Assert.Equal(QuantityKind.Length, Rules.Read("86.0 mm", Rules.Opening).Kind);
        Assert.Equal(QuantityKind.Area, Rules.Read("5809 mm2", Rules.Opening).Kind);
        Assert.Null(QuantityText.Read("86 mm2", Rules.Opening, out string? problem));
        Assert.Contains("300 mm2 to 300000 mm2", problem, StringComparison.Ordinal);
    }

    [Fact]
    public void A_figure_written_as_exactly_the_bound_is_taken()
    {
        QuantityRule bounded = new([QuantityKind.Angle], SignWords.None, 0.0, double.DegreesToRadians(60));

        Assert.Equal(double.DegreesToRadians(60), Rules.Read("60 deg", bounded).Value, 1e-15);
        Assert.Equal(500.0, Rules.Read("500 mm", Rules.Bore).Value);
    }
}
