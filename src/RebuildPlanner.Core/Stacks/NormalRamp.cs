using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>The normal law's probability Φ and its two repeated integrals from −∞, from tables: trials ask for them millions of times.</summary>
/// <remarks>R₁ = zΦ + φ, R₂ = ½((z² + 1)Φ + zφ). Source: dlmf (7.18). Valid for: every z. Error: 1e-8.</remarks>
internal static class NormalRamp
{
    /// <summary>Beyond so many standard deviations nothing is left.</summary>
    public const double Reach = 6.5;

    // Cubic between knots: the error is h⁴/384 of a fourth derivative below 1.4, that is 1e-8 at 1/24.
    private const int KnotsPerUnit = 24;
    private const int Knots = (2 * 7 * KnotsPerUnit) + 2;

    private static readonly double[][] Values = [Tabulate(0), Tabulate(1), Tabulate(2)];
    private static readonly double[] Densities = [.. Enumerable.Range(0, Knots).Select(k => NormalLaw.Density(Knot(k)) / KnotsPerUnit)];

    /// <summary>R of the given order for a standard deviation σ, in σ's unit to that power; a step's own integrals where σ is zero.</summary>
    public static double At(int order, double offset, double sigma)
    {
        if (offset <= -Reach * sigma)
        {
            return 0.0;
        }

        if (offset >= Reach * sigma)
        {
            return order switch { 0 => 1.0, 1 => offset, _ => 0.5 * ((offset * offset) + (sigma * sigma)) };
        }

        double position = ((offset / sigma) + 7.0) * KnotsPerUnit;
        int k = (int)position;
        double t = position - k;
        double[] values = Values[order];
        double slope0 = order == 0 ? Densities[k] : Values[order - 1][k] / KnotsPerUnit;
        double slope1 = order == 0 ? Densities[k + 1] : Values[order - 1][k + 1] / KnotsPerUnit;
        double rise = values[k + 1] - values[k];
        double cubic = values[k] + (t * (slope0 + (t * ((3.0 * rise) - (2.0 * slope0) - slope1 + (t * (slope0 + slope1 - (2.0 * rise)))))));
        return order switch { 0 => cubic, 1 => sigma * cubic, _ => sigma * sigma * cubic };
    }

    private static double[] Tabulate(int order)
    {
        double[] values = new double[Knots];
        for (int k = 0; k < Knots; k++)
        {
            double z = Knot(k), below = NormalLaw.Below(z), density = NormalLaw.Density(z);
            values[k] = order switch
            {
                0 => below,
                1 => (z * below) + density,
                _ => 0.5 * ((((z * z) + 1.0) * below) + (z * density)),
            };
        }

        return values;
    }

    private static double Knot(int k) => ((double)k / KnotsPerUnit) - 7.0;
}
