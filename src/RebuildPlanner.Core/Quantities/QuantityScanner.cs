using System.Globalization;

namespace RebuildPlanner.Core.Quantities;

/// <summary>Walks a written quantity from left to right: numbers, words and marks.</summary>
internal sealed class QuantityScanner(string text)
{
    // What no gauge shows; it also keeps every number exact in a decimal and every conversion within it.
    private const int MostDigits = 15;

    private int _at;

    public string Rest => text[_at..];

    public bool AtEnd => _at == text.Length;

    public bool AtMinus => !AtEnd && text[_at] is '-' or '−';

    private char Next => At(_at);

    public void SkipBlanks()
    {
        while (!AtEnd && char.IsWhiteSpace(text[_at]))
        {
            _at++;
        }
    }

    public bool Take(string mark)
    {
        if (!text.AsSpan(_at).StartsWith(mark, StringComparison.Ordinal))
        {
            return false;
        }

        _at += mark.Length;
        return true;
    }

    public bool TakeMinus() => Take("-") || Take("−");

    /// <summary>The next unit or word, or null; "cu in" is one.</summary>
    public string? TakeWord()
    {
        SkipBlanks();
        int start = _at;
        if (!AtEnd && !char.IsAsciiDigit(Next))
        {
            while (!AtEnd && BelongsToWord())
            {
                _at++;
            }
        }

        if (_at == start)
        {
            return null;
        }

        string word = text[start.._at];
        int afterWord = _at;
        if (word == "cu")
        {
            if (TakeWord() == "in")
            {
                return "cu in";
            }

            _at = afterWord;
        }

        return word;
    }

    /// <summary>The next number, or null and why.</summary>
    public WrittenNumber? TakeNumber(out string? problem)
    {
        int start = _at;
        bool negative = TakeMinus();
        string whole = TakeDigits();
        string? decimals = Next == '.' && At(_at + 1) != '.' ? TakeDecimals() : null;
        problem = decimals is { Length: 0 } ? "A digit is wanted after the decimal point."
            : whole.Length == 0 && decimals is null ? NoNumber()
            : null;
        if (problem is not null)
        {
            return null;
        }

        (decimal value, decimal step) = decimals is null && TakeFraction(whole, out problem) is { } fraction
            ? fraction
            : (Exact(whole + "." + decimals), Exact("1") / PowerOfTen(decimals?.Length ?? 0));
        problem ??= DigitsIn(whole + decimals) > MostDigits ? "That is more digits than any gauge shows: fifteen at most." : Follower();
        return problem is null ? new(text[start.._at], negative ? -value : value, step) : null;
    }

    private bool BelongsToWord() => char.IsLetterOrDigit(Next) || Next is '°' or '²' or '³' or '^' or '"' or '″'
        || (Next == '/' && char.IsLetter(At(_at + 1)));

    private string NoNumber() => Next == '+'
        ? "A figure is written without a plus sign."
        : "A number is wanted first, as in 84.512 mm, .020 in or 4 1/32 in.";

    // Looked for here because what follows would otherwise be blamed on the unit.
    private string? Follower()
    {
        if (Next is 'e' or 'E' && (char.IsAsciiDigit(At(_at + 1)) || (At(_at + 1) is '+' or '-' && char.IsAsciiDigit(At(_at + 2)))))
        {
            return "Powers of ten are not read: write the number out.";
        }

        int afterNumber = _at;
        SkipBlanks();
        bool digit = char.IsAsciiDigit(Next);
        _at = afterNumber;
        return digit ? "A number has no blanks inside, save before a fraction as in 4 1/32 in." : null;
    }

    private (decimal Value, decimal Step)? TakeFraction(string whole, out string? problem)
    {
        problem = null;
        int afterWhole = _at;
        string numerator = whole;
        bool mixed = false;
        if (Next != '/')
        {
            SkipBlanks();
            mixed = _at > afterWhole;
            numerator = TakeDigits();
        }

        if (numerator.Length == 0 || Next != '/' || !char.IsAsciiDigit(At(_at + 1)))
        {
            _at = afterWhole;
            return null;
        }

        _at++;
        string denominator = TakeDigits();
        if (DigitsIn(whole) + DigitsIn(numerator) + DigitsIn(denominator) > MostDigits || Exact(denominator) == 0m)
        {
            problem = "The lower number of a fraction cannot be zero, and neither may be longer than a rule shows.";
            return (0m, 1m);
        }

        if (mixed && Exact(numerator) >= Exact(denominator))
        {
            problem = $"{numerator}/{denominator} is a whole inch or more: after a whole number a fraction is less than one.";
        }

        return ((mixed ? Exact(whole) : 0m) + (Exact(numerator) / Exact(denominator)), 1m / Exact(denominator));
    }

    private string TakeDecimals()
    {
        _at++;
        return TakeDigits();
    }

    private string TakeDigits()
    {
        int start = _at;
        while (char.IsAsciiDigit(Next))
        {
            _at++;
        }

        return text[start.._at];
    }

    private char At(int index) => index < text.Length ? text[index] : '\0';

    private static int DigitsIn(string digits) => digits.TrimStart('0').Length;

    // Too long a number is refused a moment later; here it only must not overflow.
    private static decimal Exact(string digits) =>
        decimal.TryParse(digits, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out decimal value) ? value : 0m;

    private static decimal PowerOfTen(int exponent)
    {
        decimal power = 1m;
        for (int i = 0; i < Math.Min(exponent, 28); i++)
        {
            power *= 10m;
        }

        return power;
    }
}
