using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Measuring;

/// <summary>A formula of a few figures that gives another figure.</summary>
public interface IFormula
{
    /// <summary>The formula.</summary>
    static abstract T Of<T>(ReadOnlySpan<T> figures)
        where T : struct, IScalar<T>;
}

/// <summary>Carries a formula that is not linear into an estimate, which is.</summary>
public static class DerivedEstimate
{
    /// <summary>The formula at the estimates, with the doubts of each through its slope.</summary>
    /// <param name="book">Where the doubts are kept.</param>
    /// <param name="what">What the remainder counts under.</param>
    /// <param name="inputs">The estimates the formula reads, in its order; the same source may stand in several.</param>
    /// <remarks>
    /// What the straight line leaves out is bounded by the change of slope over the box of worst limits and joins the worst case as a doubt
    /// of its own, so that the limits stay certain; in the distribution it is of second order and left out. Source: jcgm100 (5.1.2).
    /// </remarks>
    public static Estimate Of<TFormula>(SourceBook book, What what, params ReadOnlySpan<Estimate> inputs)
        where TFormula : IFormula
    {
        Dual<Real>[] point = new Dual<Real>[inputs.Length];
        Dual<Interval>[] box = new Dual<Interval>[inputs.Length];
        double[] radius = new double[inputs.Length];
        for (int input = 0; input < inputs.Length; input++)
        {
            (double low, double high) = Worst(book, inputs[input]);
            point[input] = new Dual<Real>(new Real(inputs[input].Value), default);
            box[input] = new Dual<Interval>(new Interval(inputs[input].Value + low, inputs[input].Value + high), default);
            radius[input] = Math.Max(-low, high);
        }

        double value = TFormula.Of<Dual<Real>>(point).Value.Value;
        List<Term> terms = [];
        double remainder = 0.0;
        for (int input = 0; input < inputs.Length; input++)
        {
            Dual<Real> plain = point[input];
            Dual<Interval> bounds = box[input];
            point[input] = new Dual<Real>(plain.Value, Real.From(1.0));
            box[input] = new Dual<Interval>(bounds.Value, Interval.From(1.0));
            double slope = TFormula.Of<Dual<Real>>(point).Derivative.Value;
            Interval slopes = TFormula.Of<Dual<Interval>>(box).Derivative;
            point[input] = plain;
            box[input] = bounds;

            terms.AddRange(inputs[input].Terms.Select(term => term with { Coefficient = slope * term.Coefficient }));
            remainder += Math.Max(slopes.High - slope, slope - slopes.Low) * radius[input];
        }

        if (remainder > 1e-9 * Math.Abs(value))
        {
            terms.Add(new Term(book.Add(Source.WorstOnly(-remainder, remainder)), 1.0, what));
        }

        return new Estimate(value, terms);
    }

    private static (double Low, double High) Worst(SourceBook book, Estimate estimate)
    {
        double low = 0.0, high = 0.0;
        foreach (Term term in estimate.Terms)
        {
            Source source = book.Sources[term.Source];
            double a = term.Coefficient * source.WorstLow, b = term.Coefficient * source.WorstHigh;
            low += Math.Min(a, b);
            high += Math.Max(a, b);
        }

        return (low, high);
    }
}
