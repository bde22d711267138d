namespace RebuildPlanner.Core.Stacks;

/// <summary>Averages of blocks of trials, and how sure their average is: from the blocks themselves, not from a formula.</summary>
internal struct BlockSpread
{
    private int _blocks;
    private double _mean, _squares;

    /// <summary>The average over the blocks.</summary>
    public readonly double Mean => _mean;

    /// <summary>The standard deviation of the average, infinite below two blocks.</summary>
    /// <remarks>s/√h. Source: jcgm101 (7.9.4). Valid for: blocks of equal size. Error: that of s from so many blocks.</remarks>
    public readonly double ErrorOfMean => _blocks < 2 ? double.PositiveInfinity : Math.Sqrt(_squares / (_blocks - 1) / _blocks);

    /// <summary>Takes a block in.</summary>
    public void Add(double block)
    {
        _blocks++;
        double step = block - _mean;
        _mean += step / _blocks;
        _squares += step * (block - _mean);
    }
}
