using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>The least and greatest a figure can be with every source anywhere between its worst limits.</summary>
/// <param name="Low">The least.</param>
/// <param name="High">The greatest.</param>
/// <param name="Exact">True where both are attained at a corner proved to be the extreme; false where they are only certain bounds.</param>
public readonly record struct WorstLimits(double Low, double High, bool Exact);

/// <summary>The worst case: exact corners where an output is monotone in every source, proved by interval derivatives; certain bounds elsewhere.</summary>
/// <remarks>
/// The derivative is taken by source, not by input, so that an error shared by several inputs, or by two cylinders in a spread,
/// cancels as it does in the engine. Source: ieee1788.
/// </remarks>
public sealed class WorstCase
{
    private const int Inputs = CylinderFigures<Real>.Count;
    private const int Outputs = CylinderStack<Real>.Count;

    private readonly EngineModel _model;
    private readonly int _sources;
    private readonly Interval[] _slopes;
    private readonly WorstLimits[] _limits;

    /// <summary>Bounds every output of every cylinder of a model.</summary>
    public WorstCase(EngineModel model)
    {
        _model = model;
        _sources = model.Sources.Length;
        int cylinders = model.Cylinders.Count;
        _slopes = new Interval[cylinders * Outputs * _sources];
        _limits = new WorstLimits[cylinders * Outputs];
        for (int cylinder = 0; cylinder < cylinders; cylinder++)
        {
            BoundSlopes(cylinder);
            for (int output = 0; output < Outputs; output++)
            {
                ReadOnlySpan<Interval> slopes = Slopes(cylinder, output);
                _limits[(cylinder * Outputs) + output] = Between(
                    slopes, Extreme(slopes, upper: false, cylinder, output), Extreme(slopes, upper: true, cylinder, output));
            }
        }
    }

    /// <summary>The worst limits of one output, coherent unit.</summary>
    public WorstLimits Limits(int cylinder, Output output) => _limits[(cylinder * Outputs) + (int)output];

    /// <summary>The worst limits of the difference of one output between two cylinders, coherent unit.</summary>
    public WorstLimits Difference(Output output, int minuend, int subtrahend)
    {
        ReadOnlySpan<Interval> up = Slopes(minuend, (int)output), down = Slopes(subtrahend, (int)output);
        Span<Interval> slopes = new Interval[_sources];
        for (int source = 0; source < _sources; source++)
        {
            slopes[source] = up[source] - down[source];
        }

        return Between(
            slopes,
            Extreme(slopes, upper: false, minuend, (int)output) - Extreme(slopes, upper: false, subtrahend, (int)output, opposite: true),
            Extreme(slopes, upper: true, minuend, (int)output) - Extreme(slopes, upper: true, subtrahend, (int)output, opposite: true));
    }

    /// <summary>The worst limits of the sum of one output over all cylinders, coherent unit.</summary>
    public WorstLimits Sum(Output output)
    {
        Span<Interval> slopes = new Interval[_sources];
        for (int cylinder = 0; cylinder < _model.Cylinders.Count; cylinder++)
        {
            ReadOnlySpan<Interval> own = Slopes(cylinder, (int)output);
            for (int source = 0; source < _sources; source++)
            {
                slopes[source] += own[source];
            }
        }

        End low = default, high = default;
        for (int cylinder = 0; cylinder < _model.Cylinders.Count; cylinder++)
        {
            low += Extreme(slopes, upper: false, cylinder, (int)output);
            high += Extreme(slopes, upper: true, cylinder, (int)output);
        }

        return Between(slopes, low, high);
    }

    /// <summary>The worst limits of a figure that is exactly linear in its sources, coherent unit.</summary>
    /// <param name="sources">The model's sources.</param>
    /// <param name="value">The figure at the estimates.</param>
    /// <param name="row">Its change for a unit of each source.</param>
    public static WorstLimits OfLinear(ReadOnlySpan<Source> sources, double value, ReadOnlySpan<double> row)
    {
        double low = value, high = value;
        for (int source = 0; source < row.Length; source++)
        {
            double a = row[source] * sources[source].WorstLow, b = row[source] * sources[source].WorstHigh;
            low += Math.Min(a, b);
            high += Math.Max(a, b);
        }

        return new WorstLimits(low, high, Exact: true);
    }

    /// <summary>Bounds the slope of every output of a cylinder to every source over the whole box of worst limits.</summary>
    private void BoundSlopes(int cylinder)
    {
        CylinderForm form = _model.Cylinders[cylinder].Form;
        CylinderFigures<Dual<Interval>> duals = default;
        for (int input = 0; input < Inputs; input++)
        {
            duals[input] = new Dual<Interval>(Box(cylinder, input), default);
        }

        for (int input = 0; input < Inputs; input++)
        {
            ReadOnlySpan<Term> terms = _model.TermsOf(cylinder, input);
            if (terms.IsEmpty)
            {
                continue;
            }

            Interval box = duals[input].Value;
            duals[input] = new Dual<Interval>(box, Interval.From(1.0));
            CylinderStack<Dual<Interval>>.Compute(duals, form, out CylinderStack<Dual<Interval>> stack);
            duals[input] = new Dual<Interval>(box, default);
            for (int output = 0; output < Outputs; output++)
            {
                Interval slope = stack[output].Derivative;
                Span<Interval> slopes = _slopes.AsSpan(((cylinder * Outputs) + output) * _sources, _sources);
                foreach (Term term in terms)
                {
                    slopes[term.Source] += term.Coefficient * slope;
                }
            }
        }
    }

