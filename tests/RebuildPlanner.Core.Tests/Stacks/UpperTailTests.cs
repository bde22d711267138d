using MathNet.Numerics.Integration;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Stacks;

public class UpperTailTests
{
    [Theory]
    [InlineData(1.0)]
    [InlineData(2.0)]
    [InlineData(3.0)]
    [InlineData(8.0)]
    public void Integrals_of_the_t_tail_agree_with_quadrature(double degreesOfFreedom) =>
        AssertIntegrals(new StudentTail(0.7, degreesOfFreedom), x => 1.0 - MathNet.Numerics.Distributions.StudentT.CDF(0.0, 0.7, degreesOfFreedom, x));

    [Fact]
    public void Integrals_of_the_normal_tail_agree_with_quadrature() =>
        AssertIntegrals(new NormalTail(0.7), x => 1.0 - MathNet.Numerics.Distributions.Normal.CDF(0.0, 0.7, x));

    [Fact]
    public void Integrals_of_the_rectangle_agree_with_quadrature() =>
        AssertIntegrals(new RectangleTail(1.3), x => Math.Max(0.0, 1.3 - x) / 2.6);

    [Theory]
    [InlineData(1.0)]
    [InlineData(3.0)]
    [InlineData(9.0)]
    public void Far_offsets_agree_with_the_t_tail_averaged_over_the_normal(double degreesOfFreedom)
    {
        const double scale = 0.1;
        LinearSum sum = new([Source.Normal(1.0), Source.Pooled(scale, 0, degreesOfFreedom, -1.0, 1.0)], [1.0, 1.0]);
        foreach (double offset in new[] { 9.0, 12.0, 30.0 })
        {
            double oracle = GaussLegendreRule.Integrate(
                w => MathNet.Numerics.Distributions.Normal.PDF(0.0, 1.0, w)
                    * MathNet.Numerics.Distributions.StudentT.CDF(0.0, scale, degreesOfFreedom, w - offset), -7.0, 7.0, 256);
            // The three-point rule first misses a sixth moment of 6σ⁶: (ν)₆/720·6/d⁶ of the tail, 0.03 % at 9 σ for ν = 3. Where the tail is
            // below 1e-9, as for ν = 9, nothing is promised.
            Assert.Equal(oracle, sum.Inside(offset, double.PositiveInfinity), 1e-9 + (2e-3 * oracle));
        }
    }

    private static void AssertIntegrals(UpperTail tail, Func<double, double> oracle)
    {
        foreach (double d in new[] { 0.2, 1.0, 1.3, 6.0 })
        {
            // The rectangle's corner is at the end of a panel, so that sixty-four points are exact to rounding in each.
            double once = Integral(oracle, d), twice = Integral(x => (d - x) * oracle(x), d);
            Assert.Equal(oracle(d), tail.At(0, d), 1e-12);
            Assert.Equal(once, tail.At(1, d), 1e-11);
            Assert.Equal(twice, tail.At(2, d), 1e-11);
        }
    }

    private static double Integral(Func<double, double> f, double to) =>
        to <= 1.3 ? GaussLegendreRule.Integrate(f, 0.0, to, 64) : GaussLegendreRule.Integrate(f, 0.0, 1.3, 64) + GaussLegendreRule.Integrate(f, 1.3, to, 64);
}
