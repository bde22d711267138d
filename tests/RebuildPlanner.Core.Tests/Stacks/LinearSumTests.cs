using CsCheck;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Stacks;

public class LinearSumTests
{
    private static readonly double Infinite = double.PositiveInfinity;

    [Fact]
    public void Agrees_with_JCGM101_example_9_2_2()
    {
        // JCGM 101:2008, 9.2.2: four standard normals, u 2.00, ±3.92.
        LinearSum sum = Sum(Repeat(4, Source.Normal(1.0)));

        Assert.Equal(2.0, sum.StandardUncertainty, 1e-15);
        Assert.Equal(3.92, sum.HalfWidth(), 0.005);
    }

    [Fact]
    public void Agrees_with_JCGM101_example_9_2_3_and_its_exact_value()
    {
        // JCGM 101:2008, 9.2.3: four rectangles of standard deviation 1, ±3.88; exactly 2√3·(2 − 0.6^¼).
        LinearSum sum = Sum(Repeat(4, Source.Rectangular(Math.Sqrt(3.0))));

        Assert.Equal(3.88, sum.HalfWidth(), 0.005);
        Assert.Equal(2.0 * Math.Sqrt(3.0) * (2.0 - Math.Pow(0.6, 0.25)), sum.HalfWidth(), 1e-6);
    }

    [Fact]
    public void Agrees_with_JCGM101_example_9_2_4()
    {
        // JCGM 101:2008, 9.2.4: the fourth of standard deviation 10, u 10.1, ±17.0 by Monte Carlo.
        Source[] sources = [.. Repeat(3, Source.Rectangular(Math.Sqrt(3.0))), Source.Rectangular(10.0 * Math.Sqrt(3.0))];
        LinearSum sum = Sum(sources);

        Assert.Equal(10.1, sum.StandardUncertainty, 0.05);
        Assert.Equal(17.0, sum.HalfWidth(), 0.05);
    }

    [Theory]
    [InlineData(1.0)]
    [InlineData(0.1)]
    [InlineData(1e-4)]
    [InlineData(1e-9)]
    public void Two_rectangles_have_the_half_width_of_their_trapezoid(double narrow)
    {
        // The trapezoid's sloping end holds q = 2.5 % from the corner a + b on: h = a + b − √(8abq).
        double h = Math.Sqrt(0.2 * narrow) <= 2.0 * narrow ? 1.0 + narrow - Math.Sqrt(0.2 * narrow) : 0.95;

        Assert.Equal(h, Sum(Source.Rectangular(1.0), Source.Rectangular(narrow)).HalfWidth(), 1e-7);
    }

    [Fact]
    public void Stays_inside_the_worst_case_where_k_times_u_does_not()
    {
        // Half-widths 1 and 0.1, the true half-width 1.1 − √0.02.
        Source[] sources = [Source.Rectangular(1.0), Source.Rectangular(0.1)];
        double[] row = [1.0, 1.0];
        double k = Propagation.CoverageFactor(Propagation.EffectiveDegreesOfFreedom(sources, row));

        Assert.Equal(0.95858, Sum(sources).HalfWidth(), 1e-5);
        Assert.Equal(1.1 - Math.Sqrt(0.02), Sum(sources).HalfWidth(), 1e-8);
        Assert.Equal(1.137, k * Propagation.StandardUncertainty(sources, row), 0.001);
    }

    [Theory]
    [InlineData(1, 5.19)]
    [InlineData(2, 1.76)]
    [InlineData(8, 0.94)]
    public void Mean_of_six_places_of_one_pool_has_the_t_of_the_pool(int degreesOfFreedom, double expected)
    {
        double oracle = MathNet.Numerics.Distributions.StudentT.InvCDF(0.0, 1.0 / Math.Sqrt(6.0), degreesOfFreedom, 0.975);
        double[] row = [.. Enumerable.Repeat(1.0 / 6.0, 6)];
        LinearSum pooled = new(Repeat(6, Source.Pooled(1.0, 0, degreesOfFreedom, -3.0, 3.0)), row);

        Assert.Equal(expected, pooled.HalfWidth(), 0.006);
        Assert.Equal(1.0, pooled.HalfWidth() / oracle, 1e-6);
    }