    /// <summary>One end of a figure, found two ways from the sources of proved direction.</summary>
    /// <param name="Bound">With the sources of unproved direction left as intervals: certain.</param>
    /// <param name="Corner">With those at their centres.</param>
    /// <param name="Size">How large the numbers were that it was made of, for what rounding may do.</param>
    private readonly record struct End(double Bound, double Corner, double Size)
    {
        public static End operator +(End left, End right) => new(left.Bound + right.Bound, left.Corner + right.Corner, left.Size + right.Size);

        public static End operator -(End left, End right) => new(left.Bound - right.Bound, left.Corner - right.Corner, left.Size + right.Size);
    }

    /// <summary>The limits from both ends: the nearer of the bound and of the corner moved by what the unproved slopes can make of it.</summary>
    /// <remarks>
    /// An error shared by two cylinders has in their difference a slope of zero, which outward rounding turns into a sliver on both sides of
    /// zero. As an interval in each cylinder by itself it would not cancel; by the mean value theorem it does, up to the sliver. Source: ieee1788.
    /// </remarks>
    private WorstLimits Between(ReadOnlySpan<Interval> slopes, End low, End high)
    {
        const double rounding = 1e-12;
        Interval rest = default;
        bool proved = true;
        for (int source = 0; source < _sources; source++)
        {
            Source own = _model.Sources[source];
            if (!slopes[source].IsNonNegative && !slopes[source].IsNonPositive && own.WorstLow != own.WorstHigh)
            {
                rest += slopes[source] * new Interval(own.WorstLow, own.WorstHigh);
                proved = false;
            }
        }

        if (proved)
        {
            return new WorstLimits(low.Corner, high.Corner, Exact: true);
        }

        // Comparisons that a number without meaning fails leave the bound standing.
        double nearLow = low.Corner + rest.Low, nearHigh = high.Corner + rest.High;
        return new WorstLimits(
            nearLow > low.Bound ? nearLow : low.Bound,
            nearHigh < high.Bound ? nearHigh : high.Bound,
            Exact: Math.Max(-rest.Low, rest.High) <= rounding * Math.Max(low.Size, high.Size));
    }

    /// <summary>The output with each source at the end that makes the guiding figure extreme; a source of unproved direction is left as an interval.</summary>
    /// <param name="slopes">Slopes of the guiding figure: the output itself, a difference or a sum it takes part in.</param>
    /// <param name="upper">Whether the guiding figure is made greatest, else least.</param>
    /// <param name="opposite">Whether this output counts against the guiding figure, so that its bound is taken on the other side.</param>
    private End Extreme(
        ReadOnlySpan<Interval> slopes, bool upper, int cylinder, int output, bool opposite = false)
    {
        CylinderForm form = _model.Cylinders[cylinder].Form;
        CylinderFigures<Interval> bounds = default;
        CylinderFigures<Real> corner = default;
        bool exact = true;
        for (int input = 0; input < Inputs; input++)
        {
            double fixedPart = _model.EstimateOf(cylinder, (Input)input).Value;
            Interval loosePart = default;
            foreach (Term term in _model.TermsOf(cylinder, input))
            {
                Source source = _model.Sources[term.Source];
                Interval slope = slopes[term.Source];
                if (slope.IsNonNegative || slope.IsNonPositive)
                {
                    fixedPart += term.Coefficient * (slope.IsNonNegative == upper ? source.WorstHigh : source.WorstLow);
                }
                else if (source.WorstLow != source.WorstHigh)
                {
                    exact = false;
                    loosePart += term.Coefficient * new Interval(source.WorstLow, source.WorstHigh);
                }
            }

            corner[input] = new Real(fixedPart);
            bounds[input] = Interval.From(fixedPart) + loosePart;
        }

        CylinderStack<Real>.Compute(corner, form, out CylinderStack<Real> stack);
        double at = stack[output].Value;
        if (exact)
        {
            return new End(at, at, Math.Abs(at));
        }

        CylinderStack<Interval>.Compute(bounds, form, out CylinderStack<Interval> bounded);
        return new End(upper == opposite ? bounded[output].Low : bounded[output].High, at, Math.Abs(at));
    }

    private Interval Box(int cylinder, int input)
    {
        Interval box = Interval.From(_model.EstimateOf(cylinder, (Input)input).Value);
        foreach (Term term in _model.TermsOf(cylinder, input))
        {
            Source source = _model.Sources[term.Source];
            box += term.Coefficient * new Interval(source.WorstLow, source.WorstHigh);
        }

        return box;
    }

    private ReadOnlySpan<Interval> Slopes(int cylinder, int output) =>
        _slopes.AsSpan(((cylinder * Outputs) + output) * _sources, _sources);
}
