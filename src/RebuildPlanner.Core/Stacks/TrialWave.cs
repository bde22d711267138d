using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>Some blocks of trials that are run at once, by as many as there are benches. Who runs which block changes nothing.</summary>
internal sealed class TrialWave
{
    private readonly ITrialModel _model;
    private readonly int _first, _end, _tiles;
    private readonly ulong _seed;
    private int _next;

    /// <summary>Makes room for the sums.</summary>
    /// <param name="model">What the trials are run on.</param>
    /// <param name="first">The first block.</param>
    /// <param name="end">The one after the last.</param>
    /// <param name="tiles">Tiles a block.</param>
    /// <param name="seed">The seed of the run.</param>
    public TrialWave(ITrialModel model, int first, int end, int tiles, ulong seed)
    {
        (_model, _first, _end, _tiles, _seed, _next) = (model, first, end, tiles, seed, first - 1);
        Sums = new BlockSums[Blocks * model.Figures.Count];
        Joint = new int[Blocks * model.Joints.Count];
    }

    /// <summary>How many blocks.</summary>
    public int Blocks => _end - _first;

    /// <summary>What each block says of each figure, block by block.</summary>
    public BlockSums[] Sums { get; }

    /// <summary>In how many trials of each block the limits of each joint held.</summary>
    public int[] Joint { get; }

    /// <summary>Runs the blocks.</summary>
    /// <exception cref="OperationCanceledException">The run was ended between two blocks.</exception>
    public void Run(TrialBench[] benches, CancellationToken cancellation)
    {
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
