namespace RebuildPlanner.Core.Numerics;

/// <summary>The arithmetic a formula of the trade may use, so that one text of it gives figures, sensitivities, bounds and trials.</summary>
/// <typeparam name="TSelf">The scalar itself: <see cref="Real"/>, <see cref="Dual{T}"/>, <see cref="Interval"/>.</typeparam>
/// <remarks>There is no comparison here on purpose: a formula that branches on an uncertain figure has no derivative and no bound.</remarks>
public interface IScalar<TSelf>
    where TSelf : struct, IScalar<TSelf>
{
    /// <summary>A number known exactly, as a scalar.</summary>
    static abstract TSelf From(double exact);

    /// <summary>Sum.</summary>
    static abstract TSelf operator +(TSelf left, TSelf right);

    /// <summary>Difference.</summary>
    static abstract TSelf operator -(TSelf left, TSelf right);

    /// <summary>Opposite.</summary>
    static abstract TSelf operator -(TSelf operand);

    /// <summary>Product.</summary>
    static abstract TSelf operator *(TSelf left, TSelf right);

    /// <summary>Product with a number known exactly.</summary>
    static abstract TSelf operator *(double exact, TSelf right);

    /// <summary>Quotient.</summary>
    static abstract TSelf operator /(TSelf left, TSelf right);

    /// <summary>Square; tighter than x·x for an interval that holds zero.</summary>
    static abstract TSelf Square(TSelf x);

    /// <summary>Square root.</summary>
    static abstract TSelf Sqrt(TSelf x);

    /// <summary>Sine of an angle in radians.</summary>
    static abstract TSelf Sin(TSelf angleRad);

    /// <summary>Cosine of an angle in radians.</summary>
    static abstract TSelf Cos(TSelf angleRad);

    /// <summary>Exponential.</summary>
    static abstract TSelf Exp(TSelf x);

    /// <summary>Natural logarithm.</summary>
    static abstract TSelf Log(TSelf x);
}
