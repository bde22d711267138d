using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Every figure of a stage that a result or a verdict may ask for, read to first order and in the worst case.</summary>
public sealed class StageFigures
{
    private readonly StageModel _model;
    private readonly WorstCase _worst;
    private EngineTrials? _trials;

    /// <summary>Reads a model both ways.</summary>
    public StageFigures(StageModel model)
    {
        _model = model;
        FirstOrder = new FirstOrder(model.Model);
        _worst = new WorstCase(model.Model);
    }

    /// <summary>The first-order reading.</summary>
    public FirstOrder FirstOrder { get; }

    /// <summary>The trials that were run, or null.</summary>
    public MonteCarlo? Run { get; private set; }

    /// <summary>Whether intervals and probabilities are those of the trials, not of first order. Values and standard uncertainties are first order always.</summary>
    public bool TrialsCount { get; private set; }

    /// <summary>Takes trials in, to count in the place of first order or to stand behind it.</summary>
    public void Take(EngineTrials trials, MonteCarlo run, bool count) => (_trials, Run, TrialsCount) = (trials, run, count);

    /// <summary>Whether first order proves a spread to be one: the extreme pair differs by more than its half-width.</summary>
    /// <remarks>Trials cannot tell: the largest of equal cylinders less the smallest is above zero in every one of them.</remarks>
    public bool Differs(LinearFigure spread) => FirstOrderLimits(spread.Value, [.. spread.Row]).Low > 0.0;

    /// <summary>Sum of the swept volumes, or null where one is missing, mm³.</summary>
    public LinearFigure? Displacement
    {
        get
        {
            LinearFigure?[] swept = [.. Cylinders.Select(cylinder => Of(Output.SweptVolume, cylinder))];
            if (Array.Exists(swept, figure => figure is null))
            {
                return null;
            }

            Term[] terms = [.. swept.SelectMany(figure => figure!.Terms)];
            return new LinearFigure(swept.Sum(figure => figure!.Value), Row(terms), _worst.Sum(Output.SweptVolume), terms) { Sampled = Sampled(_trials?.Displacement) };
        }
    }

    private IEnumerable<int> Cylinders => Enumerable.Range(0, _model.Model.Cylinders.Count);

    /// <summary>One output of one cylinder, or null where its figures do not suffice.</summary>
    public LinearFigure? Of(Output output, int cylinder)
    {
        if (!FirstOrder.IsKnown(cylinder, output))
        {
            return null;
        }

        List<Term> terms = [];
        for (int input = 0; input < CylinderFigures<Real>.Count; input++)
        {
            double slope = FirstOrder.Sensitivity(cylinder, output, (Input)input);
            if (slope == 0.0)
            {
                continue;
            }

            foreach (Term term in _model.Model.DoubtsOf(cylinder, input))
            {
                terms.Add(term with { Coefficient = slope * term.Coefficient });
            }
        }

        return new LinearFigure(
            FirstOrder.Value(cylinder, output), FirstOrder.Row(cylinder, output), _worst.Limits(cylinder, output), terms)
        {
            Sampled = Sampled(_trials?.PlaceOf(output, cylinder)),
        };
    }

    private SampledFigure? Sampled(int? place) => place is { } at ? Run?.Figures[at] : null;

    /// <summary>A figure that is linear in what was measured, as it stands or combined.</summary>
    public LinearFigure Linear(params ReadOnlySpan<(double Factor, Estimate Estimate)> parts)
    {
        Estimate estimate = Estimate.Combine(parts);
        double[] row = Row(estimate.Terms);
        return new LinearFigure(estimate.Value, row, WorstCase.OfLinear(_model.Model.Sources, estimate.Value, row), estimate.Terms);
    }

    /// <summary>Largest less smallest of an output, or null for one cylinder and where a cylinder lacks it: the missing one might be the extreme.</summary>
    /// <remarks>
    /// First order by the extreme pair; of pairs equally far apart the one in most doubt, for equal readings do not make equal cylinders.
    /// The worst case over every pair.
    /// </remarks>
    public LinearFigure? Spread(Output output)
    {
        LinearFigure?[] known = [.. Cylinders.Select(cylinder => Of(output, cylinder))];
        return Array.Exists(known, figure => figure is null) || Spread(output, known) is not { } spread ? null : spread with { Sampled = Sampled(_trials?.SpreadOf(output)) };
    }

    /// <summary>The spread of those cylinders whose output is known already, as it is told while the others are still being read; null for fewer than two.</summary>
    public LinearFigure? SpreadSoFar(Output output, out int count)
    {
        LinearFigure?[] known = [.. Cylinders.Select(cylinder => Of(output, cylinder))];
        count = known.Count(figure => figure is not null);
        return Spread(output, known);
    }

