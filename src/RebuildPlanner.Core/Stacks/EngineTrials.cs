using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>An engine as trials see it: every figure that bends, of every cylinder, and what the cylinders come to together.</summary>
/// <remarks>
/// Figures that are sums of what was measured (bore, chamber, crown, piston to head) have an exact law already and are not drawn. The static ratios and
/// the displacement decide when there are trials enough.
/// </remarks>
public sealed class EngineTrials : ITrialModel
{
    /// <summary>The figures of a cylinder that are no plain sum of what was measured, with their words.</summary>
    public static IReadOnlyList<(Output Output, string Word)> Bent { get; } =
    [
        (Output.SweptVolume, "swept volume"), (Output.Gasket, "gasket volume"), (Output.Deck, "deck volume"), (Output.TopLand, "top-land crevice"),
        (Output.ClearanceVolume, "clearance volume"), (Output.CompressionRatio, "compression ratio"), (Output.TrappedRatio, "trapped ratio"),
        (Output.CrankingPressure, "cranking pressure"), (Output.CrossCheck, "cross-check"),
    ];

    private static readonly Output[] _bent = [.. Bent.Select(bent => bent.Output)];

    private readonly EngineModel _model;
    private readonly FirstOrder _firstOrder;
    private readonly List<TrialFigure> _figures = [];
    private readonly int[] _placeOf;
    private readonly Dictionary<Output, int> _spreadOf = [];
    private readonly List<IReadOnlyList<FigureLimit>> _joints = [];

    /// <summary>Lays out the figures of an engine.</summary>
    /// <param name="model">The engine.</param>
    /// <param name="firstOrder">Its first-order reading: values and linear parts.</param>
    public EngineTrials(EngineModel model, FirstOrder firstOrder)
    {
        (_model, _firstOrder) = (model, firstOrder);
        int cylinders = model.Cylinders.Count;
        _placeOf = new int[cylinders * CylinderStack<Lanes>.Count];
        Array.Fill(_placeOf, -1);
        for (int cylinder = 0; cylinder < cylinders; cylinder++)
        {
            foreach (Output output in _bent)
            {
                if (firstOrder.IsKnown(cylinder, output))
                {
                    _placeOf[(cylinder * CylinderStack<Lanes>.Count) + (int)output] =
                        Add(new TrialFigure(firstOrder.Value(cylinder, output), firstOrder.Row(cylinder, output), output == Output.CompressionRatio, PoleOf(output)));
                }
            }
        }

        if (IsKnownOfAll(Output.SweptVolume))
        {
            double[] row = new double[model.Sources.Length];
            for (int cylinder = 0; cylinder < cylinders; cylinder++)
            {
                double[] own = firstOrder.Row(cylinder, Output.SweptVolume);
                for (int s = 0; s < row.Length; s++)
                {
                    row[s] += own[s];
                }
            }

            Displacement = Add(new TrialFigure(Enumerable.Range(0, cylinders).Sum(cylinder => firstOrder.Value(cylinder, Output.SweptVolume)), row));
        }

        foreach (Output output in cylinders > 1 ? new[] { Output.CompressionRatio, Output.Chamber } : [])
        {
            if (IsKnownOfAll(output))
            {
                double[] values = [.. Enumerable.Range(0, cylinders).Select(cylinder => firstOrder.Value(cylinder, output))];
                _spreadOf.Add(output, Add(new TrialFigure(values.Max() - values.Min(), null, Decides: false)));
            }
        }
    }

    /// <inheritdoc/>
    public ReadOnlySpan<Source> Sources => _model.Sources;

    /// <inheritdoc/>
    public IReadOnlyList<TrialFigure> Figures => _figures;

    /// <inheritdoc/>
    public IReadOnlyList<IReadOnlyList<FigureLimit>> Joints => _joints;

    /// <summary>Where the sum of the swept volumes stands, or null.</summary>
    public int? Displacement { get; }

    /// <summary>Where one output of one cylinder stands, or null where it is missing or its law is known without trials.</summary>
    public int? PlaceOf(Output output, int cylinder) => _placeOf[(cylinder * CylinderStack<Lanes>.Count) + (int)output] is >= 0 and int place ? place : null;

