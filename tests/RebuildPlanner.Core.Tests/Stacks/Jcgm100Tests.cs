using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Stacks;

/// <summary>The standard's own examples, each by the road results take: formula, dual sensitivities, terms, rows, propagation.</summary>
public class Jcgm100Tests
{
    [Fact]
    public void Agrees_with_JCGM100_example_H1()
    {
        double[][] table = ReferenceColumns.Read("jcgm100-h1-end-gauge.csv", 6, firstColumn: 1);
        Source[] sources = [.. table.Select(input => new Source(SourceShape.Pooled, input[1], input[2], -1, 0.0, 0.0))];
        Estimate[] inputs = [.. table.Select((input, i) => new Estimate(input[0], [new Term(i, 1.0, What.Bore)]))];

        (double length, double[] row) = Propagated(sources.Length, inputs, new EndGauge());
        double u = Propagation.StandardUncertainty(sources, row), effective = Propagation.EffectiveDegreesOfFreedom(sources, row);

        // JCGM 100:2008, H.1: l = 50.000 838 mm, u_c = 32 nm, ν_eff = 16.7, k = 2.92, U99 = 93 nm.
        Assert.Equal(50_000_838.0, length, 0.5);
        Assert.Equal(32.0, u, 0.5);
        Assert.Equal(16.7, effective, 0.05);
        Assert.Equal(2.92, Propagation.CoverageFactor(effective, 0.99), 0.005);
        Assert.Equal(93.0, Propagation.CoverageFactor(effective, 0.99) * u, 0.5);
        // Computed from the same inputs, independently of this program, to six figures.
        Assert.Equal(31.7106, u, 5e-5);
        Assert.Equal(16.656, effective, 5e-4);
    }

    [Fact]
    public void Agrees_with_JCGM100_example_H2()
    {
        double[][] table = ReferenceColumns.Read("jcgm100-h2-resistance.csv", 5);
        double[] means = [.. Enumerable.Range(0, 3).Select(k => table.Average(set => set[k]))];
        double Covariance(int a, int b) => table.Sum(set => (set[a] - means[a]) * (set[b] - means[b])) / (5.0 * 4.0);
        double[][] covariance = [.. Enumerable.Range(0, 3).Select(a => Enumerable.Range(0, 3).Select(b => Covariance(a, b)).ToArray())];
        var factor = MathNet.Numerics.LinearAlgebra.Matrix<double>.Build.DenseOfRowArrays(covariance).Cholesky().Factor;
        Source[] sources = [.. Enumerable.Repeat(Source.Normal(1.0), 3)];
        Estimate[] inputs = [.. means.Select((mean, k) => new Estimate(k == 1 ? 1e-3 * mean : mean,
            [.. Enumerable.Range(0, k + 1).Select(s => new Term(s, (k == 1 ? 1e-3 : 1.0) * factor[k, s], What.Bore))]))];

        // JCGM 100:2008, table H.4, and to more figures with unrounded correlations (computed independently of this program).
        (string Name, IFormula Formula, double Value, double Printed, double Full)[] expected =
        [
            ("R", new Impedance(Part.Resistance), 127.732, 0.071, 0.071071),
            ("X", new Impedance(Part.Reactance), 219.847, 0.295, 0.295582),
            ("Z", new Impedance(Part.Modulus), 254.260, 0.236, 0.236336),
        ];
        List<double[]> rows = [];
        foreach ((string name, IFormula formula, double value, double printed, double full) in expected)
        {
            (double result, double[] row) = Propagated(3, inputs, formula);
            double u = Propagation.StandardUncertainty(sources, row);
            rows.Add(row);
            Assert.True(Math.Abs(result - value) < 6e-4, name);
            // The document rounds correlations to two figures first, which costs up to one in its last place.
            Assert.True(Math.Abs(u - printed) < 0.001, name);
            Assert.True(Math.Abs(u - full) < 1e-6, name);
        }

        // Correlations of the inputs as printed; of the results, table H.4, -0.588, -0.485, 0.993.
        Assert.Equal(-0.36, covariance[0][1] / Math.Sqrt(covariance[0][0] * covariance[1][1]), 0.005);
        Assert.Equal(0.86, covariance[0][2] / Math.Sqrt(covariance[0][0] * covariance[2][2]), 0.005);
        Assert.Equal(-0.65, covariance[1][2] / Math.Sqrt(covariance[1][1] * covariance[2][2]), 0.006);
        Assert.Equal(-0.588, Correlation(sources, rows[0], rows[1]), 0.002);
        Assert.Equal(-0.485, Correlation(sources, rows[0], rows[2]), 0.002);
        Assert.Equal(0.993, Correlation(sources, rows[1], rows[2]), 0.002);
    }

    [Fact]
    public void Agrees_with_JCGM100_example_H3()
    {
        double[][] table = ReferenceColumns.Read("jcgm100-h3-thermometer.csv", 11);
        double[] t = [.. table.Select(pair => pair[0])], b = [.. table.Select(pair => pair[1])];
        Estimate[] observed = [.. b.Select((value, i) => new Estimate(value, [new Term(i, 1.0, What.Bore)]))];
        (double y1, double[] intercept) = Propagated(11, observed, new Line(t, 1.0, 0.0));
        (double y2, double[] slope) = Propagated(11, observed, new Line(t, 0.0, 1.0));
        (double at30, double[] predicted) = Propagated(11, observed, new Line(t, 1.0, 10.0));
        double s = Math.Sqrt(t.Select((temperature, i) => Math.Pow(b[i] - y1 - (y2 * (temperature - 20.0)), 2.0)).Sum() / 9.0);
        Source[] sources = [.. Enumerable.Repeat(Source.Pooled(s, 0, 9.0, 0.0, 0.0), 11)];

        // JCGM 100:2008, H.3.3 to H.3.4, in the figures printed there; one s for all observations, so ν = 9.
        Assert.Equal(-0.1712, y1, 5e-5);
        Assert.Equal(0.00218, y2, 5e-6);
        Assert.Equal(0.0029, Propagation.StandardUncertainty(sources, intercept), 5e-5);
        Assert.Equal(0.00067, Propagation.StandardUncertainty(sources, slope), 5e-6);
        Assert.Equal(-0.930, Correlation(sources, intercept, slope), 5e-4);
        Assert.Equal(-0.1494, at30, 5e-5);
        Assert.Equal(0.0041, Propagation.StandardUncertainty(sources, predicted), 5e-5);
        Assert.Equal(9.0, Propagation.EffectiveDegreesOfFreedom(sources, predicted), 1e-12);
    }

