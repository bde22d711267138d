using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Stacks;

/// <summary>
/// Examples of JCGM 101:2008, clause 9. Tolerances follow from the trials: a limit of the 95 % interval is known to 2.7 u/√n where it is counted
/// plainly (√(0.025 · 0.975)/φ(1.96)), and three times that is allowed, besides the rounding of the published figure.
/// </summary>
public class Jcgm101Tests
{
    private const int Trials = 1_000_000;
    private const double PlainLimit = 3.0 * 2.7 / 1000.0; // in units of u, for 10⁶ trials

    private static readonly TrialOptions _plain = new(Seed: 20_081, Trials: Trials, Plain: true);

    public static TheoryData<bool> Roads => [true, false];

    [Fact]
    public void Four_normals_as_in_9_2_2()
    {
        SampledFigure sum = Sampled(FormulaTrials.Sum([.. Enumerable.Repeat(Source.Normal(1.0), 4)]), _plain);

        Assert.Equal(2.0, sum.StandardUncertainty, 3.0 * 2.0 / Math.Sqrt(2.0 * Trials));
        Assert.Equal(-3.92, sum.Symmetric().Low, 0.005 + (2.0 * PlainLimit));
        Assert.Equal(3.92, sum.Symmetric().High, 0.005 + (2.0 * PlainLimit));
    }

    [Fact]
    public void Four_rectangles_as_in_9_2_3()
    {
        SampledFigure sum = Sampled(FormulaTrials.Sum([.. Enumerable.Repeat(Source.Rectangular(Math.Sqrt(3.0)), 4)]), _plain);
        double exact = 2.0 * Math.Sqrt(3.0) * (2.0 - Math.Pow(0.6, 0.25)); // from the quartic tail of four rectangles

        Assert.Equal(3.88, exact, 0.005);
        Assert.Equal(-exact, sum.Symmetric().Low, 2.0 * PlainLimit);
        Assert.Equal(exact, sum.Symmetric().High, 2.0 * PlainLimit);
        Assert.True(3.92 - sum.Symmetric().High > 2.0 * PlainLimit, "trials must tell the sum from a normal");
    }

    [Fact]
    public void One_wide_rectangle_among_four_as_in_9_2_4()
    {
        SampledFigure sum = Sampled(
            FormulaTrials.Sum(
                Source.Rectangular(Math.Sqrt(3.0)), Source.Rectangular(Math.Sqrt(3.0)), Source.Rectangular(Math.Sqrt(3.0)), Source.Rectangular(10.0 * Math.Sqrt(3.0))),
            _plain);

        Assert.Equal(10.1, sum.StandardUncertainty, 0.05);
        Assert.Equal(-17.0, sum.Symmetric().Low, 0.05 + PlainLimit);
        Assert.Equal(17.0, sum.Symmetric().High, 0.05 + PlainLimit);
    }

    // Mass calibration. First order gives 1.2340 and 0.0539; the standard's figures are taken from memory.
    [Theory]
    [MemberData(nameof(Roads))]
    public void Mass_calibration_as_in_9_3(bool plain)
    {
        const double Reference = 100_000.0, Small = 1.234;
        Source[] sources =
        [
            Source.Normal(0.050), Source.Normal(0.020), Source.Rectangular(0.10), Source.Rectangular(1000.0), Source.Rectangular(50.0),
        ];
        double Of(double[] x) =>
            ((Reference + x[0] + Small + x[1]) * (1.0 + ((1.20 + x[2] - 1.2) * ((1.0 / (8000.0 + x[3])) - (1.0 / (8000.0 + x[4])))))) - Reference;
        FormulaTrials mass = new(sources, Of(new double[5]), [1.0, 1.0, 0.0, 0.0, 0.0], Of);

        SampledFigure sampled = Sampled(mass, _plain with { Plain = plain });
        (double low, double high) = sampled.Shortest();

        Assert.Equal(1.2341, sampled.Mean, 0.00005 + (3.0 * 0.0754 / 1000.0));
        Assert.Equal(0.0754, sampled.StandardUncertainty, 0.0002);
        Assert.Equal((1.0834, 1.3825), (low, high), Near(0.004)); // the shortest interval is level at its best: a thousandth of u there moves it by fiftieths
        Assert.True(MonteCarlo.Tolerance(0.0754, 1) < Math.Abs((1.2340 - (1.96 * 0.0539)) - sampled.Symmetric().Low), "first order fails to one digit");
    }

