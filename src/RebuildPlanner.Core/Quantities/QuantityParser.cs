namespace RebuildPlanner.Core.Quantities;

/// <summary>Takes a written quantity apart into numbers, units, limits and closing word, without asking what they mean.</summary>
internal static class QuantityParser
{
    private const string BothLimits = "Both limits are written, the upper one first, as in 1.05 mm +0.05/-0.02 mm.";

    private const string StrayMinus =
        "A minus sign cannot follow a figure: a range is written 1.02..1.08 mm, limits 1.05 mm +0.05/-0.02 mm, a fraction 4 1/32 in.";

    public static WrittenQuantity? Parse(string text, out string? problem)
    {
        QuantityScanner scanner = new(text);
        scanner.SkipBlanks();
        if (scanner.AtEnd)
        {
            problem = "Nothing is written here.";
            return null;
        }

        if (TakePart(scanner, out problem) is not { } value)
        {
            return null;
        }

        LimitForm form = LimitForm.None;
        WrittenPart first = default, second = default;
        if (TakeForm(scanner) is { } written)
        {
            form = written;
            if (!TakeLimits(scanner, form, out first, out second, out problem))
            {
                return null;
            }
        }
        else if (scanner.AtMinus)
        {
            problem = StrayMinus;
            return null;
        }

        string? word = scanner.TakeWord();
        scanner.SkipBlanks();
        problem = scanner.AtEnd ? null : Leftover(scanner.Rest, word, form);
        return problem is null ? new(value, form, first, second, word) : null;
    }

    private static LimitForm? TakeForm(QuantityScanner scanner)
    {
        scanner.SkipBlanks();
        return scanner.Take("±") || scanner.Take("+/-") || scanner.Take("+/−") ? LimitForm.Symmetric
            : scanner.Take("..") ? LimitForm.Range
            : scanner.Take("+") ? LimitForm.UpperLower
            : null;
    }

    private static bool TakeLimits(
        QuantityScanner scanner, LimitForm form, out WrittenPart first, out WrittenPart second, out string? problem)
    {
        first = second = default;
        scanner.SkipBlanks();
        if (form != LimitForm.Range && scanner.AtMinus)
        {
            problem = form == LimitForm.Symmetric ? "A limit after ± has no sign of its own." : BothLimits;
            return false;
        }

        if (TakePart(scanner, out problem) is not { } taken)
        {
            return false;
        }

        first = taken;
        if (form != LimitForm.UpperLower)
        {
            return true;
        }

        scanner.SkipBlanks();
        bool slash = scanner.Take("/");
        scanner.SkipBlanks();
        if (!slash || !scanner.TakeMinus() || scanner.AtMinus)
        {
            problem = BothLimits;
            return false;
        }

        scanner.SkipBlanks();
        if (TakePart(scanner, out problem) is not { } lower)
        {
            return false;
        }

        second = lower;
        return true;
    }

    private static WrittenPart? TakePart(QuantityScanner scanner, out string? problem)
    {
        if (scanner.TakeNumber(out problem) is not { } number)
        {
            return null;
        }

        string? unit = scanner.TakeWord();
        scanner.SkipBlanks();
        return new(number, unit);
    }

    private static string Leftover(string rest, string? word, LimitForm form) =>
        word is not null && SignWordTable.IsWord(word) && form == LimitForm.None
            ? $"The word comes last: write {rest} before {word}."
            : word is "to" ? "A range is written with two points, as in 1.02..1.08 mm."
            : rest.StartsWith(':') ? "A ratio is written as one number: 10.5, not 10.5:1."
            : $"'{rest}' is not understood at the end of a quantity: leave it out.";
}
