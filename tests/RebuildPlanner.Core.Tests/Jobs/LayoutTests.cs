using System.Globalization;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Tests.Jobs;

/// <summary>Single, inline, vee and flat engines of 1 to 24 cylinders, two and four strokes.</summary>
public class LayoutTests
{
    private const string Given =
        """
        "given": [ { "what": "bore", "value": "81 mm ± 0.01 mm" }, { "what": "chamber", "value": "36 cc ± 0.3 cc" },
          { "what": "gasket thickness", "value": "1.2 mm ± 0.05 mm" }, { "what": "gasket opening", "value": "82.5 mm ± 0.2 mm" },
          { "what": "deck", "value": "0.2 mm ± 0.03 mm below" }, { "what": "crown", "value": "1.0 cc ± 0.2 cc dish" } ]
        """;

    public static TheoryData<string, int> Layouts
    {
        get
        {
            TheoryData<string, int> data = new() { { "single", 1 } };
            foreach (int cylinders in new[] { 2, 3, 4, 6, 8, 12, 24 })
            {
                data.Add("inline", cylinders);
                if (cylinders % 2 == 0)
                {
                    data.Add("vee", cylinders);
                    data.Add("flat", cylinders);
                }
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Layouts))]
    public void Every_cylinder_of_every_layout_has_the_same_ratio_from_the_same_figures(string layout, int cylinders)
    {
        Results results = StageResults.Of(Engine(layout, cylinders), Stage.AsMachined);

        Assert.Equal(cylinders, results.Cylinders.Count);
        Assert.Empty(results.Missing);
        Assert.All(results.Cylinders, cylinder => Assert.Equal(results.Cylinders[0].CompressionRatio!.Value, cylinder.CompressionRatio!.Value));
        Assert.Equal(cylinders * results.Cylinders[0].SweptVolume!.Value, results.Displacement!.Value, 1e-6 * cylinders);
        Assert.Equal(cylinders == 1, results.RatioSpread is null);
        Assert.Equal(cylinders + 1, results.Verdicts.Count);
        Assert.InRange(results.Verdicts[^1].Probability!.Value, 0, results.Verdicts.Min(verdict => verdict.Probability!.Value) + 1e-3);
    }

    // Chambers differ by their own ± 0.3 cc alone; what two cylinders share cancels, gaskets of two heads do not.
    [Fact]
    public void A_spread_across_two_heads_is_less_sure_than_one_under_one_head()
    {
        double one = StageResults.Of(Engine("inline", 2), Stage.AsMachined).RatioSpread!.StandardUncertainty!.Value;
        double two = StageResults.Of(Engine("vee", 2), Stage.AsMachined).RatioSpread!.StandardUncertainty!.Value;

        Assert.True(two > 1.1 * one, $"{two} against {one}");
    }

    // Two chambers of 36 ± 0.3 cc, rectangular and each its own: their difference is 0 with u = 0.3·√(2/3), never exactly nothing.
    [Fact]
    public void Equal_figures_do_not_make_equal_cylinders()
    {
        ResultQuantity chambers = StageResults.Of(Engine("inline", 2), Stage.AsMachined).ChamberSpread!;

        Assert.Equal((0.0, Math.Round(300 * Math.Sqrt(2.0 / 3), 9)), (chambers.Value, Math.Round(chambers.StandardUncertainty!.Value, 9)));
    }

    // ISO 2533: at 1000 m the air has 0.887 of its sea-level pressure, and the gauge shows that part of what it shows at sea level.
    [Fact]
    public void Cranking_pressure_falls_with_the_air_of_the_altitude()
    {
        double At(string altitude) => StageResults.Of(
            Workbench.Single(
                $$""" "engine": { "cylinders": 1, "stroke": "78 mm ± 0.04 mm", "rodLength": "132 mm", "cam": { "inletCloses": "46 deg ABDC" }, "altitude": "{{altitude}}" } """),
            Stage.AsReceived).Cylinders[0].CrankingPressure!.Value;

        Assert.Equal(0.887, At("1000 m") / At("0 m"), 5e-4);
        Assert.Equal(At("1000 ft"), At("304.8 m"), 1e-6);
    }

    // Exhaust closes 86° before top: by the triangle of r 27, L 110 without offset, x = L + r − r·cos θ − √(L² − r²·sin² θ), θ = 86°.
    [Fact]
    public void A_two_stroke_traps_its_charge_at_exhaust_closing()
    {
        Job job = Workbench.Read(
            $$"""
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "T" },
              "engine": { "cylinders": 1, "cycle": "two-stroke", "stroke": "54 mm ± 0.02 mm", "rodLength": "110 mm ± 0.02 mm", "cam": { "inletCloses": null, "exhaustCloses": "86 deg BTDC" } },
              {{Given}} }
            """);
        CylinderResult cylinder = StageResults.Of(job, Stage.AsReceived).Cylinders[0];
        double angle = 86 * Math.PI / 180;
        double x = 137 - (27 * Math.Cos(angle)) - Math.Sqrt((110.0 * 110) - Math.Pow(27 * Math.Sin(angle), 2));

        Assert.Equal(1 + (x / 54 * (cylinder.CompressionRatio!.Value - 1)), cylinder.TrappedRatio!.Value, 1e-9);
        Assert.InRange(cylinder.CrankingPressure!.Value, 0, 101.325 * (Math.Pow(cylinder.TrappedRatio.Value, 1.3) - 1));
    }

    private static Job Engine(string layout, int cylinders)
    {
        string[] labels = [.. Enumerable.Range(1, cylinders).Select(number => $"\"{number.ToString(CultureInfo.InvariantCulture)}\"")];
        int half = cylinders / 2;
        string banks = layout is "vee" or "flat"
            ? $$""", "banks": [ { "label": "left", "cylinders": [{{string.Join(",", labels[..half])}}] }, { "label": "right", "cylinders": [{{string.Join(",", labels[half..])}}] } ] """
            : "";
        return Workbench.Read(
            $$"""
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "T" },
              "engine": { "cylinders": {{cylinders}}, "layout": "{{layout}}", "stroke": "78 mm ± 0.04 mm" {{banks}} },
              {{Given}}, "limits": [ { "what": "compression ratio", "max": "9.3" } ] }
            """);
    }
}
