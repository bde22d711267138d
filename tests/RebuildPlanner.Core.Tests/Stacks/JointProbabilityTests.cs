using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Stacks;

public class JointProbabilityTests
{
    private static readonly double Infinite = double.PositiveInfinity;

    [Fact]
    public void One_line_has_the_probability_of_its_own_linear_sum()
    {
        Source[] sources = [Source.Rectangular(1.0), Source.Pooled(0.3, 0, 4.0, -1.0, 1.0)];
        double[] row = [1.0, -2.0];

        Assert.Equal(new LinearSum(sources, row).Inside(-0.5, 1.2), JointProbability.Of(sources, [new(row, -0.5, 1.2)]), 1e-15);
        Assert.Equal(1.0, JointProbability.Of(sources, []), 1e-15);
    }

    [Fact]
    public void Independent_lines_multiply()
    {
        Source[] sources = [.. Enumerable.Range(0, 12).Select(i => i % 3 == 0 ? Source.Normal(0.2 + (0.05 * i)) : Source.Rectangular(1.0 - (0.08 * i)))];
        LimitedLine[] lines = [.. Enumerable.Range(0, 4).Select(line => Line(sources, s => s / 3 == line ? 1.0 : 0.0, -0.6, 0.9 + (0.1 * line)))];

        double product = lines.Aggregate(1.0, (so, line) => so * Alone(sources, line));
        // Nothing is drawn; a rectangle narrow beside the normal is merged into it, 3e-5 a line at most.
        Assert.Equal(product, JointProbability.Of(sources, lines), 3e-5);
    }

    [Fact]
    public void Identical_and_mirrored_lines_are_one()
    {
        Source[] sources = [Source.Rectangular(1.0), Source.Normal(0.5), Source.Pooled(0.3, 0, 3.0, -1.0, 1.0)];
        double[] row = [1.0, 0.7, 2.0], mirrored = [-3.0, -2.1, -6.0];

        double alone = new LinearSum(sources, row).Inside(-0.8, 0.9);
        Assert.Equal(alone, JointProbability.Of(sources, [new(row, -0.8, Infinite), new(mirrored, -2.7, Infinite), new(row, -5.0, 1.0)]), 1e-12);
    }

    [Fact]
    public void Lines_without_any_doubt_count_as_what_they_are()
    {
        Source[] sources = [Source.Normal(1.0), Source.WorstOnly(-1.0, 1.0)];
        LimitedLine doubtful = new(new[] { 1.0, 0.0 }, 0.0, Infinite);

        Assert.Equal(0.5, JointProbability.Of(sources, [doubtful, new(new[] { 0.0, 1.0 }, -0.1, 0.1)]), 1e-9);
        Assert.Equal(0.0, JointProbability.Of(sources, [doubtful, new(new[] { 0.0, 1.0 }, 0.1, 0.2)]), 1e-15);
    }

    [Theory]
    [InlineData(0.0)]
    [InlineData(0.5)]
    [InlineData(-0.9)]
    public void Two_normal_lines_agree_with_the_orthant_formula(double correlation)
    {
        // P(X > 0, Y > 0) = 1/4 + asin(r)/2π (Sheppard 1899). Neither line has a doubt of its own in the second form.
        double other = Math.Sqrt(1.0 - (correlation * correlation));
        Source[] sources = [Source.Normal(1.0), Source.Normal(1.0)];
        LimitedLine[] lines = [new(new[] { 1.0, 0.0 }, 0.0, Infinite), new(new[] { correlation, other }, 0.0, Infinite)];
        double turn = 0.6, c = Math.Cos(turn), s = Math.Sin(turn);
        LimitedLine[] turned = [new(new[] { c, s }, 0.0, Infinite), new(new[] { (correlation * c) - (other * s), (correlation * s) + (other * c) }, 0.0, Infinite)];

        double expected = 0.25 + (Math.Asin(correlation) / (2.0 * Math.PI));
        Assert.Equal(expected, JointProbability.Of(sources, lines), 1e-3);
        Assert.Equal(expected, JointProbability.Of(sources, turned), 1e-3);
    }