    [Theory]
    [InlineData(1, 12.7)]
    [InlineData(2, 2.07)]
    public void Six_pools_of_their_own_are_another_thing_than_one(int degreesOfFreedom, double expected)
    {
        double[] row = [.. Enumerable.Repeat(1.0 / 6.0, 6)];
        Source[] apart = [.. Enumerable.Range(0, 6).Select(pool => Source.Pooled(1.0, pool, degreesOfFreedom, -3.0, 3.0))];

        Assert.Equal(expected, new LinearSum(apart, row).HalfWidth(), expected * 0.005);
    }

    [Fact]
    public void Sum_of_Cauchy_laws_is_the_Cauchy_law_of_the_summed_scales()
    {
        LinearSum sum = Sum(Source.Pooled(1.0, 0, 1.0, -3.0, 3.0), Source.Pooled(0.5, 1, 1.0, -3.0, 3.0));
        foreach (double x in new[] { 0.0, 0.3, 2.0, 15.0, 60.0, 224.0, 226.0, 1000.0, 1e6 })
        {
            // The two tails are added beyond 150 scales, where what they mix is (c/d)³/π, 1e-7.
            Assert.Equal(1.0 - (Math.Atan2(1.5, x) / Math.PI), sum.Below(x), 1e-7);
        }

        Assert.Equal(1.5 * Math.Tan(0.475 * Math.PI), sum.HalfWidth(), 1e-5);
    }

    [Fact]
    public void Sum_of_many_equal_rectangles_agrees_with_the_Irwin_Hall_polynomial()
    {
        foreach (int count in new[] { 3, 4, 5, 6, 9, 12 })
        {
            LinearSum sum = Sum(Repeat(count, Source.Rectangular(0.5)));
            foreach (double x in new[] { 0.1, 0.5, 0.8, 1.2, 1.45 })
            {
                // Up to twelve parts the alternating sum loses at most five of its sixteen digits.
                Assert.Equal(IrwinHall(count, x + (0.5 * count)), sum.Below(x), 1e-7);
            }
        }
    }

    [Fact]
    public void Rectangle_and_normal_agree_with_the_integral_of_the_normal_law()
    {
        foreach (double sigma in new[] { 1e-8, 1e-3, 0.2, 0.4, 3.0, 1e4 })
        {
            LinearSum sum = Sum(Source.Rectangular(1.0), Source.Normal(sigma));
            foreach (double x in new[] { 0.1, 0.95, 1.0, 1.0 + sigma, 5.0 * sigma })
            {
                double z = (x + 1.0) / sigma, y = (x - 1.0) / sigma;
                double oracle = 0.5 * sigma * (Antiderivative(z) - Antiderivative(y));
                // For a wide normal the difference of two antiderivatives keeps twelve digits of σ.
                Assert.Equal(oracle, sum.Below(x), 1e-8 + (1e-12 * sigma));
            }
        }
    }

    [Theory]
    [MemberData(nameof(Mixtures))]
    public void Agrees_with_a_plain_simulation(string name, Source[] sources, double[] row)
    {
        const int draws = 2_000_000;
        LinearSum sum = new(sources, row);
        double h = sum.HalfWidth(), edge = 0.6 * h, far = 1.3 * h;
        int inside = 0, below = 0, beyond = 0;
        Simulation simulation = new(sources, 20_25);
        double[] draw = new double[sources.Length];
        for (int i = 0; i < draws; i++)
        {
            simulation.Next(draw);
            double y = 0.0;
            for (int s = 0; s < draw.Length; s++)
            {
                y += row[s] * draw[s];
            }

            inside += Math.Abs(y) <= h ? 1 : 0;
            below += y <= edge ? 1 : 0;
            beyond += y > far ? 1 : 0;
        }

        AssertShare(name, 0.95, inside, draws);
        AssertShare(name, sum.Below(edge), below, draws);
        AssertShare(name, 1.0 - sum.Below(far), beyond, draws);
    }

