using System.Reflection;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Jobs;

public class EngineRulesTests
{
    [Theory]
    [InlineData("Stroke", "88.0 mm ± 0.05 mm")]
    [InlineData("RodLength", "140 mm")]
    [InlineData("PinOffset", "-0.8 mm")]
    [InlineData("OriginalBore", "84.0 mm")]
    [InlineData("ClaimedDisplacement", "1951 cc")]
    [InlineData("ClaimedDisplacement", "350 cu in")]
    [InlineData("ClaimedDisplacement", "5.7 L")]
    [InlineData("VeeAngle", "90 deg")]
    [InlineData("IntakeFaceAngle", "-10 deg")]
    [InlineData("SprocketPitchDiameter", "60 mm")]
    [InlineData("RunAngle", "4 deg")]
    [InlineData("InletCloses", "52 deg ABDC")]
    [InlineData("ExhaustCloses", "86 deg BTDC")]
    [InlineData("ExhaustCloses", "12 deg ATDC")]
    [InlineData("TimingLift", "0.050 in")]
    [InlineData("RockerRatio", "1.5")]
    [InlineData("PushrodTilt", "5 deg")]
    [InlineData("Boost", "0.8 bar")]
    [InlineData("Altitude", "150 m")]
    [InlineData("Altitude", "-400 m")]
    [InlineData("Altitude", "5280 ft")]
    [InlineData("GaugeStep", "0.001 mm")]
    [InlineData("GaugeStep", "0.2 cc")]
    [InlineData("GaugeStep", "0.5 deg")]
    [InlineData("GaugeStep", "5 psi")]
    [InlineData("Temperature", "21 C ± 1 C")]
    [InlineData("Temperature", "68 F")]
    [InlineData("Drop", "10.00 mm ± 0.02 mm")]
    [InlineData("BuretteScale", "0.0 cc")]
    [InlineData("WantedClearance", "0.045 mm")]
    [InlineData("OversizeBore", "84.50 mm")]
    [InlineData("GasketProtrusion", "0.50..0.60 mm")]
    public void Takes_what_a_job_file_says(string field, string text) => Reads(text, RuleOf(typeof(EngineRules), field));

    [Theory]
    [InlineData("Stroke", "88.0 cc")]
    [InlineData("InletCloses", "52 deg")]
    [InlineData("Altitude", "9000 m")]
    [InlineData("Boost", "-5 kPa")]
    [InlineData("RockerRatio", "15")]
    [InlineData("BuretteScale", "-1 cc")]
    [InlineData("Temperature", "300 C")]
    public void Refuses_what_cannot_be(string field, string text)
    {
        Assert.Null(QuantityText.Read(text, RuleOf(typeof(EngineRules), field), out string? problem));
        Assert.NotNull(problem);
    }

    [Theory]
    [InlineData("Tolerance", "0.02 mm")]
    [InlineData("Step", "0.01 mm")]
    [InlineData("Max", "0.60 mm")]
    [InlineData("CleanUp", "0.06 mm")]
    [InlineData("HoneStock", "4 thou")]
    [InlineData("Offset", "0 mm")]
    public void Takes_what_a_shop_says_of_its_machines(string field, string text) => Reads(text, RuleOf(typeof(CutRules), field));

    [Theory]
    [InlineData(CutKind.HeadSkim, "0.20 mm ± 0.02 mm")]
    [InlineData(CutKind.DeckCut, "10 thou")]
    [InlineData(CutKind.LineBore, "0.05 mm")]
    [InlineData(CutKind.Bore, "84.50 mm")]
    [InlineData(CutKind.Hone, "3.327 in")]
    [InlineData(CutKind.Sleeve, "84.00 mm")]
    [InlineData(CutKind.ValveSeat, "0.3 mm")]
    public void A_cut_is_metal_off_or_a_finished_size(CutKind kind, string text) => Reads(text, CutRules.Value(kind));

    [Fact]
    public void A_skim_as_large_as_a_bore_and_a_bore_as_small_as_a_skim_are_slips()
    {
        Assert.Null(QuantityText.Read("84.50 mm", CutRules.Value(CutKind.HeadSkim), out _));
        Assert.Null(QuantityText.Read("0.50 mm", CutRules.Value(CutKind.Bore), out _));
    }

    private static QuantityRule RuleOf(Type rules, string field) =>
        (QuantityRule)rules.GetProperty(field, BindingFlags.Public | BindingFlags.Static)!.GetValue(null)!;

    private static void Reads(string text, QuantityRule rule)
    {
        Assert.NotNull(QuantityText.Read(text, rule, out string? problem));
        Assert.Null(problem);
    }
}
