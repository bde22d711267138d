using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Measuring;

/// <summary>A figure's best value and the doubts it carries, linear in each. Readings, given figures, assumed figures and cuts all end as this.</summary>
/// <param name="Value">The best value, in the coherent unit of its kind (mm, mm², mm³, rad, kPa).</param>
/// <param name="Terms">The doubts; empty for a figure taken as exact.</param>
public sealed record Estimate(double Value, IReadOnlyList<Term> Terms)
{
    /// <summary>The figure that is absent: exactly zero.</summary>
    public static Estimate Zero { get; } = new(0.0, []);

    /// <summary>A number taken as exact.</summary>
    public static Estimate Exact(double value) => new(value, []);

    /// <summary>The sum of estimates, each times a factor; shared sources stay shared.</summary>
    /// <param name="parts">Factor and estimate, in any order.</param>
    public static Estimate Combine(params ReadOnlySpan<(double Factor, Estimate Estimate)> parts)
    {
        double value = 0.0;
        List<Term> terms = [];
        foreach ((double factor, Estimate estimate) in parts)
        {
            value += factor * estimate.Value;
            foreach (Term term in estimate.Terms)
            {
                terms.Add(term with { Coefficient = factor * term.Coefficient });
            }
        }

        return new(value, terms);
    }
}
