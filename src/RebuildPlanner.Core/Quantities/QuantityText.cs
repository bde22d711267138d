namespace RebuildPlanner.Core.Quantities;

/// <summary>The one strict grammar for what a workshop writes.</summary>
public static class QuantityText
{
    /// <summary>Reads a written quantity under the rule of its place.</summary>
    /// <param name="text">What was typed.</param>
    /// <param name="rule">What may stand here.</param>
    /// <param name="problem">Where it cannot be read: what is wrong and what would be right; else null.</param>
    /// <returns>The quantity, or null.</returns>
    public static Quantity? Read(string text, QuantityRule rule, out string? problem)
    {
        problem = DecimalComma.Problem(text);
        if (problem is not null || QuantityParser.Parse(text, out problem) is not { } written)
        {
            return null;
        }

        problem = UnitRule.Settle(written, rule, out SettledUnits units) ?? SignRule.Problem(written, units.Kind, rule);
        if (problem is not null)
        {
            return null;
        }

        Figure unsigned = Evaluate(written, units);
        if (unsigned.Low > unsigned.High)
        {
            problem = "The lower end of a range comes first, as in 1.02..1.08 mm.";
            return null;
        }

        problem = SignRule.Apply(written, rule.Signs, unsigned, out Figure figure) ?? SaneRange.Problem(written, units, rule, figure);
        return problem is null ? Finish(text, units, figure, written.Form != LimitForm.None) : null;
    }

    private static Figure Evaluate(WrittenQuantity written, SettledUnits units)
    {
        decimal value = units.ToWorking(written.Value.Number.Value);
        decimal first = written.First.Number.Value, second = written.Second.Number.Value;
        decimal step = units.Value?.DifferenceToWorking(written.Value.Number.Step) ?? written.Value.Number.Step;
        switch (written.Form)
        {
            case LimitForm.Symmetric:
                decimal half = Difference(units.First, first);
                return new(value, value - half, value + half, step);
            case LimitForm.UpperLower:
                return new(value, value - Difference(units.Second, second), value + Difference(units.First, first), step);
            case LimitForm.Range:
                decimal high = units.First?.ToWorking(first) ?? first;
                return new((value + high) / 2m, value, high, Math.Min(step, Difference(units.First, written.First.Number.Step)));
            default:
                return new(value, value, value, step);
        }
    }

    private static decimal Difference(WrittenUnit? unit, decimal written) => unit?.DifferenceToWorking(written) ?? written;

    private static Quantity Finish(string text, SettledUnits units, Figure figure, bool hasLimits) => new(
        text, units.Kind, units.Coherent(figure.Value),
        hasLimits ? (units.Coherent(figure.Low), units.Coherent(figure.High)) : null, units.Coherent(figure.Step));
}
