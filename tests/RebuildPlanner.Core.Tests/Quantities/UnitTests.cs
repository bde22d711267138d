using RebuildPlanner.Core.Quantities;
using UnitsNet.Units;

namespace RebuildPlanner.Core.Tests.Quantities;

/// <summary>Against NIST Special Publication 811 (2008), appendix B: factors in bold there are exact, and so compared bit for bit.</summary>
public class UnitTests
{
    [Theory]
    [InlineData("1 in", 25.4)]
    [InlineData("1\"", 25.4)]
    [InlineData("1 ft", 304.8)]
    [InlineData("1 thou", 0.0254)]
    [InlineData("1 mil", 0.0254)]
    [InlineData("1 µin", 0.0000254)]
    [InlineData("1 μin", 0.0000254)]
    [InlineData("1 uin", 0.0000254)]
    [InlineData("1 µm", 0.001)]
    [InlineData("1 μm", 0.001)]
    [InlineData("1 um", 0.001)]
    [InlineData("1 m", 1000.0)]
    [InlineData("1 cm", 10.0)]
    public void Length_units_are_exactly_the_published_millimetres(string text, double millimetres) =>
        Assert.Equal(millimetres, Rules.Read(text, Rules.Length).Value);

    [Theory]
    [InlineData("1 cu in", 16387.064)]
    [InlineData("1 in3", 16387.064)]
    [InlineData("1 in³", 16387.064)]
    [InlineData("1 cc", 1000.0)]
    [InlineData("1 cm3", 1000.0)]
    [InlineData("1 cm³", 1000.0)]
    [InlineData("1 mL", 1000.0)]
    [InlineData("1 ml", 1000.0)]
    [InlineData("1 L", 1_000_000.0)]
    [InlineData("1 l", 1_000_000.0)]
    public void Volume_units_are_exactly_the_published_cubic_millimetres(string text, double cubicMillimetres) =>
        Assert.Equal(cubicMillimetres, Rules.Read(text, Rules.Volume).Value);

    [Theory]
    [InlineData("1 mm2", 1.0)]
    [InlineData("1 mm²", 1.0)]
    [InlineData("1 cm2", 100.0)]
    [InlineData("1 cm²", 100.0)]
    [InlineData("1 in2", 645.16)]
    [InlineData("1 in²", 645.16)]
    public void Area_units_are_exactly_the_published_square_millimetres(string text, double squareMillimetres) =>
        Assert.Equal(squareMillimetres, Rules.Read(text, Rules.Area).Value);

    [Fact]
    public void Every_unit_agrees_with_a_library_of_units()
    {
        (string Word, UnitsNet.IQuantity One, Enum Working)[] known =
        [
            ("in", UnitsNet.Length.FromInches(1), LengthUnit.Millimeter), ("thou", UnitsNet.Length.FromMils(1), LengthUnit.Millimeter),
            ("m", UnitsNet.Length.FromMeters(1), LengthUnit.Millimeter), ("ft", UnitsNet.Length.FromFeet(1), LengthUnit.Millimeter),
            ("µm", UnitsNet.Length.FromMicrometers(1), LengthUnit.Millimeter), ("cm", UnitsNet.Length.FromCentimeters(1), LengthUnit.Millimeter),
            ("µin", UnitsNet.Length.FromMicroinches(1), LengthUnit.Millimeter), ("cm2", UnitsNet.Area.FromSquareCentimeters(1), AreaUnit.SquareMillimeter),
            ("in2", UnitsNet.Area.FromSquareInches(1), AreaUnit.SquareMillimeter), ("cc", UnitsNet.Volume.FromCubicCentimeters(1), VolumeUnit.CubicMillimeter),
            ("mL", UnitsNet.Volume.FromMilliliters(1), VolumeUnit.CubicMillimeter), ("L", UnitsNet.Volume.FromLiters(1), VolumeUnit.CubicMillimeter),
            ("cu in", UnitsNet.Volume.FromCubicInches(1), VolumeUnit.CubicMillimeter), ("bar", UnitsNet.Pressure.FromBars(1), PressureUnit.Kilopascal),
            ("psi", UnitsNet.Pressure.FromPoundsForcePerSquareInch(1), PressureUnit.Kilopascal),
            ("F", UnitsNet.Temperature.FromDegreesFahrenheit(1), TemperatureUnit.DegreeCelsius), ("K", UnitsNet.Temperature.FromKelvins(1), TemperatureUnit.DegreeCelsius),
        ];

        foreach ((string word, UnitsNet.IQuantity one, Enum working) in known)
        {
            // The library's doubles carry an error or two in the last place; our temperatures are rounded to nine decimals.
            double tolerance = working is TemperatureUnit ? 5.1e-10 : 1e-15 * one.As(working);
            Assert.Equal(one.As(working), (double)UnitTable.Find(word)!.ToWorking(1m), tolerance);
        }
    }

    [Fact]
    public void A_psi_is_a_pound_force_on_a_square_inch()
    {
        // Pound-force 4.4482216152605 N exact, square inch 645.16 mm² exact; the quotient is 6.894 757 293 168 kPa to thirteen digits.
        Assert.Equal(6.894757293168, Rules.Read("1 psi", Rules.Pressure).Value, 5e-13);
        Assert.Equal(100.0, Rules.Read("1 bar", Rules.Pressure).Value);
        Assert.Equal(101.325, Rules.Read("101.325 kPa", Rules.Pressure).Value);
    }

    [Theory]
    [InlineData("68 F", 20.0)]
    [InlineData("32 °F", 0.0)]
    [InlineData("-40 F", -40.0)]
    [InlineData("293.15 K", 20.0)]
    [InlineData("20 C", 20.0)]
    [InlineData("−5 °C", -5.0)]
    public void Temperatures_meet_at_the_fixed_points(string text, double celsius) =>
        Assert.Equal(celsius, Rules.Read(text, Rules.Temperature).Value);

    [Fact]
    public void A_limit_on_a_temperature_is_a_difference()
    {
        Quantity quantity = Rules.Read("68 F ± 9 F", Rules.Temperature);

        // 9 F apart is 5 °C apart; read as a temperature 9 F would be −12.8 °C. The tolerance is one bit of the library's five ninths.
        Assert.Equal(15.0, quantity.Limits!.Value.Low, 1e-12);
        Assert.Equal(25.0, quantity.Limits!.Value.High, 1e-12);
        Assert.Equal(5.0 / 9.0, quantity.LastDigit, 1e-12);
    }

    [Fact]
    public void A_straight_angle_is_pi()
    {
        Assert.Equal(Math.PI, Rules.Read("180 deg", Rules.Angle).Value);
        Assert.Equal(Math.PI / 2.0, Rules.Read("90°", Rules.Angle).Value);
    }

    [Fact]
    public void Specific_energy_and_ratio_are_kept_as_written()
    {
        Assert.Equal(349.5, Rules.Read("349.5 kJ/kg", Rules.Energy).Value);
        Assert.Equal(10.5, Rules.Read("10.5", Rules.Ratio).Value);
    }

    [Fact]
    public void Every_usual_unit_reads_what_it_prints()
    {
        foreach (QuantityKind kind in Enum.GetValues<QuantityKind>())
        {
            foreach (UnitSystem system in Enum.GetValues<UnitSystem>())
            {
                QuantityRule rule = new([kind], SignWords.None, -1e9, 1e9);
                Assert.Equal(kind, Rules.Read(QuantityPrint.Text(1.0, kind, null, system), rule).Kind);
            }
        }
    }
}
