using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Quantities;

public class QuantityPrintTests
{
    [Theory]
    [InlineData(84.51234, 0.0123, "84.512", "0.012")]
    [InlineData(84.51234, 0.123, "84.51", "0.12")]
    [InlineData(84.51234, 0.0996, "84.51", "0.10")]
    [InlineData(84.51234, 0.0994, "84.512", "0.099")]
    [InlineData(84.51234, 1.5, "84.5", "1.5")]
    [InlineData(84.51234, 15.0, "85", "15")]
    [InlineData(1234.0, 150.0, "1230", "150")]
    [InlineData(1234.0, 996.0, "1200", "1000")]
    [InlineData(100.02147, 0.00035, "100.02147", "0.00035")]
    public void Two_digits_of_the_uncertainty_and_the_figure_to_the_same_place(
        double millimetres, double uncertainty, string figure, string shownUncertainty)
    {
        Assert.Equal(figure, QuantityPrint.Number(millimetres, QuantityKind.Length, uncertainty, UnitSystem.Metric));
        Assert.Equal(shownUncertainty, QuantityPrint.Uncertainty(uncertainty, QuantityKind.Length, UnitSystem.Metric));
    }

    [Theory]
    [InlineData(QuantityKind.Length, 84.51234, "84.512", "3.3273")]
    [InlineData(QuantityKind.Volume, 42_345.6, "42.35", "2.584")]
    [InlineData(QuantityKind.Ratio, 10.4567, "10.46", "10.46")]
    [InlineData(QuantityKind.Pressure, 1234.56, "1235", "179")]
    [InlineData(QuantityKind.Temperature, 20.0, "20.0", "68.0")]
    [InlineData(QuantityKind.Angle, Math.PI, "180.0", "180.0")]
    public void Without_an_uncertainty_a_figure_stops_at_the_step_of_an_ordinary_gauge(
        QuantityKind kind, double coherent, string metric, string inch)
    {
        foreach (double? none in new double?[] { null, 0.0, double.PositiveInfinity, double.NaN })
        {
            Assert.Equal(metric, QuantityPrint.Number(coherent, kind, none, UnitSystem.Metric));
            Assert.Equal(inch, QuantityPrint.Number(coherent, kind, none, UnitSystem.Inch));
        }
    }

    [Fact]
    public void The_uncertainty_is_weighed_in_the_unit_it_is_printed_in()
    {
        // 0.0254 mm is a thou: three and a bit places of an inch, but only three of a millimetre.
        Assert.Equal("3.3270", QuantityPrint.Number(84.5058, QuantityKind.Length, 0.0254, UnitSystem.Inch));
        Assert.Equal("84.506", QuantityPrint.Number(84.5058, QuantityKind.Length, 0.0254, UnitSystem.Metric));
        Assert.Equal("1.8", QuantityPrint.Uncertainty(1.0, QuantityKind.Temperature, UnitSystem.Inch));
    }

    [Theory]
    [InlineData(-0.0004, null, "0.000")]
    [InlineData(-0.004, 0.12, "0.00")]
    [InlineData(-4.0, 150.0, "0")]
    [InlineData(-0.006, 0.12, "-0.01")]
    public void Nothing_is_never_below_zero(double millimetres, double? uncertainty, string figure) =>
        Assert.Equal(figure, QuantityPrint.Number(millimetres, QuantityKind.Length, uncertainty, UnitSystem.Metric));

    [Theory]
    [InlineData(0.2, QuantityKind.Length, SignWords.Deck, "0.200 mm below")]
    [InlineData(-0.65, QuantityKind.Length, SignWords.Deck, "0.650 mm proud")]
    [InlineData(-0.0001, QuantityKind.Length, SignWords.Deck, "0.000 mm flush")]
    [InlineData(-3400.0, QuantityKind.Volume, SignWords.Crown, "3.40 cm³ dome")]
    [InlineData(10.456, QuantityKind.Ratio, SignWords.None, "10.46")]
    public void A_signed_figure_is_printed_with_its_word(double coherent, QuantityKind kind, SignWords signs, string text) =>
        Assert.Equal(text, QuantityPrint.Text(coherent, kind, null, UnitSystem.Metric, signs));

    [Fact]
    public void A_number_that_is_none_is_a_dash() =>
        Assert.Equal("–", QuantityPrint.Number(double.NaN, QuantityKind.Length, null, UnitSystem.Metric));
}
