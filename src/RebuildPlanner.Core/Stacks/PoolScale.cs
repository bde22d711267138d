using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>The scale √(ν/χ²_ν) that a pool's normals share, as a function of a standard normal draw.</summary>
/// <remarks>
/// The cube root of χ²/ν is nearly straight in that draw (Wilson and Hilferty), so a short table of exact quantiles with their slopes gives it to
/// 1e-5 for trials. Source: wilsonhilferty1931. Valid for: ν ≥ 1. Error: 1e-5 relative, 1e-3 for ν ≤ 2.
/// </remarks>
internal sealed class PoolScale
{
    private const double Reach = 5.0;
    private const int KnotsPerUnit = 4;
    private const int Knots = (int)(2.0 * Reach * KnotsPerUnit) + 1;

    private readonly double[] _roots = new double[Knots];
    private readonly double[] _slopes = new double[Knots];

    public PoolScale(double degreesOfFreedom)
    {
        for (int k = 0; k < Knots; k++)
        {
            double z = -Reach + ((double)k / KnotsPerUnit);
            double x = ChiSquare.QuantileAt(z, degreesOfFreedom);
            double slope = NormalLaw.Density(z) / ChiSquare.Density(x, degreesOfFreedom);
            _roots[k] = Math.Cbrt(x / degreesOfFreedom);
            _slopes[k] = _roots[k] * slope / (3.0 * x) / KnotsPerUnit;
        }
    }

    /// <summary>The scale at a standard normal draw; a low draw is a small s seen, and a large scale.</summary>
    public double At(double z)
    {
        double position = (Math.Clamp(z, -Reach, Reach) + Reach) * KnotsPerUnit;
        int k = Math.Min(Knots - 2, (int)position);
        double t = position - k, rise = _roots[k + 1] - _roots[k];
        double root = _roots[k] + (t * (_slopes[k] + (t * ((3.0 * rise) - (2.0 * _slopes[k]) - _slopes[k + 1]
            + (t * (_slopes[k] + _slopes[k + 1] - (2.0 * rise)))))));
        return 1.0 / (root * Math.Sqrt(root));
    }
}