    [Theory]
    [MemberData(nameof(Engines))]
    public void Agrees_with_a_plain_simulation(string name, Source[] sources, LimitedLine[] lines)
    {
        const int draws = 400_000;
        Simulation simulation = new(sources, 77);
        double[] draw = new double[sources.Length];
        (int Source, double Coefficient)[][] rows =
            [.. lines.Select(line => line.Row.ToArray().Select((c, s) => (s, c)).Where(entry => entry.c != 0.0).ToArray())];
        int hits = 0;
        for (int i = 0; i < draws; i++)
        {
            simulation.Next(draw);
            bool holds = true;
            for (int line = 0; line < rows.Length && holds; line++)
            {
                double y = 0.0;
                foreach ((int source, double coefficient) in rows[line])
                {
                    y += coefficient * draw[source];
                }

                holds = y >= lines[line].Low && y <= lines[line].High;
            }

            hits += holds ? 1 : 0;
        }

        double joint = JointProbability.Of(sources, lines), share = (double)hits / draws;
        // 1e-3 is what is promised; five standard deviations of the share are the simulation's own.
        double allowed = 1e-3 + (5.0 * Math.Sqrt(share * (1.0 - share) / draws));
        Assert.True(Math.Abs(joint - share) < allowed, $"{name}: {joint} against {share} ± {allowed}");
        Assert.InRange(joint, 0.05, 0.98);
    }

    public static TheoryData<string, Source[], LimitedLine[]> Engines() => new()
    {
        Engine("eight cylinders", 8, 3, 5.0), Engine("shared pool of three", 4, 3, 3.0), Engine("one freedom", 6, 2, 1.0), Engine("six with two", 6, 2, 12.0),
    };

    [Fact]
    public void Does_not_depend_on_the_order_of_lines_or_on_their_units()
    {
        (_, Source[] sources, LimitedLine[] lines) = Engine("", 4, 3, 6.0);
        double joint = JointProbability.Of(sources, lines);
        LimitedLine[] scaled = [.. lines.Reverse().Select(line => new LimitedLine(line.Row.ToArray().Select(c => 1e3 * c).ToArray(), 1e3 * line.Low, 1e3 * line.High))];

        // Another order pairs other factors with the lines: both are right to 1e-3.
        Assert.Equal(joint, JointProbability.Of(sources, scaled), 1.5e-3);
    }

    /// <summary>Cylinders that share a gasket, a gauge and a pool; a ratio, a gap with no doubt that the ratio has not, and a wall to itself.</summary>
    internal static (string Name, Source[] Sources, LimitedLine[] Lines) Engine(string name, int cylinders, int kinds, double degreesOfFreedom)
    {
        List<Source> sources =
        [
            Source.Rectangular(0.03), Source.Rectangular(0.004), Source.Rectangular(0.02), Source.Rectangular(0.01),
        ];
        List<(int Line, int Source, double Coefficient)> entries = [];
        for (int cylinder = 0; cylinder < cylinders; cylinder++)
        {
            int ratio = kinds * cylinder, gap = ratio + 1, wall = ratio + 2, first = sources.Count;
            for (int i = 0; i < 6; i++)
            {
                sources.Add(Source.Pooled(0.006, 0, degreesOfFreedom, -1.0, 1.0));
            }

            sources.AddRange([Source.Rectangular(0.01), Source.Rectangular(0.02), Source.Rectangular(0.002), Source.Pooled(0.01, 1, 9.0, -1.0, 1.0)]);
            entries.AddRange([(ratio, 0, -1.0), (gap, 0, 1.0), (ratio, 1, 2.0), (gap, 1, -1.0), (ratio, 2, 0.7)]);
            for (int i = 0; i < 6; i++)
            {
                entries.Add((ratio, first + i, -1.0 + (0.1 * i)));
                entries.Add((gap, first + i, i < 4 ? 1.0 : 0.0));
            }

            entries.AddRange([(ratio, first + 6, 1.0), (ratio, first + 7, 0.9), (ratio, first + 8, 1.0), (gap, first + 8, 1.0)]);
            if (kinds > 2)
            {
                entries.AddRange([(wall, first + 9, 1.0), (wall, 3, 1.0)]);
            }
        }

        LimitedLine[] lines = [.. Enumerable.Range(0, kinds * cylinders).Select(line =>
        {
            double[] row = new double[sources.Count];
            foreach ((_, int source, double coefficient) in entries.Where(entry => entry.Line == line))
            {
                row[source] += coefficient;
            }

            double u = Propagation.StandardUncertainty([.. sources], row);
            return new LimitedLine(row, line % 3 == 0 ? -2.2 * u : -1.9 * u, line % 2 == 0 ? 2.0 * u : Infinite);
        })];
        return (name, [.. sources], lines);
    }

    private static LimitedLine Line(Source[] sources, Func<int, double> coefficient, double low, double high) =>
        new(sources.Select((_, s) => coefficient(s)).ToArray(), low, high);

    private static double Alone(Source[] sources, LimitedLine line) => new LinearSum(sources, line.Row.Span).Inside(line.Low, line.High);
}
