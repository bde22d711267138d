namespace RebuildPlanner.Core.Cylinders;

/// <summary>What one cylinder's figures come to.</summary>
public enum Output
{
    /// <summary>Mean bore, mm.</summary>
    Bore,

    /// <summary>Swept volume, mm³.</summary>
    SweptVolume,

    /// <summary>Chamber, mm³.</summary>
    Chamber,

    /// <summary>Gasket volume, mm³.</summary>
    Gasket,

    /// <summary>Deck volume, mm³.</summary>
    Deck,

    /// <summary>Crown volume, mm³.</summary>
    Crown,

    /// <summary>Top-land crevice, mm³.</summary>
    TopLand,

    /// <summary>Clearance volume at top dead centre, mm³.</summary>
    ClearanceVolume,

    /// <summary>Static compression ratio, 1.</summary>
    CompressionRatio,

    /// <summary>Trapped ratio, 1.</summary>
    TrappedRatio,

    /// <summary>Cranking pressure, kPa gauge.</summary>
    CrankingPressure,

    /// <summary>Piston to head at the closest end of the pin, mm.</summary>
    PistonToHead,

    /// <summary>Whole chamber less the sum of its parts, mm³.</summary>
    CrossCheck,
}
