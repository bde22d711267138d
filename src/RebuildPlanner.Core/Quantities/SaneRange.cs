using System.Globalization;

namespace RebuildPlanner.Core.Quantities;

/// <summary>Refuses a figure that no engine has, and says which slip would explain it.</summary>
internal static class SaneRange
{
    public static string? Problem(WrittenQuantity written, SettledUnits units, QuantityRule rule, Figure figure)
    {
        (double low, double high) = Range(rule, units.Kind);
        bool valueFits = Fits(units.Coherent(figure.Value), low, high);

        // The doubt of a small figure may reach across zero where zero is the least sane value; anything else out of range is a slip.
        bool lowFits = low == 0.0 || Fits(units.Coherent(figure.Low), low, high);
        bool limitsFit = lowFits && Fits(units.Coherent(figure.High), low, high);
        if (valueFits && limitsFit)
        {
            return null;
        }

        string unit = units.Value is null ? "" : " " + units.Value.Word;
        string bounds = $"{Bound(low, units, rule.Signs)} to {Bound(high, units, rule.Signs)}";
        if (valueFits || written.Form == LimitForm.Range)
        {
            string reach = $"{Bound(units.Coherent(figure.Low), units, rule.Signs)} to {Bound(units.Coherent(figure.High), units, rule.Signs)}";
            return $"The limits {reach} reach outside {bounds}, which looks like a slip.";
        }

        string word = written.Word is null ? "" : " " + written.Word;
        string slip = Explanation(written, units, rule) is { } meant ? $": {written.Value.Number.Text} {meant}{word} would fit" : "";
        return $"{written.Value.Number.Text}{unit}{word} is outside {bounds} and looks like a slip{slip}.";
    }

    private static (double Low, double High) Range(QuantityRule rule, QuantityKind kind) =>
        kind == QuantityKind.Area && rule.Kinds.Count > 1 ? (rule.AreaLow, rule.AreaHigh) : (rule.SaneLow, rule.SaneHigh);

    // The bounds are themselves converted figures: what is written as exactly the bound must not fail on its last bit.
    private static bool Fits(double value, double low, double high)
    {
        double hair = 1e-12 * Math.Max(Math.Abs(low), Math.Abs(high));
        return value >= low - hair && value <= high + hair;
    }

    private static string? Explanation(WrittenQuantity written, SettledUnits units, QuantityRule rule)
    {
        (double low, double high) = Range(rule, units.Kind);
        decimal sign = written.Word is { } word && SignWordTable.Words(rule.Signs)[1] == word ? -1m : 1m;
        return UnitTable.Usual(units.Kind)
            .Where(other => units.Value is { } typed && other.Factor != typed.Factor)
            .FirstOrDefault(other => Fits(units.Coherent(sign * other.ToWorking(written.Value.Number.Value)), low, high))?.Word;
    }

    private static string Bound(double coherent, SettledUnits units, SignWords signs)
    {
        double shown = InUnit(coherent, units);
        string unit = units.Value is null ? "" : " " + units.Value.Word;
        return signs == SignWords.None ? Short(shown) + unit : $"{Short(Math.Abs(shown))}{unit} {SignWordTable.Word(signs, shown)}";
    }

    private static double InUnit(double coherent, SettledUnits units)
    {
        double working = units.Kind == QuantityKind.Angle ? double.RadiansToDegrees(coherent) : coherent;
        return units.Value?.FromWorking(working) ?? working;
    }

    // Four digits say where the bound is; the sixth decimal of an inch does not.
    private static string Short(double value)
    {
        int decimals = value == 0.0 ? 0 : Math.Clamp(3 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 9);
        return Math.Round(value, decimals).ToString("0.#########", CultureInfo.InvariantCulture);
    }
}
