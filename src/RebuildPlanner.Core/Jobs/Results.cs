using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>One computed quantity with how sure it is. Not computed is null.</summary>
/// <param name="Value">First order value, in <paramref name="Kind"/>'s coherent unit.</param>
/// <param name="Kind">Its kind.</param>
/// <param name="StandardUncertainty">u, first order.</param>
/// <param name="Low">Lower end of the 95 % coverage interval.</param>
/// <param name="High">Upper end of the 95 % coverage interval.</param>
/// <param name="WorstLow">Lower end of the worst case.</param>
/// <param name="WorstHigh">Upper end of the worst case.</param>
public sealed record ResultQuantity(
    double Value, QuantityKind Kind, double? StandardUncertainty = null, double? Low = null, double? High = null,
    double? WorstLow = null, double? WorstHigh = null);

/// <summary>How much of the ratio's doubt counts under one thing.</summary>
/// <param name="Input">Its word.</param>
/// <param name="Share">Its share; all sum to 1.</param>
public sealed record ResultShare(string Input, double Share);

/// <summary>One cylinder's results.</summary>
public sealed record CylinderResult(string Cylinder)
{
    /// <summary>Mean bore.</summary>
    public ResultQuantity? Bore { get; init; }

    /// <summary>Swept volume.</summary>
    public ResultQuantity? SweptVolume { get; init; }

    /// <summary>Clearance volume at top dead centre.</summary>
    public ResultQuantity? ClearanceVolume { get; init; }

    /// <summary>Static compression ratio.</summary>
    public ResultQuantity? CompressionRatio { get; init; }

    /// <summary>Trapped ratio.</summary>
    public ResultQuantity? TrappedRatio { get; init; }

    /// <summary>Cranking pressure, gauge.</summary>
    public ResultQuantity? CrankingPressure { get; init; }

    /// <summary>Piston to head.</summary>
    public ResultQuantity? PistonToHead { get; init; }

    /// <summary>Taper of the bore.</summary>
    public ResultQuantity? Taper { get; init; }

    /// <summary>Out-of-round of the bore.</summary>
    public ResultQuantity? OutOfRound { get; init; }

    /// <summary>Chamber.</summary>
    public ResultQuantity? Chamber { get; init; }

    /// <summary>Gasket volume.</summary>
    public ResultQuantity? Gasket { get; init; }

    /// <summary>Deck volume.</summary>
    public ResultQuantity? Deck { get; init; }

    /// <summary>Crown volume.</summary>
    public ResultQuantity? Crown { get; init; }

    /// <summary>Top-land crevice.</summary>
    public ResultQuantity? TopLand { get; init; }

    /// <summary>Whole chamber less the sum of its parts.</summary>
    public ResultQuantity? CrossCheck { get; init; }

    /// <summary>Shares of the ratio's doubt, largest first.</summary>
    public IReadOnlyList<ResultShare> Shares { get; init; } = [];
}

/// <summary>Whether a limit is held.</summary>
public enum VerdictState
{
    /// <summary>Held, proven to the level wanted.</summary>
    Within,

    /// <summary>Neither proven.</summary>
    NotProven,

    /// <summary>Broken, proven to the level wanted.</summary>
    Outside,
}

/// <summary>One verdict on one limit.</summary>
/// <param name="What">What the limit is about.</param>
/// <param name="Cylinder">The cylinder, or null for the engine.</param>
/// <param name="Limit">The limit as written.</param>
/// <param name="Min">The least allowed.</param>
/// <param name="Max">The greatest allowed.</param>
/// <param name="State">The verdict.</param>
/// <param name="Probability">That the true value is inside; null where a figure is missing.</param>
/// <param name="Level">The belief wanted.</param>
/// <param name="Settle">What would settle a verdict not proven, or null.</param>
/// <param name="Number">Which of the job's limits it is on, from 0: two limits may read alike and be set on different places.</param>
/// <param name="Place">What the limit is set on; nothing named means all.</param>
public sealed record Verdict(
    string What, string? Cylinder, string Limit, ResultQuantity? Min, ResultQuantity? Max, VerdictState State, double? Probability,
    double Level, string? Settle, int Number, Place Place);

/// <summary>Something to mind.</summary>
/// <param name="Code">Its code, stable for other programs.</param>
/// <param name="Text">In words.</param>
/// <param name="Cylinder">The cylinder it is about, or null for all.</param>
/// <param name="Figure">The figure it is about, or null.</param>
public sealed record Caution(string Code, string Text, string? Cylinder = null, string? Figure = null);

/// <summary>A figure nowhere to be found.</summary>
/// <param name="What">Its word.</param>
/// <param name="Cylinder">The cylinder.</param>
public sealed record MissingFigure(string What, string Cylinder);

