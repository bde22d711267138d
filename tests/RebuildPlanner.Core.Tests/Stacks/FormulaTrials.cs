using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Stacks;

/// <summary>One figure of a formula written in the test, for examples that are no engine.</summary>
internal sealed class FormulaTrials(Source[] sources, double value, double[]? row, Func<double[], double> formula) : ITrialModel, ITrialWorker
{
    public ReadOnlySpan<Source> Sources => sources;

    public IReadOnlyList<TrialFigure> Figures { get; } = [new(value, row)];

    public static FormulaTrials Sum(params Source[] sources) =>
        new(sources, 0.0, [.. sources.Select(_ => 1.0)], deviations => deviations.Sum());

    public ITrialWorker Worker() => this;

    public void Compute(TrialTile tile, Span<double> figures, Span<double> linear)
    {
        double[] deviations = new double[sources.Length];
        for (int trial = 0; trial < TrialTile.Trials; trial++)
        {
            for (int s = 0; s < sources.Length; s++)
            {
                deviations[s] = tile.Of(s) is { IsEmpty: false } draws ? draws[trial] : 0.0;
            }

            figures[trial] = formula(deviations);
            linear[trial] = row is null ? 0.0 : deviations.Zip(row, (deviation, slope) => deviation * slope).Sum();
        }
    }
}
