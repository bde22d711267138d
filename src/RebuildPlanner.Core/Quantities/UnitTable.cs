using UnitsNet.Units;
using static RebuildPlanner.Core.Quantities.QuantityKind;

namespace RebuildPlanner.Core.Quantities;

/// <summary>Every unit a workshop may write, in each of its spellings.</summary>
internal static class UnitTable
{
    public static readonly WrittenUnit Millimetre = WrittenUnit.Working("mm", Length);
    public static readonly WrittenUnit Inch = Of("in", LengthUnit.Inch);
    public static readonly WrittenUnit Thou = Of("thou", LengthUnit.Mil);
    public static readonly WrittenUnit Metre = Of("m", LengthUnit.Meter);
    public static readonly WrittenUnit Foot = Of("ft", LengthUnit.Foot);
    public static readonly WrittenUnit SquareMillimetre = WrittenUnit.Working("mm2", Area);
    public static readonly WrittenUnit SquareInch = Of("in2", AreaUnit.SquareInch);
    public static readonly WrittenUnit CubicCentimetre = Of("cc", VolumeUnit.CubicCentimeter);
    public static readonly WrittenUnit CubicInch = Of("cu in", VolumeUnit.CubicInch);
    public static readonly WrittenUnit Litre = Of("L", VolumeUnit.Liter);
    public static readonly WrittenUnit Degree = WrittenUnit.Working("deg", Angle);
    public static readonly WrittenUnit Kilopascal = WrittenUnit.Working("kPa", Pressure);
    public static readonly WrittenUnit Psi = Of("psi", PressureUnit.PoundForcePerSquareInch);
    public static readonly WrittenUnit Bar = Of("bar", PressureUnit.Bar);
    public static readonly WrittenUnit Celsius = WrittenUnit.Working("C", Temperature);
    public static readonly WrittenUnit Fahrenheit = Of("F", TemperatureUnit.DegreeFahrenheit, TemperatureDeltaUnit.DegreeFahrenheit);
    public static readonly WrittenUnit KilojoulePerKilogram = WrittenUnit.Working("kJ/kg", SpecificEnergy);

    // Both code points of the Greek letter are met: the micro sign of Latin-1 and the letter itself.
    private static readonly WrittenUnit[] All =
    [
        Millimetre, Inch, Thou, Of("µm", LengthUnit.Micrometer), Of("μm", LengthUnit.Micrometer), Of("um", LengthUnit.Micrometer),
        Of("\"", LengthUnit.Inch), Of("″", LengthUnit.Inch), Of("mil", LengthUnit.Mil), Of("cm", LengthUnit.Centimeter), Metre, Foot,
        Of("µin", LengthUnit.Microinch), Of("μin", LengthUnit.Microinch), Of("uin", LengthUnit.Microinch),
        SquareMillimetre, WrittenUnit.Working("mm²", Area), Of("cm2", AreaUnit.SquareCentimeter), Of("cm²", AreaUnit.SquareCentimeter),
        SquareInch, Of("in²", AreaUnit.SquareInch),
        CubicCentimetre, Of("cm3", VolumeUnit.CubicCentimeter), Of("cm³", VolumeUnit.CubicCentimeter), Of("mL", VolumeUnit.Milliliter),
        Of("ml", VolumeUnit.Milliliter), Litre, Of("l", VolumeUnit.Liter), CubicInch, Of("in3", VolumeUnit.CubicInch),
        Of("in³", VolumeUnit.CubicInch),
        Degree, WrittenUnit.Working("°", Angle), Kilopascal, Bar, Psi,
        Celsius, WrittenUnit.Working("°C", Temperature), Fahrenheit,
        Of("°F", TemperatureUnit.DegreeFahrenheit, TemperatureDeltaUnit.DegreeFahrenheit),
        Of("K", TemperatureUnit.Kelvin, TemperatureDeltaUnit.Kelvin), KilojoulePerKilogram,
    ];

    private static readonly Dictionary<string, WrittenUnit> BySpelling = All.ToDictionary(unit => unit.Word, StringComparer.Ordinal);

    // Refused, so that one unit is not written in ten ways, but what they stand for is known.
    private static readonly (string Word, string[] LongNames)[] Advice =
    [
        ("in", ["inch", "inches", "ins"]), ("µm", ["micron", "microns"]), ("thou", ["thousandth", "thousandths"]), ("ft", ["foot", "feet"]),
        ("m", ["metre", "meter"]), ("mm", ["millimetre", "millimeter"]), ("L", ["litre", "liter"]), ("cc", ["ccm"]),
        ("cu in", ["ci", "cid", "cui", "cu"]), ("in2", ["sq", "sqin"]), ("deg", ["degree", "degrees"]), ("C", ["celsius", "degc"]),
        ("F", ["fahrenheit", "degf"]), ("K", ["kelvin"]),
    ];

    public static WrittenUnit? Find(string spelling) => BySpelling.GetValueOrDefault(spelling);

    /// <summary>The unit that was probably meant, the kinds wanted at the place first.</summary>
    public static string? Nearest(string typed, IReadOnlyList<QuantityKind> wanted) =>
        Advice.FirstOrDefault(advice => advice.LongNames.Contains(typed.ToLowerInvariant())).Word
        ?? NearestWord.Of(typed, All.Where(unit => wanted.Contains(unit.Kind)).Select(unit => unit.Word))
        ?? NearestWord.Of(typed, BySpelling.Keys);

    /// <summary>The units to show when one of a kind is wanted, the most usual first; also those a slip is tested against.</summary>
    public static IReadOnlyList<WrittenUnit> Usual(QuantityKind kind) => kind switch
    {
        Length => [Millimetre, Inch, Thou],
        Area => [SquareMillimetre, BySpelling["cm2"], SquareInch],
        Volume => [CubicCentimetre, BySpelling["mL"], CubicInch],
        Angle => [Degree],
        Pressure => [Kilopascal, Bar, Psi],
        Temperature => [Celsius, Fahrenheit],
        SpecificEnergy => [KilojoulePerKilogram],
        _ => [],
    };

    private static WrittenUnit Of(string word, LengthUnit unit) =>
        WrittenUnit.Multiple(word, Length, value => UnitsNet.Length.From(value, unit).As(LengthUnit.Millimeter));

    private static WrittenUnit Of(string word, AreaUnit unit) =>
        WrittenUnit.Multiple(word, Area, value => UnitsNet.Area.From(value, unit).As(AreaUnit.SquareMillimeter));

    private static WrittenUnit Of(string word, VolumeUnit unit) =>
        WrittenUnit.Multiple(word, Volume, value => UnitsNet.Volume.From(value, unit).As(VolumeUnit.CubicMillimeter));

    private static WrittenUnit Of(string word, PressureUnit unit) =>
        WrittenUnit.Multiple(word, Pressure, value => UnitsNet.Pressure.From(value, unit).As(PressureUnit.Kilopascal));

    private static WrittenUnit Of(string word, TemperatureUnit unit, TemperatureDeltaUnit difference) => WrittenUnit.WithOffset(
        word, Temperature, value => UnitsNet.Temperature.From(value, unit).As(TemperatureUnit.DegreeCelsius),
        value => UnitsNet.TemperatureDelta.From(value, difference).As(TemperatureDeltaUnit.DegreeCelsius));
}
