namespace RebuildPlanner.Core.Stacks;

/// <summary>Parts a model's sources between those that lines share, which are drawn, and those of one line alone, which are integrated.</summary>
internal sealed class SharedFactors
{
    // A line with less than this part of its variance to itself would be nearly a step; it is made smooth by one of its drawn factors instead.
    private const double EnoughOfItsOwn = 0.1;

    // A rectangle narrower than this beside every line it moves is drawn as a normal: it moves a probability by less than 3e-5.
    private const double Narrow = 0.3;

    private readonly List<(int Kind, int[] Lines, double[] Weights)> _drawn = [];
    private readonly List<double> _degreesOfFreedom = [];
    private readonly Dictionary<int, int> _poolPlaces = [];

    public SharedFactors(ReadOnlySpan<Source> sources, IReadOnlyList<LimitedLine> lines)
    {
        int count = lines.Count;
        double[] variances = new double[count], own = new double[count];
        List<(Source Source, int[] Lines, double[] Weights)> present = [];
        for (int s = 0; s < sources.Length; s++)
        {
            double u = sources[s].Shape == SourceShape.None ? 0.0 : sources[s].StandardUncertainty;
            int source = s;
            int[] moved = u == 0.0 ? [] : [.. Enumerable.Range(0, count).Where(line => lines[line].Row.Span[source] != 0.0)];
            if (moved.Length == 0)
            {
                continue;
            }

            double[] weights = [.. moved.Select(line => lines[line].Row.Span[source] * u)];
            present.Add((sources[s], moved, weights));
            for (int i = 0; i < moved.Length; i++)
            {
                variances[moved[i]] += weights[i] * weights[i];
                own[moved[i]] += moved.Length == 1 ? weights[i] * weights[i] : 0.0;
            }
        }

        List<double>[] halfWidths = [.. Enumerable.Range(0, count).Select(_ => new List<double>())];
        double[] normal = new double[count];
        Dictionary<int, double>[] pooled = [.. Enumerable.Range(0, count).Select(_ => new Dictionary<int, double>())];
        foreach ((Source source, int[] moved, double[] weights) in present)
        {
            int kind = Kind(source, moved, weights, variances), line = moved[0];
            if (moved.Length > 1 || own[line] < EnoughOfItsOwn * variances[line])
            {
                double unit = kind == Factor.Rectangle ? Math.Sqrt(3.0) : 1.0;
                _drawn.Add((kind, moved, [.. weights.Select(weight => unit * weight)]));
            }
            else if (source.Shape == SourceShape.Rectangular)
            {
                halfWidths[line].Add(Math.Abs(weights[0]) * Math.Sqrt(3.0));
            }
            else if (kind == Factor.Normal)
            {
                normal[line] += weights[0] * weights[0];
            }
            else
            {
                pooled[line][kind] = pooled[line].GetValueOrDefault(kind) + (weights[0] * weights[0]);
            }
        }

        Private = [.. Enumerable.Range(0, count).Select(line =>
            new PrivatePart(halfWidths[line], normal[line], [.. pooled[line].Select(entry => (entry.Key, entry.Value))]))];
        IsSmooth = [.. Enumerable.Range(0, count).Select(line => own[line] >= EnoughOfItsOwn * variances[line] && own[line] > 0.0)];
        Drawn = Reduced(variances);
    }

    /// <summary>ν of each pool, by its place.</summary>
    public IReadOnlyList<double> PoolDegreesOfFreedom => _degreesOfFreedom;

    /// <summary>The factors to draw, the weightiest first, where the point set is best.</summary>
    public Factor[] Drawn { get; }

    /// <summary>What each line has to itself.</summary>
    public PrivatePart[] Private { get; }

    /// <summary>Whether a line has enough to itself to be smooth in the draws.</summary>
    public bool[] IsSmooth { get; }

    private int Kind(in Source source, int[] moved, double[] weights, double[] variances)
    {
        if (source.Shape == SourceShape.Rectangular)
        {
            for (int i = 0; i < moved.Length; i++)
            {
                if (3.0 * weights[i] * weights[i] > Narrow * Narrow * variances[moved[i]])
                {
                    return Factor.Rectangle;
                }
            }

            return Factor.Normal;
        }

        if (source.Shape == SourceShape.Normal || double.IsPositiveInfinity(source.DegreesOfFreedom))
        {
            return Factor.Normal;
        }

        if (source.Pool < 0 || !_poolPlaces.TryGetValue(source.Pool, out int place))
        {
            place = _degreesOfFreedom.Count;
            _degreesOfFreedom.Add(source.DegreesOfFreedom);
            if (source.Pool >= 0)
            {
                _poolPlaces[source.Pool] = place;
            }
        }

        return place;
    }

    /// <summary>Normals that move the same lines, joined by their covariance into no more of them than lines.</summary>
    private Factor[] Reduced(double[] variances)
    {
        List<Factor> factors = [];
        foreach (var group in _drawn.GroupBy(entry => (entry.Kind, string.Join(',', entry.Lines))))
        {
            double[][] weights = [.. group.Select(entry => entry.Weights)];
            int[] lines = group.First().Lines;
            bool join = group.Key.Kind != Factor.Rectangle && weights.Length > 1;
            factors.AddRange((join ? [.. Joined(weights, lines.Length)] : weights).Select(weight => new Factor(group.Key.Kind, lines, weight)));
        }

        return [.. factors.OrderByDescending(
            factor => factor.Lines.Select((line, i) => factor.Weights[i] * factor.Weights[i] / variances[line]).Sum())];
    }

    /// <summary>The columns of the Cholesky factor of Σ w·wᵀ; a pivot that is nothing but rounding has no column.</summary>
    private static List<double[]> Joined(double[][] weights, int size)
    {
        double[,] rest = new double[size, size];
        foreach (double[] weight in weights)
        {
            for (int i = 0; i < size; i++)
            {
                for (int j = 0; j < size; j++)
                {
                    rest[i, j] += weight[i] * weight[j];
                }
            }
        }

        double[] whole = [.. Enumerable.Range(0, size).Select(i => rest[i, i])];
        List<double[]> columns = [];
        for (int pivot = 0; pivot < size; pivot++)
        {
            if (rest[pivot, pivot] <= 1e-12 * whole[pivot])
            {
                continue;
            }

            double root = Math.Sqrt(rest[pivot, pivot]);
            int at = pivot;
            double[] column = [.. Enumerable.Range(0, size).Select(i => i < at ? 0.0 : rest[i, at] / root)];
            for (int i = pivot; i < size; i++)
            {
                for (int j = pivot; j < size; j++)
                {
                    rest[i, j] -= column[i] * column[j];
                }
            }

            columns.Add(column);
        }

        return columns;
    }
}
