using System.Runtime.Intrinsics;
using static System.Runtime.CompilerServices.MethodImplOptions;
using Inline = System.Runtime.CompilerServices.MethodImplAttribute;

namespace RebuildPlanner.Core.Numerics;

/// <summary>Eight numbers side by side: a formula in them is eight trials at once.</summary>
/// <remarks>
/// Sum, difference, product, quotient and root are rounded the same by every machine, with wide registers or without, and sine and cosine are made of
/// them. Exponential and logarithm are asked of the framework one lane at a time: its wide forms fuse products with sums where the machine can, and the
/// last bit would hang on that.
/// </remarks>
public readonly record struct Lanes : IScalar<Lanes>
{
    /// <summary>How many there are.</summary>
    public const int Count = 8;

    /// <summary>The numbers.</summary>
    public readonly Vector512<double> Values;

    /// <summary>Makes lanes of a register.</summary>
    [Inline(AggressiveInlining)]
    public Lanes(Vector512<double> values) => Values = values;

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Lanes From(double exact) => new(Vector512.Create(exact));

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Lanes operator +(Lanes left, Lanes right) => new(left.Values + right.Values);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Lanes operator -(Lanes left, Lanes right) => new(left.Values - right.Values);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Lanes operator -(Lanes operand) => new(-operand.Values);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Lanes operator *(Lanes left, Lanes right) => new(left.Values * right.Values);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Lanes operator *(double exact, Lanes right) => new(exact * right.Values);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Lanes operator /(Lanes left, Lanes right) => new(left.Values / right.Values);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Lanes Square(Lanes x) => new(x.Values * x.Values);

    /// <inheritdoc/>
    [Inline(AggressiveInlining)]
    public static Lanes Sqrt(Lanes x) => new(Vector512.Sqrt(x.Values));

    /// <inheritdoc/>
    public static Lanes Sin(Lanes angleRad) => new(LaneSine.Sin(angleRad.Values));

    /// <inheritdoc/>
    public static Lanes Cos(Lanes angleRad) => new(LaneSine.Cos(angleRad.Values));

    /// <inheritdoc/>
    public static Lanes Exp(Lanes x) => Each(x, Math.Exp);

    /// <inheritdoc/>
    public static Lanes Log(Lanes x) => Each(x, Math.Log);

    // A delegate of a named method: the compiler keeps it, and no trial makes another.
    private static Lanes Each(Lanes x, Func<double, double> function)
    {
        Span<double> lanes = stackalloc double[Count];
        x.Values.CopyTo(lanes);

        // An angle or an altitude that carries no doubt is the same in every lane.
        if (x.Values == Vector512.Create(lanes[0]))
        {
            return From(function(lanes[0]));
        }

        for (int lane = 0; lane < Count; lane++)
        {
            lanes[lane] = function(lanes[lane]);
        }

        return new(Vector512.Create<double>(lanes));
    }
}
