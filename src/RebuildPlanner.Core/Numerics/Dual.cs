using static System.Runtime.CompilerServices.MethodImplOptions;
using Inline = System.Runtime.CompilerServices.MethodImplAttribute;

namespace RebuildPlanner.Core.Numerics;

/// <summary>A figure and its derivative with respect to one input: forward differentiation by dual numbers.</summary>
/// <typeparam name="T">The scalar that value and derivative are read in.</typeparam>
/// <remarks>Over <see cref="Interval"/> the derivative is a bound over a whole box, which is what proves monotonicity.</remarks>
public readonly record struct Dual<T> : IScalar<Dual<T>>
    where T : struct, IScalar<T>
{
    /// <summary>The figure.</summary>
    public readonly T Value;

    /// <summary>Its derivative with respect to the one input that was seeded with 1.</summary>
    public readonly T Derivative;

    /// <summary>Makes a dual of a figure and its derivative.</summary>
    public Dual(T value, T derivative)
    {
        Value = value;
        Derivative = derivative;
    }

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> From(double exact) => new(T.From(exact), T.From(0.0));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> operator +(Dual<T> left, Dual<T> right) => new(left.Value + right.Value, left.Derivative + right.Derivative);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> operator -(Dual<T> left, Dual<T> right) => new(left.Value - right.Value, left.Derivative - right.Derivative);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> operator -(Dual<T> operand) => new(-operand.Value, -operand.Derivative);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> operator *(Dual<T> left, Dual<T> right) =>
        new(left.Value * right.Value, (left.Derivative * right.Value) + (left.Value * right.Derivative));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> operator *(double exact, Dual<T> right) => new(exact * right.Value, exact * right.Derivative);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> operator /(Dual<T> left, Dual<T> right)
    {
        // (l' − q·r')/r and not (l'r − l·r')/r²: one division fewer, and the narrower bound over intervals.
        T quotient = left.Value / right.Value;
        return new(quotient, (left.Derivative - (quotient * right.Derivative)) / right.Value);
    }

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> Square(Dual<T> x) => new(T.Square(x.Value), 2.0 * (x.Value * x.Derivative));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> Sqrt(Dual<T> x)
    {
        T root = T.Sqrt(x.Value);
        return new(root, 0.5 * (x.Derivative / root));
    }

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> Sin(Dual<T> angleRad) => new(T.Sin(angleRad.Value), T.Cos(angleRad.Value) * angleRad.Derivative);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> Cos(Dual<T> angleRad) => new(T.Cos(angleRad.Value), -(T.Sin(angleRad.Value) * angleRad.Derivative));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> Exp(Dual<T> x)
    {
        T exponential = T.Exp(x.Value);
        return new(exponential, exponential * x.Derivative);
    }

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Dual<T> Log(Dual<T> x) => new(T.Log(x.Value), x.Derivative / x.Value);
}