    [Fact]
    public void Agrees_with_the_example_of_JCGM100_G_4_1()
    {
        // JCGM 100:2008, G.4.1 example: 0.25 %, 0.57 %, 0.82 % with ν 9, 4, 14: u_c 1.03 %, ν_eff 19.0, t95(19) 2.09.
        Source[] sources = [OfItsOwn(0.25, 9), OfItsOwn(0.57, 4), OfItsOwn(0.82, 14)];
        double[] row = [1.0, 1.0, 1.0];
        double effective = Propagation.EffectiveDegreesOfFreedom(sources, row);

        Assert.Equal(1.03, Propagation.StandardUncertainty(sources, row), 0.005);
        Assert.Equal(19.0, effective, 0.05);
        Assert.Equal(2.09, Propagation.CoverageFactor(effective), 0.005);
    }

    [Fact]
    public void Four_equal_parts_add_their_degrees_of_freedom_but_four_terms_of_a_pool_do_not()
    {
        double[] row = [1.0, -1.0, 1.0, 1.0, 0.0];
        Source[] apart = [.. Enumerable.Range(0, 5).Select(pool => Source.Pooled(0.3, pool, 10.0, -1.0, 1.0))];
        Source[] together = [.. Enumerable.Range(0, 5).Select(_ => Source.Pooled(0.3, 7, 10.0, -1.0, 1.0))];

        Assert.Equal(40.0, Propagation.EffectiveDegreesOfFreedom(apart, row), 1e-12);
        Assert.Equal(10.0, Propagation.EffectiveDegreesOfFreedom(together, row), 1e-12);
        Assert.Equal(Propagation.StandardUncertainty(apart, row), Propagation.StandardUncertainty(together, row), 1e-15);
    }

    [Fact]
    public void Nothing_finite_has_infinitely_many_degrees_of_freedom()
    {
        Source[] sources = [Source.Rectangular(1.0), Source.Normal(2.0), OfItsOwn(1.0, 3)];

        Assert.Equal(double.PositiveInfinity, Propagation.EffectiveDegreesOfFreedom(sources, [1.0, 1.0, 0.0]));
        Assert.Equal(1.96, Propagation.CoverageFactor(double.PositiveInfinity), 5e-4);
    }

    private static Source OfItsOwn(double u, double degreesOfFreedom) => new(SourceShape.Pooled, u, degreesOfFreedom, -1, 0.0, 0.0);

    private static double Correlation(Source[] sources, double[] a, double[] b) =>
        Propagation.Covariance(sources, a, b) / (Propagation.StandardUncertainty(sources, a) * Propagation.StandardUncertainty(sources, b));

    private static (double Value, double[] Row) Propagated(int sources, Estimate[] inputs, IFormula formula)
    {
        double[] row = new double[sources];
        for (int seeded = 0; seeded < inputs.Length; seeded++)
        {
            int one = seeded;
            Dual<Real>[] duals = [.. inputs.Select((input, i) => new Dual<Real>(new(input.Value), new(i == one ? 1.0 : 0.0)))];
            Propagation.AddTo(row, inputs[seeded], formula.Of(duals).Derivative.Value);
        }

        return (formula.Of<Real>([.. inputs.Select(input => new Real(input.Value))]).Value, row);
    }

    private interface IFormula
    {
        T Of<T>(T[] x)
            where T : struct, IScalar<T>;
    }

    private sealed class EndGauge : IFormula
    {
        public T Of<T>(T[] x)
            where T : struct, IScalar<T> => x[0] + x[1] - (x[0] * ((x[4] * x[3]) + (x[2] * x[5])));
    }

    private enum Part
    {
        Resistance, Reactance, Modulus,
    }

    private sealed class Impedance(Part part) : IFormula
    {
        public T Of<T>(T[] x)
            where T : struct, IScalar<T> => part switch
            {
                Part.Resistance => x[0] / x[1] * T.Cos(x[2]),
                Part.Reactance => x[0] / x[1] * T.Sin(x[2]),
                _ => x[0] / x[1],
            };
    }

    private sealed class Line(double[] t, double ofIntercept, double ofSlope) : IFormula
    {
        public T Of<T>(T[] x)
            where T : struct, IScalar<T>
        {
            double n = t.Length, sum = t.Sum(value => value - 20.0), squares = t.Sum(value => (value - 20.0) * (value - 20.0));
            double determinant = (n * squares) - (sum * sum);
            T ys = T.From(0.0), products = T.From(0.0);
            for (int i = 0; i < x.Length; i++)
            {
                ys += x[i];
                products += (t[i] - 20.0) * x[i];
            }

            T intercept = (1.0 / determinant) * ((squares * ys) - (sum * products));
            T slope = (1.0 / determinant) * ((n * products) - (sum * ys));
            return (ofIntercept * intercept) + (ofSlope * slope);
        }
    }
}
