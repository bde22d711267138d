using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>From a job and a stage to everything known of the engine there.</summary>
public static class StageResults
{
    /// <summary>The coverage of the intervals printed, 1.</summary>
    public const double Coverage = 0.95;

    /// <summary>Computes the results.</summary>
    /// <param name="job">The job.</param>
    /// <param name="stage">The stage asked for.</param>
    /// <param name="options">How first order is checked by trials, or null for the usual way; no trials at all where their number is 0.</param>
    /// <param name="progress">Told the trials run so far.</param>
    /// <param name="cancellation">Ends the trials between two blocks.</param>
    /// <returns>The results; <see cref="Results.Cylinders"/> hold nothing but nulls where no cylinder can be computed.</returns>
    /// <exception cref="OperationCanceledException">The trials were ended.</exception>
    public static Results Of(Job job, Stage stage, TrialOptions? options = null, IProgress<long>? progress = null, CancellationToken cancellation = default)
    {
        StageModel model = new(job, stage);
        StageFigures figures = new(model);
        Verdicts verdicts = new(model, figures);
        (TrialReport? report, RatioPicture? picture) = FirstOrderCheck.Run(model, figures, verdicts, options ?? new TrialOptions(), progress, cancellation);
        LinearFigure? ratioSpread = figures.Spread(Output.CompressionRatio), chamberSpread = figures.Spread(Output.Chamber);
        return new Results(job.Number, stage)
        {
            Trials = report,
            RatioPicture = picture,
            RatiosDiffer = ratioSpread is null ? null : figures.Differs(ratioSpread),
            Displacement = figures.Displacement is { } displacement ? figures.Quantity(displacement, QuantityKind.Volume) : null,
            Cylinders = [.. Enumerable.Range(0, job.Engine.Cylinders).Select(cylinder => CylinderOf(model, figures, cylinder))],
            RatioSpread = ratioSpread is null ? null : figures.Quantity(ratioSpread, QuantityKind.Ratio, neverNegative: true),
            ChamberSpread = chamberSpread is null ? null : figures.Quantity(chamberSpread, QuantityKind.Volume, neverNegative: true),
            Verdicts = verdicts.All(),
            Cautions = Cautions.Of(model, figures, report),
            Missing = model.Missing,
            Provenance = [.. model.Used.Select(used => new ProvenanceLine(
                WhatWords.Of(used.Figure.What), model.Search.Parts.Label(used.Cylinder), used.Figure.Kind, used.Figure.Stage, used.Figure.From,
                used.Figure.Gauge, figures.Quantity(used.Figure), used.Figure.Written))],
        };
    }

    private static CylinderResult CylinderOf(StageModel model, StageFigures figures, int cylinder)
    {
        return new CylinderResult(model.Search.Parts.Label(cylinder))
        {
            Bore = Of(Output.Bore, QuantityKind.Length),
            SweptVolume = Of(Output.SweptVolume, QuantityKind.Volume),
            ClearanceVolume = Of(Output.ClearanceVolume, QuantityKind.Volume),
            CompressionRatio = Of(Output.CompressionRatio, QuantityKind.Ratio),
            TrappedRatio = Of(Output.TrappedRatio, QuantityKind.Ratio),
            CrankingPressure = Of(Output.CrankingPressure, QuantityKind.Pressure),
            PistonToHead = Of(Output.PistonToHead, QuantityKind.Length),
            Chamber = Of(Output.Chamber, QuantityKind.Volume),
            Gasket = Of(Output.Gasket, QuantityKind.Volume),
            Deck = Of(Output.Deck, QuantityKind.Volume),
            Crown = Of(Output.Crown, QuantityKind.Volume),
            TopLand = Of(Output.TopLand, QuantityKind.Volume),
            CrossCheck = Of(Output.CrossCheck, QuantityKind.Volume),
            Taper = figures.Taper(cylinder) is { } taper ? figures.Quantity(taper, QuantityKind.Length, neverNegative: true) : null,
            OutOfRound = figures.OutOfRound(cylinder) is { } round ? figures.Quantity(round, QuantityKind.Length, neverNegative: true) : null,
            Shares = figures.Of(Output.CompressionRatio, cylinder) is null ? [] : SharesOf(figures.FirstOrder, cylinder),
        };

        ResultQuantity? Of(Output output, QuantityKind kind) =>
            figures.Of(output, cylinder) is { } figure ? figures.Quantity(figure, kind) : null;
    }

    private static ResultShare[] SharesOf(FirstOrder firstOrder, int cylinder) =>
    [
        .. Enum.GetValues<What>()
            .Select(what => (What: what, Share: firstOrder.Share(cylinder, what)))
            .Where(share => share.Share != 0.0)
            .OrderByDescending(share => share.Share)
            .Select(share => new ResultShare(WhatWords.Of(share.What), share.Share)),
    ];
}
