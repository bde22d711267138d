using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Jobs;

public class ResultsTextTests
{
    [Theory]
    [InlineData(1.0, "> 99.9 %")]
    [InlineData(0.99951, "> 99.9 %")]
    [InlineData(0.9994, "99.9 %")]
    [InlineData(0.817, "81.7 %")]
    [InlineData(0.0, "< 0.1 %")]
    [InlineData(null, "–")]
    public void No_belief_is_printed_as_certain(double? probability, string text) => Assert.Equal(text, ResultsText.Belief(probability));

    [Theory]
    [InlineData(0.95, "95 %")]
    [InlineData(0.99, "99 %")]
    [InlineData(0.975, "97.5 %")]
    public void A_level_is_printed_as_it_was_set(double level, string text) => Assert.Equal(text, ResultsText.Level(level));

    [Theory]
    [InlineData(10.2, 10.11, 10.29, "10.2", "10.1", "10.3")]
    [InlineData(10.0, 9.9, 10.1, "10.0", "9.9", "10.1")]
    [InlineData(9.44, 9.401, 9.499, "9.4", "9.4", "9.5")]
    public void The_customers_interval_is_rounded_outwards(double ratio, double low, double high, string said, string saidLow, string saidHigh)
    {
        Results results = new("J", Stage.AsMachined) { Cylinders = [OfRatio("1", ratio, low, high)] };

        RatioAnswer answer = RatioAnswer.Of(results)!;

        Assert.Equal((said, said, saidLow, saidHigh), (answer.Least, answer.Most, answer.Low, answer.High));
    }

    [Fact]
    public void The_answer_spans_all_cylinders_and_names_those_without_a_ratio()
    {
        Results results = new("J", Stage.AsMachined)
        {
            Cylinders = [OfRatio("1", 10.0, 9.93, 10.07), new CylinderResult("2"), OfRatio("3", 10.4, 10.31, 10.49)],
        };

        RatioAnswer answer = RatioAnswer.Of(results)!;

        Assert.Equal(("10.0", "10.4", "9.9", "10.5", 2), (answer.Least, answer.Most, answer.Low, answer.High, answer.Known));
        Assert.Equal(["2"], answer.Unknown);
        Assert.Null(RatioAnswer.Of(new Results("J", Stage.AsMachined) { Cylinders = [new CylinderResult("1")] }));
    }

    [Fact]
    public void Cylinders_are_named_unless_they_are_all_and_the_same_caution_is_said_once()
    {
        Results results = new("J", Stage.AsMachined)
        {
            Cylinders = [new CylinderResult("1"), new CylinderResult("2"), new CylinderResult("3")],
            Missing = [new MissingFigure("chamber", "2"), new MissingFigure("deck", "1"), new MissingFigure("deck", "2"), new MissingFigure("deck", "3")],
            Cautions = [new Caution("a", "Mind this.", "1"), new Caution("a", "Mind this.", "3"), new Caution("b", "Mind that.")],
        };
        ResultsText text = new(results, UnitSystem.Metric);

        Assert.Equal(["chamber: 2", "deck: all"], text.Missing());
        Assert.Equal(["Cylinder 1, 3: Mind this.", "Mind that."], text.Cautions());
    }

    [Theory]
    [InlineData("piston to head", "\"min\": \"0.9 mm\"", "deck")]
    [InlineData("taper", "\"max\": \"0.0125 mm\"", "bore")]
    [InlineData("compression ratio", "\"max\": \"11\"", "chamber")]
    [InlineData("chamber spread", "\"max\": \"1 cc\"", "chamber")]
    public void A_verdict_without_a_figure_names_the_one_it_rests_on(string subject, string bound, string lacks)
    {
        Job job = Workbench.Engine(
            2, """ "given": [ { "what": "bore", "value": "81 mm ± 0.01 mm" }, { "what": "gasket thickness", "value": "1.2 mm ± 0.05 mm" } ] """,
            $$""" "limits": [ { "what": "{{subject}}", {{bound}}, "stage": "as received" } ] """);

        Results results = StageResults.Of(job, Stage.AsReceived);

        Assert.All(results.Verdicts, verdict => Assert.Equal((VerdictState.NotProven, lacks), (verdict.State, verdict.Settle)));
        Assert.NotEmpty(results.Verdicts);
    }

    [Fact]
    public void A_figure_used_is_told_with_its_value_doubt_and_the_words_it_was_written_in()
    {
        Results results = StageResults.Of(Workbench.Single(), Stage.AsReceived);

        ProvenanceLine deck = results.Used(What.Deck, "1")!;
        Assert.Equal("0.2 mm ± 0.03 mm below", deck.Written);
        Assert.Equal((0.2, QuantityKind.Length), (deck.Value.Value, deck.Value.Kind));
        Assert.Equal(0.03 / Math.Sqrt(3.0), deck.Value.StandardUncertainty!.Value, 1e-15); // a rectangle's
        Assert.Equal(36_000.0, results.Used(What.Chamber, "1")!.Value.Value);
        Assert.Null(results.Used(What.Rock, "1"));
    }

    private static CylinderResult OfRatio(string label, double value, double low, double high) =>
        new(label) { CompressionRatio = new ResultQuantity(value, QuantityKind.Ratio, 0.05, low, high, low, high) };
}
