using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Quantities;

/// <summary>What is refused, and that the refusal tells what would be right; fragments are set apart by a bar.</summary>
public class RefusalTests
{
    [Theory]
    [InlineData("84,512 mm", "write 84.512 mm")]
    [InlineData("1,05 mm ± 0,03 mm", "write 1.05 mm ± 0.03 mm")]
    [InlineData("1,02..1,08 mm", "write 1.02..1.08 mm")]
    [InlineData(",020 in", "write .020 in")]
    public void Refuses_a_decimal_comma_and_says_what_to_write(string text, string fragments) =>
        Refuses(text, Rules.Length, "point, not a comma|" + fragments);

    [Theory]
    [InlineData("1,234.5 mm", "write 1234.5 mm")]
    [InlineData("1.234,5 mm", "write 1234.5 mm")]
    [InlineData("1,234,567 mm", "write 1234567 mm")]
    public void Refuses_thousands_set_apart(string text, string fragments) => Refuses(text, Rules.Length, "Thousands|" + fragments);

    [Theory]
    [InlineData("", "Nothing")]
    [InlineData("   ", "Nothing")]
    [InlineData("mm", "number is wanted")]
    [InlineData("NaN mm", "number is wanted")]
    [InlineData("Infinity mm", "number is wanted")]
    [InlineData("+1 mm", "plus sign")]
    [InlineData("84. mm", "digit|after the decimal point")]
    [InlineData("1.2.3 mm", ".3 mm|not understood")]
    [InlineData("1e3 mm", "Powers of ten")]
    [InlineData("1E-3 mm", "Powers of ten")]
    [InlineData("1 234 mm", "no blanks")]
    [InlineData("4.5 1/2 in", "no blanks")]
    [InlineData("1/0 in", "cannot be zero")]
    [InlineData("4 5/4 in", "5/4|less than one")]
    [InlineData("1234567890123456 mm", "fifteen")]
    [InlineData("79228162514264337593543950335 1/2 in", "longer than a rule")]
    [InlineData("0.00000000000000000000000000000000001234567890123456 mm", "fifteen")]
    [InlineData("１２ mm", "number is wanted")]
    public void Refuses_what_is_not_a_plain_number(string text, string fragments) => Refuses(text, Rules.Length, fragments);

    [Theory]
    [InlineData("1.05 mm ± -0.03 mm", "no sign")]
    [InlineData("1.05 mm ± 0.03", "limit needs its unit|write 0.03 mm")]
    [InlineData("1.05 mm +0.05/-0", "limit needs its unit|write 0.05 mm")]
    [InlineData("1.05 mm +0/-0.02", "limit needs its unit|write 0.02 mm")]
    [InlineData("1.02 mm..1.08", "limit needs its unit")]
    [InlineData("1.05 mm +0.05 mm", "Both limits|+0.05/-0.02 mm")]
    [InlineData("1.05 mm -0.02/+0.05 mm", "minus sign|1.05 mm +0.05/-0.02 mm")]
    [InlineData("84-85 mm", "minus sign|1.02..1.08 mm")]
    [InlineData("4-1/32 in", "minus sign|4 1/32 in")]
    [InlineData("84 mm to 85 mm", "two points|1.02..1.08 mm")]
    [InlineData("1.05 mm +0.05/0.02 mm", "Both limits")]
    [InlineData("1.05 mm +0.05/--0.02 mm", "Both limits")]
    [InlineData("1.05 mm ±", "number is wanted")]
    [InlineData("1.08..1.02 mm", "lower end|first")]
    [InlineData("1.05 mm ± 0.03 cc", "of one kind|a length|a volume")]
    public void Refuses_limits_that_are_not_whole(string text, string fragments) =>
        Refuses(text, new([QuantityKind.Length, QuantityKind.Volume], SignWords.None, 0, 1e6), fragments);

    [Theory]
    [InlineData("42.3", "Volume", "unit is missing|42.3 cc|42.3 mL")]
    [InlineData("84.512", "Length", "unit is missing|84.512 mm|84.512 in")]
    [InlineData("42.3 mm", "Volume", "volume is wanted here: cc, mL or cu in|mm is the unit of a length")]
    [InlineData("42.3 cc", "Length", "length is wanted here: mm, in or thou|cc is the unit of a volume")]
    [InlineData("5 deg", "Opening", "A length (mm, in or thou) or an area (mm2, cm2 or in2) is wanted here|deg is the unit of an angle")]
    [InlineData("10.5 mm", "Ratio", "bare number is wanted here|a length")]
    [InlineData("10.5:1", "Ratio", "10.5, not 10.5:1")]
    [InlineData("84.5 mn", "Length", "'mn'|write mm")]
    [InlineData("84.5 MM", "Length", "'MM'|write mm")]
    [InlineData("3.3 inches", "Length", "'inches'|write in")]
    [InlineData("2 microns", "Length", "'microns'|write µm")]
    [InlineData("42 cm^3", "Volume", "'cm^3'|write cm3")]
    [InlineData("42 furlongs", "Length", "'furlongs'|length is wanted here: mm, in or thou")]
    [InlineData("20 degC", "Temperature", "'degC'|write C")]
    [InlineData("0 flush", "Deck", "unit is missing|0 mm")]
    public void Refuses_a_missing_wrong_or_unknown_unit(string text, string rule, string fragments) =>
        Refuses(text, Rules.Named(rule), fragments);

