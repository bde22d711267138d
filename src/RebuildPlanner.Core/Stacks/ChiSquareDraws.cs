using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>The factor by which the spread of a pool of repeats may be wrong.</summary>
internal static class ChiSquareDraws
{
    /// <summary>Fills with √(ν/χ²_ν): a normal times it is a t of ν degrees of freedom.</summary>
    /// <param name="factors">Where they go.</param>
    /// <param name="degreesOfFreedom">ν, ≥ 1.</param>
    /// <param name="random">Where the bits come from.</param>
    /// <remarks>
    /// χ²_ν is twice a gamma of shape ν/2, drawn by squeezing a cubed normal; below shape 1 from the next shape. Source: marsagliatsang2000.
    /// Valid for: ν ≥ 1, whole or not. Error: none but the normals' own.
    /// </remarks>
    public static void Fill(Span<double> factors, double degreesOfFreedom, ref RandomLanes random)
    {
        double shape = 0.5 * degreesOfFreedom, raised = shape < 1.0 ? shape + 1.0 : shape;
        double d = raised - (1.0 / 3.0), c = 1.0 / Math.Sqrt(9.0 * d);
        Span<double> normals = stackalloc double[NormalDraws.Batch];
        int next = normals.Length;
        for (int at = 0; at < factors.Length;)
        {
            if (next == normals.Length)
            {
                NormalDraws.Fill(normals, ref random);
                next = 0;
            }

            double x = normals[next++], root = 1.0 + (c * x), v = root * root * root;
            if (v <= 0.0 || Math.Log(random.NextAboveZero()) >= (0.5 * x * x) + (d * (1.0 - v + Math.Log(v))))
            {
                continue;
            }

            double gamma = d * v * (shape < 1.0 ? Math.Pow(random.NextAboveZero(), 1.0 / shape) : 1.0);
            factors[at++] = Math.Sqrt(shape / gamma);
        }
    }
}
