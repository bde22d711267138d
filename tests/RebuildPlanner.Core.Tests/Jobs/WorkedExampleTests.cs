using System.Text.Json;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Jobs;

/// <summary>The job worked whole in tests/Reference, computed twice independently of this program.</summary>
public class WorkedExampleTests
{
    private static readonly Results _results = StageResults.Of(
        Workbench.Read(RepositoryFiles.Text("tests", "Reference", "example-job.json")), Stage.AsMachined);

    private static readonly JsonElement _reference = JsonDocument.Parse(RepositoryFiles.Text("tests", "Reference", "example-results.json")).RootElement;

    public static TheoryData<int, string> Quantities
    {
        get
        {
            TheoryData<int, string> data = [];
            foreach (int cylinder in new[] { 0, 1 })
            {
                foreach (string name in new[] { "bore", "sweptVolume", "clearanceVolume", "compressionRatio", "pistonToHead" })
                {
                    data.Add(cylinder, name);
                }
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Quantities))]
    public void Value_agrees_to_rounding_and_doubt_to_a_thousandth(int cylinder, string name)
    {
        CylinderResult result = _results.Cylinders[cylinder];
        (ResultQuantity quantity, double perUnit) = name switch
        {
            "bore" => (result.Bore!, 1.0),
            "sweptVolume" => (result.SweptVolume!, 1000.0),
            "clearanceVolume" => (result.ClearanceVolume!, 1000.0),
            "compressionRatio" => (result.CompressionRatio!, 1.0),
            _ => (result.PistonToHead!, 1.0),
        };
        (double value, double u) = Pair(Cylinder(cylinder).GetProperty(name));

        Assert.Equal(value, quantity.Value / perUnit, 1e-12 * value);
        Assert.Equal(u, quantity.StandardUncertainty!.Value / perUnit, 1e-3 * u);
    }

    // The reference keeps α fixed; α at its ends widens the limits by 1.6e-4, hence 3e-4.
    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    public void Worst_case_of_the_ratio_agrees(int cylinder)
    {
        (double low, double high) = Pair(Cylinder(cylinder).GetProperty("worst"));

        Assert.Equal(low, _results.Cylinders[cylinder].CompressionRatio!.WorstLow!.Value, 3e-4);
        Assert.Equal(high, _results.Cylinders[cylinder].CompressionRatio!.WorstHigh!.Value, 3e-4);
    }

    // 600 000 trials leave noise of 0.01 u, and the linear sum differs by up to 0.04 u.
    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    public void Limits_of_the_ratio_agree_with_random_trials(int cylinder)
    {
        ResultQuantity ratio = _results.Cylinders[cylinder].CompressionRatio!;
        double u = ratio.StandardUncertainty!.Value;

        Assert.Equal(Cylinder(cylinder).GetProperty("mc")[1].GetDouble(), ratio.Low!.Value, 0.05 * u);
        Assert.Equal(Cylinder(cylinder).GetProperty("mc")[2].GetDouble(), ratio.High!.Value, 0.05 * u);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    public void Probabilities_inside_the_limits_agree(int cylinder)
    {
        string label = _results.Cylinders[cylinder].Cylinder;

        Assert.Equal(Cylinder(cylinder).GetProperty("pCR").GetDouble(), Probability("compression ratio", label), 0.005);
        Assert.Equal(Cylinder(cylinder).GetProperty("pPH").GetDouble(), Probability("piston to head", label), 0.005);
    }

    [Fact]
    public void Displacement_and_spread_agree()
    {
        (double displacement, double uDisplacement) = Pair(_reference.GetProperty("displacement"));
        (double spread, double uSpread) = Pair(_reference.GetProperty("spread"));

        Assert.Equal(displacement, _results.Displacement!.Value / 1000, 1e-9);
        Assert.Equal(uDisplacement, _results.Displacement.StandardUncertainty!.Value / 1000, 1e-3 * uDisplacement);
        Assert.Equal(spread, _results.RatioSpread!.Value, 1e-12);
        Assert.Equal(uSpread, _results.RatioSpread.StandardUncertainty!.Value, 1e-3 * uSpread);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    public void Volumes_and_trapped_ratio_agree(int cylinder)
    {
        CylinderResult result = _results.Cylinders[cylinder];
        JsonElement volumes = Cylinder(cylinder).GetProperty("volumes");

        Assert.Equal(volumes.GetProperty("chamber").GetDouble(), result.Chamber!.Value / 1000, 1e-9);
        Assert.Equal(volumes.GetProperty("gasket").GetDouble(), result.Gasket!.Value / 1000, 1e-9);
        Assert.Equal(volumes.GetProperty("deck").GetDouble(), result.Deck!.Value / 1000, 1e-9);
        Assert.Equal(volumes.GetProperty("crown").GetDouble(), result.Crown!.Value / 1000, 1e-9);
        Assert.Equal(volumes.GetProperty("topLand").GetDouble(), result.TopLand!.Value / 1000, 1e-9);
        Assert.Equal(Cylinder(cylinder).GetProperty("trapped").GetDouble(), result.TrappedRatio!.Value, 1e-9);
    }

    [Fact]
    public void Shares_sum_to_one_and_stand_largest_first()
    {
        foreach (CylinderResult cylinder in _results.Cylinders)
        {
            Assert.Equal(1.0, cylinder.Shares.Sum(share => share.Share), 1e-12);
            Assert.Equal(cylinder.Shares.OrderByDescending(share => share.Share), cylinder.Shares);
        }
    }

    [Fact]
    public void The_ratio_of_the_second_cylinder_is_outside_and_so_is_the_engine()
    {
        Verdict[] ratio = [.. _results.Verdicts.Where(verdict => verdict.What == "compression ratio")];

        Assert.Equal([("1", VerdictState.NotProven), ("2", VerdictState.Outside), (null, VerdictState.Outside)], ratio.Select(verdict => (verdict.Cylinder, verdict.State)));
    }

    private static JsonElement Cylinder(int index) => _reference.GetProperty("cylinders")[index];

    private static (double First, double Second) Pair(JsonElement pair) => (pair[0].GetDouble(), pair[1].GetDouble());

    private static double Probability(string what, string cylinder) =>
        _results.Verdicts.Single(verdict => verdict.What == what && verdict.Cylinder == cylinder).Probability!.Value;
}
