using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Jobs;

/// <summary>The closed list of what a limit or target may name.</summary>
public static class Subjects
{
    // Metal or fire behind them: a piston at the head, a valve on a piston, a bore through its wall.
    private const double SureLevel = 0.99;

    private const double UsualLevel = 0.95;

    /// <summary>Every subject: the derived figures first, then the measured lengths in the order of <see cref="WhatTable"/>.</summary>
    public static IReadOnlyList<Subject> All { get; } =
    [
        Of(Derived.CompressionRatio, "compression ratio", QuantityKind.Ratio, 1, 40),
        Of(Derived.TrappedRatio, "trapped ratio", QuantityKind.Ratio, 1, 40),
        Of(Derived.CrankingPressure, "cranking pressure", QuantityKind.Pressure, 0, 10_000),
        Of(Derived.PistonToHead, "piston to head", QuantityKind.Length, 0, 50),
        Of(Derived.ChamberSpread, "chamber spread", QuantityKind.Volume, 0, 500_000),
        Of(Derived.RatioSpread, "ratio spread", QuantityKind.Ratio, 0, 10),
        Of(Derived.BoreClearance, "bore clearance", QuantityKind.Length, 0, 5),
        Of(Derived.Taper, "taper", QuantityKind.Length, 0, 5),
        Of(Derived.OutOfRound, "out-of-round", QuantityKind.Length, 0, 5),
        Of(Derived.GasketOverhang, "gasket overhang", QuantityKind.Length, -10, 50),
        .. Lengths(),
    ];

    /// <summary>The subject with the given word, spelled exactly, or null.</summary>
    public static Subject? Find(string word) => All.FirstOrDefault(subject => subject.Word == word);

    /// <summary>The subject that is a derived figure.</summary>
    public static Subject Of(Derived derived) => All[(int)derived];

    /// <summary>The belief a limit asks for where it states none: 0.99 for piston to head, piston to valve and wall, else 0.95.</summary>
    public static double DefaultLevel(Subject subject) =>
        subject.Derived is Derived.PistonToHead || subject.What is What.PistonToValve or What.Wall ? SureLevel : UsualLevel;

    private static Subject Of(Derived derived, string word, QuantityKind kind, double low, double high) =>
        new(derived, null, word, new([kind], SignWords.None, low, high));

    // A limit on an opening is a limit on its diameter: no traced area has one bound that means anything to a bore.
    private static IEnumerable<Subject> Lengths()
    {
        foreach (WhatLine line in WhatTable.Lines)
        {
            if (line.Rule.Kinds.Contains(QuantityKind.Length))
            {
                yield return new(null, line.What, line.Word, line.Rule with { Kinds = [QuantityKind.Length] });
            }
        }
    }
}
