using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>Some blocks of trials that are run at once, by as many as there are benches. Who runs which block changes nothing.</summary>
internal sealed class TrialWave
{
    private readonly ITrialModel _model;
    private readonly int _tiles;
    private readonly ulong _seed;
    private int _first, _end, _next;

    /// <summary>Makes room for the sums, used wave after wave.</summary>
    /// <param name="model">What the trials are run on.</param>
    /// <param name="mostBlocks">The most blocks of a wave.</param>
    /// <param name="tiles">Tiles a block.</param>
    /// <param name="seed">The seed of the run.</param>
    public TrialWave(ITrialModel model, int mostBlocks, int tiles, ulong seed)
    {
        (_model, _tiles, _seed) = (model, tiles, seed);
        Sums = new BlockSums[mostBlocks * model.Figures.Count];
        Joint = new int[mostBlocks * model.Joints.Count];
    }

    /// <summary>How many blocks.</summary>
    public int Blocks => _end - _first;

    /// <summary>What each block says of each figure, block by block.</summary>
    public BlockSums[] Sums { get; }

    /// <summary>In how many trials of each block the limits of each joint held.</summary>
    public int[] Joint { get; }

    /// <summary>Runs blocks.</summary>
    /// <param name="first">The first.</param>
    /// <param name="end">The one after the last.</param>
    /// <param name="benches">Who computes.</param>
    /// <param name="cancellation">Ends the run between two blocks.</param>
    /// <exception cref="OperationCanceledException">It was ended.</exception>
    public void Run(int first, int end, TrialBench[] benches, CancellationToken cancellation)
    {
        (_first, _end, _next) = (first, end, first - 1);
        Array.Clear(Sums);
        Array.Clear(Joint);
        Thread[] others = [.. benches.Skip(1).Take(Blocks - 1).Select(bench => new Thread(() => Run(bench, cancellation)))];
        Array.ForEach(others, thread => thread.Start());
        Run(benches[0], cancellation);
        Array.ForEach(others, thread => thread.Join());
        cancellation.ThrowIfCancellationRequested();
    }

    private void Run(TrialBench bench, CancellationToken cancellation)
    {
        int figures = _model.Figures.Count, joints = _model.Joints.Count;
        for (int block = Interlocked.Increment(ref _next); block < _end && !cancellation.IsCancellationRequested; block = Interlocked.Increment(ref _next))
        {
            int place = block - _first;
            bench.Run(new RandomLanes(_seed, (ulong)block), _tiles, Sums.AsSpan(place * figures, figures), Joint.AsSpan(place * joints, joints));
        }
    }
}
