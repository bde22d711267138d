namespace RebuildPlanner.Core.Stacks;

/// <summary>What a linear sum is made of, in units of its own size: rectangles, one normal, and a t for each pool.</summary>
internal sealed class Components
{
    // Below this part of the widest a doubt changes no probability by more than a millionth of a millionth, whatever its law.
    private const double Negligible = 1e-7;
    private static readonly double RootThree = Math.Sqrt(3.0);

    private Components(double unit, double[] halfWidths, double standardDeviation, (double Scale, double DegreesOfFreedom)[] pools) =>
        (Unit, HalfWidths, StandardDeviation, Pools) = (unit, halfWidths, standardDeviation, pools);

    /// <summary>The size of the sum, in the figure's unit: what the numbers below are multiples of.</summary>
    public double Unit { get; }

    /// <summary>Half-widths of the rectangles, widest first.</summary>
    public double[] HalfWidths { get; }

    /// <summary>Standard deviation of all normals together.</summary>
    public double StandardDeviation { get; }

    /// <summary>Scale and ν of each pool's t.</summary>
    public (double Scale, double DegreesOfFreedom)[] Pools { get; }

    /// <summary>Gathers the components of a row.</summary>
    public static Components Of(ReadOnlySpan<Source> sources, ReadOnlySpan<double> row)
    {
        if (sources.Length != row.Length)
        {
            throw new ArgumentException("A row has one sensitivity for each source.", nameof(row));
        }

        double largest = 0.0;
        for (int s = 0; s < sources.Length; s++)
        {
            largest = Math.Max(largest, Size(sources[s], row[s]));
        }

        if (largest == 0.0)
        {
            return new(0.0, [], 0.0, []);
        }

        List<double> halfWidths = [];
        List<(int Pool, double DegreesOfFreedom, double Variance)> pools = [];
        double normal = 0.0;
        for (int s = 0; s < sources.Length; s++)
        {
            double size = Size(sources[s], row[s]) / largest;
            if (size == 0.0)
            {
                continue;
            }

            SourceShape shape = sources[s].Shape;
            bool endless = shape == SourceShape.Pooled && double.IsPositiveInfinity(sources[s].DegreesOfFreedom);
            if (shape == SourceShape.Normal || endless || (shape == SourceShape.Rectangular && size < Negligible))
            {
                normal += size * size;
            }
            else if (shape == SourceShape.Rectangular)
            {
                halfWidths.Add(size * RootThree);
            }
            else
            {
                int number = sources[s].Pool, known = number < 0 ? -1 : pools.FindIndex(pool => pool.Pool == number);
                if (known < 0)
                {
                    pools.Add((number, sources[s].DegreesOfFreedom, size * size));
                }
                else
                {
                    pools[known] = pools[known] with { Variance = pools[known].Variance + (size * size) };
                }
            }
        }

        halfWidths.Sort((a, b) => b.CompareTo(a));
        return new(largest, [.. halfWidths], Math.Sqrt(normal), [.. pools.Select(pool => (Math.Sqrt(pool.Variance), pool.DegreesOfFreedom))]);
    }

    /// <summary>The same without the widest rectangles.</summary>
    public Components Without(int widest) => new(Unit, HalfWidths[widest..], StandardDeviation, Pools);

    private static double Size(in Source source, double coefficient) =>
        source.Shape == SourceShape.None ? 0.0 : Math.Abs(coefficient) * source.StandardUncertainty;
}