    [Theory]
    [InlineData("4.2 cc", "Crown", "must end with dish, dome or flat|4.2 cc dish")]
    [InlineData("0.20 mm", "Deck", "must end with below, proud or flush|0.20 mm below")]
    [InlineData("0 mm ± 0.02 mm", "Deck", "must end with|0 mm flush")]
    [InlineData("46 deg", "InletCloses", "ABDC or BBDC|46 deg ABDC")]
    [InlineData("86 deg", "ExhaustCloses", "BTDC or ATDC|86 deg BTDC")]
    [InlineData("46 deg BTDC", "InletCloses", "BTDC does not belong|ABDC or BBDC")]
    [InlineData("4.2 cc below", "Crown", "below does not belong|dish, dome or flat")]
    [InlineData("0.2 mm dish", "Deck", "dish does not belong|below, proud or flush")]
    [InlineData("0.2 mm belw", "Deck", "'belw'|write below")]
    [InlineData("4.2 cc Dish", "Crown", "'Dish'|write dish")]
    [InlineData("-3.4 cc dome", "Crown", "dome says which way|minus sign")]
    [InlineData("-0.20 mm", "Deck", "not a minus sign|0.20 mm proud")]
    [InlineData("-0.05 mm", "Protrusion", "not a minus sign|0.05 mm below")]
    [InlineData("0.2 cc flat", "Crown", "flat is written with zero only|dish or dome")]
    [InlineData("0.1..0.3 mm flush", "Deck", "flush is written with zero only|below or proud")]
    [InlineData("84.5 mm below", "Bore", "No closing word|below")]
    [InlineData("84.5 mm about", "Bore", "'about'|leave it out")]
    [InlineData("84.5 mm below the deck", "Bore", "the deck")]
    [InlineData("4.2 cc dish ± 0.1 cc", "Crown", "comes last|± 0.1 cc")]
    [InlineData("84.5 mm; rough", "Bore", "; rough")]
    [InlineData("10.5 dish", "Ratio", "dish")]
    public void Refuses_a_wrong_or_missing_closing_word(string text, string rule, string fragments) =>
        Refuses(text, Rules.Named(rule), fragments);

    [Theory]
    [InlineData("3.327 mm", "Bore", "3.327 mm is outside 20 mm to 500 mm|slip|3.327 in would fit")]
    [InlineData("84.512 in", "Bore", "84.512 in is outside 0.7874 in to 19.69 in|slip|84.512 mm would fit")]
    [InlineData("3327 mm", "Bore", "3327 mm is outside|3327 thou would fit")]
    [InlineData("8451200 mm", "Bore", "is outside 20 mm to 500 mm and looks like a slip.")]
    [InlineData("20 mm proud", "Deck", "20 mm proud is outside 15 mm proud to 50 mm below|slip")]
    [InlineData("40 mm proud", "Deck", "40 thou proud would fit")]
    [InlineData("84 mm ± 80 mm", "Bore", "limits 4 mm to 164 mm|20 mm to 500 mm")]
    [InlineData("450 mm ± 60 mm", "Bore", "limits 390 mm to 510 mm")]
    [InlineData("2..3 mm", "Bore", "limits 2 mm to 3 mm")]
    [InlineData("1500", "Ratio", "1500 is outside 0 to 1000")]
    [InlineData("-84 mm", "Bore", "below zero|minus sign")]
    [InlineData("10000 F", "Temperature", "-459.7 F to 1832 F")]
    [InlineData("300 deg ABDC", "InletCloses", "114.6 deg BBDC to 171.9 deg ABDC")]
    public void Refuses_what_no_engine_has_and_names_the_likely_slip(string text, string rule, string fragments) =>
        Refuses(text, Rules.Named(rule), fragments);

    private static void Refuses(string text, QuantityRule rule, string fragments)
    {
        Assert.Null(QuantityText.Read(text, rule, out string? problem));
        Assert.NotNull(problem);
        Assert.All(fragments.Split('|'), fragment => Assert.Contains(fragment, problem, StringComparison.Ordinal));
        Assert.EndsWith(".", problem, StringComparison.Ordinal);
    }
}
