using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Measuring;

/// <summary>Linear expansion of the metals of an engine and its gauges.</summary>
public static class Expansion
{
    /// <summary>Relative half-width of any α: ±10 %.</summary>
    public const double RelativeLimit = 0.10;

    /// <summary>Half-width of a temperature written without limits, °C.</summary>
    public const double TemperatureLimitC = 1.0;

    /// <summary>The metal of measuring faces, rods of gauges and setting masters.</summary>
    public const Metal GaugeMetal = Metal.Steel;

    /// <summary>Linear expansion, 1/°C.</summary>
    /// <remarks>Source: materials-tables. Valid for: 0 to 50 °C. Error: ±10 %, see <see cref="RelativeLimit"/>.</remarks>
    public static double PerC(Metal metal) => metal switch
    {
        Metal.CastIron or Metal.GreyIron => 11.4e-6,
        Metal.Steel => 11.7e-6,
        _ => 21.5e-6,
    };

    /// <summary>What is added to a length read at a temperature to have it at 20 °C, mm.</summary>
    /// <param name="lengthMm">Length as read, or of the setting master for a comparator, mm.</param>
    /// <param name="gaugePerC">α of the gauge, 1/°C.</param>
    /// <param name="gaugeC">Its temperature, °C.</param>
    /// <param name="partPerC">α of the part, 1/°C.</param>
    /// <param name="partC">Its temperature, °C.</param>
    /// <remarks>L·(α_g·(t_g − 20) − α_p·(t_p − 20)). Source: iso1. Valid for: 5 to 50 °C. Error: second order in α·Δt, below 1e-7.</remarks>
    public static double CorrectionMm(double lengthMm, double gaugePerC, double gaugeC, double partPerC, double partC) =>
        lengthMm * ((gaugePerC * (gaugeC - 20.0)) - (partPerC * (partC - 20.0)));
}