    private LinearFigure? Spread(Output output, LinearFigure?[] known)
    {
        int[] cylinders = [.. Cylinders.Where(cylinder => known[cylinder] is not null)];
        if (cylinders.Length < 2)
        {
            return null;
        }

        (int Up, int Down)[] pairs = [.. cylinders.SelectMany(up => cylinders.Where(down => down != up).Select(down => (up, down)))];
        (int up, int down) = pairs.MaxBy(pair => (known[pair.Up]!.Value - known[pair.Down]!.Value, DifferenceVariance(output, pair.Up, pair.Down)));
        WorstLimits worst = pairs
            .Select(pair => _worst.Difference(output, pair.Up, pair.Down))
            .Aggregate((a, b) => new WorstLimits(Math.Max(a.Low, b.Low), Math.Max(a.High, b.High), Math.Max(a.Slack, b.Slack)));
        Term[] terms = [.. known[up]!.Terms, .. known[down]!.Terms.Select(term => term with { Coefficient = -term.Coefficient })];
        return new LinearFigure(known[up]!.Value - known[down]!.Value, Row(terms), worst, terms);
    }

    private double DifferenceVariance(Output output, int up, int down) =>
        FirstOrder.Covariance(output, up, up) + FirstOrder.Covariance(output, down, down) - (2.0 * FirstOrder.Covariance(output, up, down));

    /// <summary>Largest difference between depths on one axis, or null where the bore was not read at two depths, mm.</summary>
    public LinearFigure? Taper(int cylinder) => LargestDifference(cylinder, place => place.Axis, place => place.At);

    /// <summary>Largest difference between axes at one depth, or null where the bore was not read on both, mm.</summary>
    public LinearFigure? OutOfRound(int cylinder) => LargestDifference(cylinder, place => place.At, place => place.Axis);

    /// <summary>Value, doubt, interval and worst case of a figure.</summary>
    /// <param name="figure">The figure.</param>
    /// <param name="kind">Its kind.</param>
    /// <param name="neverNegative">A spread, taper or out-of-round cannot be below zero, and neither can its interval.</param>
    public ResultQuantity Quantity(LinearFigure figure, QuantityKind kind, bool neverNegative = false)
    {
        double[] row = [.. figure.Row];
        (double low, double high) = TrialsCount && figure.Sampled is { } sampled ? sampled.Symmetric(StageResults.Coverage)
            : figure.Sampled?.FirstOrder ?? FirstOrderLimits(figure.Value, row);
        double least = neverNegative ? 0.0 : double.NegativeInfinity;
        return new ResultQuantity(
            figure.Value, kind, Propagation.StandardUncertainty(_model.Model.Sources, row), Math.Max(least, low), high,
            Math.Max(least, figure.Worst.Low), figure.Worst.High);
    }

    private (double Low, double High) FirstOrderLimits(double value, double[] row)
    {
        double halfWidth = new LinearSum(_model.Model.Sources, row).HalfWidth(StageResults.Coverage);
        return (value - halfWidth, value + halfWidth);
    }

    /// <summary>Value and doubt of a figure that went into the results.</summary>
    public ResultQuantity Quantity(Figure figure)
    {
        QuantityKind kind = figure.IsArea ? QuantityKind.Area
            : (int)figure.What < WhatTable.Lines.Count ? WhatTable.Line(figure.What).Rule.Kinds[0] : QuantityKind.Length;
        return new ResultQuantity(
            figure.Estimate.Value, kind, Propagation.StandardUncertainty(_model.Model.Sources, Row(figure.Estimate.Terms)));
    }

    private LinearFigure? LargestDifference<TGroup, TOther>(int cylinder, Func<Place, TGroup> same, Func<Place, TOther?> other)
        where TOther : struct
    {
        IReadOnlyList<PlacedEstimate> places = _model.Search.Find(What.Bore, cylinder)?.Places ?? [];
        (PlacedEstimate High, PlacedEstimate Low)[] pairs =
        [
            .. from high in places
               from low in places
               where Equals(same(high.Place), same(low.Place)) && other(high.Place) is not null && other(low.Place) is not null
                   && !Equals(other(high.Place), other(low.Place))
               select (high, low),
        ];
        if (pairs.Length == 0)
        {
            return null;
        }

        (PlacedEstimate largest, PlacedEstimate smallest) = pairs.MaxBy(pair => pair.High.Estimate.Value - pair.Low.Estimate.Value);
        return Linear((1.0, largest.Estimate), (-1.0, smallest.Estimate));
    }

    private double[] Row(IReadOnlyList<Term> terms)
    {
        double[] row = new double[_model.Model.Sources.Length];
        Propagation.AddTo(row, terms, 1.0);
        return row;
    }
}
