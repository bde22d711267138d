namespace RebuildPlanner.Core.Cylinders;

/// <summary>The figures of one cylinder that its volumes, ratio and gaps are computed from.</summary>
public enum Input
{
    /// <summary>Mean bore, mm.</summary>
    Bore,

    /// <summary>Stroke, twice the crank throw, mm.</summary>
    Stroke,

    /// <summary>Pin offset, &gt; 0 towards the side the crankpin moves to after top dead centre, mm.</summary>
    PinOffset,

    /// <summary>Rod length between centres, mm.</summary>
    RodLength,

    /// <summary>Measured piston travel, mm.</summary>
    Travel,

    /// <summary>Chamber in the head, mm³.</summary>
    Chamber,

    /// <summary>Gasket opening as a diameter, mm.</summary>
    GasketOpening,

    /// <summary>Gasket opening as a traced area, mm².</summary>
    GasketArea,

    /// <summary>Gasket thickness, compressed, mm.</summary>
    GasketThickness,

    /// <summary>Deck clearance, mean of both pin ends, &gt; 0 below, mm.</summary>
    Deck,

    /// <summary>Deck clearance at the end of the pin where it is least, mm.</summary>
    LeastDeck,

    /// <summary>How far the piston rocks nearer the head, mm.</summary>
    Rock,

    /// <summary>Recess of the head above its face, over the squish pad, mm.</summary>
    HeadRecess,

    /// <summary>Crown volume, &gt; 0 for a dish, mm³.</summary>
    Crown,

    /// <summary>Top land height, mm.</summary>
    TopLandHeight,

    /// <summary>Top land diameter, mm.</summary>
    TopLandDiameter,

    /// <summary>Named pockets, mm³.</summary>
    Pocket,

    /// <summary>Fill of the whole chamber through the plug hole at top dead centre, mm³.</summary>
    WholeChamber,

    /// <summary>Plug hole above the seated plug, mm³.</summary>
    PlugHole,

    /// <summary>Closing of the port or valve that traps the charge: after bottom dead centre, or before top for a two-stroke, rad.</summary>
    Closing,

    /// <summary>Altitude, m.</summary>
    Altitude,

    /// <summary>Exponent of compression while cranking, 1.</summary>
    CrankingExponent,
}