    public static TheoryData<string, Source[], double[]> Mixtures()
    {
        TheoryData<string, Source[], double[]> data = [];
        Source[] typical =
        [
            .. Enumerable.Range(1, 10).Select(i => Source.Rectangular(0.3 + (0.1 * i))), .. Repeat(3, Source.Pooled(0.2, 0, 5.0, -1.0, 1.0)),
            Source.Pooled(0.3, 1, 12.0, -1.0, 1.0), Source.WorstOnly(-9.0, 9.0),
        ];
        data.Add("typical", typical, [.. typical.Select((_, i) => 1.0 - (0.13 * i))]);
        data.Add("one dominates", [Source.Rectangular(10.0), Source.Rectangular(0.4), Source.Normal(0.05), Source.Pooled(0.1, 0, 3.0, -1, 1)], [1, 1, 1, 1]);
        data.Add("two dominate", [Source.Rectangular(10.0), Source.Rectangular(8.0), Source.Rectangular(0.4), Source.Pooled(0.1, 0, 2.0, -1, 1)], [1, -1, 1, 1]);
        data.Add("heavy", [Source.Rectangular(1.0), Source.Pooled(0.5, 0, 1.0, -1, 1), Source.Pooled(0.5, 0, 1.0, -1, 1), Source.Normal(0.3)], [1, 1, 2, 1]);
        data.Add("two heavy", [Source.Pooled(0.5, 0, 2.0, -1, 1), Source.Pooled(0.5, 1, 1.0, -1, 1), Source.Normal(0.3)], [1, 2, 1]);
        data.Add("rectangles", [.. Enumerable.Range(1, 5).Select(i => Source.Rectangular(i))], [1, 1, -1, 1, 1]);
        return data;
    }

    [Fact]
    public void Half_width_scales_with_the_row() =>
        AnySum.Select(Gen.Double[-12.0, 6.0]).Sample((sum, power) =>
        {
            double k = Math.Pow(10.0, power);
            double once = new LinearSum(sum.Sources, sum.Row).HalfWidth();
            double scaled = new LinearSum(sum.Sources, [.. sum.Row.Select(c => k * c)]).HalfWidth();
            // The same numbers but for rounding, which the root finder's 1e-8 of a tail may turn into another last step.
            return Math.Abs(scaled - (k * once)) <= 1e-7 * k * once;
        }, iter: 200);

    [Fact]
    public void Half_width_is_where_the_law_says() =>
        AnySum.Sample(sum =>
        {
            LinearSum law = new(sum.Sources, sum.Row);
            double h = law.HalfWidth(0.9);
            return Math.Abs(law.Inside(-h, h) - 0.9) < 1e-7 && Math.Abs(law.Below(h) - 0.95) < 1e-7;
        }, iter: 300);

    [Fact]
    public void Law_never_falls_and_does_not_know_the_sign_of_a_doubt() =>
        AnySum.Sample(sum =>
        {
            LinearSum law = new(sum.Sources, sum.Row), mirrored = new(sum.Sources, [.. sum.Row.Select(Math.Abs)]);
            double last = 0.0;
            for (double x = -60.0; x <= 60.0; x = x < -0.01 ? 0.8 * x : x <= 0.0 ? 0.012 : 1.25 * x)
            {
                double below = law.Below(x);
                // Two evaluations, each right to 1e-7, may not differ the wrong way by more than both.
                if (below < last - 2e-7 || Math.Abs(below + mirrored.Below(-x) - 1.0) > 1e-12)
                {
                    return false;
                }

                last = below;
            }

            return last > 0.9;
        }, iter: 300);

