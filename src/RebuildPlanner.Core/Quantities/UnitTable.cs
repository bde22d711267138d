using static RebuildPlanner.Core.Quantities.QuantityKind;

namespace RebuildPlanner.Core.Quantities;

/// <summary>Every unit a workshop may write, in each of its spellings.</summary>
/// <remarks>
/// The inch is 25.4 mm, the pound 0.45359237 kg, standard gravity 9.80665 m/s² and the zero of Celsius 273.15 K, each exact by definition; all else is
/// computed from them. Source: sp811 (appendix B). A test holds every unit to a library of units.
/// </remarks>
internal static class UnitTable
{
    private const decimal MillimetresPerInch = 25.4m, MillimetresPerMetre = 1000m, KelvinAtZeroCelsius = 273.15m, FahrenheitAtZeroCelsius = 32m;
    private const decimal CelsiusPerFahrenheit = 5m / 9m, KilogramsPerPound = 0.45359237m, GravityMetresPerSecondSquared = 9.80665m, PascalsPerKilopascal = 1000m;
    private const decimal SquareMillimetresPerSquareInch = MillimetresPerInch * MillimetresPerInch;
    private const decimal CubicMillimetresPerCubicInch = SquareMillimetresPerSquareInch * MillimetresPerInch, CubicMillimetresPerCubicCentimetre = 1000m;

    // As many digits as a double gives back; the rest of the unending fraction would only make sums long.
    private const int PsiDecimals = 14;

    private static readonly decimal KilopascalsPerPsi = decimal.Round(
        KilogramsPerPound * GravityMetresPerSecondSquared * MillimetresPerMetre * MillimetresPerMetre / SquareMillimetresPerSquareInch / PascalsPerKilopascal, PsiDecimals);

    public static readonly WrittenUnit Millimetre = new("mm", Length);
    public static readonly WrittenUnit Inch = new("in", Length, MillimetresPerInch);
    public static readonly WrittenUnit Thou = new("thou", Length, MillimetresPerInch / 1000m);
    public static readonly WrittenUnit Metre = new("m", Length, MillimetresPerMetre);
    public static readonly WrittenUnit Foot = new("ft", Length, 12m * MillimetresPerInch);
    public static readonly WrittenUnit SquareMillimetre = new("mm2", Area);
    public static readonly WrittenUnit SquareInch = new("in2", Area, SquareMillimetresPerSquareInch);
    public static readonly WrittenUnit CubicCentimetre = new("cc", Volume, CubicMillimetresPerCubicCentimetre);
    public static readonly WrittenUnit CubicInch = new("cu in", Volume, CubicMillimetresPerCubicInch);
    public static readonly WrittenUnit Litre = new("L", Volume, 1000m * CubicMillimetresPerCubicCentimetre);
    public static readonly WrittenUnit Degree = new("deg", Angle);
    public static readonly WrittenUnit Kilopascal = new("kPa", Pressure);
    public static readonly WrittenUnit Psi = new("psi", Pressure, KilopascalsPerPsi);
    public static readonly WrittenUnit Bar = new("bar", Pressure, 100m);
    public static readonly WrittenUnit Celsius = new("C", Temperature);
    public static readonly WrittenUnit Fahrenheit = new("F", Temperature, CelsiusPerFahrenheit, FahrenheitAtZeroCelsius);
    public static readonly WrittenUnit KilojoulePerKilogram = new("kJ/kg", SpecificEnergy);

    private static readonly WrittenUnit Micrometre = new("µm", Length, 0.001m);
    private static readonly WrittenUnit Microinch = new("µin", Length, MillimetresPerInch / 1_000_000m);
    private static readonly WrittenUnit SquareCentimetre = new("cm2", Area, 100m);

    // Both code points of the Greek letter are met: the micro sign of Latin-1 and the letter itself.
    private static readonly WrittenUnit[] All =
    [
        Millimetre, Inch, Thou, Micrometre, Micrometre with { Word = "μm" }, Micrometre with { Word = "um" },
        Inch with { Word = "\"" }, Inch with { Word = "″" }, Thou with { Word = "mil" }, new("cm", Length, 10m), Metre, Foot,
        Microinch, Microinch with { Word = "μin" }, Microinch with { Word = "uin" },
        SquareMillimetre, SquareMillimetre with { Word = "mm²" }, SquareCentimetre, SquareCentimetre with { Word = "cm²" },
        SquareInch, SquareInch with { Word = "in²" },
        CubicCentimetre, CubicCentimetre with { Word = "cm3" }, CubicCentimetre with { Word = "cm³" }, CubicCentimetre with { Word = "mL" },
        CubicCentimetre with { Word = "ml" }, Litre, Litre with { Word = "l" }, CubicInch, CubicInch with { Word = "in3" },
        CubicInch with { Word = "in³" },
        Degree, Degree with { Word = "°" }, Kilopascal, Bar, Psi,
        Celsius, Celsius with { Word = "°C" }, Fahrenheit, Fahrenheit with { Word = "°F" },
        new("K", Temperature, Zero: KelvinAtZeroCelsius), KilojoulePerKilogram,
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
}
