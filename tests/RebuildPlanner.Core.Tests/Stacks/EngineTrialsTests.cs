using System.Text.Json;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;
using RebuildPlanner.Core.Tests.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Stacks;

public class EngineTrialsTests
{
    private static readonly Job _job = Workbench.Read(RepositoryFiles.Text("tests", "Reference", "example-job.json"));
    private static readonly JsonElement _reference = JsonDocument.Parse(RepositoryFiles.Text("tests", "Reference", "example-results.json")).RootElement;

    // 600 000 trials of an independent program, good to 0.01 u; ours are sure to two digits of u.
    [Theory]
    [InlineData(false, 0)]
    [InlineData(false, 1)]
    [InlineData(true, 0)]
    [InlineData(true, 1)]
    public void Limits_of_the_worked_job_agree_with_another_programs_trials(bool plain, int cylinder)
    {
        JsonElement known = _reference.GetProperty("cylinders")[cylinder];
        Results results = StageResults.Of(_job, Stage.AsMachined, new TrialOptions(Plain: plain, Trials: plain ? 600_000 : null));
        ResultQuantity ratio = results.Cylinders[cylinder].CompressionRatio!;

        Assert.False(results.Trials!.FirstOrderHolds);
        Assert.Equal(known.GetProperty("mc")[1].GetDouble(), ratio.Low!.Value, 0.03 * ratio.StandardUncertainty!.Value);
        Assert.Equal(known.GetProperty("mc")[2].GetDouble(), ratio.High!.Value, 0.03 * ratio.StandardUncertainty!.Value);
        Verdict verdict = results.Verdicts.First(verdict => verdict.What == "compression ratio" && verdict.Cylinder == known.GetProperty("cylinder").GetString());
        Assert.Equal(known.GetProperty("pCR").GetDouble(), verdict.Probability!.Value, 0.005);
    }

    // The road with the linear part and the road without must meet: limits within three errors of 10⁶ plain trials.
    [Theory]
    [InlineData("van-four.json")]
    [InlineData("fen-boat-three.json")]
    public void Both_roads_meet(string sample)
    {
        Job job = Workbench.Read(RepositoryFiles.Text("samples", sample));
        StageModel model = new(job, LastStage.Of(job));
        FirstOrder firstOrder = new(model.Model);
        EngineTrials trials = new(model.Model, firstOrder);
        MonteCarlo controlled = MonteCarlo.Run(trials, new TrialOptions()), plain = MonteCarlo.Run(trials, new TrialOptions(Seed: 99, Trials: 1_000_000, Plain: true));

        for (int cylinder = 0; cylinder < model.Model.Cylinders.Count; cylinder++)
        {
            foreach (Output output in new[] { Output.CompressionRatio, Output.ClearanceVolume, Output.TrappedRatio })
            {
                int place = trials.PlaceOf(output, cylinder)!.Value;
                double u = firstOrder.StandardUncertainty(cylinder, output);
                (double low, double high) = controlled.Figures[place].Symmetric();
                Assert.True(controlled.Figures[place].IsControlled);
                Assert.Equal(plain.Figures[place].Symmetric().Low, low, 0.03 * u);
                Assert.Equal(plain.Figures[place].Symmetric().High, high, 0.03 * u);
            }
        }
    }

    [Fact]
    public void Neither_threads_nor_repetition_change_a_bit_and_a_seed_does()
    {
        byte[] Of(TrialOptions options) => ResultsJson.Write(StageResults.Of(_job, Stage.AsMachined, options));

        byte[] one = Of(new TrialOptions(Threads: 1));

        Assert.Equal(one, Of(new TrialOptions(Threads: 1)));
        Assert.Equal(one, Of(new TrialOptions(Threads: 2)));
        Assert.Equal(one, Of(new TrialOptions(Threads: 7)));
        Assert.NotEqual(one, Of(new TrialOptions(Seed: 2)));
    }

    [Theory]
    [InlineData(3.0, 4e-16)]
    [InlineData(1000.0, 4e-16)]
    [InlineData(1e6, 4e-16)]
    public void Sine_and_cosine_in_lanes_are_those_of_the_library(double reach, double tolerance)
    {
        Random random = new(11);
        for (int round = 0; round < 20_000; round++)
        {
            double x = round == 0 ? 0.0 : reach * ((2.0 * random.NextDouble()) - 1.0);
            Assert.Equal(Math.Sin(x), Lanes.Sin(Lanes.From(x)).Values[3], tolerance);
            Assert.Equal(Math.Cos(x), Lanes.Cos(Lanes.From(x)).Values[6], tolerance);
        }
    }

