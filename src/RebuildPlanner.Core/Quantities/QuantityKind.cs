namespace RebuildPlanner.Core.Quantities;

/// <summary>What kind of thing a written quantity is, and with it the coherent unit its number is kept in.</summary>
public enum QuantityKind
{
    /// <summary>Kept in mm.</summary>
    Length,

    /// <summary>Kept in mm².</summary>
    Area,

    /// <summary>Kept in mm³.</summary>
    Volume,

    /// <summary>Kept in rad.</summary>
    Angle,

    /// <summary>Kept in kPa.</summary>
    Pressure,

    /// <summary>Kept in °C.</summary>
    Temperature,

    /// <summary>Kept in kJ/kg.</summary>
    SpecificEnergy,

    /// <summary>A bare number.</summary>
    Ratio,
}
