using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Jobs;

/// <summary>A figure the program derives and a limit may name.</summary>
public enum Derived
{
    /// <summary>Static compression ratio.</summary>
    CompressionRatio,

    /// <summary>Trapped ratio.</summary>
    TrappedRatio,

    /// <summary>Cranking pressure, gauge.</summary>
    CrankingPressure,

    /// <summary>Piston to head.</summary>
    PistonToHead,

    /// <summary>Largest less smallest chamber.</summary>
    ChamberSpread,

    /// <summary>Largest less smallest ratio.</summary>
    RatioSpread,

    /// <summary>Bore less skirt.</summary>
    BoreClearance,

    /// <summary>Taper of a bore.</summary>
    Taper,

    /// <summary>Out-of-round of a bore.</summary>
    OutOfRound,

    /// <summary>Half of gasket opening less bore.</summary>
    GasketOverhang,
}

/// <summary>What a limit is about: a derived figure, or a measured one.</summary>
/// <param name="Derived">The derived figure, or null.</param>
/// <param name="What">The measured one, or null.</param>
/// <param name="Word">Its word in the job file.</param>
/// <param name="Rule">How its bounds are written.</param>
public sealed record Subject(Derived? Derived, What? What, string Word, QuantityRule Rule);

/// <summary>One line of limits or targets.</summary>
/// <param name="Subject">What it is about.</param>
/// <param name="Min">The least allowed, or null.</param>
/// <param name="Max">The greatest allowed, or null.</param>
/// <param name="Level">The belief wanted, 0.5 to 1, or null for the trade's own.</param>
/// <param name="Stage">The one stage it is judged at; null for planned and as machined.</param>
/// <param name="Place">Which cylinder, head, bank or valve; nothing named means all.</param>
public sealed record Limit(Subject Subject, Quantity? Min, Quantity? Max, double? Level, Stage? Stage, Place Place);
