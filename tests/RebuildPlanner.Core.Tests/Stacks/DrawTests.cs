using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Stacks;

/// <summary>Moments and distribution functions of every draw against closed forms and MathNet.Numerics; tolerances are five standard errors of 2¹⁸ draws.</summary>
public class DrawTests
{
    private const int Tiles = 1024, Draws = Tiles * TrialTile.Trials;

    private static readonly double _error = 5.0 / Math.Sqrt(Draws);

    public static TheoryData<string, Source, double> Laws => new()
    {
        { "rectangular", Source.Rectangular(2.0), 1.8 },
        { "normal", Source.Normal(0.7), 3.0 },
        { "triangular", Source.Triangular(3.0), 2.4 },
        { "arcsine", Source.Arcsine(1.5), 1.5 },
        { "t of 12", Source.Pooled(1.0, 0, 12.0, -9.0, 9.0), 3.75 },
    };

    // Kurtosis E x⁴/u⁴ in closed form; of t it is 3(ν − 2)/(ν − 4), u² being ν/(ν − 2).
    [Theory]
    [MemberData(nameof(Laws))]
    public void Mean_variance_and_kurtosis_are_those_of_the_law(string name, Source source, double kurtosis)
    {
        double[] draws = Drawn(source)[0];
        double variance = source.StandardUncertainty * source.StandardUncertainty;
        variance *= double.IsFinite(source.DegreesOfFreedom) ? source.DegreesOfFreedom / (source.DegreesOfFreedom - 2.0) : 1.0;

        Assert.Equal(0.0, draws.Average(), Math.Sqrt(variance) * _error);
        Assert.Equal(variance, draws.Average(x => x * x), variance * Math.Sqrt(kurtosis - 1.0) * _error);
        Assert.True(Math.Abs((draws.Average(x => x * x * x * x) / variance / variance) - kurtosis) < 0.05 * kurtosis, name);
    }

    // Variance (b − a)²/12 + d²/9 with a rectangle's ends known within d, and no draw beyond them.
    [Fact]
    public void Curvilinear_trapezoid_has_its_variance_and_stays_within_its_ends()
    {
        Source source = Source.CurvilinearTrapezoid(1.0, 0.4);
        double[] draws = Drawn(source)[0];
        double variance = (1.0 / 3.0) + (0.16 / 9.0);

        Assert.Equal(variance, source.StandardUncertainty * source.StandardUncertainty, 1e-12);
        Assert.Equal(variance, draws.Average(x => x * x), variance * _error);
        Assert.InRange(draws.Max(), 1.3, 1.4);
        Assert.InRange(draws.Min(), -1.4, -1.3);
    }

    [Theory]
    [InlineData(1.0)]
    [InlineData(2.0)]
    [InlineData(3.0)]
    [InlineData(7.0)]
    [InlineData(100_000.0)]
    public void A_pool_of_few_or_many_degrees_of_freedom_is_a_t(double freedom)
    {
        double[] draws = Drawn(Source.Pooled(1.0, 0, freedom, -9.0, 9.0))[0];

        foreach (double x in new[] { -4.0, -2.0, -1.0, -0.25, 0.5, 1.5, 3.0 })
        {
            double share = draws.Count(draw => draw <= x) / (double)Draws;
            Assert.Equal(MathNet.Numerics.Distributions.StudentT.CDF(0.0, 1.0, freedom, x), share, 0.5 * _error);
        }
    }

    [Fact]
    public void Normals_follow_their_law_into_the_tails()
    {
        double[] draws = Drawn(Source.Normal(1.0))[0];

        foreach (double x in new[] { -4.0, -3.0, -1.96, -0.5, 0.0, 0.1, 1.0, 2.5, 3.5 })
        {
            double p = MathNet.Numerics.Distributions.Normal.CDF(0.0, 1.0, x);
            Assert.Equal(p, draws.Count(draw => draw <= x) / (double)Draws, Math.Sqrt(p * (1.0 - p)) * _error);
        }

        Assert.InRange(draws.Max(Math.Abs), 4.0, 5.78);
    }

    // Of one pool the scale is shared and the normals are not: squares go together, the numbers do not.
    [Fact]
    public void Places_of_a_pool_share_the_scale_alone()
    {
        double[][] draws = Drawn(Source.Pooled(1.0, 0, 12.0, -9.0, 9.0), Source.Pooled(1.0, 0, 12.0, -9.0, 9.0), Source.Pooled(1.0, 1, 12.0, -9.0, 9.0));

        Assert.Equal(0.0, Correlation(draws[0], draws[1]), _error);
        Assert.True(Correlation(Squared(draws[0]), Squared(draws[1])) > 0.05);
        Assert.Equal(0.0, Correlation(Squared(draws[0]), Squared(draws[2])), 2.0 * _error);
    }

    [Fact]
    public void What_has_no_law_is_not_drawn() =>
        Assert.True(new TrialTile([Source.Unstated, Source.WorstOnly(-1.0, 1.0), Source.Normal(0.0)]) is var tile
            && tile.Of(0).IsEmpty && tile.Of(1).IsEmpty && tile.Of(2).IsEmpty);

    [Fact]
    public void Another_seed_or_block_gives_other_bits_and_the_same_gives_the_same()
    {
        ulong Of(ulong seed, ulong block) => new RandomLanes(seed, block) is var random ? random.NextBits()[3] : 0;

        ulong[] bits = [Of(1, 0), Of(1, 1), Of(2, 0), Of(2, 1), Of(0, 0), Of(0, 1)];

        Assert.Equal(bits.Length, bits.Distinct().Count());
        Assert.Equal(Of(7, 9), Of(7, 9));
    }

    // First outputs of xoshiro256** from the state 1, 2, 3, 4, as its authors' reference code gives them: worked with pencil from the definition,
    // rotl(2·5, 7)·9 = 11520, then with state (7, 0, 262146, 211106232532992): 0, then 1509978240.
    [Fact]
    public void The_generator_is_the_one_it_is_named_after()
    {
        RandomLanes random = RandomLanes.FromState(1, 2, 3, 4);

        Assert.Equal(11520UL, random.NextBits()[0]);
        Assert.Equal(0UL, random.NextBits()[5]);
        Assert.Equal(1509978240UL, random.NextBits()[7]);
    }

    private static double[][] Drawn(params Source[] sources)
    {
        TrialTile tile = new(sources);
        RandomLanes random = new(42, 0);
        double[][] draws = [.. sources.Select(_ => new double[Draws])];
        for (int at = 0; at < Tiles; at++)
        {
            tile.Draw(ref random);
            for (int s = 0; s < sources.Length; s++)
            {
                tile.Of(s).CopyTo(draws[s].AsSpan(at * TrialTile.Trials));
            }
        }

        return draws;
    }

    private static double[] Squared(double[] draws) => [.. draws.Select(draw => draw * draw)];

    private static double Correlation(double[] a, double[] b)
    {
        double meanA = a.Average(), meanB = b.Average();
        double ab = a.Zip(b, (x, y) => (x - meanA) * (y - meanB)).Average();
        return ab / Math.Sqrt(a.Average(x => (x - meanA) * (x - meanA)) * b.Average(y => (y - meanB) * (y - meanB)));
    }
}
