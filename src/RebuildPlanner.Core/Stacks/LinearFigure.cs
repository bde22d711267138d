using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.Stacks;

/// <summary>A figure read to first order: value, change for a unit of each source, worst limits, and what each doubt counts under.</summary>
/// <param name="Value">At the estimates, coherent unit.</param>
/// <param name="Row">Change for a unit of each source.</param>
/// <param name="Worst">The worst limits.</param>
/// <param name="Terms">The same changes with what they count under.</param>
public sealed record LinearFigure(double Value, IReadOnlyList<double> Row, WorstLimits Worst, IReadOnlyList<Term> Terms)
{
    /// <summary>The figure as trials show it, or null where none were run on it.</summary>
    public SampledFigure? Sampled { get; init; }

    /// <summary>The row without what counts under one thing: that thing known exactly.</summary>
    public double[] RowWithout(What what)
    {
        double[] row = [.. Row];
        foreach (Term term in Terms)
        {
            if (term.What == what)
            {
                row[term.Source] -= term.Coefficient;
            }
        }

        return row;
    }
}