    [Fact]
    public void A_doubt_of_a_millionth_leaves_the_law_where_it_was() =>
        AnySum.Select(Gen.Bool).Sample((sum, pooled) =>
        {
            Source dust = pooled ? Source.Pooled(1e-9, 77, 3.0, -1.0, 1.0) : Source.Rectangular(1e-9);
            double without = new LinearSum(sum.Sources, sum.Row).HalfWidth();
            double with = new LinearSum([.. sum.Sources, dust], [.. sum.Row, 1.0]).HalfWidth();
            return Math.Abs(with - without) <= 1e-6 * without;
        }, iter: 200);

    [Fact]
    public void Nothing_doubtful_is_a_step()
    {
        LinearSum sum = new([Source.WorstOnly(-1.0, 1.0), Source.Rectangular(2.0)], [1.0, 0.0]);

        Assert.Equal(0.0, sum.HalfWidth());
        Assert.Equal(1.0, sum.Below(0.0));
        Assert.Equal(0.0, sum.Below(-1e-300));
        Assert.Equal(1.0, sum.Inside(0.0, Infinite));
        Assert.Equal(0.0, sum.Inside(1e-9, Infinite));
    }

    [Fact]
    public void Inside_of_everything_is_certain_and_of_nothing_impossible()
    {
        LinearSum sum = Sum(Source.Rectangular(1.0), Source.Pooled(0.2, 0, 1.0, -1.0, 1.0));

        Assert.Equal(1.0, sum.Inside(-Infinite, Infinite));
        Assert.Equal(0.5, sum.Inside(0.0, Infinite), 1e-12);
        Assert.Equal(0.0, sum.Inside(1.0, -1.0));
    }

    private static readonly Gen<Source> AnySource =
        Gen.Select(Gen.Int[0, 2], Gen.Double[-3.0, 0.0], Gen.Int[0, 1], Gen.Int[0, 1]).Select((shape, power, pool, _) =>
        {
            double size = Math.Pow(10.0, power);
            return shape switch
            {
                0 => Source.Rectangular(size),
                1 => Source.Normal(size),
                _ => Source.Pooled(size, pool, pool == 0 ? 3.0 : 8.0, -size, size),
            };
        });

    private static readonly Gen<(Source[] Sources, double[] Row)> AnySum =
        AnySource.Array[1, 12].Select(sources => (sources, sources.Select((_, i) => i % 2 == 0 ? 1.0 : -0.7).ToArray()));

    private static void AssertShare(string name, double probability, int hits, int draws)
    {
        // Five standard deviations of a share of so many draws: one false alarm in a million.
        double allowed = 5.0 * Math.Sqrt(probability * (1.0 - probability) / draws);
        Assert.True(Math.Abs(((double)hits / draws) - probability) < allowed, $"{name}: {(double)hits / draws} against {probability} ± {allowed}");
    }

    private static double Antiderivative(double z) =>
        (z * MathNet.Numerics.Distributions.Normal.CDF(0.0, 1.0, z)) + MathNet.Numerics.Distributions.Normal.PDF(0.0, 1.0, z);

    private static double IrwinHall(int count, double x)
    {
        double sum = 0.0;
        for (int k = 0; k <= (int)Math.Floor(x); k++)
        {
            double binomial = MathNet.Numerics.SpecialFunctions.Binomial(count, k);
            sum += (k % 2 == 0 ? 1.0 : -1.0) * binomial * Math.Pow(x - k, count);
        }

        return sum / MathNet.Numerics.SpecialFunctions.Factorial(count);
    }

    private static LinearSum Sum(params Source[] sources) => new(sources, [.. Enumerable.Repeat(1.0, sources.Length)]);

    private static Source[] Repeat(int count, Source source) => [.. Enumerable.Repeat(source, count)];
}
