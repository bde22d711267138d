using System.Globalization;
using CsCheck;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Quantities;

public class QuantityProperties
{
    private static readonly Gen<decimal> Written =
        Gen.Select(Gen.Int[0, 99_999], Gen.Int[0, 4]).Select((digits, scale) => new decimal(digits, 0, 0, false, (byte)scale));

    private static readonly Gen<double> Millimetres = Gen.Double[-500.0, 500.0];

    private static readonly Gen<double> Uncertainties = Gen.Double[-5.0, 1.5].Select(exponent => Math.Pow(10.0, exponent));

    private static readonly Gen<UnitSystem> Systems = Gen.Enum<UnitSystem>();

    [Fact]
    public void Inch_and_millimetre_entry_agree_to_the_bit() => Written.Sample(inches =>
        Assert.Equal(Rules.Read(Text(inches * 25.4m) + " mm", Rules.Length).Value, Rules.Read(Text(inches) + " in", Rules.Length).Value));

    [Fact]
    public void A_number_in_the_coherent_unit_is_unchanged() => Written.Sample(written =>
        Assert.Equal(double.Parse(Text(written), CultureInfo.InvariantCulture), Rules.Read(Text(written) + " mm", Rules.Length).Value));

    [Fact]
    public void Every_length_printed_reads_back_within_half_its_last_digit() =>
        Gen.Select(Millimetres, Uncertainties, Systems).Sample((length, uncertainty, system) =>
        {
            Quantity back = Rules.Read(QuantityPrint.Text(length, QuantityKind.Length, uncertainty, system), Rules.SignedLength);

            // From ten up, the last known digit stands left of the point, while the text still ends in the ones.
            double step = back.LastDigit * Math.Pow(10.0, Math.Max(0, -QuantityPrint.Decimals(QuantityKind.Length, uncertainty, system)));
            Assert.InRange(back.Value, length - (0.5 * step) - 1e-12, length + (0.5 * step) + 1e-12);
        });

    [Fact]
    public void The_uncertainty_shows_two_significant_digits_and_no_third() =>
        Gen.Select(Uncertainties, Systems).Sample((uncertainty, system) =>
        {
            string shown = QuantityPrint.Uncertainty(uncertainty, QuantityKind.Length, system);
            string digits = shown.Replace(".", "", StringComparison.Ordinal).TrimStart('0');
            Assert.Equal(2, digits.Length);
        });

    [Fact]
    public void A_dome_has_the_mirrored_limits_of_a_dish() =>
        Gen.Select(Gen.Int[100, 9999], Gen.Int[0, 99], Gen.Int[0, 99]).Sample((value, up, down) =>
        {
            string figure = $"{Text(value / 100m)} cc +{Text(up / 100m)}/-{Text(down / 100m)} cc";
            Quantity dish = Rules.Read(figure + " dish", Rules.Crown), dome = Rules.Read(figure + " dome", Rules.Crown);

            Assert.Equal(-dish.Value, dome.Value);
            Assert.Equal((-dish.Limits!.Value.High, -dish.Limits.Value.Low), dome.Limits);
            Assert.True(dome.Limits!.Value.Low <= dome.Value && dome.Value <= dome.Limits.Value.High);
        });

    [Fact]
    public void No_text_whatever_breaks_the_reader()
    {
        Gen<string> typed = Gen.OneOf(
            Gen.String, Gen.String["0123456789./,+-−±eE µ°²\"mincuftlothdeg .."], Gen.String["19/ .,-+±m"]);
        typed.Sample(text =>
        {
            Quantity? quantity = QuantityText.Read(text, Rules.Length, out string? problem);
            Assert.True(quantity is null != problem is null);
        });
    }

    private static string Text(decimal number) => number.ToString(CultureInfo.InvariantCulture);
}
