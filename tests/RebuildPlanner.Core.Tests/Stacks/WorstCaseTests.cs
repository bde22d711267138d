using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;
using RebuildPlanner.Core.Tests.Jobs;

namespace RebuildPlanner.Core.Tests.Stacks;

public class WorstCaseTests
{
    private const string Gasket = """
        "given": [
          { "what": "bore", "value": "81 mm ± 0.01 mm" }, { "what": "chamber", "value": "36 cc ± 0.3 cc" },
          { "what": "gasket thickness", "value": "1.2 mm ± 0.3 mm" }, { "what": "gasket opening", "value": "82.5 mm" },
          { "what": "deck", "value": "0.2 mm below" }, { "what": "crown", "value": "1.0 cc dish" } ]
        """;

    [Theory]
    [InlineData("0 cc")]
    [InlineData("0.1 cc")]
    [InlineData("0.7 cc")]
    public void A_burettes_limit_of_error_cancels_in_the_worst_spread_of_chambers(string limitOfError)
    {
        Job job = Workbench.Engine(
            2,
            $$"""
            "gauges": [ { "id": "g", "kind": "burette", "resolution": "0.2 cc", "limitOfError": "{{limitOfError}}" } ]
            """,
            """
            "readings": [
              { "what": "chamber", "cylinder": "1", "from": "0.0 cc", "to": "46.8 cc", "gauge": "g", "stage": "as received" },
              { "what": "chamber", "cylinder": "2", "from": "0.0 cc", "to": "47.8 cc", "gauge": "g", "stage": "as received" } ]
            """);

        WorstLimits spread = new StageFigures(new StageModel(job, Stage.AsReceived)).Spread(Output.Chamber)!.Worst;

        // By hand: 1 cm³, and two scale readings of ±0.1 cm³ on each side. Rounding of 47 000 mm³ leaves ten digits.
        Assert.Equal(600.0, spread.Low, 1e-9);
        Assert.Equal(1400.0, spread.High, 1e-9);
        Assert.InRange(spread.Slack, 0.0, 1e-9); // outward rounding of the shared slope, nothing else
    }

    [Theory]
    [InlineData(Output.CompressionRatio)]
    [InlineData(Output.ClearanceVolume)]
    public void Worst_difference_holds_every_draw_and_no_doubt_twice(Output output)
    {
        EngineModel model = new StageModel(Workbench.Engine(2, Gasket), Stage.AsReceived).Model;
        WorstLimits limits = new WorstCase(model).Difference(output, 0, 1);
        Random random = new(19);
        double low = double.PositiveInfinity, high = double.NegativeInfinity;
        for (int draw = 0; draw < 20_000; draw++)
        {
            // Ends more often than not, since extremes stand there.
            double[] at = [.. model.Sources.ToArray().Select(source => random.Next(3) switch
            {
                0 => source.WorstLow,
                1 => source.WorstHigh,
                _ => source.WorstLow + (random.NextDouble() * (source.WorstHigh - source.WorstLow)),
            })];
            double difference = Of(model, 0, output, at) - Of(model, 1, output, at);
            (low, high) = (Math.Min(low, difference), Math.Max(high, difference));
        }

        // A gasket counted twice, once in each cylinder, would more than double the width.
        Assert.InRange(low, limits.Low - 1e-9, limits.Low + (0.15 * (limits.High - limits.Low)));
        Assert.InRange(high, limits.High - (0.15 * (limits.High - limits.Low)), limits.High + 1e-9);
    }

    private static double Of(EngineModel model, int cylinder, Output output, double[] at)
    {
        model.Values(cylinder, out CylinderFigures<Real> figures);
        for (int input = 0; input < CylinderFigures<Real>.Count; input++)
        {
            foreach (Term term in model.TermsOf(cylinder, input))
            {
                figures[input] += new Real(term.Coefficient * at[term.Source]);
            }
        }

        CylinderStack<Real>.Compute(figures, model.Cylinders[cylinder].Form, out CylinderStack<Real> stack);
        return stack.Of(output).Value;
    }
}
