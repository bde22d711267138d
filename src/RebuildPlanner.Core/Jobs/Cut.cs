using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Jobs;

/// <summary>What is cut.</summary>
public enum CutKind
{
    /// <summary>Metal off the head's face; the value is what comes off.</summary>
    HeadSkim,

    /// <summary>Metal off the block's deck; the value is what comes off.</summary>
    DeckCut,

    /// <summary>The main line bored; the value is how far the crank rises towards the deck.</summary>
    LineBore,

    /// <summary>A cylinder bored; the value is the finished size.</summary>
    Bore,

    /// <summary>A cylinder honed; the value is the finished size.</summary>
    Hone,

    /// <summary>A cylinder sleeved; the value is the finished size.</summary>
    Sleeve,

    /// <summary>A valve seat cut; the value is how far the valve sinks.</summary>
    ValveSeat,
}

/// <summary>One cut, planned or made.</summary>
/// <param name="Kind">What is cut.</param>
/// <param name="Place">Head, bank, cylinder or valve; nothing named means all.</param>
/// <param name="Value">Metal removed, or the finished size of a bore; null for a bore finished to the piston that goes there.</param>
/// <param name="Stage">When.</param>
public sealed record Cut(CutKind Kind, Place Place, Quantity? Value, Stage Stage);

/// <summary>What the shop's machine does for one kind of cut.</summary>
public sealed record Process(
    CutKind Kind, Quantity? Tolerance = null, Quantity? Step = null, Quantity? Max = null, Quantity? CleanUp = null, Quantity? HoneStock = null,
    Quantity? Offset = null);
