namespace RebuildPlanner.Core.Numerics;

/// <summary>The standard normal law, without unit.</summary>
public static class NormalLaw
{
    private static readonly double InverseRootTwoPi = 1.0 / Math.Sqrt(2.0 * Math.PI);

    /// <summary>The density φ(z), without unit.</summary>
    /// <param name="z">Standardised offset z, any real.</param>
    /// <remarks>φ(z) = exp(−z²/2)/√(2π). Source: dlmf. Valid for: every z. Error: a few units of the last place.</remarks>
    public static double Density(double z) => InverseRootTwoPi * Math.Exp(-0.5 * z * z);

    /// <summary>The probability Φ(z) of a value at or below z, without unit.</summary>
    /// <param name="z">Standardised offset z, any real or ±∞.</param>
    /// <remarks>Φ(z) = 1 − Q(z). Source: dlmf (7.2, 7.9). Valid for: every z. Error: 1e-15.</remarks>
    public static double Below(double z) => z < 0.0 ? Above(-z) : 1.0 - Above(z);

    /// <summary>The probability Q(z) of a value above z, without unit; it keeps its relative accuracy far out.</summary>
    /// <param name="z">Standardised offset z, any real or ±∞.</param>
    /// <remarks>
    /// |z| &lt; 3: ½ − φ(z)·(z + z³/3 + z⁵/15 + …); beyond: φ(z)/(z + 1/(z + 2/(z + 3/…))).
    /// Source: dlmf (7.6.2, 7.9.3). Valid for: every z. Error: 1e-13 relative for z ≥ 0.
    /// </remarks>
    public static double Above(double z)
    {
        if (z < 0.0)
        {
            return 1.0 - Above(-z);
        }

        if (z < 3.0)
        {
            double sum = z, term = z;
            for (int odd = 3; term > 1e-17 * sum; odd += 2)
            {
                term *= z * z / odd;
                sum += term;
            }

            return 0.5 - (Density(z) * sum);
        }

        if (z > 40.0)
        {
            return 0.0;
        }

        // The fraction's error falls about as exp(−2z√n): 56 levels at z = 3 and fewer beyond reach the last place.
        double fraction = z;
        for (int level = 12 + (int)(400.0 / (z * z)); level >= 1; level--)
        {
            fraction = z + (level / fraction);
        }

        return Density(z) / fraction;
    }

    /// <summary>The standardised offset z that a value stays below with the given probability, without unit.</summary>
    /// <param name="probability">p, 0 to 1; the ends give ∓∞.</param>
    /// <remarks>
    /// Φ(z) = p: the rational start of <see cref="QuickQuantile"/> and one Halley step. Source: wichura1988. Valid for: 0 ≤ p ≤ 1.
    /// Error: 1e-14, relative in the smaller of p and 1 − p.
    /// </remarks>
    public static double Quantile(double probability)
    {
        if (probability > 0.5)
        {
            // 1 − p is exact here, so the upper half loses nothing by being mirrored.
            return -Quantile(1.0 - probability);
        }

        double z = QuickQuantile(probability);
        if (probability <= 1e-300)
        {
            return z;
        }

        double step = (Below(z) - probability) / Density(z);
        return z - (step / (1.0 + (0.5 * z * step)));
    }

    /// <summary>The quantile to about seven digits, for trials, where its speed counts.</summary>
    /// <remarks>Rational approximations PPND7. Source: wichura1988. Valid for: 0 ≤ p ≤ 1. Error: 1e-6 relative.</remarks>
    internal static double QuickQuantile(double probability)
    {
        double q = probability - 0.5;
        if (Math.Abs(q) <= 0.425)
        {
            double s = 0.180625 - (q * q);
            return q * ((((((59.109374720 * s) + 159.29113202) * s) + 50.434271938) * s) + 3.3871327179)
                / ((((((67.187563600 * s) + 78.757757664) * s) + 17.895169469) * s) + 1.0);
        }

        double tail = q < 0.0 ? probability : 1.0 - probability;
        if (tail <= 0.0)
        {
            return q < 0.0 ? double.NegativeInfinity : double.PositiveInfinity;
        }

        double r = Math.Sqrt(-Math.Log(tail));
        double z;
        if (r <= 5.0)
        {
            r -= 1.6;
            z = ((((((0.17023821103 * r) + 1.3067284816) * r) + 2.7568153900) * r) + 1.4234372777)
                / ((((0.12021132975 * r) + 0.73700164250) * r) + 1.0);
        }
        else
        {
            r -= 5.0;
            z = ((((((0.017337203997 * r) + 0.42868294337) * r) + 3.0812263860) * r) + 6.6579051150)
                / ((((0.012258202635 * r) + 0.24197894225) * r) + 1.0);
        }

        return q < 0.0 ? -z : z;
    }
}
