using CsCheck;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Tests.Numerics;

public class ScalarTests
{
    private static readonly Gen<(double X, double Y)> Point = Gen.Select(Gen.Double[0.3, 3.0], Gen.Double[0.3, 3.0]);

    private static readonly Gen<(double X, double Y, double WideX, double WideY, double AtX, double AtY)> Boxed =
        Gen.Select(Gen.Double[0.3, 3.0], Gen.Double[0.3, 3.0], Gen.Double[0.0, 2.0], Gen.Double[0.0, 2.0], Gen.Double[0.0, 1.0], Gen.Double[0.0, 1.0]);

    [Fact]
    public void Dual_derivative_agrees_with_the_central_difference() =>
        Point.Sample(point =>
        {
            const double step = 1e-5;
            double Value(double x) => Formula(new Real(x), new Real(point.Y)).Value;
            double difference = (Value(point.X + step) - Value(point.X - step)) / (2.0 * step);
            double derivative = Formula(Seeded(point.X), Held(point.Y)).Derivative.Value;
            // h²/6 of a third derivative that reaches 300 here, and rounding of 1e-15/h.
            return Math.Abs(derivative - difference) < 1e-7 * (1.0 + Math.Abs(derivative));
        });

    [Fact]
    public void Dual_value_is_the_real_value() =>
        Point.Sample(point => Formula(Seeded(point.X), Held(point.Y)).Value == Formula(new Real(point.X), new Real(point.Y)));

    [Fact]
    public void Interval_holds_the_result_of_every_point_of_the_box() =>
        Boxed.Sample(box =>
        {
            (Interval x, Interval y, double atX, double atY) = Box(box);
            Interval bound = Formula(x, y);
            double value = Formula(new Real(atX), new Real(atY)).Value;
            return bound.Low <= value && value <= bound.High;
        });

    [Fact]
    public void Interval_operations_hold_their_results_on_both_sides_of_zero() =>
        Boxed.Sample(box =>
        {
            (Interval x, Interval y, double atX, double atY) = Box((box.X - 2.0, box.Y - 2.0, 3.0 * box.WideX, 3.0 * box.WideY, box.AtX, box.AtY));
            return Holds(x * y, atX * atY) && Holds(x + y, atX + atY) && Holds(x - y, atX - atY) && Holds(-x, -atX) && (atY == 0.0 || Holds(x / y, atX / atY))
                && Holds(-1.7 * x, -1.7 * atX) && Holds(Interval.Square(x), atX * atX) && Holds(Interval.Sin(x), Math.Sin(atX))
                && Holds(Interval.Cos(x), Math.Cos(atX)) && Holds(Interval.Exp(x), Math.Exp(atX));
        });

    [Fact]
    public void Dual_interval_holds_the_derivative_at_every_point_of_the_box() =>
        Boxed.Sample(box =>
        {
            (Interval x, Interval y, double atX, double atY) = Box(box);
            Interval bound = Formula(new Dual<Interval>(x, Interval.From(1.0)), new Dual<Interval>(y, Interval.From(0.0))).Derivative;
            return Holds(bound, Formula(Seeded(atX), Held(atY)).Derivative.Value);
        });

    [Theory]
    [MemberData(nameof(Closed))]
    public void Interval_ends_are_those_of_the_closed_form(string name, Interval bound, double low, double high)
    {
        // Outward by a step or two for each operation, and no more: four units in the last place of the larger end.
        double hair = 4.0 * (Math.BitIncrement(Math.Max(1.0, Math.Abs(high))) - Math.Max(1.0, Math.Abs(high)));
        Assert.True(bound.Low <= low && bound.Low >= low - hair, name);
        Assert.True(bound.High >= high && bound.High <= high + hair, name);
    }

    public static TheoryData<string, Interval, double, double> Closed() => new()
    {
        { "square over zero", Interval.Square(new(-1.0, 2.0)), 0.0, 4.0 },
        { "square below zero", Interval.Square(new(-3.0, -2.0)), 4.0, 9.0 },
        { "product", new Interval(1.0, 2.0) * new Interval(-3.0, 1.0), -6.0, 2.0 },
        { "quotient", new Interval(1.0, 2.0) / new Interval(-4.0, -2.0), -1.0, -0.25 },
        { "root", Interval.Sqrt(new(4.0, 9.0)), 2.0, 3.0 },
        { "cosine over its top", Interval.Cos(new(-0.1, 0.2)), Math.Cos(0.2), 1.0 },
        { "sine over its bottom", Interval.Sin(new(4.0, 5.0)), -1.0, Math.Sin(4.0) },
        { "sine rising", Interval.Sin(new(-0.5, 0.5)), Math.Sin(-0.5), Math.Sin(0.5) },
        { "cosine of more than a turn", Interval.Cos(new(0.5, 7.0)), -1.0, 1.0 },
        { "logarithm", Interval.Log(new(1.0, Math.E)), 0.0, 1.0 },
        { "nothing stays nothing", new Interval(0.0, 0.0) * Interval.Everything, 0.0, 0.0 },
    };

    [Fact]
    public void Quotient_by_an_interval_that_holds_zero_is_everything() =>
        Assert.Equal(Interval.Everything, Interval.From(1.0) / new Interval(-1.0, 1.0));

    private static bool Holds(Interval bound, double value) => bound.Low <= value && value <= bound.High;

    private static (Interval X, Interval Y, double AtX, double AtY) Box(
        (double X, double Y, double WideX, double WideY, double AtX, double AtY) box) =>
        (new(box.X, box.X + box.WideX), new(box.Y, box.Y + box.WideY),
            Math.Min(box.X + (box.AtX * box.WideX), box.X + box.WideX), Math.Min(box.Y + (box.AtY * box.WideY), box.Y + box.WideY));

    private static Dual<Real> Seeded(double x) => new(new(x), new(1.0));

    private static Dual<Real> Held(double y) => new(new(y), new(0.0));

    // Every operation of the interface once, x and y both above zero.
    private static T Formula<T>(T x, T y)
        where T : struct, IScalar<T> =>
        (T.Sqrt(T.Square(x) + (2.0 * (x * y))) / (x + T.From(1.0)))
            - (T.Sin(x * y) * T.Log(x + y)) + (T.Exp(-x) * T.Cos(x - y));
}
