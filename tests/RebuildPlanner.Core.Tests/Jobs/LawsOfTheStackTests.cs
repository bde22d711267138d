using CsCheck;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Jobs;

public class LawsOfTheStackTests
{
    private static readonly Output[] _outputs = [.. Enum.GetValues<Output>().Where(output => output != Output.CrossCheck)];

    private static readonly Output[] _volumes = [Output.SweptVolume, Output.Chamber, Output.Gasket, Output.Deck, Output.Crown, Output.TopLand, Output.ClearanceVolume];

    [Fact]
    public void Millimetre_and_inch_entry_agree() => RandomEngine.Gen.Sample(engine =>
    {
        StageFigures metric = Figures(engine.Job()), inch = Figures(engine.Job(inch: true));
        return _outputs.All(output => Close(metric.Of(output, 0)!.Value, inch.Of(output, 0)!.Value)
            && Close(metric.FirstOrder.StandardUncertainty(0, output), inch.FirstOrder.StandardUncertainty(0, output)));
    }, iter: 40);

    // Thirteen digits are written, so a relative 1e-9 leaves room for differences of near-equal figures.
    [Fact]
    public void Lengths_times_k_give_volumes_times_k_cubed_and_the_same_ratio() => RandomEngine.Gen.Sample(engine =>
    {
        StageFigures one = Figures(engine.Job()), twice = Figures(engine.Job(scale: 2));
        return Close(one.Of(Output.CompressionRatio, 0)!.Value, twice.Of(Output.CompressionRatio, 0)!.Value)
            && Close(one.Of(Output.TrappedRatio, 1)!.Value, twice.Of(Output.TrappedRatio, 1)!.Value)
            && Close(2 * one.Of(Output.PistonToHead, 0)!.Value, twice.Of(Output.PistonToHead, 0)!.Value)
            && _volumes.All(output => Close(8 * one.Of(output, 0)!.Value, twice.Of(output, 0)!.Value));
    }, iter: 40);

    [Fact]
    public void Sensitivities_agree_with_central_differences() => RandomEngine.Gen.Sample(engine =>
    {
        EngineModel model = new StageModel(engine.Job(), Stage.AsReceived).Model;
        FirstOrder firstOrder = new(model);
        model.Values(0, out CylinderFigures<Real> figures);
        for (int input = 0; input < CylinderFigures<Real>.Count; input++)
        {
            if (model.TermsOf(0, input).IsEmpty)
            {
                continue;
            }

            Real centre = figures[input];
            double step = 1e-5 * Math.Max(1, Math.Abs(centre.Value));
            figures[input] = new Real(centre.Value + step);
            CylinderStack<Real>.Compute(figures, model.Cylinders[0].Form, out CylinderStack<Real> above);
            figures[input] = new Real(centre.Value - step);
            CylinderStack<Real>.Compute(figures, model.Cylinders[0].Form, out CylinderStack<Real> below);
            figures[input] = centre;
            foreach (Output output in _outputs)
            {
                // Cancellation in the difference leaves about 1e-16·|y|/step.
                double difference = (above.Of(output).Value - below.Of(output).Value) / (2 * step);
                double tolerance = (1e-5 * Math.Abs(difference)) + (1e-14 * Math.Abs(above.Of(output).Value) / step) + 1e-9;
                Assert.Equal(difference, firstOrder.Sensitivity(0, output, (Input)input), tolerance);
            }
        }
    }, iter: 40);

    [Fact]
    public void Worst_case_holds_every_corner_and_is_no_wider_than_its_slack() => RandomEngine.Gen.Sample(engine =>
    {
        EngineModel model = new StageModel(engine.Job(), Stage.AsReceived).Model;
        WorstCase worst = new(model);
        WorstLimits limits = worst.Limits(0, Output.CompressionRatio);
        double low = double.MaxValue, high = double.MinValue;

        // Brute force over the corners of the inputs of one cylinder that have no source in common: every sign of every one.
        Input[] inputs = [.. Enum.GetValues<Input>().Where(input => !model.TermsOf(0, (int)input).IsEmpty
            && input is not (Input.Closing or Input.Altitude or Input.CrankingExponent or Input.LeastDeck))];
        for (int corner = 0; corner < 1 << inputs.Length; corner++)
        {
            model.Values(0, out CylinderFigures<Real> figures);
            for (int bit = 0; bit < inputs.Length; bit++)
            {
                double end = figures[(int)inputs[bit]].Value;
                foreach (Term term in model.TermsOf(0, (int)inputs[bit]))
                {
                    Source source = model.Sources[term.Source];
                    double a = term.Coefficient * source.WorstLow, b = term.Coefficient * source.WorstHigh;
                    end += (corner >> bit & 1) == 1 ? Math.Max(a, b) : Math.Min(a, b);
                }

                figures[(int)inputs[bit]] = new Real(end);
            }

            CylinderStack<Real>.Compute(figures, model.Cylinders[0].Form, out CylinderStack<Real> stack);
            low = Math.Min(low, stack.Of(Output.CompressionRatio).Value);
            high = Math.Max(high, stack.Of(Output.CompressionRatio).Value);
        }

        // An offset pin leaves the rod's direction unproved by a hair: the limits may be wider by their slack, never narrower.
        double width = limits.High - limits.Low;
        return limits.Low <= low + (1e-9 * width) && limits.High >= high - (1e-9 * width)
            && limits.Slack < 0.02 * width && low - limits.Low <= limits.Slack + (1e-9 * width) && limits.High - high <= limits.Slack + (1e-9 * width);
    }, iter: 6);

