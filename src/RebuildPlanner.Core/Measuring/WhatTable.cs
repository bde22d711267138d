using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Measuring;

/// <summary>Whose part a figure belongs to: given once, it is one input for all who share that part.</summary>
public enum Belongs
{
    /// <summary>One crank: one input for the engine.</summary>
    Engine,

    /// <summary>One input a bank.</summary>
    Bank,

    /// <summary>One input a head: its gasket, its skim.</summary>
    Head,

    /// <summary>One input a cylinder; a piston piece stands for its cylinder.</summary>
    Cylinder,
}

/// <summary>The metal whose expansion a reading follows.</summary>
public enum PartMetal
{
    /// <summary>The block's.</summary>
    Block,

    /// <summary>The head's.</summary>
    Head,

    /// <summary>The rod's.</summary>
    Rod,

    /// <summary>A piston's: aluminium.</summary>
    Piston,

    /// <summary>Crank, pins, valves: steel.</summary>
    Steel,
}

/// <summary>The keys beside cylinder, head, bank and piece that tell places of one figure apart.</summary>
[Flags]
public enum PlaceKeys
{
    /// <summary>None.</summary>
    None = 0,

    /// <summary><c>at</c>: top, middle or bottom.</summary>
    Depth = 1,

    /// <summary><c>at</c>: front or rear.</summary>
    PinEnd = 2,

    /// <summary><c>axis</c>: thrust or along crank.</summary>
    Axis = 4,

    /// <summary><c>valve</c>: inlet or exhaust.</summary>
    Valve = 8,

    /// <summary><c>clock</c>: hours.</summary>
    Clock = 16,

    /// <summary><c>drop</c>: how far the piston stands below the deck.</summary>
    Drop = 32,
}

/// <summary>One line of the closed list of <c>what</c>.</summary>
/// <param name="What">The thing.</param>
/// <param name="Word">Its word in the job file.</param>
/// <param name="Rule">Unit kind, sign words and sane range.</param>
/// <param name="Belongs">Whose part it is.</param>
/// <param name="NeedsCylinder">A reading of it must name a cylinder (or a piece where <paramref name="MayBePiece"/>).</param>
/// <param name="MayBePiece">It may be measured on an unassigned piston piece.</param>
/// <param name="Keys">The place keys allowed.</param>
/// <param name="Metal">The metal that a temperature correction uses.</param>
public sealed record WhatLine(
    What What, string Word, QuantityRule Rule, Belongs Belongs, bool NeedsCylinder, bool MayBePiece, PlaceKeys Keys, PartMetal Metal);

/// <summary>The closed list of everything a job file may call <c>what</c>, printed in docs/what.md.</summary>
public static class WhatTable
{
    /// <summary>Every line, in the order of the enumeration.</summary>
    public static IReadOnlyList<WhatLine> Lines => WhatLines.All;

    /// <summary>The line of a thing in the job file's list.</summary>
    public static WhatLine Line(What what) => Lines[(int)what];

    /// <summary>The line with the given word, spelled exactly, or null.</summary>
    public static WhatLine? Find(string word) => Lines.FirstOrDefault(line => line.Word == word);
}
