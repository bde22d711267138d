namespace RebuildPlanner.Core.Stacks;

/// <summary>The probability that several figures over the same sources all lie inside their limits at once.</summary>
public static class JointProbability
{
    // What is neither proven nor disproven by less than this is not told apart on any sheet.
    private const double Settled = 1e-6;

    /// <summary>The probability that every line holds, without unit.</summary>
    /// <param name="sources">The model's sources.</param>
    /// <param name="lines">The figures with their limits; none at all hold with certainty.</param>
    /// <remarks>
    /// Between max(0, 1 − Σ(1 − p_i)) and min p_i; where the two agree no more is asked. Lines whose rows are multiples of one another are first made
    /// one. The rest by a fixed set of 4096 points, so that the same job gives the same figure every time.
    /// Source: genzbretz2009. Valid for: independent sources. Error: 1e-3, 1e-6 where the bounds agree.
    /// </remarks>
    public static double Of(ReadOnlySpan<Source> sources, IReadOnlyList<LimitedLine> lines)
    {
        List<LimitedLine> open = [];
        double allBut = 1.0, least = 1.0;
        foreach (LimitedLine line in Joined(sources, lines))
        {
            double alone = new LinearSum(sources, line.Row.Span).Inside(line.Low, line.High);
            allBut -= 1.0 - alone;
            least = Math.Min(least, alone);
            if (alone < 1.0 - (Settled / (10.0 * lines.Count)))
            {
                open.Add(line);
            }
        }

        double bound = Math.Max(0.0, allBut);
        return open.Count < 2 || least - bound < Settled
            ? Math.Clamp(open.Count < 2 ? least : 0.5 * (least + bound), 0.0, 1.0)
            : Math.Clamp(new ConditionedLines(sources, open).Average(), bound, least);
    }

    /// <summary>The lines with every set of parallel rows made one line, inside all their limits.</summary>
    private static List<LimitedLine> Joined(ReadOnlySpan<Source> sources, IReadOnlyList<LimitedLine> lines)
    {
        List<LimitedLine> joined = [];
        foreach (LimitedLine line in lines)
        {
            bool found = false;
            for (int i = 0; i < joined.Count && !found; i++)
            {
                LimitedLine other = joined[i];
                double factor = Multiple(sources, other.Row.Span, line.Row.Span);
                if (factor != 0.0)
                {
                    double low = line.Low / factor, high = line.High / factor;
                    joined[i] = other with { Low = Math.Max(other.Low, Math.Min(low, high)), High = Math.Min(other.High, Math.Max(low, high)) };
                    found = true;
                }
            }

            if (!found)
            {
                joined.Add(line);
            }
        }

        return joined;
    }

    /// <summary>k where b = k·a in every source that has a law, else 0.</summary>
    private static double Multiple(ReadOnlySpan<Source> sources, ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        double aa = Propagation.Covariance(sources, a, a), ab = Propagation.Covariance(sources, a, b), bb = Propagation.Covariance(sources, b, b);
        if (aa == 0.0 || bb == 0.0 || ab * ab < aa * bb * (1.0 - 1e-9))
        {
            return 0.0;
        }

        // Covariance sees a difference only squared; a tenth of a millionth of u in any one source settles it.
        double k = ab / aa, allowed = 1e-7 * Math.Sqrt(bb);
        for (int s = 0; s < sources.Length; s++)
        {
            if (Math.Abs(b[s] - (k * a[s])) * sources[s].StandardUncertainty > allowed)
            {
                return 0.0;
            }
        }

        return k;
    }
}