    /// <summary>Where the largest less the smallest of an output stands, or null.</summary>
    public int? SpreadOf(Output output) => _spreadOf.TryGetValue(output, out int place) ? place : null;

    /// <summary>Asks for the probability that one output holds its limits on several cylinders at once.</summary>
    /// <returns>The joint's number, or null where a cylinder lacks the output or its law is known without trials.</returns>
    public int? AddJoint(Output output, IReadOnlyList<int> cylinders, double low, double high)
    {
        int?[] places = [.. cylinders.Select(cylinder => PlaceOf(output, cylinder))];
        if (places.Length == 0 || Array.Exists(places, place => place is null))
        {
            return null;
        }

        _joints.Add([.. places.Select(place => new FigureLimit(place!.Value, low, high))]);
        return _joints.Count - 1;
    }

    /// <inheritdoc/>
    public ITrialWorker Worker() => new CylinderBench(this);

    // Both ratios are 1 and a quotient with the clearance volume below the line; that volume is nearly a plain sum.
    private static double? PoleOf(Output output) => output is Output.CompressionRatio or Output.TrappedRatio ? 1.0 : null;

    private int Add(TrialFigure figure)
    {
        _figures.Add(figure);
        return _figures.Count - 1;
    }

    private bool IsKnownOfAll(Output output) => Enumerable.Range(0, _model.Cylinders.Count).All(cylinder => _firstOrder.IsKnown(cylinder, output));

    /// <summary>One who computes: each distinct input once a tile, then the stack of every cylinder, eight trials at a time.</summary>
    private sealed class CylinderBench(EngineTrials trials) : ITrialWorker
    {
        private const int Inputs = CylinderFigures<Lanes>.Count;

        private readonly EngineModel _model = trials._model;

        // The deviation of each estimate from its value, trial by trial; one that carries no law has none.
        private readonly double[]?[] _deviations = Rows(trials._model);
        private readonly double[] _chambers = new double[trials._model.Cylinders.Count * TrialTile.Trials];
        private readonly double[] _ratios = new double[trials._model.Cylinders.Count * TrialTile.Trials];

        public void Compute(TrialTile tile, Span<double> figures, Span<double> linear)
        {
            for (int estimate = 0; estimate < _deviations.Length; estimate++)
            {
                if (_deviations[estimate] is { } deviation)
                {
                    Deviate(_model.DoubtsOf(estimate), tile, deviation);
                }
            }

            for (int cylinder = 0; cylinder < _model.Cylinders.Count; cylinder++)
            {
                ComputeCylinder(cylinder, figures, linear);
            }

            Together(figures, linear);
        }

        private static double[]?[] Rows(EngineModel model)
        {
            double[]?[] rows = new double[]?[model.EstimateCount];
            for (int estimate = 0; estimate < rows.Length; estimate++)
            {
                foreach (Term term in model.DoubtsOf(estimate))
                {
                    rows[estimate] ??= model.Sources[term.Source].IsDrawn ? new double[TrialTile.Trials] : null;
                }
            }

            return rows;
        }

        private static void Deviate(ReadOnlySpan<Term> doubts, TrialTile tile, Span<double> deviation)
        {
            deviation.Clear();
            foreach (Term term in doubts)
            {
                ReadOnlySpan<double> draws = tile.Of(term.Source);
                for (int at = 0; at < draws.Length; at += Lanes.Count)
                {
                    (Vector512.Create<double>(deviation[at..]) + (term.Coefficient * Vector512.Create(draws[at..]))).CopyTo(deviation[at..]);
                }
            }
        }

        private void ComputeCylinder(int cylinder, Span<double> figures, Span<double> linear)
        {
            CylinderForm form = _model.Cylinders[cylinder].Form;
            _model.Values(cylinder, out CylinderFigures<Real> values);
            Span<int> varying = stackalloc int[Inputs];
            int count = 0;
            Unsafe.SkipInit(out CylinderFigures<Lanes> inputs);
            for (int input = 0; input < Inputs; input++)
            {
                inputs[input] = Lanes.From(values[input].Value);
                if (DeviationOf(cylinder, input) is not null)
                {
                    varying[count++] = input;
                }
            }

            varying = varying[..count];
            for (int at = 0; at < TrialTile.Trials; at += Lanes.Count)
            {
                foreach (int input in varying)
                {
                    inputs[input] = new Lanes(Vector512.Create(values[input].Value) + Vector512.Create(DeviationOf(cylinder, input)!, at));
                }

                CylinderStack<Lanes>.Compute(inputs, form, out CylinderStack<Lanes> stack);
                Store(cylinder, at, stack, figures);
            }

            Linear(cylinder, varying, linear);
        }

