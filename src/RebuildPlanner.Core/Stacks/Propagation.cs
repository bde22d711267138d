using System.Runtime.Intrinsics;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>The law of propagation on rows of sensitivities to a model's sources. Nothing here allocates.</summary>
public static class Propagation
{
    /// <summary>The covariance of two figures, in the product of their units.</summary>
    /// <param name="sources">The model's sources, u in the unit of what each acts on.</param>
    /// <param name="a">The row of one figure, its unit per unit of each source.</param>
    /// <param name="b">The row of the other.</param>
    /// <remarks>
    /// cov(a, b) = Σ a_s·b_s·u_s²; there are no cross terms, since what correlates two figures is a source they share.
    /// Source: jcgm100 (F.1.2.3). Valid for: figures linear over the sources' spread. Error: rounding.
    /// </remarks>
    public static double Covariance(ReadOnlySpan<Source> sources, ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        double sum = 0.0;
        for (int s = 0; s < sources.Length; s++)
        {
            double u = sources[s].StandardUncertainty;
            sum += a[s] * b[s] * u * u;
        }

        return sum;
    }

    /// <summary>The covariances of many figures of one part with the same figures of another at once, each in its unit squared.</summary>
    /// <param name="variances">u² of each source.</param>
    /// <param name="a">For each source the sensitivities of all figures of the one part, side by side; their count a multiple of eight.</param>
    /// <param name="b">The same of the other part.</param>
    /// <param name="covariances">Where they go: as many as there are figures.</param>
    /// <remarks>
    /// The sum of <see cref="Covariance"/>, term by term in the same order, with figures where a register has its lanes: no figure's digits
    /// depend on the machine. Source: jcgm100 (F.1.2.3). Valid for: figures linear over the sources' spread. Error: rounding.
    /// </remarks>
    public static void Covariances(ReadOnlySpan<double> variances, ReadOnlySpan<double> a, ReadOnlySpan<double> b, Span<double> covariances)
    {
        for (int lane = 0; lane < covariances.Length; lane += Vector512<double>.Count)
        {
            Vector512<double> sum = Vector512<double>.Zero;
            for (int s = 0, at = lane; s < variances.Length; s++, at += covariances.Length)
            {
                sum += Vector512.Create(a[at..]) * Vector512.Create(b[at..]) * variances[s];
            }

            sum.CopyTo(covariances[lane..]);
        }
    }

    /// <summary>The combined standard uncertainty of a figure, in its unit.</summary>
    /// <param name="sources">The model's sources.</param>
    /// <param name="row">The figure's row.</param>
    /// <remarks>u = √cov(row, row). Source: jcgm100 (5.1.2). Valid for: figures linear over the sources' spread. Error: rounding.</remarks>
    public static double StandardUncertainty(ReadOnlySpan<Source> sources, ReadOnlySpan<double> row) =>
        Math.Sqrt(Covariance(sources, row, row));

    /// <summary>The variance of the linear sum by the laws of its parts, the figure's unit squared: a pool's t is wider than its s.</summary>
    /// <remarks>Σ a_s²·u_s², a pool's terms times ν/(ν − 2); without bound for ν ≤ 2. Source: jcgm101 (6.4.9). Valid for: every row. Error: rounding.</remarks>
    public static double VarianceOfLaws(ReadOnlySpan<Source> sources, ReadOnlySpan<double> row)
    {
        double variance = 0.0;
        for (int s = 0; s < sources.Length; s++)
        {
            double own = sources[s].IsDrawn ? Variance(sources[s], row[s]) : 0.0, freedom = sources[s].DegreesOfFreedom;
            if (own > 0.0)
            {
                variance += double.IsPositiveInfinity(freedom) ? own : freedom > 2.0 ? own * freedom / (freedom - 2.0) : double.PositiveInfinity;
            }
        }

        return variance;
    }

    /// <summary>The fewest degrees of freedom of a doubt that moves a figure, ∞ where all are known for certain.</summary>
    public static double LeastFreedom(ReadOnlySpan<Source> sources, ReadOnlySpan<double> row)
    {
        double least = double.PositiveInfinity;
        for (int s = 0; s < sources.Length; s++)
        {
            least = sources[s].IsDrawn && row[s] != 0.0 ? Math.Min(least, sources[s].DegreesOfFreedom) : least;
        }

        return least;
    }

