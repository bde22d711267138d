using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Quantities;

/// <summary>Rules wide enough to stay out of the way of what a test is about.</summary>
internal static class Rules
{
    public static readonly QuantityRule Length = Of(QuantityKind.Length, 0, 1e7);
    public static readonly QuantityRule SignedLength = Of(QuantityKind.Length, -1e7, 1e7);
    public static readonly QuantityRule Area = Of(QuantityKind.Area, 0, 1e9);
    public static readonly QuantityRule Volume = Of(QuantityKind.Volume, 0, 1e10);
    public static readonly QuantityRule Angle = Of(QuantityKind.Angle, -10, 10);
    public static readonly QuantityRule Pressure = Of(QuantityKind.Pressure, 0, 1e6);
    public static readonly QuantityRule Temperature = Of(QuantityKind.Temperature, -273.15, 1000);
    public static readonly QuantityRule Energy = Of(QuantityKind.SpecificEnergy, 0, 1e6);
    public static readonly QuantityRule Ratio = Of(QuantityKind.Ratio, 0, 1000);
    public static readonly QuantityRule Bore = Of(QuantityKind.Length, 20, 500);
    public static readonly QuantityRule Opening = new([QuantityKind.Length, QuantityKind.Area], SignWords.None, 20, 600, 300, 300_000);
    public static readonly QuantityRule Crown = Of(QuantityKind.Volume, -2e6, 5e6, SignWords.Crown);
    public static readonly QuantityRule Deck = Of(QuantityKind.Length, -15, 50, SignWords.Deck);
    public static readonly QuantityRule Protrusion = Of(QuantityKind.Length, -20, 10, SignWords.Protrusion);
    public static readonly QuantityRule InletCloses = Of(QuantityKind.Angle, -2, 3, SignWords.AfterBottom);
    public static readonly QuantityRule ExhaustCloses = Of(QuantityKind.Angle, -2, 3, SignWords.BeforeTop);

    /// <summary>The rule with the given name, so that a table of cases can name one.</summary>
    public static QuantityRule Named(string name) => (QuantityRule)typeof(Rules).GetField(name)!.GetValue(null)!;

    public static Quantity Read(string text, QuantityRule rule)
    {
        Quantity? quantity = QuantityText.Read(text, rule, out string? problem);
        Assert.True(quantity is not null, $"{text}: {problem}");
        Assert.Null(problem);
        return quantity;
    }

    private static QuantityRule Of(QuantityKind kind, double low, double high, SignWords signs = SignWords.None) =>
        new([kind], signs, low, high);
}