        private void Store(int cylinder, int at, in CylinderStack<Lanes> stack, Span<double> figures)
        {
            // Without clearance there is no ratio; the trial keeps no limit of it.
            Vector512<double> clear = Vector512.GreaterThan(stack[(int)Output.ClearanceVolume].Values, Vector512<double>.Zero), none = Vector512.Create(double.NaN);
            foreach (Output output in _bent)
            {
                if (trials.PlaceOf(output, cylinder) is { } place)
                {
                    Vector512<double> figure = stack[(int)output].Values;
                    (FirstOrder.NeedsClearance(output) ? Vector512.ConditionalSelect(clear, figure, none) : figure).CopyTo(figures[((place * TrialTile.Trials) + at)..]);
                }
            }

            stack[(int)Output.Chamber].Values.CopyTo(_chambers, (cylinder * TrialTile.Trials) + at);
            Vector512.ConditionalSelect(clear, stack[(int)Output.CompressionRatio].Values, none).CopyTo(_ratios, (cylinder * TrialTile.Trials) + at);
        }

        // Sensitivity to each input times its deviation: the sum over the sources, gathered by input.
        private void Linear(int cylinder, ReadOnlySpan<int> varying, Span<double> linear)
        {
            foreach (Output output in _bent)
            {
                if (trials.PlaceOf(output, cylinder) is not { } place)
                {
                    continue;
                }

                Span<double> row = linear.Slice(place * TrialTile.Trials, TrialTile.Trials);
                row.Clear();
                foreach (int input in varying)
                {
                    double slope = trials._firstOrder.Sensitivity(cylinder, output, (Input)input);
                    double[] deviation = DeviationOf(cylinder, input)!;
                    for (int at = 0; at < (slope == 0.0 ? 0 : TrialTile.Trials); at += Lanes.Count)
                    {
                        (Vector512.Create<double>(row[at..]) + (slope * Vector512.Create(deviation, at))).CopyTo(row[at..]);
                    }
                }
            }
        }

        private void Together(Span<double> figures, Span<double> linear)
        {
            int cylinders = _model.Cylinders.Count;
            if (trials.Displacement is { } displacement)
            {
                Span<double> sum = figures.Slice(displacement * TrialTile.Trials, TrialTile.Trials), parts = linear.Slice(displacement * TrialTile.Trials, TrialTile.Trials);
                sum.Clear();
                parts.Clear();
                for (int cylinder = 0; cylinder < cylinders; cylinder++)
                {
                    int place = trials.PlaceOf(Output.SweptVolume, cylinder)!.Value * TrialTile.Trials;
                    for (int at = 0; at < TrialTile.Trials; at += Lanes.Count)
                    {
                        (Vector512.Create<double>(sum[at..]) + Vector512.Create<double>(figures[(place + at)..])).CopyTo(sum[at..]);
                        (Vector512.Create<double>(parts[at..]) + Vector512.Create<double>(linear[(place + at)..])).CopyTo(parts[at..]);
                    }
                }
            }

            foreach ((Output output, int place) in trials._spreadOf)
            {
                double[] of = output == Output.Chamber ? _chambers : _ratios;
                for (int at = 0; at < TrialTile.Trials; at += Lanes.Count)
                {
                    Vector512<double> least = Vector512.Create(of, at), most = least;
                    for (int cylinder = 1; cylinder < cylinders; cylinder++)
                    {
                        Vector512<double> own = Vector512.Create(of, (cylinder * TrialTile.Trials) + at);
                        (least, most) = (Vector512.Min(least, own), Vector512.Max(most, own));
                    }

                    (most - least).CopyTo(figures[((place * TrialTile.Trials) + at)..]);
                }
            }
        }

        private double[]? DeviationOf(int cylinder, int input) => _deviations[_model.EstimateIndex(cylinder, input)];
    }
}
