namespace RebuildPlanner.Core.Quantities;

/// <summary>The units of a written quantity after those left out are filled in; null where a bare number is right.</summary>
internal readonly record struct SettledUnits(QuantityKind Kind, WrittenUnit? Value, WrittenUnit? First, WrittenUnit? Second)
{
    public decimal ToWorking(decimal written) => Value?.ToWorking(written) ?? written;

    // The only kind whose coherent unit is not decimal to its written one: it is converted once, last.
    public double Coherent(decimal working) => Kind == QuantityKind.Angle
        ? double.DegreesToRadians((double)working)
        : (double)working + 0.0;
}

/// <summary>Which unit each number of a quantity has, and whether the place allows it.</summary>
/// <remarks>A number without a unit takes the next one written to its right; only a limit of zero may go without.</remarks>
internal static class UnitRule
{
    public static string? Settle(WrittenQuantity written, QuantityRule rule, out SettledUnits units)
    {
        units = default;
        string?[] words = [written.Value.Unit, written.First.Unit, written.Second.Unit];
        if (words.All(word => word is null))
        {
            units = new(QuantityKind.Ratio, null, null, null);
            return rule.Kinds.Contains(QuantityKind.Ratio) ? null : Missing(written.Value.Number, rule);
        }

        WrittenUnit?[] found = new WrittenUnit?[words.Length];
        for (int i = 0; i < words.Length; i++)
        {
            if (words[i] is { } word && Find(word, written, rule, out found[i]) is { } problem)
            {
                return problem;
            }
        }

        WrittenUnit? second = found[2], first = found[1] ?? second, value = found[0] ?? first;
        units = new(value!.Kind, value, first ?? value, second ?? value);
        WrittenNumber? bare = first is null && written.Form != LimitForm.None && written.First.Number.Value != 0m ? written.First.Number
            : second is null && written.Form == LimitForm.UpperLower && written.Second.Number.Value != 0m ? written.Second.Number
            : null;
        return bare is { } number ? $"The limit needs its unit too: write {number.Text} {value.Word}." : OneKind(units);
    }

    /// <summary>The kinds wanted with their usual units, opening a sentence: "a volume is wanted here: cc, mL or cu in".</summary>
    public static string Wanted(QuantityRule rule) => rule.Kinds is [{ } only]
        ? only == QuantityKind.Ratio ? "a bare number is wanted here, without a unit" : $"{Name(only)} is wanted here: {Units(only)}"
        : $"{string.Join(" or ", rule.Kinds.Select(kind => $"{Name(kind)} ({Units(kind)})"))} is wanted here";

    public static string Listed(IReadOnlyList<string> words) =>
        words.Count < 2 ? string.Concat(words) : string.Join(", ", words.SkipLast(1)) + " or " + words[^1];

    private static string? Find(string word, WrittenQuantity written, QuantityRule rule, out WrittenUnit? unit)
    {
        unit = UnitTable.Find(word);
        if (unit is not null)
        {
            return rule.Kinds.Contains(unit.Kind) ? null : Sentence($"{Wanted(rule)}; {word} is the unit of {Name(unit.Kind)}.");
        }

        if (SignWordTable.IsWord(word))
        {
            return rule.Kinds.Contains(QuantityKind.Ratio)
                ? $"No closing word belongs here: leave {word} out."
                : Missing(written.Value.Number, rule);
        }

        return UnitTable.Nearest(word, rule.Kinds) is { } nearest && UnitTable.Find(nearest) is { } near && rule.Kinds.Contains(near.Kind)
            ? $"'{word}' is not a unit known here: write {nearest}."
            : Sentence($"'{word}' is not a unit known here; {Wanted(rule)}.");
    }

    private static string Missing(WrittenNumber number, QuantityRule rule)
    {
        string[] ways = [.. rule.Kinds.SelectMany(kind => UnitTable.Usual(kind).Take(2)).Select(unit => $"{number.Text} {unit.Word}")];
        return $"The unit is missing: write {Listed(ways)}.";
    }

    private static string Units(QuantityKind kind) => Listed([.. UnitTable.Usual(kind).Select(unit => unit.Word)]);

    private static string? OneKind(SettledUnits units) =>
        units.First!.Kind == units.Kind && units.Second!.Kind == units.Kind
            ? null
            : $"A figure and its limits are of one kind: {Name(units.Kind)} cannot have {Name(OtherKind(units))} as its limit.";

    private static QuantityKind OtherKind(SettledUnits units) => units.First!.Kind != units.Kind ? units.First.Kind : units.Second!.Kind;

    private static string Name(QuantityKind kind) => kind switch
    {
        QuantityKind.Length => "a length",
        QuantityKind.Area => "an area",
        QuantityKind.Volume => "a volume",
        QuantityKind.Angle => "an angle",
        QuantityKind.Pressure => "a pressure",
        QuantityKind.Temperature => "a temperature",
        QuantityKind.SpecificEnergy => "a specific energy",
        _ => "a bare number",
    };

    private static string Sentence(string text) => char.ToUpperInvariant(text[0]) + text[1..];
}