/// <summary>A figure used, and where it came from.</summary>
/// <param name="What">Its word.</param>
/// <param name="Cylinder">The cylinder.</param>
/// <param name="Kind">Measured, computed, given or assumed.</param>
/// <param name="Stage">The stage it is of, or null for one that holds throughout.</param>
/// <param name="From">Who gave it, the part it belongs to, or what it was carried through.</param>
/// <param name="Gauge">The gauge that read it.</param>
/// <param name="Value">Its value and standard uncertainty.</param>
/// <param name="Written">The words a given or assumed figure was written in.</param>
public sealed record ProvenanceLine(
    string What, string Cylinder, FigureKind Kind, Stage? Stage, string? From, string? Gauge, ResultQuantity Value, string? Written);

/// <summary>What is to be said of the method behind intervals and beliefs.</summary>
public enum MethodNote
{
    /// <summary>They are of first order, and trials agree.</summary>
    FirstOrder,

    /// <summary>They are by trials, since first order is off.</summary>
    Trials,

    /// <summary>A spread by trials is biased upwards.</summary>
    SpreadIsBiased,

    /// <summary>The trials ended before the digits wanted were sure.</summary>
    Unsure,
}

/// <summary>What trials showed of first order, and how they were run.</summary>
/// <param name="Options">How they were run.</param>
/// <param name="Trials">How many.</param>
/// <param name="IsCapped">Whether they ended at the cap with digits unsure.</param>
/// <param name="FailsAt">The figure first order is furthest off at, beyond the digits wanted; null where it holds.</param>
/// <param name="FailsOn">The cylinder it is of, or null.</param>
/// <param name="WithoutClearance">The largest share of trials of a cylinder in which no clearance was left.</param>
public sealed record TrialReport(TrialOptions Options, long Trials, bool IsCapped, string? FailsAt, string? FailsOn, double WithoutClearance)
{
    /// <summary>Whether the intervals and probabilities printed are those of first order, checked by the trials.</summary>
    public bool FirstOrderHolds => FailsAt is null;
}

/// <summary>Shares of the trials in equal parts of one range, cylinder by cylinder.</summary>
/// <param name="From">Where the range begins, 1.</param>
/// <param name="To">Where it ends.</param>
/// <param name="Shares">For each cylinder the shares, or null where it has no ratio.</param>
public sealed record RatioPicture(double From, double To, IReadOnlyList<IReadOnlyList<double>?> Shares);

/// <summary>Everything known of an engine at one stage: what every face prints, computed once.</summary>
public sealed record Results(string Job, Stage Stage)
{
    /// <summary>True where nothing of any cylinder could be computed.</summary>
    public bool IsEmpty => Cylinders.All(cylinder => cylinder == new CylinderResult(cylinder.Cylinder) { Shares = cylinder.Shares });

    /// <summary>The trials behind the results, or null where none were run.</summary>
    public TrialReport? Trials { get; init; }

    /// <summary>What is to be said of the method, in order; nothing where no trials were run.</summary>
    public IEnumerable<MethodNote> Method()
    {
        if (Trials is not { } trials)
        {
            yield break;
        }

        yield return trials.FirstOrderHolds ? MethodNote.FirstOrder : MethodNote.Trials;
        if (!trials.FirstOrderHolds && RatioSpread is not null)
        {
            yield return MethodNote.SpreadIsBiased;
        }

        if (trials.IsCapped)
        {
            yield return MethodNote.Unsure;
        }
    }

    /// <summary>How the trials of each cylinder's ratio fell, or null where none were run or no ratio is in doubt.</summary>
    public RatioPicture? RatioPicture { get; init; }

    /// <summary>Whether first order proves a difference between the cylinders with the largest and the smallest ratio; null where there is no spread.</summary>
    public bool? RatiosDiffer { get; init; }

    /// <summary>Sum of the swept volumes.</summary>
    public ResultQuantity? Displacement { get; init; }

    /// <summary>The cylinders in order.</summary>
    public IReadOnlyList<CylinderResult> Cylinders { get; init; } = [];

    /// <summary>Largest less smallest ratio.</summary>
    public ResultQuantity? RatioSpread { get; init; }

    /// <summary>Largest less smallest chamber.</summary>
    public ResultQuantity? ChamberSpread { get; init; }

    /// <summary>The verdicts, in the order of the limits.</summary>
    public IReadOnlyList<Verdict> Verdicts { get; init; } = [];

    /// <summary>The cautions, most serious first.</summary>
    public IReadOnlyList<Caution> Cautions { get; init; } = [];

    /// <summary>What is missing.</summary>
    public IReadOnlyList<MissingFigure> Missing { get; init; } = [];

    /// <summary>Every figure used and where it came from; of one thing on one cylinder the one that counts first, then those it was carried from.</summary>
    public IReadOnlyList<ProvenanceLine> Provenance { get; init; } = [];

    /// <summary>The figure that counts for a thing on a cylinder, or null where none was used.</summary>
    public ProvenanceLine? Used(What what, string cylinder) =>
        Provenance.FirstOrDefault(line => line.What == WhatWords.Of(what) && line.Cylinder == cylinder);
}
