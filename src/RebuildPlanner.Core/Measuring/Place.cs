namespace RebuildPlanner.Core.Measuring;

/// <summary>Where along a bore or wall, or at which end of the pin, a reading was taken.</summary>
public enum At
{
    /// <summary>At ring reversal, below the ridge.</summary>
    Top,

    /// <summary>Half way down.</summary>
    Middle,

    /// <summary>Low in the bore.</summary>
    Bottom,

    /// <summary>The front end of the pin.</summary>
    Front,

    /// <summary>The rear end of the pin.</summary>
    Rear,
}

/// <summary>Across which axis a bore was measured.</summary>
public enum BoreAxis
{
    /// <summary>Across the thrust faces.</summary>
    Thrust,

    /// <summary>Along the crank.</summary>
    AlongCrank,
}

/// <summary>Which valve.</summary>
public enum Valve
{
    /// <summary>The inlet valve.</summary>
    Inlet,

    /// <summary>The exhaust valve.</summary>
    Exhaust,
}

/// <summary>Which thing exactly: the part and the place on it.</summary>
/// <param name="Cylinder">Cylinder label, or null.</param>
/// <param name="Piece">Piston piece, or null.</param>
/// <param name="Head">Head label, or null.</param>
/// <param name="Bank">Bank label, or null.</param>
/// <param name="At">Depth or pin end.</param>
/// <param name="Axis">Axis of a bore.</param>
/// <param name="Valve">Which valve.</param>
/// <param name="ClockHours">Hours on the clock looking down on the deck, 12 at the cam-drive end.</param>
public sealed record Place(
    string? Cylinder = null, string? Piece = null, string? Head = null, string? Bank = null,
    At? At = null, BoreAxis? Axis = null, Valve? Valve = null, double? ClockHours = null)
{
    /// <summary>How closely the part is named: 2 one cylinder or piece, 1 one head or bank, 0 all. The narrowest entry counts.</summary>
    public int Narrowness => Cylinder is not null || Piece is not null ? 2 : Head is not null || Bank is not null ? 1 : 0;

    /// <summary>No part named: all of them.</summary>
    public static Place Everywhere { get; } = new();
}
