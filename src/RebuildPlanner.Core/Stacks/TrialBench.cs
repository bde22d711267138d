using System.Runtime.Intrinsics;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>Room for one who computes: made once, used for every block.</summary>
internal sealed class TrialBench(ITrialModel model, PreparedFigure[] prepared)
{
    private readonly TrialTile _tile = new(model.Sources);
    private readonly ITrialWorker _worker = model.Worker();
    private readonly FigureLimit[][] _joints = [.. model.Joints.Select(joint => joint.ToArray())];
    private readonly double[] _figures = new double[prepared.Length * TrialTile.Trials], _linear = new double[prepared.Length * TrialTile.Trials];

    public FigureTally[] Tallies { get; } = [.. prepared.Select(figure => new FigureTally(figure.Tally.From, figure.Tally.To))];

    public void Run(RandomLanes random, int tiles, Span<BlockSums> sums, Span<int> joint)
    {
        for (int at = 0; at < tiles; at++)
        {
            _tile.Draw(ref random);
            _worker.Compute(_tile, _figures, _linear);
            CountJoints(joint);
            for (int figure = 0; figure < prepared.Length; figure++)
            {
                Count(prepared[figure], Tallies[figure], Row(_figures, figure), Row(_linear, figure), ref sums[figure]);
            }
        }
    }

    private static Span<double> Row(double[] rows, int figure) => rows.AsSpan(figure * TrialTile.Trials, TrialTile.Trials);

    private static void Count(PreparedFigure prepared, FigureTally tally, Span<double> figure, Span<double> linear, ref BlockSums sums)
    {
        double value = prepared.Figure.Value;
        Vector512<double> middle = Vector512.Create(value), low = Vector512.Create(prepared.LowCheck), high = Vector512.Create(prepared.HighCheck);
        Vector512<double> sum = default, squares = default, difference = default, differences = default;
        Vector512<long> belowLow = default, belowHigh = default, linearLow = default, linearHigh = default, without = default;
        bool controlled = prepared.Controls;
        for (int at = 0; at < figure.Length; at += Vector512<double>.Count)
        {
            Vector512<double> y = Vector512.Create<double>(figure[at..]), none = ~Vector512.Equals(y, y);
            if (none != Vector512<double>.Zero)
            {
                // No figure is as bad as the highest, and moves no moment.
                without -= none.AsInt64();
                Vector512.ConditionalSelect(none, Vector512.Create(double.PositiveInfinity), y).CopyTo(figure[at..]);
                y = Vector512.ConditionalSelect(none, middle, y);
            }

            Vector512<double> step = y - middle;
            sum += step;
            squares += step * step;
            belowLow -= (Vector512.LessThanOrEqual(y, low) & ~none).AsInt64();
            belowHigh -= (Vector512.LessThanOrEqual(y, high) & ~none).AsInt64();
            if (controlled)
            {
                Vector512<double> l = Vector512.Create<double>(linear[at..]);
                difference += step - l;
                differences += (step * step) - (l * l);
                Vector512<double> bent = l;
                if (prepared.Figure.Pole is { } pole)
                {
                    // As TrialFigure.Bent, and left in its place to be tallied.
                    Vector512<double> turned = TrialFigure.Turned(value, pole, new Lanes(l)).Values;
                    bent = Vector512.ConditionalSelect(
                        Vector512.GreaterThan(turned, Vector512.Create(pole)), turned, Vector512.Create(double.PositiveInfinity)) - middle;
                    bent.CopyTo(linear[at..]);
                }

                linearLow -= Vector512.LessThanOrEqual(bent + middle, low).AsInt64();
                linearHigh -= Vector512.LessThanOrEqual(bent + middle, high).AsInt64();
            }
        }

        sums.Sum += Vector512.Sum(sum);
        sums.SumOfSquares += Vector512.Sum(squares);
        sums.Difference += Vector512.Sum(difference);
        sums.DifferenceOfSquares += Vector512.Sum(differences);
        sums.BelowLow += (int)Vector512.Sum(belowLow);
        sums.BelowHigh += (int)Vector512.Sum(belowHigh);
        sums.LinearBelowLow += (int)Vector512.Sum(linearLow);
        sums.LinearBelowHigh += (int)Vector512.Sum(linearHigh);
        sums.Without += (int)Vector512.Sum(without);
        tally.Add(figure, 0.0, tally.Figure);
        if (controlled)
        {
            tally.Add(linear, value, tally.Linear);
        }
    }

    private void CountJoints(Span<int> joint)
    {
        for (int number = 0; number < joint.Length; number++)
        {
            FigureLimit[] limits = _joints[number];
            for (int at = 0; at < TrialTile.Trials; at += Vector512<double>.Count)
            {
                Vector512<double> inside = Vector512<double>.AllBitsSet;
                foreach (FigureLimit limit in limits)
                {
                    Vector512<double> y = Vector512.Create<double>(Row(_figures, limit.Figure)[at..]);
                    inside &= Vector512.GreaterThanOrEqual(y, Vector512.Create(limit.Low)) & Vector512.LessThanOrEqual(y, Vector512.Create(limit.High));
                }

                joint[number] -= (int)Vector512.Sum(inside.AsInt64());
            }
        }
    }
}
