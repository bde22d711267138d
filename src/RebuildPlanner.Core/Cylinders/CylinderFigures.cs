using System.Runtime.CompilerServices;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Cylinders;

/// <summary>The inputs of one cylinder under their trade names; an absent one is exactly zero.</summary>
/// <typeparam name="T">The scalar they are read in.</typeparam>
/// <remarks>An inline array, so that a pass for each input can seed it by index without a copy of the list of names.</remarks>
[InlineArray(Count)]
public struct CylinderFigures<T>
    where T : struct, IScalar<T>
{
    /// <summary>How many inputs there are.</summary>
    public const int Count = (int)Input.CrankingExponent + 1;

    private T _first;

    /// <summary>Mean bore, mm.</summary>
    public readonly T Bore => this[(int)Input.Bore];

    /// <summary>Stroke, mm.</summary>
    public readonly T Stroke => this[(int)Input.Stroke];

    /// <summary>Pin offset, mm.</summary>
    public readonly T PinOffset => this[(int)Input.PinOffset];

    /// <summary>Rod length, mm.</summary>
    public readonly T RodLength => this[(int)Input.RodLength];

    /// <summary>Measured piston travel, mm.</summary>
    public readonly T Travel => this[(int)Input.Travel];

    /// <summary>Chamber, mm³.</summary>
    public readonly T Chamber => this[(int)Input.Chamber];

    /// <summary>Gasket opening diameter, mm.</summary>
    public readonly T GasketOpening => this[(int)Input.GasketOpening];

    /// <summary>Gasket opening area, mm².</summary>
    public readonly T GasketArea => this[(int)Input.GasketArea];

    /// <summary>Gasket thickness, mm.</summary>
    public readonly T GasketThickness => this[(int)Input.GasketThickness];

    /// <summary>Mean deck clearance, mm.</summary>
    public readonly T Deck => this[(int)Input.Deck];

    /// <summary>Least deck clearance, mm.</summary>
    public readonly T LeastDeck => this[(int)Input.LeastDeck];

    /// <summary>Rock, mm.</summary>
    public readonly T Rock => this[(int)Input.Rock];

    /// <summary>Head recess, mm.</summary>
    public readonly T HeadRecess => this[(int)Input.HeadRecess];

    /// <summary>Crown volume, mm³.</summary>
    public readonly T Crown => this[(int)Input.Crown];

    /// <summary>Top land height, mm.</summary>
    public readonly T TopLandHeight => this[(int)Input.TopLandHeight];

    /// <summary>Top land diameter, mm.</summary>
    public readonly T TopLandDiameter => this[(int)Input.TopLandDiameter];

    /// <summary>Pockets, mm³.</summary>
    public readonly T Pocket => this[(int)Input.Pocket];

    /// <summary>Whole chamber fill, mm³.</summary>
    public readonly T WholeChamber => this[(int)Input.WholeChamber];

    /// <summary>Plug hole, mm³.</summary>
    public readonly T PlugHole => this[(int)Input.PlugHole];

    /// <summary>Closing angle, rad.</summary>
    public readonly T Closing => this[(int)Input.Closing];

    /// <summary>Altitude, m.</summary>
    public readonly T Altitude => this[(int)Input.Altitude];

    /// <summary>Cranking exponent, 1.</summary>
    public readonly T CrankingExponent => this[(int)Input.CrankingExponent];
}
