namespace RebuildPlanner.Core.Quantities;

/// <summary>Minus signs and closing words: which way a figure points.</summary>
internal static class SignRule
{
    /// <summary>What is wrong with the closing word or a minus sign, before any arithmetic.</summary>
    public static string? Problem(WrittenQuantity written, QuantityKind kind, QuantityRule rule)
    {
        IReadOnlyList<string> words = SignWordTable.Words(rule.Signs);
        bool negative = IsNegative(written.Value.Number) || (written.Form == LimitForm.Range && IsNegative(written.First.Number));
        if (written.Word is { } word && !words.Contains(word))
        {
            return Misplaced(word, words);
        }

        if (written.Word is null && words.Count > 0 && (negative || rule.Signs != SignWords.Protrusion))
        {
            string unit = written.Value.Unit ?? UnitTable.Usual(kind).Select(usual => usual.Word).FirstOrDefault("");
            string example = $"{written.Value.Number.Text.TrimStart('-', '−')} {unit}";
            string likely = SignWordTable.Word(rule.Signs, (double)written.Value.Number.Value);
            return negative
                ? $"A word says which way, not a minus sign: {UnitRule.Listed(words)}, as in {example} {words[1]}."
                : $"It must end with {UnitRule.Listed(words)}, as in {example} {likely}.";
        }

        return !negative ? null
            : words.Count > 0 ? $"The word {written.Word} says which way: leave the minus sign out."
            : rule.SaneLow < 0.0 ? null
            : "A figure below zero makes no sense here: leave the minus sign out.";
    }

    /// <summary>Turns the figure to the side its word says.</summary>
    public static string? Apply(WrittenQuantity written, SignWords family, Figure unsigned, out Figure figure)
    {
        figure = unsigned;
        IReadOnlyList<string> words = SignWordTable.Words(family);
        if (written.Word is not { } word)
        {
            return null;
        }

        if (word == words[1])
        {
            figure = unsigned with { Value = -unsigned.Value, Low = -unsigned.High, High = -unsigned.Low };
        }

        return words.Count == 3 && word == words[2] && unsigned.Value != 0m
            ? $"{word} is written with zero only: end with {words[0]} or {words[1]}."
            : null;
    }

    // The sign as typed: minus zero is a slip too.
    private static bool IsNegative(WrittenNumber number) => number.Text[0] is '-' or '−';

    private static string Misplaced(string word, IReadOnlyList<string> words)
    {
        if (words.Count == 0)
        {
            return SignWordTable.IsWord(word)
                ? $"No closing word belongs here: leave {word} out."
                : $"'{word}' is not understood at the end of a quantity: leave it out.";
        }

        return SignWordTable.Nearest(word) is { } nearest && words.Contains(nearest)
            ? $"'{word}' is not understood: write {nearest}."
            : $"{word} does not belong here: end with {UnitRule.Listed(words)}.";
    }
}
