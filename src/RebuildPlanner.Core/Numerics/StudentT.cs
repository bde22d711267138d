namespace RebuildPlanner.Core.Numerics;

/// <summary>Student's t law with a real number of degrees of freedom, without unit.</summary>
public static class StudentT
{
    // Beyond this the first term of the expansion in 1/ν is exact to 1e-12, and the continued fraction loses ν·1e-18 to cancelling.
    private const double NearlyNormal = 1e6;

    /// <summary>The density f(t), without unit.</summary>
    /// <param name="t">Standardised offset t, any real.</param>
    /// <param name="degreesOfFreedom">ν, ≥ 1, ∞ for the normal law.</param>
    /// <remarks>
    /// f(t) = Γ((ν+1)/2)/(Γ(ν/2)√(πν))·(1 + t²/ν)^(−(ν+1)/2). Source: jcgm100 (G.3.2). Valid for: ν ≥ 1. Error: 1e-13 relative.
    /// </remarks>
    public static double Density(double t, double degreesOfFreedom)
    {
        Guard(degreesOfFreedom);
        if (degreesOfFreedom > NearlyNormal)
        {
            double square = t * t;
            return NormalLaw.Density(t) * (1.0 + (((square * square) - (2.0 * square) - 1.0) / (4.0 * degreesOfFreedom)));
        }

        return GammaRatio(0.5 * degreesOfFreedom) / Math.Sqrt(Math.PI * degreesOfFreedom)
            * Math.Exp(-0.5 * (degreesOfFreedom + 1.0) * LogOnePlus(t * t / degreesOfFreedom));
    }

    /// <summary>The probability of a value at or below t, without unit.</summary>
    /// <param name="t">Standardised offset t, any real or ±∞.</param>
    /// <param name="degreesOfFreedom">ν, ≥ 1, ∞ for the normal law.</param>
    /// <remarks>1 − <see cref="Above"/>. Source: dlmf (8.17). Valid for: ν ≥ 1. Error: 1e-13.</remarks>
    public static double Below(double t, double degreesOfFreedom) =>
        t < 0.0 ? Above(-t, degreesOfFreedom) : 1.0 - Above(t, degreesOfFreedom);

    /// <summary>The probability of a value above t, without unit; it keeps its relative accuracy far out.</summary>
    /// <param name="t">Standardised offset t, any real or ±∞.</param>
    /// <param name="degreesOfFreedom">ν, ≥ 1, ∞ for the normal law.</param>
    /// <remarks>
    /// ½·I_x(ν/2, ½) with x = ν/(ν + t²), the incomplete beta function by its continued fraction.
    /// Source: dlmf (8.17.22). Valid for: ν ≥ 1. Error: 1e-12, relative for ν below 1e4.
    /// </remarks>
    public static double Above(double t, double degreesOfFreedom)
    {
        Guard(degreesOfFreedom);
        if (t < 0.0)
        {
            return 1.0 - Above(-t, degreesOfFreedom);
        }

        if (t == 0.0 || double.IsPositiveInfinity(t))
        {
            return t == 0.0 ? 0.5 : 0.0;
        }

        double nu = degreesOfFreedom;
        if (nu > NearlyNormal)
        {
            return NormalLaw.Above(t) + (NormalLaw.Density(t) * ((t * t) + 1.0) * t / (4.0 * nu));
        }

        double a = 0.5 * nu, square = t * t;
        double x = nu / (nu + square), complement = square / (nu + square);
        double front = GammaRatio(a) / Math.Sqrt(Math.PI) * Math.Exp(-a * LogOnePlus(square / nu)) * Math.Sqrt(complement);
        return x < (a + 1.0) / (a + 2.5)
            ? 0.5 * front / a * BetaFraction(a, 0.5, x)
            : 0.5 - (front * BetaFraction(0.5, a, complement));
    }

