namespace RebuildPlanner.Core.Numerics;

/// <summary>The characteristic function of Student's t law, without unit.</summary>
/// <remarks>Made once for a ν, so that the recurrence's divisions are done once and not at every point.</remarks>
public sealed class StudentTCharacteristic
{
    // From here on the expansion for large order, with four terms, is exact to 1e-9; the recurrence would take more than thirty steps.
    private const int LargeOrder = 60;

    private readonly int _degreesOfFreedom;
    private readonly double _rootNu;
    private readonly double[] _steps;

    /// <summary>Makes the function for ν degrees of freedom.</summary>
    /// <param name="degreesOfFreedom">ν, ≥ 1; repeats give whole numbers, a part of one is left off, which only widens.</param>
    public StudentTCharacteristic(double degreesOfFreedom)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(degreesOfFreedom, 1.0);
        _degreesOfFreedom = (int)Math.Min(degreesOfFreedom, 1e9);
        _rootNu = Math.Sqrt(_degreesOfFreedom);
        _steps = new double[_degreesOfFreedom < LargeOrder ? Math.Max(0, ((_degreesOfFreedom + 1) / 2) - 2) : 0];
        double order = _degreesOfFreedom % 2 == 0 ? 2.0 : 1.5;
        for (int i = 0; i < _steps.Length; i++, order += 1.0)
        {
            _steps[i] = 1.0 / (4.0 * order * (order - 1.0));
        }
    }

    /// <summary>The function at t, without unit, 0 to 1.</summary>
    /// <param name="t">Argument t, any real.</param>
    /// <remarks>
    /// y_a(x) = x^a·K_a(x)/(Γ(a)·2^(a−1)) with a = ν/2, x = √ν|t|. With w = x²: y_(a+1) = y_a + w·y_(a−1)/(4a(a−1)), a sum of positive parts and
    /// so stable upwards; from e^(−x), (1+x)e^(−x) for an odd ν and from xK₁, xK₁ + x²K₀/2 for an even one; the expansion for large order
    /// from ν = 60. Source: hurst1995, dlmf (10.29.1, 10.39.2, 10.41.4). Valid for: whole ν ≥ 1. Error: 1e-9.
    /// </remarks>
    public double At(double t)
    {
        double x = _rootNu * Math.Abs(t);
        if (x == 0.0)
        {
            return 1.0;
        }

        if (_degreesOfFreedom >= LargeOrder)
        {
            return LargeOrderValue(0.5 * _degreesOfFreedom, x);
        }

        double square = x * x, lower, upper;
        if (_degreesOfFreedom % 2 == 1)
        {
            lower = Math.Exp(-x);
            upper = (1.0 + x) * lower;
        }
        else
        {
            (double k0, double k1) = ModifiedBessel.K0AndK1(x);
            lower = x * k1;
            upper = lower + (0.5 * square * k0);
        }

        if (_degreesOfFreedom <= 2)
        {
            return lower;
        }

        foreach (double step in _steps)
        {
            (lower, upper) = (upper, upper + (square * step * lower));
        }

        return upper;
    }

    private static double LargeOrderValue(double a, double x)
    {
        // K_a(az) ~ √(π/2a)·e^(−aη)/(1+z²)^¼·Σ(−1)^k·U_k(p)/a^k, over the same at z → 0, where it is Γ(a)·2^(a−1)/x^a.
        double z = x / a, root = Math.Sqrt(1.0 + (z * z)), p = 1.0 / root;
        double exponent = a * (1.0 - root + Math.Log(0.5 * (1.0 + root)));
        return Math.Exp(exponent) * Math.Sqrt(p) * Alternating(p, a) / Alternating(1.0, a);
    }

    private static double Alternating(double p, double a)
    {
        double s = p * p, r = p / a;
        double u1 = (3.0 - (5.0 * s)) / 24.0;
        double u2 = (81.0 + (s * (-462.0 + (385.0 * s)))) / 1152.0;
        double u3 = (30375.0 + (s * (-369603.0 + (s * (765765.0 - (425425.0 * s)))))) / 414720.0;
        double u4 = (4465125.0 + (s * (-94121676.0 + (s * (349922430.0 + (s * (-446185740.0 + (185910725.0 * s)))))))) / 39813120.0;
        return 1.0 - (r * (u1 - (r * (u2 - (r * (u3 - (r * u4)))))));
    }
}
