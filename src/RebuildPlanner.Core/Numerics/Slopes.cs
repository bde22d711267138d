using System.Runtime.Intrinsics;
using static System.Runtime.CompilerServices.MethodImplOptions;
using Inline = System.Runtime.CompilerServices.MethodImplAttribute;

namespace RebuildPlanner.Core.Numerics;

/// <summary>A figure and its derivatives with respect to <see cref="Count"/> inputs at once: what <see cref="Dual{T}"/> is for one.</summary>
/// <remarks>
/// The roots, sines and logarithms of the figure itself are taken once for eight derivatives. Each derivative is formed by the same
/// operations in the same order as in a dual number. What it won, and what did not: docs/benchmarks.md.
/// </remarks>
public readonly record struct Slopes : IScalar<Slopes>
{
    /// <summary>How many inputs one pass covers.</summary>
    public const int Count = 8;

    /// <summary>The figure.</summary>
    public readonly double Value;

    /// <summary>Its derivative with respect to each input of the pass.</summary>
    public readonly Vector512<double> Derivatives;

    /// <summary>Makes a figure with its derivatives.</summary>
    public Slopes(double value, Vector512<double> derivatives)
    {
        Value = value;
        Derivatives = derivatives;
    }

    /// <summary>An input that itself is one of those the pass differentiates by.</summary>
    /// <param name="value">The input.</param>
    /// <param name="place">Its place in the pass, 0 to <see cref="Count"/> − 1.</param>
    public static Slopes Seed(double value, int place) => new(value, Vector512<double>.Zero.WithElement(place, 1.0));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes From(double exact) => new(exact, Vector512<double>.Zero);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes operator +(Slopes left, Slopes right) => new(left.Value + right.Value, left.Derivatives + right.Derivatives);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes operator -(Slopes left, Slopes right) => new(left.Value - right.Value, left.Derivatives - right.Derivatives);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes operator -(Slopes operand) => new(-operand.Value, -operand.Derivatives);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes operator *(Slopes left, Slopes right) =>
        new(left.Value * right.Value, (left.Derivatives * right.Value) + (left.Value * right.Derivatives));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes operator *(double exact, Slopes right) => new(exact * right.Value, exact * right.Derivatives);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes operator /(Slopes left, Slopes right)
    {
        double quotient = left.Value / right.Value;
        return new(quotient, (left.Derivatives - (quotient * right.Derivatives)) / right.Value);
    }

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes Square(Slopes x) => new(x.Value * x.Value, 2.0 * (x.Value * x.Derivatives));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes Sqrt(Slopes x)
    {
        double root = Math.Sqrt(x.Value);
        return new(root, 0.5 * (x.Derivatives / root));
    }

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes Sin(Slopes angleRad) => new(Math.Sin(angleRad.Value), Math.Cos(angleRad.Value) * angleRad.Derivatives);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes Cos(Slopes angleRad) => new(Math.Cos(angleRad.Value), -(Math.Sin(angleRad.Value) * angleRad.Derivatives));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes Exp(Slopes x)
    {
        double exponential = Math.Exp(x.Value);
        return new(exponential, exponential * x.Derivatives);
    }

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Slopes Log(Slopes x) => new(Math.Log(x.Value), x.Derivatives / x.Value);
}