    /// <summary>The standardised offset t that a value stays below with the given probability, without unit.</summary>
    /// <param name="probability">p, 0 to 1; the ends give ∓∞.</param>
    /// <param name="degreesOfFreedom">ν, ≥ 1, ∞ for the normal law.</param>
    /// <remarks>
    /// ν = 1: −cot(πp); otherwise Newton on the logarithm of the tail, which is nearly straight in ln t far out and so cannot run away.
    /// Source: jcgm100 (G.3). Valid for: ν ≥ 1. Error: 1e-12 relative.
    /// </remarks>
    public static double Quantile(double probability, double degreesOfFreedom)
    {
        Guard(degreesOfFreedom);
        if (probability == 0.5)
        {
            return 0.0;
        }

        if (probability < 0.5)
        {
            return -UpperQuantile(probability, degreesOfFreedom);
        }

        return UpperQuantile(1.0 - probability, degreesOfFreedom);
    }

    private static double UpperQuantile(double tail, double nu)
    {
        if (double.IsPositiveInfinity(nu) || tail <= 0.0)
        {
            return -NormalLaw.Quantile(tail);
        }

        if (nu == 1.0)
        {
            return 1.0 / Math.Tan(Math.PI * tail);
        }

        double low = 0.0, high = double.PositiveInfinity;
        double t = -NormalLaw.Quantile(tail);
        for (int round = 0; round < 200; round++)
        {
            double above = Above(t, nu);
            if (above > tail)
            {
                low = t;
            }
            else
            {
                high = t;
            }

            double step = (above - tail) / Density(t, nu);
            if (tail < 0.1 && above > 0.0)
            {
                step = above * Math.Log(above / tail) / Density(t, nu);
            }

            double next = t + step;
            if (!(next > low && next < high))
            {
                next = double.IsPositiveInfinity(high) ? (2.0 * t) + 1.0 : 0.5 * (low + high);
            }

            if (Math.Abs(next - t) <= 1e-14 * Math.Abs(next))
            {
                return next;
            }

            t = next;
        }

        return t;
    }

    /// <summary>Γ(a + ½)/Γ(a), without unit.</summary>
    /// <remarks>
    /// The ratio itself, not the difference of two logarithms, which loses its digits for a large a. √a·(1 − 1/8a + 1/128a² + 5/1024a³ − …) above
    /// a = 30, reached by R(a) = R(a+1)·a/(a+½). Source: dlmf (5.11.13). Valid for: a ≥ ½. Error: 1e-13 relative.
    /// </remarks>
    private static double GammaRatio(double a)
    {
        double shift = 1.0;
        while (a < 30.0)
        {
            shift *= a / (a + 0.5);
            a += 1.0;
        }

        double r = 1.0 / a;
        double series = 1.0 + (r * ((-1.0 / 8.0) + (r * ((1.0 / 128.0) + (r * ((5.0 / 1024.0)
            + (r * ((-21.0 / 32768.0) + (r * ((-399.0 / 262144.0) + (r * (869.0 / 4194304.0))))))))))));
        return shift * Math.Sqrt(a) * series;
    }

    /// <summary>The continued fraction of the incomplete beta function, by Lentz's forward evaluation.</summary>
    private static double BetaFraction(double a, double b, double x)
    {
        const double tiny = 1e-300;
        double numerator = 1.0, denominator = 1.0 - ((a + b) * x / (a + 1.0));
        denominator = 1.0 / (Math.Abs(denominator) < tiny ? tiny : denominator);
        double value = denominator;
        for (int m = 1; m < 100_000; m++)
        {
            double even = m * (b - m) * x / ((a + (2 * m) - 1.0) * (a + (2 * m)));
            denominator = 1.0 / (1.0 + (even * denominator));
            numerator = 1.0 + (even / numerator);
            value *= numerator * denominator;
            double odd = -(a + m) * (a + b + m) * x / ((a + (2 * m)) * (a + (2 * m) + 1.0));
            denominator = 1.0 / (1.0 + (odd * denominator));
            numerator = 1.0 + (odd / numerator);
            double factor = numerator * denominator;
            value *= factor;
            if (Math.Abs(factor - 1.0) < 1e-15)
            {
                break;
            }
        }

        return value;
    }

    // ln(1 + x) with the rounding of 1 + x taken out again; the library has no exact one.
    private static double LogOnePlus(double x)
    {
        double sum = 1.0 + x;
        return sum == 1.0 ? x : Math.Log(sum) * (x / (sum - 1.0));
    }

    private static void Guard(double degreesOfFreedom) =>
        ArgumentOutOfRangeException.ThrowIfLessThan(degreesOfFreedom, 1.0);
}
