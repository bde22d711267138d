namespace RebuildPlanner.Core.Quantities;

/// <summary>The units figures are printed in.</summary>
public enum UnitSystem
{
    /// <summary>mm, cm³, kPa, °C.</summary>
    Metric,

    /// <summary>in, cu in, psi, °F.</summary>
    Inch,
}
