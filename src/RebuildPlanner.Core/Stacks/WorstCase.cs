using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>The least and greatest a figure can be with every source anywhere between its worst limits.</summary>
/// <param name="Low">The least.</param>
/// <param name="High">The greatest.</param>
/// <param name="Slack">
/// How much wider than the truth the limits may be: 0 where both are attained at a corner proved to be the extreme; more where the direction
/// of some source could not be proved and they are certain bounds.
/// </param>
public readonly record struct WorstLimits(double Low, double High, double Slack)
{
    /// <summary>True where both limits are attained.</summary>
    public bool Exact => Slack == 0.0;
}

/// <summary>The worst case: exact corners where an output is monotone in every source, proved by interval derivatives; certain bounds elsewhere.</summary>
/// <remarks>
/// The derivative is taken by source, not by input, so that an error shared by several inputs, or by two cylinders in a spread,
/// cancels as it does in the engine. A source whose direction is not proved is left at its middle and adds the most its slope can make of it
/// (the mean value theorem): an interval evaluation in its place was up to a hundred times wider for the rod of an offset pin.
/// Source: ieee1788.
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
                _limits[(cylinder * Outputs) + output] = Limits(Slopes(cylinder, output), (Output)output, [(cylinder, 1.0)]);
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

        return Limits(slopes, output, [(minuend, 1.0), (subtrahend, -1.0)]);
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

        return Limits(slopes, output, [.. Enumerable.Range(0, _model.Cylinders.Count).Select(cylinder => (cylinder, 1.0))]);
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

        return new WorstLimits(low, high, Slack: 0.0);
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

    /// <summary>The limits of a signed sum of one output over some cylinders, with the slopes of that sum.</summary>
    private WorstLimits Limits(ReadOnlySpan<Interval> slopes, Output output, ReadOnlySpan<(int Cylinder, double Sign)> members)
    {
        double low = 0.0, high = 0.0, loose = 0.0;
        foreach ((int cylinder, double sign) in members)
        {
            low += sign * AtCorner(slopes, upper: false, cylinder, output);
            high += sign * AtCorner(slopes, upper: true, cylinder, output);
        }

        for (int source = 0; source < _sources; source++)
        {
            if (!IsProved(slopes[source]))
            {
                Source doubt = _model.Sources[source];
                Interval reach = slopes[source] * new Interval(doubt.WorstLow, doubt.WorstHigh);
                loose += Math.Max(-reach.Low, reach.High);
            }
        }

        return new WorstLimits(low - loose, high + loose, 2.0 * loose);
    }

    /// <summary>The output with each source of proved direction at the end that makes the guiding sum extreme, the others at their middle.</summary>
    private double AtCorner(ReadOnlySpan<Interval> slopes, bool upper, int cylinder, Output output)
    {
        CylinderFigures<Real> corner = default;
        for (int input = 0; input < Inputs; input++)
        {
            double value = _model.EstimateOf(cylinder, (Input)input).Value;
            foreach (Term term in _model.TermsOf(cylinder, input))
            {
                Interval slope = slopes[term.Source];
                if (IsProved(slope))
                {
                    Source source = _model.Sources[term.Source];
                    value += term.Coefficient * (slope.IsNonNegative == upper ? source.WorstHigh : source.WorstLow);
                }
            }

            corner[input] = new Real(value);
        }

        CylinderStack<Real>.Compute(corner, _model.Cylinders[cylinder].Form, out CylinderStack<Real> stack);
        return stack.Of(output).Value;
    }

    private static bool IsProved(Interval slope) => slope.IsNonNegative || slope.IsNonPositive;

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