    // Y = X₁² + X₂² with no linear part at all when both are zero: exact mean x₁² + 2u², variance 4x₁²u² + 4u⁴.
    [Theory]
    [InlineData(0.000)]
    [InlineData(0.010)]
    [InlineData(0.050)]
    public void Comparison_loss_as_in_9_4(double x1)
    {
        const double U = 0.005;
        FormulaTrials loss = new([Source.Normal(U), Source.Normal(U)], x1 * x1, [2.0 * x1, 0.0], x => ((x1 + x[0]) * (x1 + x[0])) + (x[1] * x[1]));
        double mean = (x1 * x1) + (2.0 * U * U), deviation = Math.Sqrt((4.0 * x1 * x1 * U * U) + (4.0 * U * U * U * U));

        foreach (bool plain in Roads.Select(row => row.Data))
        {
            SampledFigure sampled = Sampled(loss, _plain with { Plain = plain });

            Assert.Equal(mean, sampled.Mean, 3.0 * deviation / 1000.0);
            Assert.Equal(deviation, sampled.StandardUncertainty, 5.0 * deviation / 1000.0);
        }
    }

    // Gauge block, 99 %: u 36 nm, shortest interval 745 to 932 nm.
    [Fact]
    public void Gauge_block_as_in_9_5()
    {
        const double Setting = 50_000_623.0, Difference = 215.0;
        Source[] sources =
        [
            Source.Pooled(25.0, 0, 18.0, -100.0, 100.0), Source.Pooled(6.0, 1, 24.0, -30.0, 30.0), Source.Pooled(4.0, 2, 5.0, -30.0, 30.0),
            Source.Pooled(7.0, 3, 8.0, -40.0, 40.0), Source.Rectangular(2.0e-6), Source.Normal(0.2), Source.Arcsine(0.5),
            Source.CurvilinearTrapezoid(1.0e-6, 0.1e-6), Source.CurvilinearTrapezoid(0.050, 0.025),
        ];
        FormulaTrials block = new(sources, Of(new double[9]), null, Of);
        double Of(double[] x)
        {
            double setting = Setting + x[0], alpha = 11.5e-6 + x[4], theta = -0.1 + x[5] + x[6];
            return setting + Difference + x[1] + x[2] + x[3] - (setting * ((x[7] * theta) + (alpha * x[8]))) - 50_000_000.0;
        }

        SampledFigure sampled = Sampled(block, _plain);
        (double low, double high) = sampled.Shortest(0.99);

        Assert.Equal(838.0, sampled.Mean, 0.5);
        Assert.Equal(36.0, sampled.StandardUncertainty, 0.5);
        Assert.Equal((745.0, 932.0), (low, high), Near(2.0));
    }

    // y = ln x over a rectangle: the density rises to the upper end, so the shortest interval ends there. Closed form: [ln 0.15, ln 1.1].
    [Fact]
    public void The_shortest_interval_of_a_logarithm_ends_at_its_upper_end()
    {
        FormulaTrials log = new([Source.Rectangular(0.5)], Math.Log(0.6), null, x => Math.Log(0.6 + x[0]));

        SampledFigure sampled = Sampled(log, _plain);

        Assert.Equal(-0.66490, sampled.Mean, 3.0 * 0.6 / 1000.0);
        Assert.Equal((Math.Log(0.15), Math.Log(1.1)), sampled.Shortest(), Near(0.01)); // bins of 1/100 at the cut-off end
    }

    // Six places that share one pool: half-width of 95 % t_ν/√6; six t's of their own would give 12.7 and 2.07.
    [Theory]
    [InlineData(1.0, 5.19)]
    [InlineData(2.0, 1.76)]
    public void Places_of_one_pool_share_its_scatter(double freedom, double halfWidth)
    {
        Source[] places = [.. Enumerable.Range(0, 6).Select(_ => Source.Pooled(1.0, 0, freedom, -100.0, 100.0))];
        FormulaTrials mean = new(places, 0.0, [.. places.Select(_ => 1.0 / 6.0)], x => x.Sum() / 6.0);

        foreach (bool plain in Roads.Select(row => row.Data))
        {
            (double low, double high) = Sampled(mean, _plain with { Plain = plain }).Symmetric();

            Assert.Equal(halfWidth, high, 0.03 * halfWidth); // the bins are a fortieth of so long-tailed a law
            Assert.Equal(-halfWidth, low, 0.03 * halfWidth);
        }
    }

    private static SampledFigure Sampled(ITrialModel model, TrialOptions options) =>
        MonteCarlo.Run(model, options).Figures[0];

    private static EqualityComparer<(double Low, double High)> Near(double tolerance) => EqualityComparer<(double Low, double High)>.Create(
        (one, other) => Math.Abs(one.Low - other.Low) <= tolerance && Math.Abs(one.High - other.High) <= tolerance, _ => 0);
}
