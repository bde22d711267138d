using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>The third reading of a model: trials, each with every doubt drawn anew.</summary>
/// <remarks>
/// Trials run in blocks, each with random streams of its own and reduced in order, so that neither the number of threads nor the width of
/// registers changes an answer. They end when twice the standard deviations of mean, spread and limits, found from the blocks, are within half a unit
/// of the last digit wanted. Source: jcgm101 (7.9). Valid for: every model. Error: told, and held to what was wanted unless the cap was hit.
/// </remarks>
public sealed class MonteCarlo
{
    /// <summary>The coverage of the intervals, 1.</summary>
    public const double Coverage = 0.95;

    // 10⁴ trials a block for plain counting, as the standard has it; where only a small difference is counted, fewer tell as much.
    private const int PlainTiles = 40, ControlledTiles = 2, PilotTiles = 2;
    private const int FewestBlocks = 10, MostBlocksAtOnce = 256;

    // Streams that no block of the run has.
    private const ulong Pilot = ulong.MaxValue;

    // A probability of several limits together is counted until it is this sure.
    private const double JointError = 0.005;

    private readonly long[] _joint;
    private readonly SampledFigure[] _figures;

    private MonteCarlo(SampledFigure[] figures, long[] joint, TrialOptions options) => (_figures, _joint, Options) = (figures, joint, options);

    /// <summary>How they were run.</summary>
    public TrialOptions Options { get; }

    /// <summary>How many trials there were.</summary>
    public long Trials { get; private set; }

    /// <summary>Whether the trials ended at the cap with digits still unsure.</summary>
    public bool IsCapped { get; private set; }

    /// <summary>The figures, in the model's order.</summary>
    public IReadOnlyList<SampledFigure> Figures => _figures;

    /// <summary>The probability that all limits of one of the model's joints hold at once.</summary>
    public double Joint(int joint) => (double)_joint[joint] / Trials;

    /// <summary>Runs trials.</summary>
    /// <param name="model">On what.</param>
    /// <param name="options">How.</param>
    /// <param name="progress">Told the trials run so far.</param>
    /// <param name="cancellation">Ends the run between two blocks.</param>
    /// <exception cref="OperationCanceledException">It was ended.</exception>
    public static MonteCarlo Run(ITrialModel model, TrialOptions options, IProgress<long>? progress = null, CancellationToken cancellation = default)
    {
        double[][] pilot = RunPilot(model, options.Seed);
        PreparedFigure[] prepared = [.. model.Figures.Select((figure, number) => PreparedFigure.Of(model.Sources, figure, pilot[number], options.Plain))];
        MonteCarlo run = new([.. prepared.Select(figure => figure.Begin())], new long[model.Joints.Count], options);
        int tiles = !Array.Exists(prepared, figure => figure.Controls) ? PlainTiles : ControlledTiles;
        int trialsOfBlock = tiles * TrialTile.Trials;
        int most = Math.Max(FewestBlocks, (int)Math.Ceiling((double)(options.Trials ?? TrialOptions.MostTrials) / trialsOfBlock));
        int threads = options.Threads > 0 ? options.Threads : Environment.ProcessorCount;
        TrialBench[] benches = [.. Enumerable.Range(0, Math.Min(threads, FewestBlocks)).Select(_ => new TrialBench(model, prepared))];
        TrialWave wave = new(model, Math.Min(most, MostBlocksAtOnce), tiles, options.Seed);
        for (int done = 0; done < most;)
        {
            int next = Math.Min(most, Math.Min(done + MostBlocksAtOnce, Math.Max(FewestBlocks, done + (done / 4))));
            wave.Run(done, next, benches, cancellation);
            run.Take(wave, trialsOfBlock);
            Gather(prepared, benches);
            done = next;
            progress?.Report(run.Trials);
            bool sure = run.IsSure(model);
            if (options.Trials is null && sure)
            {
                break;
            }

            run.IsCapped = done >= most && !sure;
        }

        return run;
    }

    private static void Gather(PreparedFigure[] prepared, TrialBench[] benches)
    {
        for (int figure = 0; figure < prepared.Length; figure++)
        {
            foreach (TrialBench bench in benches)
            {
                prepared[figure].Tally.TakeFrom(bench.Tallies[figure]);
            }

            prepared[figure].Tally.AddUp();
        }
    }

    private void Take(TrialWave wave, int trialsOfBlock)
    {
        for (int block = 0; block < wave.Blocks; block++)
        {
            for (int figure = 0; figure < _figures.Length; figure++)
            {
                _figures[figure].Add(wave.Sums[(block * _figures.Length) + figure], trialsOfBlock);
            }

            for (int joint = 0; joint < _joint.Length; joint++)
            {
                _joint[joint] += wave.Joint[(block * _joint.Length) + joint];
            }
        }

        Trials += (long)wave.Blocks * trialsOfBlock;
    }

    private bool IsSure(ITrialModel model)
    {
        for (int figure = 0; figure < _figures.Length; figure++)
        {
            if (!model.Figures[figure].Decides)
            {
                continue;
            }

            double tolerance = _figures[figure].Tolerance(Options.Digits);
            (double mean, double spread, double low, double high) = _figures[figure].TwiceErrors();
            if (mean > tolerance || spread > tolerance || low > tolerance || high > tolerance)
            {
                return false;
            }
        }

        for (int joint = 0; joint < _joint.Length; joint++)
        {
            double p = Joint(joint);
            if (2.0 * Math.Sqrt(p * (1.0 - p) / Trials) > JointError)
            {
                return false;
            }
        }

        return true;
    }

    /// <summary>Half a unit of the last digit wanted of a standard uncertainty, in its unit.</summary>
    /// <param name="u">The standard uncertainty, &gt; 0.</param>
    /// <param name="digits">Significant digits wanted, 1 or 2.</param>
    /// <remarks>u = c·10^l with c of so many digits; δ = ½·10^l. Source: jcgm101 (7.9.2). Valid for: u &gt; 0. Error: none.</remarks>
    public static double Tolerance(double u, int digits)
    {
        if (!(u > 0.0) || !double.IsFinite(u))
        {
            return double.PositiveInfinity;
        }

        // The power is read off the rounded number: 0.0996 to two digits is 0.10.
        int power = (int)Math.Floor(Math.Log10(u));
        double scaled = Math.Round(u * Math.Pow(10.0, digits - 1 - power));
        return 0.5 * Math.Pow(10.0, power - digits + (scaled >= Math.Pow(10.0, digits) ? 2 : 1));
    }

    // Where the figures lie, roughly, before anything is counted.
    private static double[][] RunPilot(ITrialModel model, ulong seed)
    {
        TrialTile tile = new(model.Sources);
        ITrialWorker worker = model.Worker();
        RandomLanes random = new(seed, Pilot);
        int figures = model.Figures.Count;
        double[] values = new double[figures * TrialTile.Trials], linear = new double[figures * TrialTile.Trials];
        double[][] pilot = [.. Enumerable.Range(0, figures).Select(_ => new double[PilotTiles * TrialTile.Trials])];
        for (int at = 0; at < PilotTiles; at++)
        {
            tile.Draw(ref random);
            worker.Compute(tile, values, linear);
            for (int figure = 0; figure < figures; figure++)
            {
                values.AsSpan(figure * TrialTile.Trials, TrialTile.Trials).CopyTo(pilot[figure].AsSpan(at * TrialTile.Trials));
            }
        }

        return pilot;
    }
}