    [Fact]
    public void Lanes_agree_with_plain_numbers()
    {
        Random random = new(5);
        for (int round = 0; round < 200; round++)
        {
            double[] x = [.. Enumerable.Range(0, Lanes.Count).Select(_ => 0.1 + (3.0 * random.NextDouble()))], y = [.. x.Reverse()];
            Lanes lanes = Formula(new Lanes(System.Runtime.Intrinsics.Vector512.Create<double>(x)), new Lanes(System.Runtime.Intrinsics.Vector512.Create<double>(y)));
            for (int lane = 0; lane < Lanes.Count; lane++)
            {
                // Sine and cosine are our own in lanes; all else is the same to the bit.
                Assert.Equal(Formula(new Real(x[lane]), new Real(y[lane])).Value, lanes.Values[lane], 1e-14);
            }
        }

        static T Formula<T>(T x, T y)
            where T : struct, IScalar<T> =>
            T.Sqrt(T.Square(x) + y) - (2.5 * T.Sin(x)) + (T.Cos(y) / T.Exp(-x)) + T.Log(y) + T.From(0.125);
    }

    // The straight line reaches where no clearance is left, and there the control has no end: first order fails worst, and must not pass for lack of one.
    [Fact]
    public void First_order_that_reaches_past_all_clearance_does_not_hold()
    {
        Job job = Workbench.Read(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "T-1" }, "engine": { "cylinders": 1, "stroke": "90 mm ± 0 mm" },
              "given": [ { "what": "bore", "value": "80 mm ± 0 mm" }, { "what": "chamber", "value": "20 cc ± 19.4 cc" }, { "what": "crown", "value": "8 cc ± 0 cc dome" },
                { "what": "gasket thickness", "value": "1 mm ± 0 mm" }, { "what": "gasket opening", "value": "80 mm ± 0 mm" }, { "what": "deck", "value": "0 mm ± 0 mm flush" } ] }
            """);

        Results results = StageResults.Of(job, Stage.AsReceived);

        Assert.False(results.Trials!.FirstOrderHolds);
        Assert.Equal("compression ratio", results.Trials.FailsAt);
        Assert.Equal((19.4 - (12.0 + (Math.PI / 4.0 * 6.4))) / 38.8, results.Trials.WithoutClearance, 0.01); // what of the rectangle leaves no clearance
        Assert.Contains(results.Cautions, caution => caution.Code == "clearance-in-doubt");
    }

    [Fact]
    public void A_run_is_broken_off_between_two_blocks()
    {
        StageModel model = new(_job, Stage.AsMachined);
        using CancellationTokenSource broken = new();
        long seen = 0;
        Progress watcher = new(trials =>
        {
            seen = trials;
            broken.Cancel();
        });

        Assert.Throws<OperationCanceledException>(() => MonteCarlo.Run(
            new EngineTrials(model.Model, new FirstOrder(model.Model)), new TrialOptions(Trials: TrialOptions.MostTrials, Plain: true), watcher, broken.Token));
        Assert.InRange(seen, 1, TrialOptions.MostTrials / 2);
    }

    // The standard's own: u 0.035 to one digit is 0.04, so δ is 0.005; to two it is 0.035 and δ is 0.0005. What rounds up to a new digit counts as that.
    [Theory]
    [InlineData(0.035, 1, 0.005)]
    [InlineData(0.035, 2, 0.0005)]
    [InlineData(0.0996, 2, 0.005)]
    [InlineData(0.0994, 2, 0.0005)]
    [InlineData(9.6, 1, 5.0)]
    [InlineData(1.0, 1, 0.5)]
    [InlineData(123.4, 2, 5.0)]
    public void Tolerance_is_half_a_unit_of_the_last_digit(double u, int digits, double tolerance) =>
        Assert.Equal(tolerance, MonteCarlo.Tolerance(u, digits), 1e-12 * tolerance);

    // Memory does not grow with the trials: the same room for ten times as many.
    [Fact]
    public void Room_does_not_grow_with_the_trials()
    {
        StageModel model = new(_job, Stage.AsMachined);
        EngineTrials trials = new(model.Model, new FirstOrder(model.Model));
        long Bytes(int count)
        {
            long before = GC.GetAllocatedBytesForCurrentThread();
            MonteCarlo.Run(trials, new TrialOptions(Trials: count, Plain: true, Threads: 1));
            return GC.GetAllocatedBytesForCurrentThread() - before;
        }

        Bytes(200_000);
        long few = Bytes(200_000), many = Bytes(2_000_000);

        Assert.True(many < few + 200_000, $"{few} bytes for 200 000 trials, {many} for ten times as many");
    }

    private sealed class Progress(Action<long> report) : IProgress<long>
    {
        public void Report(long value) => report(value);
    }
}
