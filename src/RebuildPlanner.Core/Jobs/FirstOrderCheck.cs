using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Trials against first order: where the two intervals differ by more than the digits wanted, the trials count.</summary>
/// <remarks>|ends of first order − ends by trials| ≤ δ, δ half a unit of the last digit of u wanted. Source: jcgm101 (8.1). Valid for: figures with a linear part.
/// Error: that of the trials, which is held to δ for ratios and displacement.</remarks>
internal static class FirstOrderCheck
{
    // What lies beyond would only make the rest narrow.
    private const double NearlyAll = 0.98;

    /// <summary>Runs the trials and lets them count where first order fails.</summary>
    /// <returns>What was found, or null where nothing bends or no trials were wanted.</returns>
    public static (TrialReport? Report, RatioPicture? Picture) Run(
        StageModel model, StageFigures figures, Verdicts verdicts, TrialOptions options, IProgress<long>? progress, CancellationToken cancellation)
    {
        if (options.Trials == 0)
        {
            return (null, null);
        }

        EngineTrials trials = new(model.Model, figures.FirstOrder);
        if (!trials.Figures.Any(figure => figure.Row is { } row && Propagation.VarianceOfLaws(trials.Sources, row) > 0.0))
        {
            return (null, null);
        }

        verdicts.AskJointly(trials);
        MonteCarlo run = MonteCarlo.Run(trials, options, progress, cancellation);
        (string? word, int? cylinder) = WorstFailure(model, trials, run);
        figures.Take(trials, run, count: word is not null);
        double without = run.Figures.Max(figure => figure.Without);
        return (
            new TrialReport(options, run.Trials, run.IsCapped, word, cylinder is { } at ? model.Search.Parts.Label(at) : null, without),
            PictureOf(model, trials, run));
    }

    // All cylinders over one range, the widest that any of them needs.
    private static RatioPicture? PictureOf(StageModel model, EngineTrials trials, MonteCarlo run)
    {
        const int Parts = 32;
        SampledFigure?[] ratios = [.. Enumerable.Range(0, model.Model.Cylinders.Count).Select(cylinder => trials.PlaceOf(Output.CompressionRatio, cylinder) is { } place ? run.Figures[place] : null)];
        (double Low, double High)[] ranges = [.. ratios.OfType<SampledFigure>().Select(ratio => ratio.Symmetric(NearlyAll))];
        if (ranges.Length == 0)
        {
            return null;
        }

        (double from, double to) = (ranges.Min(range => range.Low), ranges.Max(range => range.High));
        return to > from ? new RatioPicture(from, to, [.. ratios.Select(ratio => ratio?.Shares(from, to, Parts))]) : null;
    }

    private static (string? Word, int? Cylinder) WorstFailure(StageModel model, EngineTrials trials, MonteCarlo run)
    {
        double worst = 1.0;
        (string?, int?) found = (null, null);
        for (int cylinder = 0; cylinder < model.Model.Cylinders.Count; cylinder++)
        {
            foreach ((Output output, string word) in EngineTrials.Bent)
            {
                Compare(trials.PlaceOf(output, cylinder), word, cylinder);
            }
        }

        Compare(trials.Displacement, "displacement", null);
        return found;

        void Compare(int? place, string word, int? cylinder)
        {
            if (place is { } at && run.Figures[at] is { FirstOrder: { } first } figure)
            {
                (double low, double high) = figure.Symmetric(StageResults.Coverage);
                double off = Math.Max(Math.Abs(first.Low - low), Math.Abs(first.High - high)) / figure.Tolerance(run.Options.Digits);
                if (off > worst)
                {
                    (worst, found) = (off, (word, cylinder));
                }
            }
        }
    }
}
