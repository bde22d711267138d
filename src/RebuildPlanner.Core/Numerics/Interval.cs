namespace RebuildPlanner.Core.Numerics;

/// <summary>Certain bounds on a figure: every operation rounds outward, so the true result is never left out.</summary>
/// <remarks>
/// + − × ÷ and √ are correctly rounded by IEEE 754, so one step outward is enough; the library's sine, cosine, exponential and logarithm
/// are not promised to the last bit, so two steps are taken. A quotient by an interval that holds zero is the whole line.
/// Source: ieee1788.
/// </remarks>
public readonly record struct Interval : IScalar<Interval>
{
    /// <summary>The lower bound.</summary>
    public readonly double Low;

    /// <summary>The upper bound.</summary>
    public readonly double High;

    /// <summary>Makes an interval of its bounds, <paramref name="low"/> ≤ <paramref name="high"/>.</summary>
    public Interval(double low, double high)
    {
        Low = low;
        High = high;
    }

    /// <summary>Everything: what is known when nothing is.</summary>
    public static Interval Everything => new(double.NegativeInfinity, double.PositiveInfinity);

    /// <summary>True where the whole interval is at or above zero.</summary>
    public bool IsNonNegative => Low >= 0.0;

    /// <summary>True where the whole interval is at or below zero.</summary>
    public bool IsNonPositive => High <= 0.0;

    /// <inheritdoc/>
    public static Interval From(double exact) => new(exact, exact);

    /// <inheritdoc/>
    public static Interval operator +(Interval left, Interval right) =>
        new(Down(left.Low + right.Low), Up(left.High + right.High));

    /// <inheritdoc/>
    public static Interval operator -(Interval left, Interval right) =>
        new(Down(left.Low - right.High), Up(left.High - right.Low));

    /// <inheritdoc/>
    public static Interval operator -(Interval operand) => new(-operand.High, -operand.Low);

    /// <inheritdoc/>
    public static Interval operator *(Interval left, Interval right)
    {
        double a = Product(left.Low, right.Low), b = Product(left.Low, right.High);
        double c = Product(left.High, right.Low), d = Product(left.High, right.High);
        return new(Down(Math.Min(Math.Min(a, b), Math.Min(c, d))), Up(Math.Max(Math.Max(a, b), Math.Max(c, d))));
    }

    /// <inheritdoc/>
    public static Interval operator *(double exact, Interval right) => From(exact) * right;

    /// <inheritdoc/>
    public static Interval operator /(Interval left, Interval right)
    {
        if (right.Low <= 0.0 && right.High >= 0.0)
        {
            return Everything;
        }

        double a = left.Low / right.Low, b = left.Low / right.High, c = left.High / right.Low, d = left.High / right.High;
        return new(Down(Math.Min(Math.Min(a, b), Math.Min(c, d))), Up(Math.Max(Math.Max(a, b), Math.Max(c, d))));
    }

    /// <inheritdoc/>
    public static Interval Square(Interval x)
    {
        double low = x.Low * x.Low, high = x.High * x.High;
        double least = x.Low <= 0.0 && x.High >= 0.0 ? 0.0 : Down(Math.Min(low, high));
        return new(least, Up(Math.Max(low, high)));
    }

    /// <inheritdoc/>
    /// <remarks>A part below zero has no root and is left out; an interval wholly below zero gives NaN.</remarks>
    public static Interval Sqrt(Interval x) =>
        new(x.Low <= 0.0 && x.High >= 0.0 ? 0.0 : Down(Math.Sqrt(x.Low)), Up(Math.Sqrt(x.High)));

    /// <inheritdoc/>
    public static Interval Sin(Interval angleRad) => Cos(angleRad - new Interval(Math.PI / 2.0, Math.BitIncrement(Math.PI / 2.0)));

    /// <inheritdoc/>
    public static Interval Cos(Interval angleRad)
    {
        double a = Math.Cos(angleRad.Low), b = Math.Cos(angleRad.High);
        double low = Holds(angleRad, Math.PI) ? -1.0 : Math.Max(-1.0, Down(Down(Math.Min(a, b))));
        double high = Holds(angleRad, 0.0) ? 1.0 : Math.Min(1.0, Up(Up(Math.Max(a, b))));
        return new(low, high);
    }

    /// <inheritdoc/>
    public static Interval Exp(Interval x) => new(Math.Max(0.0, Down(Down(Math.Exp(x.Low)))), Up(Up(Math.Exp(x.High))));

    /// <inheritdoc/>
    public static Interval Log(Interval x) =>
        new(x.Low <= 0.0 ? double.NegativeInfinity : Down(Down(Math.Log(x.Low))), Up(Up(Math.Log(x.High))));

    /// <summary>Whether some angle + 2πk lies in the interval; a hair's breadth outside counts as inside, which only widens the bound.</summary>
    private static bool Holds(Interval x, double angleRad)
    {
        const double turn = 2.0 * Math.PI, hair = 1e-12;
        return Math.Floor((x.High - angleRad + hair) / turn) >= Math.Ceiling((x.Low - angleRad - hair) / turn);
    }

    // 0 × ∞ is 0 here: a factor that is exactly zero bounds the product whatever the other is.
    private static double Product(double x, double y) => x == 0.0 || y == 0.0 ? 0.0 : x * y;

    // An exact zero stays: widening it would turn "does not depend on this" into "depends by a hair".
    private static double Down(double x) => x == 0.0 ? 0.0 : Math.BitDecrement(x);

    private static double Up(double x) => x == 0.0 ? 0.0 : Math.BitIncrement(x);
}
