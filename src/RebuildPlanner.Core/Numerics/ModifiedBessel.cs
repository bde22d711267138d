namespace RebuildPlanner.Core.Numerics;

/// <summary>The two modified Bessel functions that a t law with an even number of degrees of freedom starts from.</summary>
internal static class ModifiedBessel
{
    // The rule's error relative to the result is about exp(−2π²/(h²x)): 1e-11 at x = 20 for h = 0.2. The t law multiplies it by a power of x.
    private const double Step = 0.2;
    private const double EulerGamma = 0.57721566490153286;
    private static readonly double[] Cosh = [.. Enumerable.Range(0, 20).Select(k => Math.Cosh(Step * k))];

    /// <summary>K₀(x) and K₁(x), without unit.</summary>
    /// <param name="x">Argument, &gt; 0.</param>
    /// <remarks>
    /// x &lt; 2: the power series; beyond: the trapezoidal rule on K_n(x) = ∫₀^∞ exp(−x·cosh u)·cosh(nu) du.
    /// Source: dlmf (10.31.1, 10.32.9). Valid for: x &gt; 0. Error: 1e-11 absolute in x·K₁ and x²·K₀.
    /// </remarks>
    public static (double K0, double K1) K0AndK1(double x) => x < 2.0 ? BySeries(x) : ByTrapezoids(x);

    private static (double K0, double K1) BySeries(double x)
    {
        // With q = x²/4 and h_k the harmonic numbers: I₀ = Σ q^k/k!², K₀ = −(ln(x/2) + γ)·I₀ + Σ h_k·q^k/k!², and K₁ = −K₀'.
        double q = 0.25 * x * x, log = -Math.Log(0.5 * x) - EulerGamma;
        double term = 1.0, harmonic = 0.0, k0 = log, k1 = 1.0 / x;
        for (int k = 1; k < 12; k++)
        {
            double previous = term / k;
            term = previous * q / k;
            harmonic += 1.0 / k;
            k0 += term * (log + harmonic);
            k1 += 0.5 * x * previous * ((1.0 / (2.0 * k)) - log - harmonic);
        }

        return (k0, k1);
    }

    private static (double K0, double K1) ByTrapezoids(double x)
    {
        double first = Math.Exp(-x), k0 = 0.5 * first, k1 = k0;
        for (int k = 1; k < Cosh.Length; k++)
        {
            double exponent = x * Cosh[k];
            if (exponent > x + 30.0)
            {
                break;
            }

            double part = Math.Exp(-exponent);
            k0 += part;
            k1 += part * Cosh[k];
        }

        return (Step * k0, Step * k1);
    }
}
