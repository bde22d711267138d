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

    /// <summary>Reads a model both ways.</summary>
    public StageFigures(StageModel model)
    {
        _model = model;
        FirstOrder = new FirstOrder(model.Model);
        _worst = new WorstCase(model.Model);
    }

    /// <summary>The first-order reading.</summary>
    public FirstOrder FirstOrder { get; }

    /// <summary>Sum of the swept volumes, or null where one is missing, mm³.</summary>
    public LinearFigure? Displacement
    {
        get
        {
            LinearFigure?[] swept = [.. Cylinders.Select(cylinder => Of(Output.SweptVolume, cylinder))];
            return Array.Exists(swept, figure => figure is null)
                ? null
                : new LinearFigure(
                    swept.Sum(figure => figure!.Value), Row(swept.SelectMany(figure => figure!.Terms)), _worst.Sum(Output.SweptVolume),
                    [.. swept.SelectMany(figure => figure!.Terms)]);
        }
    }

    private IEnumerable<int> Cylinders => Enumerable.Range(0, _model.Model.Cylinders.Count);

    /// <summary>One output of one cylinder, or null where its figures do not suffice.</summary>
    public LinearFigure? Of(Output output, int cylinder)
    {
        if (!_model.Model.Cylinders[cylinder].Known[(int)output] || !double.IsFinite(FirstOrder.Value(cylinder, output)))
        {
            return null;
        }

        bool needsClearance = output is Output.CompressionRatio or Output.TrappedRatio or Output.CrankingPressure;
        if (needsClearance && FirstOrder.Value(cylinder, Output.ClearanceVolume) <= 0.0)
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

            foreach (Term term in _model.Model.TermsOf(cylinder, input))
            {
                terms.Add(term with { Coefficient = slope * term.Coefficient });
            }
        }

        return new LinearFigure(
            FirstOrder.Value(cylinder, output), FirstOrder.Row(cylinder, output), _worst.Limits(cylinder, output), terms);
    }

    /// <summary>A figure that is linear in what was measured, as it stands or combined.</summary>
    public LinearFigure Linear(params ReadOnlySpan<(double Factor, Estimate Estimate)> parts)
    {
        Estimate estimate = Estimate.Combine(parts);
        double[] row = Row(estimate.Terms);
        return new LinearFigure(estimate.Value, row, WorstCase.OfLinear(_model.Model.Sources, estimate.Value, row), estimate.Terms);
    }

    /// <summary>Largest less smallest of an output, or null for fewer than two cylinders that have it.</summary>
    /// <remarks>First order by the extreme pair; the worst case over every pair.</remarks>
    public LinearFigure? Spread(Output output)
    {
        (int Cylinder, LinearFigure Figure)[] known =
        [
            .. Cylinders.Select(cylinder => (cylinder, Of(output, cylinder))).Where(each => each.Item2 is not null)!,
        ];
        if (known.Length < 2)
        {
            return null;
        }

        (int _, LinearFigure largest) = known.MaxBy(each => each.Figure.Value);
        (int _, LinearFigure smallest) = known.MinBy(each => each.Figure.Value);
        WorstLimits worst = new(0.0, 0.0, Exact: true);
        foreach ((int up, LinearFigure _) in known)
        {
            foreach ((int down, LinearFigure _) in known)
            {
                if (up != down)
                {
                    WorstLimits pair = _worst.Difference(output, up, down);
                    worst = new WorstLimits(Math.Max(worst.Low, pair.Low), Math.Max(worst.High, pair.High), worst.Exact && pair.Exact);
                }
            }
        }

        Term[] terms = [.. largest.Terms, .. smallest.Terms.Select(term => term with { Coefficient = -term.Coefficient })];
        return new LinearFigure(largest.Value - smallest.Value, Row(terms), worst, terms);
    }

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
        double halfWidth = new LinearSum(_model.Model.Sources, row).HalfWidth(StageResults.Coverage);
        double least = neverNegative ? 0.0 : double.NegativeInfinity;
        return new ResultQuantity(
            figure.Value, kind, Propagation.StandardUncertainty(_model.Model.Sources, row), Math.Max(least, figure.Value - halfWidth),
            figure.Value + halfWidth, Math.Max(least, figure.Worst.Low), figure.Worst.High);
    }

    private LinearFigure? LargestDifference<TGroup, TOther>(int cylinder, Func<Place, TGroup> same, Func<Place, TOther?> other)
        where TOther : struct
    {
        IReadOnlyList<PlacedEstimate> places = _model.Search.Find(What.Bore, cylinder)?.Places ?? [];
        LinearFigure? largest = null;
        foreach (IGrouping<TGroup, PlacedEstimate> group in places.Where(place => other(place.Place) is not null).GroupBy(place => same(place.Place)))
        {
            PlacedEstimate high = group.MaxBy(place => place.Estimate.Value)!, low = group.MinBy(place => place.Estimate.Value)!;
            if (group.DistinctBy(place => other(place.Place)).Count() < 2)
            {
                continue;
            }

            LinearFigure difference = Linear((1.0, high.Estimate), (-1.0, low.Estimate));
            largest = largest is null || difference.Value > largest.Value ? difference : largest;
        }

        return largest;
    }

    private double[] Row(IEnumerable<Term> terms)
    {
        double[] row = new double[_model.Model.Sources.Length];
        foreach (Term term in terms)
        {
            row[term.Source] += term.Coefficient;
        }

        return row;
    }
}
