using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Stacks;

public class NormalRampTests
{
    [Fact]
    public void Tables_agree_with_the_normal_law_between_their_knots()
    {
        for (double z = -7.0; z < 7.0; z += 0.0173)
        {
            double below = MathNet.Numerics.Distributions.Normal.CDF(0.0, 1.0, z), density = MathNet.Numerics.Distributions.Normal.PDF(0.0, 1.0, z);
            // The cubic's error at 24 knots a unit.
            Assert.Equal(below, NormalRamp.At(0, z, 1.0), 1e-8);
            Assert.Equal(2.0 * ((z * below) + density), NormalRamp.At(1, 2.0 * z, 2.0), 2e-8);
            Assert.Equal(2.0 * ((((z * z) + 1.0) * below) + (z * density)), NormalRamp.At(2, 2.0 * z, 2.0), 4e-8);
        }
    }

    [Theory]
    [InlineData(1.0, 1e-3)]
    [InlineData(2.0, 1e-3)]
    [InlineData(3.0, 1e-4)]
    [InlineData(20.0, 1e-6)]
    public void Pool_scale_agrees_with_the_quantile_of_MathNet(double degreesOfFreedom, double allowed)
    {
        PoolScale scale = new(degreesOfFreedom);
        foreach (double z in new[] { -2.9, -1.03, 0.1, 0.88, 3.3 })
        {
            double x = MathNet.Numerics.Distributions.ChiSquared.InvCDF(degreesOfFreedom, NormalLaw.Below(z));
            // For the smallest ν the cube root bends between the knots.
            Assert.Equal(1.0, scale.At(z) / Math.Sqrt(degreesOfFreedom / x), allowed);
        }
    }
}
