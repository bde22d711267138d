namespace RebuildPlanner.Core.Numerics;

/// <summary>The χ² law with ν degrees of freedom, without unit.</summary>
public static class ChiSquare
{
    /// <summary>The density at x, without unit.</summary>
    /// <param name="x">x, &gt; 0.</param>
    /// <param name="degreesOfFreedom">ν, ≥ 1.</param>
    /// <remarks>x^(a−1)·e^(−x/2)/(2^a·Γ(a)), a = ν/2. Source: dlmf (8.2). Valid for: ν ≥ 1. Error: 1e-12 relative.</remarks>
    public static double Density(double x, double degreesOfFreedom)
    {
        double a = 0.5 * degreesOfFreedom;
        return Math.Exp(((a - 1.0) * Math.Log(0.5 * x)) - (0.5 * x) - LogGamma(a)) / 2.0;
    }

    /// <summary>The probability of a value at or below x, without unit.</summary>
    /// <param name="x">x, any real.</param>
    /// <param name="degreesOfFreedom">ν, ≥ 1.</param>
    /// <remarks>
    /// P(ν/2, x/2), by its series below the mean and by the continued fraction of its complement above.
    /// Source: dlmf (8.7.1, 8.9.2). Valid for: 1 ≤ ν ≤ 1e5. Error: 1e-12.
    /// </remarks>
    public static double Below(double x, double degreesOfFreedom)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(degreesOfFreedom, 1.0);
        if (x <= 0.0)
        {
            return 0.0;
        }

        double a = 0.5 * degreesOfFreedom, y = 0.5 * x;
        double front = Math.Exp((a * Math.Log(y)) - y - LogGamma(a));
        if (y < a + 1.0)
        {
            double term = 1.0 / a, sum = term;
            for (int k = 1; term > 1e-17 * sum; k++)
            {
                term *= y / (a + k);
                sum += term;
            }

            return front * sum;
        }

        double b = y + 1.0 - a, c = 1e300, d = 1.0 / b, fraction = d;
        for (int k = 1; k < 100_000; k++)
        {
            double step = -k * (k - a);
            b += 2.0;
            d = 1.0 / ((step * d) + b);
            c = b + (step / c);
            fraction *= d * c;
            if (Math.Abs((d * c) - 1.0) < 1e-15)
            {
                break;
            }
        }

        return 1.0 - (front * fraction);
    }

    /// <summary>The x that a value stays below with the probability Φ(z), without unit.</summary>
    /// <param name="z">The normal offset that states the probability, which keeps its digits at both ends; −9 to 7.</param>
    /// <param name="degreesOfFreedom">ν, ≥ 1.</param>
    /// <remarks>
    /// Started from the cube of Wilson and Hilferty, which is nearly exact for every ν but the smallest; Newton in ln x keeps x positive.
    /// Source: wilsonhilferty1931. Valid for: ν ≥ 1. Error: 1e-9 relative.
    /// </remarks>
    public static double QuantileAt(double z, double degreesOfFreedom)
    {
        double nu = degreesOfFreedom, ninth = 2.0 / (9.0 * nu);
        double root = 1.0 - ninth + (z * Math.Sqrt(ninth)), wanted = NormalLaw.Below(z);
        double low = double.NegativeInfinity, high = double.PositiveInfinity;
        double log = root > 0.3 ? Math.Log(nu * root * root * root)
            : (2.0 / nu) * (Math.Log(wanted) + LogGamma((0.5 * nu) + 1.0)) + Math.Log(2.0);
        for (int round = 0; round < 200; round++)
        {
            double x = Math.Exp(log), below = Below(x, nu);
            if (below < wanted)
            {
                low = log;
            }
            else
            {
                high = log;
            }

            double next = log - ((below - wanted) / (x * Density(x, nu)));
            if (!(next > low && next < high))
            {
                next = double.IsInfinity(low) ? high - 1.0 : double.IsInfinity(high) ? low + 1.0 : 0.5 * (low + high);
            }

            if (Math.Abs(next - log) < 1e-11)
            {
                return Math.Exp(next);
            }

            log = next;
        }

        return Math.Exp(log);
    }

    /// <summary>ln Γ(a), without unit.</summary>
    /// <remarks>Stirling's series above 10, reached by Γ(a) = Γ(a+1)/a. Source: dlmf (5.11.1). Valid for: a &gt; 0. Error: 1e-14.</remarks>
    private static double LogGamma(double a)
    {
        double product = 1.0;
        while (a < 10.0)
        {
            product *= a;
            a += 1.0;
        }

        double r = 1.0 / (a * a);
        double series = ((1.0 / 12.0) - (r * ((1.0 / 360.0) - (r * ((1.0 / 1260.0) - (r * ((1.0 / 1680.0) - (r / 1188.0)))))))) / a;
        return ((a - 0.5) * Math.Log(a)) - a + (0.5 * Math.Log(2.0 * Math.PI)) + series - Math.Log(product);
    }
}
