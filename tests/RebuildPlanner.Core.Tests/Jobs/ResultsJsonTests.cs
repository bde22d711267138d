using System.Text.Json;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Jobs;

/// <summary>The answers in JSON, name by name: other programs read them.</summary>
public class ResultsJsonTests
{
    private static readonly string[] _quantity = ["value", "unit", "standardUncertainty", "low", "high", "worstLow", "worstHigh"];

    private static readonly JsonElement _example = Json(
        Workbench.Read(RepositoryFiles.Text("tests", "Reference", "example-job.json")), Stage.AsMachined);

    [Fact]
    public void The_document_has_its_fields_in_order() => Assert.Equal(
        ["format", "version", "job", "stage", "method", "seed", "trials", "displacement", "cylinders", "spread", "verdicts", "cautions", "missing", "provenance"],
        Names(_example));

    [Fact]
    public void A_cylinder_has_its_fields_in_order()
    {
        JsonElement cylinder = _example.GetProperty("cylinders")[0];

        Assert.Equal(
            [
                "cylinder", "bore", "sweptVolume", "clearanceVolume", "compressionRatio", "trappedRatio", "crankingPressure", "pistonToHead", "taper",
                "outOfRound", "volumes", "crossCheck", "shares",
            ],
            Names(cylinder));
        Assert.Equal(["chamber", "gasket", "deck", "crown", "topLand"], Names(cylinder.GetProperty("volumes")));
        Assert.Equal(["input", "share"], Names(cylinder.GetProperty("shares")[0]));
        Assert.Equal(JsonValueKind.Null, cylinder.GetProperty("crossCheck").ValueKind);
    }

    [Theory]
    [InlineData("bore", "mm")]
    [InlineData("sweptVolume", "cm3")]
    [InlineData("clearanceVolume", "cm3")]
    [InlineData("compressionRatio", "1")]
    [InlineData("trappedRatio", "1")]
    [InlineData("crankingPressure", "kPa")]
    [InlineData("pistonToHead", "mm")]
    [InlineData("taper", "mm")]
    public void A_quantity_has_seven_fields_and_its_unit(string name, string unit)
    {
        JsonElement quantity = _example.GetProperty("cylinders")[0].GetProperty(name);

        Assert.Equal(_quantity, Names(quantity));
        Assert.Equal(unit, quantity.GetProperty("unit").GetString());
        Assert.All(_quantity.Except(["unit"]), field => Assert.Equal(JsonValueKind.Number, quantity.GetProperty(field).ValueKind));
    }

    [Fact]
    public void A_verdict_has_its_fields_and_a_bound_is_a_quantity_of_which_only_the_value_is_known()
    {
        JsonElement verdict = _example.GetProperty("verdicts")[0];

        Assert.Equal(["what", "cylinder", "limit", "min", "max", "state", "probability", "level", "settle"], Names(verdict));
        Assert.Equal(("compression ratio", "1", "max 9.10", "not proven"), (Text(verdict, "what"), Text(verdict, "cylinder"), Text(verdict, "limit"), Text(verdict, "state")));
        Assert.Equal(JsonValueKind.Null, verdict.GetProperty("min").ValueKind);
        Assert.Equal(_quantity, Names(verdict.GetProperty("max")));
        Assert.Equal(9.1, verdict.GetProperty("max").GetProperty("value").GetDouble());
        Assert.Equal(JsonValueKind.Null, verdict.GetProperty("max").GetProperty("low").ValueKind);
        Assert.Equal(JsonValueKind.Null, _example.GetProperty("verdicts")[2].GetProperty("cylinder").ValueKind);
    }

    [Fact]
    public void Cautions_missing_and_provenance_have_their_fields()
    {
        JsonElement root = Json(
            Workbench.Single(""" "given": [ { "what": "bore", "value": "81 mm ± 0.01 mm", "from": "maker" } ] """), Stage.AsReceived);

        Assert.Equal(["code", "text", "cylinder", "figure"], Names(root.GetProperty("cautions")[0]));
        Assert.Equal(["what", "cylinder"], Names(root.GetProperty("missing")[0]));
        JsonElement bore = root.GetProperty("provenance").EnumerateArray().First(line => Text(line, "what") == "bore");
        Assert.Equal(["what", "cylinder", "kind", "stage", "from", "gauge"], Names(bore));
        Assert.Equal(("given", "maker"), (Text(bore, "kind"), Text(bore, "from")));
        Assert.Equal(JsonValueKind.Null, root.GetProperty("cylinders")[0].GetProperty("compressionRatio").ValueKind);
        Assert.Equal(JsonValueKind.Null, root.GetProperty("spread").GetProperty("compressionRatio").ValueKind);
    }

    [Fact]
    public void Numbers_are_full_precision_not_rounded_for_reading() =>
        Assert.NotEqual(9.0718, Math.Round(_example.GetProperty("cylinders")[0].GetProperty("compressionRatio").GetProperty("value").GetDouble(), 12));

    private static JsonElement Json(Job job, Stage stage) => JsonDocument.Parse(ResultsJson.Write(StageResults.Of(job, stage))).RootElement;

    private static string[] Names(JsonElement element) => [.. element.EnumerateObject().Select(property => property.Name)];

    private static string? Text(JsonElement element, string name) => element.GetProperty(name).GetString();
}
