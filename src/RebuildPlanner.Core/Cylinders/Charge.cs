using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Cylinders;

/// <summary>What the trapped charge is squeezed to.</summary>
public static class Charge
{
    // ISO 2533: sea-level pressure, temperature, lapse rate and the exponent g/(R·lapse), from its own constants.
    private const double SeaLevelKPa = 101.325, SeaLevelKelvin = 288.15, LapseKelvinPerMetre = 0.0065;
    private const double Exponent = 9.80665 / (287.05287 * LapseKelvinPerMetre);

    /// <summary>Trapped ratio, 1.</summary>
    /// <param name="belowTopMm">Piston below top dead centre when the charge is trapped, mm.</param>
    /// <param name="travelMm">Piston travel, mm, &gt; 0.</param>
    /// <param name="ratio">Static compression ratio, 1.</param>
    /// <remarks>1 + (x/S_t)·(CR − 1). Source: geometry. Valid for: 0 ≤ x ≤ S_t. Error: says nothing of flow while the valve closes.</remarks>
    public static T TrappedRatio<T>(T belowTopMm, T travelMm, T ratio)
        where T : struct, IScalar<T>
    {
        T one = T.From(1.0);
        return one + (belowTopMm / travelMm * (ratio - one));
    }

    /// <summary>Pressure of the surrounding air, kPa absolute.</summary>
    /// <param name="altitudeM">Altitude, m, −500 to 11 000.</param>
    /// <remarks>p = p₀·(1 − l·h/T₀)^(g/(R·l)). Source: iso2533. Valid for: the troposphere. Error: weather moves it by about 3 %.</remarks>
    public static T AmbientPressure<T>(T altitudeM)
        where T : struct, IScalar<T> =>
        SeaLevelKPa * T.Exp(Exponent * T.Log(T.From(1.0) - ((LapseKelvinPerMetre / SeaLevelKelvin) * altitudeM)));

    /// <summary>Cranking pressure, kPa gauge.</summary>
    /// <param name="trappedRatio">Trapped ratio, 1.</param>
    /// <param name="ambientKPa">Surrounding air, kPa absolute.</param>
    /// <param name="exponent">n, 1.20 to 1.30 (common practice).</param>
    /// <remarks>p_amb·trapped^n − p_amb. Source: common-practice. Valid for: plugs out, throttle open, tight valves and rings. Error: a guide, not a promise.</remarks>
    public static T CrankingPressure<T>(T trappedRatio, T ambientKPa, T exponent)
        where T : struct, IScalar<T> => ambientKPa * (T.Exp(exponent * T.Log(trappedRatio)) - T.From(1.0));
}