    [Fact]
    public void Without_pin_offset_the_worst_case_is_an_exact_corner() =>
        Assert.True(new WorstCase(new StageModel(Workbench.Engine(2), Stage.AsReceived).Model).Limits(1, Output.CompressionRatio).Exact);

    [Fact]
    public void Worst_case_contains_the_95_percent_interval() => RandomEngine.Gen.Sample(engine =>
    {
        Results results = StageResults.Of(engine.Job(), Stage.AsReceived);
        return results.Cylinders
            .SelectMany(cylinder => new[]
            {
                cylinder.Bore, cylinder.SweptVolume, cylinder.ClearanceVolume, cylinder.CompressionRatio, cylinder.TrappedRatio, cylinder.CrankingPressure,
                cylinder.PistonToHead, cylinder.Chamber, cylinder.Gasket, cylinder.Deck, cylinder.Crown, cylinder.TopLand, cylinder.Taper,
            })
            .Concat([results.Displacement, results.RatioSpread, results.ChamberSpread])
            .All(quantity => quantity!.WorstLow <= quantity.Low + 1e-9 && quantity.High <= quantity.WorstHigh + 1e-9);
    }, iter: 30);

    // The random draws of the worst box must stay inside the worst limits of the spread, where shared errors cancel.
    [Fact]
    public void Spread_of_any_draw_stays_inside_its_worst_case() => Gen.Select(RandomEngine.Gen, Gen.Double.Unit.Array[200]).Sample((engine, draws) =>
    {
        EngineModel model = new StageModel(engine.Job(), Stage.AsReceived).Model;
        WorstLimits limits = new WorstCase(model).Difference(Output.CompressionRatio, 0, 1);
        double[] ratios = new double[2];
        for (int cylinder = 0; cylinder < 2; cylinder++)
        {
            model.Values(cylinder, out CylinderFigures<Real> figures);
            for (int input = 0; input < CylinderFigures<Real>.Count; input++)
            {
                foreach (Term term in model.TermsOf(cylinder, input))
                {
                    Source source = model.Sources[term.Source];
                    double at = source.WorstLow + (draws[term.Source % draws.Length] * (source.WorstHigh - source.WorstLow));
                    figures[input] += new Real(term.Coefficient * at);
                }
            }

            CylinderStack<Real>.Compute(figures, model.Cylinders[cylinder].Form, out CylinderStack<Real> stack);
            ratios[cylinder] = stack.Of(Output.CompressionRatio).Value;
        }

        return ratios[0] - ratios[1] >= limits.Low - 1e-9 && ratios[0] - ratios[1] <= limits.High + 1e-9;
    }, iter: 60);

    // 200 000 draws know u to √(1/2n) ≈ 0.16 % and an end of the interval to about 0.005 u; curvature adds up to a few hundredths of u.
    [Fact]
    public void First_order_agrees_with_a_plain_random_simulation()
    {
        EngineModel model = new StageModel(new RandomEngine(84, 88, [44.2, 44.6], 0.2, 4.2, 0.5, 0.2).Job(), Stage.AsReceived).Model;
        FirstOrder firstOrder = new(model);
        Random random = new(20261201);
        double[] ratios = new double[200_000];
        double[] draw = new double[model.Sources.Length];
        for (int trial = 0; trial < ratios.Length; trial++)
        {
            Dictionary<int, double> scales = [];
            for (int source = 0; source < draw.Length; source++)
            {
                Source doubt = model.Sources[source];
                draw[source] = doubt.Shape switch
                {
                    SourceShape.Rectangular => doubt.StandardUncertainty * Math.Sqrt(3) * ((2 * random.NextDouble()) - 1),
                    SourceShape.Pooled => doubt.StandardUncertainty * Normal(random) * Scale(doubt),
                    _ => 0,
                };
            }

            model.Values(0, out CylinderFigures<Real> figures);
            for (int input = 0; input < CylinderFigures<Real>.Count; input++)
            {
                foreach (Term term in model.TermsOf(0, input))
                {
                    figures[input] += new Real(term.Coefficient * draw[term.Source]);
                }
            }

            CylinderStack<Real>.Compute(figures, model.Cylinders[0].Form, out CylinderStack<Real> stack);
            ratios[trial] = stack.Of(Output.CompressionRatio).Value;

            double Scale(Source doubt)
            {
                if (!scales.TryGetValue(doubt.Pool, out double scale))
                {
                    double chi = Enumerable.Range(0, (int)doubt.DegreesOfFreedom).Sum(_ => Math.Pow(Normal(random), 2));
                    scales.Add(doubt.Pool, scale = Math.Sqrt(doubt.DegreesOfFreedom / chi));
                }

                return scale;
            }
        }

        Array.Sort(ratios);
        double u = firstOrder.StandardUncertainty(0, Output.CompressionRatio), value = firstOrder.Value(0, Output.CompressionRatio);
        double half = new LinearSum(model.Sources, firstOrder.Row(0, Output.CompressionRatio)).HalfWidth();
        Assert.Equal(value, ratios[ratios.Length / 2], 0.03 * u);
        Assert.Equal(value - half, ratios[(int)(0.025 * ratios.Length)], 0.05 * u);
        Assert.Equal(value + half, ratios[(int)(0.975 * ratios.Length)], 0.05 * u);
    }

    private static double Normal(Random random) => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());

    private static StageFigures Figures(Job job) => new(new StageModel(job, Stage.AsReceived));

    private static bool Close(double a, double b) => Math.Abs(a - b) <= 1e-9 * Math.Max(1, Math.Max(Math.Abs(a), Math.Abs(b)));
}
