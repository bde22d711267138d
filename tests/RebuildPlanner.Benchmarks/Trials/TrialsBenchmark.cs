using System.Diagnostics;
using System.Globalization;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Benchmarks;

/// <summary>
/// Trials of an eight-cylinder engine against a numpy script of the same model: a million plain trials, and the time to the same accuracy of the limits.
/// </summary>
internal static class TrialsBenchmark
{
    private const int Cylinders = 8, Trials = 1_000_000, Rounds = 5, Seeds = 50, FewTrials = 5120;
    private const double WantedPlain = 20.0, WantedSooner = 300.0, Limit = 9.6;

    /// <summary>Runs it.</summary>
    /// <returns>Whether the two programs agree.</returns>
    public static bool Run()
    {
        string python = Environment.GetEnvironmentVariable("PYTHON") ?? "python3", script = Path.Combine(AppContext.BaseDirectory, "Trials", "rival_trials.py");
        if (Tool.Run(python, "-c", "import numpy").Code != 0)
        {
            Console.WriteLine($"no numpy for {python}, skipped; PYTHON names an interpreter that has it.");
            return true;
        }

        EngineTrials engine = Engine();
        TrialOptions plain = new(Trials: Trials, Plain: true, Threads: 2), few = new(Trials: FewTrials, Threads: 2);
        MonteCarlo.Run(engine, plain);
        MonteCarlo.Run(engine, few);

        double[][] rival = Rival(python, script, Trials, Enumerable.Range(1, Seeds));
        (double Seconds, MonteCarlo Run)[] ours = [.. Enumerable.Range(1, Rounds).Select(seed => Timed(engine, plain with { Seed = (ulong)seed }))];
        (double Seconds, MonteCarlo Run)[] controlled = [.. Enumerable.Range(1, Seeds).Select(seed => Timed(engine, few with { Seed = (ulong)seed }))];
        MonteCarlo truth = MonteCarlo.Run(engine, new TrialOptions(Seed: 4711, Trials: 4 * Trials));

        double rivalSeconds = rival.Min(row => row[0]), ourSeconds = ours.Min(run => run.Seconds), fewSeconds = ByTurns.Median(controlled.Select(run => run.Seconds));
        Say($"trials: {Trials} plain, ours {1e3 * ourSeconds:0.0} ms on two threads, numpy {1e3 * rivalSeconds:0} ms; {rivalSeconds / ourSeconds:0.0} times as fast (wanted ≥ {WantedPlain:0} with AVX-512)");

        double ourRms = Rms(controlled.Select(run => Limits(run.Run)), Limits(truth)), rivalRms = Rms(rival.Select(LimitsOf), Limits(truth));

        // The error of the rival falls with the root of its trials: what it would take to be as sure as we are.
        double sameSeconds = rivalSeconds * (rivalRms / ourRms) * (rivalRms / ourRms);
        Say($"trials: limits by {FewTrials} controlled trials {1e3 * fewSeconds:0.00} ms, RMS error {ourRms:0.0000000}; numpy's million {rivalRms:0.0000000} over {Seeds} seeds; as sure {sameSeconds / fewSeconds:0} times sooner (wanted ≥ {WantedSooner:0})");

        bool agree = Enumerable.Range(0, Cylinders).All(cylinder => Agrees(ours[0].Run, rival[0], cylinder));
        Say($"trials: the two {(agree ? "agree" : "DISAGREE")} in mean, deviation, limits, share above {Limit} and spread");
        return agree;
    }

    private static bool Agrees(MonteCarlo ours, double[] rival, int cylinder)
    {
        SampledFigure ratio = ours.Figures[cylinder], spread = ours.Figures[Cylinders];
        ReadOnlySpan<double> row = rival.AsSpan(1 + (5 * cylinder), 5);
        double u = row[1];
        return Math.Abs(ratio.Mean - row[0]) < 0.01 * u && Math.Abs(ratio.StandardUncertainty - u) < 0.01 * u
            && Math.Abs(ratio.Symmetric().Low - row[2]) < 0.03 * u && Math.Abs(ratio.Symmetric().High - row[3]) < 0.03 * u
            && Math.Abs(1.0 - ratio.Below(Limit) - row[4]) < 0.003
            && Math.Abs(spread.Symmetric().Low - rival[^2]) < 0.03 * u && Math.Abs(spread.Symmetric().High - rival[^1]) < 0.03 * u;
    }

