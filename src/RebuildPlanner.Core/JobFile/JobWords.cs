using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>The closed lists of words in a job file, apart from <c>what</c>, which <see cref="WhatTable"/> holds.</summary>
public static class JobWords
{
    /// <summary>The word in <c>format</c>.</summary>
    public const string Format = "rebuild-planner-job";

    /// <summary>The one version there is.</summary>
    public const int Version = 1;

    /// <summary><c>stage</c>, in order of time.</summary>
    public static WordList<Stage> Stages { get; } = new(Array.ConvertAll(Enum.GetValues<Stage>(), stage => (StageWords.Of(stage), stage)));

    /// <summary><c>cycle</c>.</summary>
    public static WordList<EngineCycle> Cycles { get; } = new(("four-stroke", EngineCycle.FourStroke), ("two-stroke", EngineCycle.TwoStroke));

    /// <summary><c>ignition</c>.</summary>
    public static WordList<Ignition> Ignitions { get; } = new(("spark", Ignition.Spark), ("compression", Ignition.Compression));

    /// <summary><c>layout</c>.</summary>
    public static WordList<Layout> Layouts { get; } = new(
        ("single", Layout.Single), ("inline", Layout.Inline), ("vee", Layout.Vee), ("flat", Layout.Flat));

    /// <summary><c>metal</c>, <c>blockMetal</c> and <c>rodMetal</c>.</summary>
    public static WordList<Metal> Metals { get; } = new(
        ("cast iron", Metal.CastIron), ("grey iron", Metal.GreyIron), ("steel", Metal.Steel), ("aluminium", Metal.Aluminium));

    /// <summary>The cam's <c>place</c>: true for overhead.</summary>
    public static WordList<bool> CamPlaces { get; } = new(("overhead", true), ("block", false));

    /// <summary>The cam's <c>drive</c>.</summary>
    public static WordList<CamDrive> CamDrives { get; } = new(("belt", CamDrive.Belt), ("chain", CamDrive.Chain), ("gear", CamDrive.Gear));

    /// <summary>A burette's <c>glass</c>.</summary>
    public static WordList<Glass> Glasses { get; } = new(("borosilicate", Glass.Borosilicate), ("soda-lime", Glass.SodaLime));

    /// <summary><c>at</c> along a bore or wall.</summary>
    public static WordList<At> Depths { get; } = new(("top", At.Top), ("middle", At.Middle), ("bottom", At.Bottom));

    /// <summary><c>at</c> along the pin.</summary>
    public static WordList<At> PinEnds { get; } = new(("front", At.Front), ("rear", At.Rear));

    /// <summary><c>axis</c>.</summary>
    public static WordList<BoreAxis> Axes { get; } = new(("thrust", BoreAxis.Thrust), ("along crank", BoreAxis.AlongCrank));

    /// <summary><c>valve</c>.</summary>
    public static WordList<Valve> Valves { get; } = new(("inlet", Valve.Inlet), ("exhaust", Valve.Exhaust));

    /// <summary><c>what</c> of cuts and process.</summary>
    public static WordList<CutKind> Cuts { get; } = new(Array.ConvertAll(Enum.GetValues<CutKind>(), kind => (CutWords.Of(kind), kind)));

    /// <summary>The word for a depth or a pin end.</summary>
    public static string WordFor(At at) => at is At.Front or At.Rear ? PinEnds.WordFor(at) : Depths.WordFor(at);
}
