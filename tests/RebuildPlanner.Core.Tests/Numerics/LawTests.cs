using MathNet.Numerics;
using MathNet.Numerics.Integration;
using RebuildPlanner.Core.Numerics;
using ChiSquared = MathNet.Numerics.Distributions.ChiSquared;

namespace RebuildPlanner.Core.Tests.Numerics;

public class LawTests
{
    // Math.NET states about 1e-13 for these functions; an absolute allowance of the same size covers the middle of the laws.
    private const double OracleDigits = 1e-12;

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.7)]
    [InlineData(2.999)]
    [InlineData(3.001)]
    [InlineData(4.5)]
    [InlineData(9.0)]
    [InlineData(30.0)]
    public void Normal_tail_agrees_with_MathNet_relatively(double z)
    {
        double oracle = 0.5 * SpecialFunctions.Erfc(z / Math.Sqrt(2.0));

        Assert.Equal(1.0, NormalLaw.Above(z) / oracle, OracleDigits);
        Assert.Equal(1.0, NormalLaw.Below(-z) / oracle, OracleDigits);
        Assert.Equal(1.0, NormalLaw.Above(z) + NormalLaw.Above(-z), 1e-16);
    }

    [Theory]
    [InlineData(1e-250)]
    [InlineData(1e-12)]
    [InlineData(0.001)]
    [InlineData(0.074)]
    [InlineData(0.4)]
    [InlineData(0.5)]
    [InlineData(0.975)]
    [InlineData(0.99999)]
    public void Normal_quantile_is_the_inverse(double probability)
    {
        double z = NormalLaw.Quantile(probability);

        Assert.Equal(1.0, NormalLaw.Below(z) / probability, 1e-12);
        // The quick form is published to about seven figures.
        Assert.Equal(z, NormalLaw.QuickQuantile(probability), 2e-6 * Math.Max(1.0, Math.Abs(z)));
    }

    // JCGM 100:2008, table G.2.
    [Theory]
    [InlineData(1, 0.95, 12.71)]
    [InlineData(2, 0.95, 4.30)]
    [InlineData(3, 0.9973, 9.22)]
    [InlineData(10, 0.95, 2.23)]
    [InlineData(16, 0.99, 2.92)]
    [InlineData(50, 0.6827, 1.01)]
    [InlineData(double.PositiveInfinity, 0.95, 1.960)]
    public void T_factor_agrees_with_JCGM100_table_G2(double degreesOfFreedom, double coverage, double printed) =>
        Assert.Equal(printed, StudentT.Quantile(0.5 + (0.5 * coverage), degreesOfFreedom), 0.005);

    [Theory]
    [InlineData(1.0)]
    [InlineData(2.0)]
    [InlineData(3.0)]
    [InlineData(16.66)]
    [InlineData(59.0)]
    [InlineData(60.5)]
    [InlineData(1000.0)]
    public void T_law_agrees_with_MathNet(double degreesOfFreedom)
    {
        Oracle oracle = new(degreesOfFreedom);
        foreach (double t in new[] { -25.0, -3.0, -0.4, 0.0, 1e-3, 0.9, 1.7, 2.5, 8.0, 40.0 })
        {
            // For ν = 1000 the oracle is off by 5e-12 near zero, where ½ + t·f(0) shows it.
            Assert.Equal(oracle.Below(t), StudentT.Below(t, degreesOfFreedom), degreesOfFreedom < 1000.0 ? OracleDigits : 1e-11);
            Assert.Equal(1.0, StudentT.Density(t, degreesOfFreedom) / oracle.Density(t), 1e-11);
        }

        foreach (double probability in new[] { 1e-6, 0.025, 0.3, 0.6, 0.995 })
        {
            Assert.Equal(1.0, StudentT.Below(StudentT.Quantile(probability, degreesOfFreedom), degreesOfFreedom) / probability, 1e-12);
        }
    }

    [Fact]
    public void T_law_with_one_and_two_degrees_of_freedom_agrees_with_its_closed_forms()
    {
        foreach (double t in new[] { 0.2, 3.0, 500.0, 1e6 })
        {
            double two = 2.0 / ((2.0 + (t * t)) * (1.0 + (t / Math.Sqrt(2.0 + (t * t))))) / 2.0;
            Assert.Equal(1.0, StudentT.Above(t, 1.0) / (Math.Atan2(1.0, t) / Math.PI), 1e-12);
            Assert.Equal(1.0, StudentT.Above(t, 2.0) / two, 1e-12);
        }
    }

    [Fact]
    public void T_law_goes_over_into_the_normal_law_without_a_step()
    {
        // Either side of the change of method the law itself moves by 2e-13.
        Assert.Equal(StudentT.Above(2.2, 0.999999e6), StudentT.Above(2.2, 1.000001e6), 1e-12);
        Assert.Equal(NormalLaw.Above(2.2), StudentT.Above(2.2, double.PositiveInfinity), 1e-16);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.99)]
    public void Refuses_less_than_one_degree_of_freedom(double degreesOfFreedom)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => StudentT.Below(1.0, degreesOfFreedom));
        Assert.Throws<ArgumentOutOfRangeException>(() => new StudentTCharacteristic(degreesOfFreedom));
    }

    [Theory]
    [InlineData(1.0)]
    [InlineData(2.0)]
    [InlineData(3.0)]
    [InlineData(24.0)]
    [InlineData(400.0)]
    public void Chi_square_agrees_with_MathNet(double degreesOfFreedom)
    {
        ChiSquared oracle = new(degreesOfFreedom);
        foreach (double part in new[] { 0.02, 0.4, 0.99, 1.01, 1.3, 3.0 })
        {
            double x = part * degreesOfFreedom;
            Assert.Equal(oracle.CumulativeDistribution(x), ChiSquare.Below(x, degreesOfFreedom), OracleDigits);
            Assert.Equal(1.0, ChiSquare.Density(x, degreesOfFreedom) / oracle.Density(x), 1e-10);
        }

        foreach (double z in new[] { -6.0, -2.0, 0.0, 1.0, 4.0 })
        {
            double below = ChiSquare.Below(ChiSquare.QuantileAt(z, degreesOfFreedom), degreesOfFreedom);
            // The quantile is good to 1e-10 of itself; a law of ν freedoms turns that into ν/2 times as much.
            Assert.Equal(1.0, below / NormalLaw.Below(z), 1e-10 * degreesOfFreedom);
        }
    }

    [Theory]
    [InlineData(0.01)]
    [InlineData(0.5)]
    [InlineData(1.999)]
    [InlineData(2.001)]
    [InlineData(6.0)]
    [InlineData(20.0)]
    public void Modified_Bessel_functions_agree_with_MathNet(double x)
    {
        (double k0, double k1) = ModifiedBessel.K0AndK1(x);

        // The step of the trapezoidal rule was chosen for this.
        Assert.Equal(SpecialFunctions.BesselK(0.0, x) * x * x, k0 * x * x, 1e-11);
        Assert.Equal(SpecialFunctions.BesselK(1.0, x) * x, k1 * x, 1e-11);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    [InlineData(7)]
    [InlineData(30)]
    [InlineData(59)]
    [InlineData(60)]
    [InlineData(61)]
    [InlineData(90)]
    public void T_characteristic_function_agrees_with_the_Bessel_function_of_MathNet(int degreesOfFreedom)
    {
        StudentTCharacteristic characteristic = new(degreesOfFreedom);
        double order = 0.5 * degreesOfFreedom;
        foreach (double t in new[] { 0.05, 0.3, 1.0, 1.9, 4.0 })
        {
            double x = Math.Sqrt(degreesOfFreedom) * t;
            double log = (order * Math.Log(0.5 * x)) + Math.Log(2.0) - SpecialFunctions.GammaLn(order) + Math.Log(SpecialFunctions.BesselK(order, x));
            Assert.Equal(Math.Exp(log), characteristic.At(t), 1e-9);
            Assert.Equal(characteristic.At(t), characteristic.At(-t), 1e-16);
        }

        Assert.Equal(1.0, characteristic.At(0.0), 1e-16);
    }

    [Theory]
    [InlineData(5)]
    [InlineData(8)]
    [InlineData(70)]
    public void T_characteristic_function_agrees_with_the_integral_that_defines_it(int degreesOfFreedom)
    {
        Oracle law = new(degreesOfFreedom);
        foreach (double t in new[] { 0.4, 1.3 })
        {
            // Half periods up to 400; what is beyond is below 1e-9 for ν ≥ 5.
            double sum = 0.0, half = Math.PI / t;
            for (double from = 0.0; from < 400.0; from += half)
            {
                sum += 2.0 * GaussLegendreRule.Integrate(x => Math.Cos(t * x) * law.Density(x), from, from + half, 64);
            }

            Assert.Equal(sum, new StudentTCharacteristic(degreesOfFreedom).At(t), 1e-8);
        }
    }

    private sealed class Oracle(double degreesOfFreedom)
    {
        private readonly MathNet.Numerics.Distributions.StudentT _law = new(0.0, 1.0, degreesOfFreedom);

        public double Below(double t) => _law.CumulativeDistribution(t);

        public double Density(double t) => _law.Density(t);
    }
}
