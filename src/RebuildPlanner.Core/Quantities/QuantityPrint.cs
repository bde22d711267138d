using System.Globalization;

namespace RebuildPlanner.Core.Quantities;

/// <summary>Turns coherent numbers into what a workshop writes, with no more digits than are known.</summary>
/// <remarks>
/// The standard uncertainty is shown with two significant digits and the figure to the same decimal. Source: jcgm100 (7.2.6).
/// </remarks>
public static class QuantityPrint
{
    // Decimals of a double beyond this are its binary noise, however small an uncertainty is claimed.
    private const int MostDecimals = 9;

    private const int SignificantDigits = 2;

    /// <summary>The unit's word, as it can be typed again; empty for a ratio.</summary>
    public static string Unit(QuantityKind kind, UnitSystem system) => (kind, system) switch
    {
        (QuantityKind.Length, UnitSystem.Metric) => "mm",
        (QuantityKind.Length, _) => "in",
        (QuantityKind.Area, UnitSystem.Metric) => "mm²",
        (QuantityKind.Area, _) => "in²",
        (QuantityKind.Volume, UnitSystem.Metric) => "cm³",
        (QuantityKind.Volume, _) => "cu in",
        (QuantityKind.Angle, _) => "deg",
        (QuantityKind.Pressure, UnitSystem.Metric) => "kPa",
        (QuantityKind.Pressure, _) => "psi",
        (QuantityKind.Temperature, UnitSystem.Metric) => "°C",
        (QuantityKind.Temperature, _) => "°F",
        (QuantityKind.SpecificEnergy, _) => "kJ/kg",
        _ => "",
    };

    /// <summary>A coherent number in the printed unit.</summary>
    public static double InUnit(double coherent, QuantityKind kind, UnitSystem system) =>
        Written(kind, system)?.FromWorking(Working(coherent, kind)) ?? coherent;

    /// <summary>A coherent difference or uncertainty in the printed unit: a temperature's zero does not count.</summary>
    public static double DifferenceInUnit(double coherent, QuantityKind kind, UnitSystem system) =>
        Written(kind, system)?.DifferenceFromWorking(Working(coherent, kind)) ?? coherent;

    /// <summary>How many decimals figure and uncertainty are printed with; below zero, tens (−1), hundreds (−2) and so on.</summary>
    /// <param name="kind">The kind.</param>
    /// <param name="standardUncertaintyCoherent">
    /// u, coherent unit; null, zero or without bound where none is known, which gives the kind's usual step.
    /// </param>
    /// <param name="system">The units printed in.</param>
    public static int Decimals(QuantityKind kind, double? standardUncertaintyCoherent, UnitSystem system)
    {
        double u = standardUncertaintyCoherent is { } coherent ? DifferenceInUnit(coherent, kind, system) : 0.0;
        if (u <= 0.0 || !double.IsFinite(u))
        {
            return UsualDecimals(kind, system);
        }

        // The exponent is read off the rounded number, so that 0.0996 is 0.10 and not 0.100.
        string rounded = u.ToString("E" + (SignificantDigits - 1), CultureInfo.InvariantCulture);
        int exponent = int.Parse(rounded.AsSpan(rounded.IndexOf('E') + 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        return Math.Min(MostDecimals, SignificantDigits - 1 - exponent);
    }

    /// <summary>The figure without its unit, such as "84.512"; a dash where there is no number.</summary>
    public static string Number(double coherent, QuantityKind kind, double? standardUncertaintyCoherent, UnitSystem system) =>
        Fixed(InUnit(coherent, kind, system), Decimals(kind, standardUncertaintyCoherent, system));

    /// <summary>The standard uncertainty without its unit, to the decimals of the figure it belongs to.</summary>
    public static string Uncertainty(double standardUncertaintyCoherent, QuantityKind kind, UnitSystem system) =>
        Fixed(DifferenceInUnit(standardUncertaintyCoherent, kind, system), Decimals(kind, standardUncertaintyCoherent, system));

    /// <summary>The figure with its unit and closing word, such as "0.20 mm below".</summary>
    public static string Text(
        double coherent, QuantityKind kind, double? standardUncertaintyCoherent, UnitSystem system, SignWords signs = SignWords.None)
    {
        string number = Number(coherent, kind, standardUncertaintyCoherent, system);
        bool isZero = !number.Any(c => c is >= '1' and <= '9');
        string word = SignWordTable.Word(signs, isZero ? 0.0 : coherent);
        string[] parts = [word.Length > 0 ? number.TrimStart('-') : number, Unit(kind, system), word];
        return string.Join(' ', parts.Where(part => part.Length > 0));
    }

    // The last digit an ordinary gauge of the kind can show, which is the most an exact-looking figure deserves.
    private static int UsualDecimals(QuantityKind kind, UnitSystem system) => (kind, system) switch
    {
        (QuantityKind.Length or QuantityKind.Area or QuantityKind.Volume, UnitSystem.Inch) => kind == QuantityKind.Length ? 4 : 3,
        (QuantityKind.Length, _) => 3,
        (QuantityKind.Volume or QuantityKind.Ratio, _) => 2,
        (QuantityKind.Pressure or QuantityKind.Area, _) => 0,
        _ => 1,
    };

    private static string Fixed(double value, int decimals)
    {
        if (!double.IsFinite(value))
        {
            return "–";
        }

        double step = Math.Pow(10.0, Math.Max(0, -decimals));
        string text = (Math.Round(value / step) * step).ToString("F0", CultureInfo.InvariantCulture);
        if (decimals >= 0)
        {
            text = value.ToString("F" + decimals, CultureInfo.InvariantCulture);
        }

        return text.StartsWith('-') && !text.Any(c => c is >= '1' and <= '9') ? text[1..] : text;
    }

    private static double Working(double coherent, QuantityKind kind) =>
        kind == QuantityKind.Angle ? double.RadiansToDegrees(coherent) : coherent;

    private static WrittenUnit? Written(QuantityKind kind, UnitSystem system) => UnitTable.Find(Unit(kind, system));
}