    /// <summary>Adds an estimate's doubts, times a factor, to a row in the figure's unit per unit of each source.</summary>
    /// <param name="row">The row that is added to.</param>
    /// <param name="estimate">The estimate whose terms are added.</param>
    /// <param name="factor">The figure's sensitivity to the estimate.</param>
    /// <remarks>row_s += factor·c_s, the chain rule. Source: jcgm100 (5.1.3). Valid for: every row. Error: rounding.</remarks>
    public static void AddTo(Span<double> row, Estimate estimate, double factor) => AddTo(row, estimate.Terms, factor);

    /// <inheritdoc cref="AddTo(Span{double}, Estimate, double)"/>
    /// <param name="row">The row that is added to.</param>
    /// <param name="terms">The terms that are added.</param>
    /// <param name="factor">The figure's sensitivity to what they are terms of.</param>
    public static void AddTo(Span<double> row, IReadOnlyList<Term> terms, double factor)
    {
        for (int i = 0; i < terms.Count; i++)
        {
            row[terms[i].Source] += factor * terms[i].Coefficient;
        }
    }

    /// <summary>The effective degrees of freedom of a figure, a number ≥ 1, ∞ where no part has finitely many.</summary>
    /// <param name="sources">The model's sources.</param>
    /// <param name="row">The figure's row.</param>
    /// <remarks>
    /// ν_eff = u⁴/Σ(u_i⁴/ν_i), all terms of a pool being one part u_i: they were judged from the same s, so their errors do not average out.
    /// Source: jcgm100 (G.4.1). Valid for: independent parts. Error: the formula is itself an approximation.
    /// </remarks>
    public static double EffectiveDegreesOfFreedom(ReadOnlySpan<Source> sources, ReadOnlySpan<double> row)
    {
        double variance = 0.0, sum = 0.0;
        for (int s = 0; s < sources.Length; s++)
        {
            double own = Variance(sources[s], row[s]);
            variance += own;
            if (own == 0.0 || double.IsPositiveInfinity(sources[s].DegreesOfFreedom))
            {
                continue;
            }

            // A pool's terms are gathered where its first one stands.
            if (sources[s].Pool >= 0)
            {
                if (StandsEarlier(sources[..s], row, sources[s].Pool))
                {
                    continue;
                }

                for (int other = s + 1; other < sources.Length; other++)
                {
                    own += sources[other].Pool == sources[s].Pool ? Variance(sources[other], row[other]) : 0.0;
                }
            }

            sum += own * own / sources[s].DegreesOfFreedom;
        }

        return sum == 0.0 ? double.PositiveInfinity : variance * variance / sum;
    }

    /// <summary>The factor k by which u is multiplied for an interval of the given coverage, without unit.</summary>
    /// <param name="effectiveDegreesOfFreedom">ν_eff, ≥ 1; a part of one is left off.</param>
    /// <param name="coverage">The probability wanted, between 0 and 1.</param>
    /// <remarks>
    /// k = t_p(ν_eff), ν_eff rounded to two decimals and then truncated: the standard's own 18.999 is its 19.0. For the method notes and the
    /// standard's own examples: with a dominant rectangular part k·u may pass the worst case, so results use <see cref="LinearSum"/>.
    /// Source: jcgm100 (G.4.1, G.6.4). Valid for: a nearly normal sum. Error: see there.
    /// </remarks>
    public static double CoverageFactor(double effectiveDegreesOfFreedom, double coverage = 0.95) =>
        StudentT.Quantile(0.5 + (0.5 * coverage), Math.Truncate(Math.Round(effectiveDegreesOfFreedom, 2)));

    private static double Variance(in Source source, double coefficient)
    {
        double u = coefficient * source.StandardUncertainty;
        return u * u;
    }

    private static bool StandsEarlier(ReadOnlySpan<Source> earlier, ReadOnlySpan<double> row, int pool)
    {
        for (int s = 0; s < earlier.Length; s++)
        {
            if (earlier[s].Pool == pool && Variance(earlier[s], row[s]) != 0.0)
            {
                return true;
            }
        }

        return false;
    }
}
