using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Jobs;

/// <summary>How the figures of a cut and of the shop's processes are written: lengths without a closing word.</summary>
/// <remarks>Ranges are common practice and generous; twenty millimetres is more than any head or deck gives.</remarks>
public static class CutRules
{
    /// <summary>How far the machine may be off.</summary>
    public static QuantityRule Tolerance { get; } = Mm(1);

    /// <summary>The smallest step it can be set to.</summary>
    public static QuantityRule Step { get; } = Mm(5);

    /// <summary>The most that may come off.</summary>
    public static QuantityRule Max { get; } = Mm(20);

    /// <summary>Allowance on diameter for cleaning up.</summary>
    public static QuantityRule CleanUp { get; } = Mm(5);

    /// <summary>Left on diameter for the hone.</summary>
    public static QuantityRule HoneStock { get; } = Mm(2);

    /// <summary>Of the boring bar from the worn bore.</summary>
    public static QuantityRule Offset { get; } = Mm(10);

    /// <summary>The value of a cut: the finished size of a bore, how far a valve sinks, or the metal that comes off.</summary>
    public static QuantityRule Value(CutKind kind) => kind switch
    {
        CutKind.Bore or CutKind.Hone or CutKind.Sleeve => WhatTable.Line(What.Bore).Rule,
        CutKind.ValveSeat => WhatTable.Line(What.ValveSink).Rule,
        _ => Max,
    };

    private static QuantityRule Mm(double high) => new([QuantityKind.Length], SignWords.None, 0, high);
}