    private static double[][] Rival(string python, string script, int trials, IEnumerable<int> seeds)
    {
        string input = Path.GetTempFileName();
        try
        {
            File.WriteAllLines(input, seeds.Select(seed => seed.ToString(CultureInfo.InvariantCulture)));
            string output = Tool.Output("bash", "-c", $"{python} '{script}' {trials.ToString(CultureInfo.InvariantCulture)} < '{input}'");
            return [.. output.Split('\n', StringSplitOptions.RemoveEmptyEntries).Select(line => line.Split(' ').Select(word => double.Parse(word, CultureInfo.InvariantCulture)).ToArray())];
        }
        finally
        {
            File.Delete(input);
        }
    }

    private static (double Seconds, MonteCarlo Run) Timed(EngineTrials engine, TrialOptions options)
    {
        long begun = Stopwatch.GetTimestamp();
        MonteCarlo run = MonteCarlo.Run(engine, options);
        Limits(run);
        return (Stopwatch.GetElapsedTime(begun).TotalSeconds, run);
    }

    private static double[] Limits(MonteCarlo run) =>
        [.. Enumerable.Range(0, Cylinders).SelectMany(cylinder => new[] { run.Figures[cylinder].Symmetric().Low, run.Figures[cylinder].Symmetric().High })];

    private static double[] LimitsOf(double[] row) => [.. Enumerable.Range(0, Cylinders).SelectMany(cylinder => new[] { row[3 + (5 * cylinder)], row[4 + (5 * cylinder)] })];

    private static double Rms(IEnumerable<double[]> runs, double[] truth) =>
        Math.Sqrt(runs.Average(run => run.Zip(truth, (one, true_) => (one - true_) * (one - true_)).Average()));

    // The model of the script, to the letter; only the ratio and its spread are asked for, as there.
    private static EngineTrials Engine()
    {
        List<Source> sources =
        [
            Source.Normal(0.02), Source.Normal(0.02), Source.Normal(60.0), Source.Normal(80.0), Source.Rectangular(0.004), Source.Rectangular(0.2),
        ];
        List<Estimate> estimates =
        [
            Estimate.Zero, Of(78.0, What.Stroke, 0), Of(1.20, What.GasketThickness, 1), Of(2000.0, What.Crown, 2), Of(82.5, What.GasketOpening, 5),
        ];
        List<CylinderModel> cylinders = [];
        bool[] known = [.. Enum.GetValues<Output>().Select(output => output == Output.CompressionRatio)];
        for (int cylinder = 0; cylinder < Cylinders; cylinder++)
        {
            int source = sources.Count, estimate = estimates.Count;
            sources.AddRange([Source.Normal(0.003), Source.Normal(60.0), Source.Normal(0.015), Source.Normal(0.1), Source.Normal(0.02)]);
            estimates.AddRange([
                Of(81.0, What.Bore, source, 4), Of(38000.0 + (50.0 * cylinder), What.Chamber, source + 1, 3), Of(0.20, What.Deck, source + 2),
                Of(5.0, What.TopLandHeight, source + 3), Of(80.5, What.TopLandDiameter, source + 4)]);
            int[] estimateOf = new int[CylinderFigures<Real>.Count];
            (estimateOf[(int)Input.Stroke], estimateOf[(int)Input.GasketThickness], estimateOf[(int)Input.Crown], estimateOf[(int)Input.GasketOpening]) = (1, 2, 3, 4);
            (estimateOf[(int)Input.Bore], estimateOf[(int)Input.Chamber], estimateOf[(int)Input.Deck]) = (estimate, estimate + 1, estimate + 2);
            (estimateOf[(int)Input.TopLandHeight], estimateOf[(int)Input.TopLandDiameter]) = (estimate + 3, estimate + 4);
            cylinders.Add(new CylinderModel(
                (cylinder + 1).ToString(CultureInfo.InvariantCulture), new CylinderForm(false, false, false, TopLand: true, false, false), estimateOf, known));
        }

        EngineModel model = new(sources, estimates, cylinders);
        return new EngineTrials(model, new FirstOrder(model));
    }

    private static Estimate Of(double value, What what, params int[] sources) => new(value, [.. sources.Select(source => new Term(source, 1.0, what))]);

    private static void Say(FormattableString text) => Console.WriteLine(text.ToString(CultureInfo.InvariantCulture));
}
