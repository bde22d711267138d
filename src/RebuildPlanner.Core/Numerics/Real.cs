using static System.Runtime.CompilerServices.MethodImplOptions;
using Inline = System.Runtime.CompilerServices.MethodImplAttribute;

namespace RebuildPlanner.Core.Numerics;

/// <summary>A plain number: the figure itself.</summary>
public readonly record struct Real : IScalar<Real>
{
    /// <summary>The number.</summary>
    public readonly double Value;

    /// <summary>Makes a scalar of a number.</summary>
    public Real(double value) => Value = value;

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real From(double exact) => new(exact);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real operator +(Real left, Real right) => new(left.Value + right.Value);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real operator -(Real left, Real right) => new(left.Value - right.Value);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real operator -(Real operand) => new(-operand.Value);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real operator *(Real left, Real right) => new(left.Value * right.Value);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real operator *(double exact, Real right) => new(exact * right.Value);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real operator /(Real left, Real right) => new(left.Value / right.Value);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real Square(Real x) => new(x.Value * x.Value);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real Sqrt(Real x) => new(Math.Sqrt(x.Value));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real Sin(Real angleRad) => new(Math.Sin(angleRad.Value));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real Cos(Real angleRad) => new(Math.Cos(angleRad.Value));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real Exp(Real x) => new(Math.Exp(x.Value));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Real Log(Real x) => new(Math.Log(x.Value));
}
