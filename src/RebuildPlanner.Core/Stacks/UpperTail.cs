using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>A law symmetric about zero, by the chance of passing an offset and the repeated integrals of that chance.</summary>
/// <remarks>
/// W₀(d) = P(Z &gt; d), W₁ = ∫₀^d W₀, W₂ = ∫₀^d W₁. A rectangle of half-width a added to Z averages W₀ over ±a, which is a difference of W₁; two
/// rectangles need W₂. So the widest rectangles never have to be resolved by a quadrature.
/// </remarks>
internal abstract class UpperTail
{
    /// <summary>W of the given order at an offset d ≥ 0.</summary>
    public abstract double At(int order, double offset);
}

/// <summary>A law with closed partial moments S₁ = ∫₀^z s·f(s) ds and S₂ = ∫₀^z s²·f(s) ds.</summary>
internal abstract class ClosedTail(double scale) : UpperTail
{
    /// <inheritdoc/>
    /// <remarks>By parts: W₁ = zQ + S₁ and W₂ = ½z²Q + zS₁ − ½S₂, in units of the scale.</remarks>
    public override double At(int order, double offset)
    {
        double z = scale > 0.0 ? offset / scale : double.PositiveInfinity;
        if (double.IsPositiveInfinity(z))
        {
            return order == 0 && offset == 0.0 ? 0.5 : 0.0;
        }

        double above = Above(z);
        return order switch
        {
            0 => above,
            1 => scale * ((z * above) + FirstMoment(z)),
            _ => scale * scale * ((0.5 * z * z * above) + (z * FirstMoment(z)) - (0.5 * SecondMoment(z, above))),
        };
    }

    protected abstract double Above(double z);

    protected abstract double FirstMoment(double z);

    protected abstract double SecondMoment(double z, double above);
}

/// <summary>No doubt at all: a step at zero.</summary>
internal sealed class NoTail() : ClosedTail(0.0)
{
    protected override double Above(double z) => 0.0;

    protected override double FirstMoment(double z) => 0.0;

    protected override double SecondMoment(double z, double above) => 0.0;
}

/// <summary>A rectangle, its scale the half-width.</summary>
internal sealed class RectangleTail(double halfWidth) : ClosedTail(halfWidth)
{
    protected override double Above(double z) => 0.5 * Math.Max(0.0, 1.0 - z);

    protected override double FirstMoment(double z) => 0.25 * Math.Min(1.0, z * z);

    protected override double SecondMoment(double z, double above) => Math.Min(1.0, z * z * z) / 6.0;
}

/// <summary>A normal law.</summary>
internal sealed class NormalTail(double standardDeviation) : ClosedTail(standardDeviation)
{
    protected override double Above(double z) => NormalLaw.Above(z);

    protected override double FirstMoment(double z) => NormalLaw.Density(0.0) - NormalLaw.Density(z);

    protected override double SecondMoment(double z, double above) => 0.5 - above - (z * NormalLaw.Density(z));
}

/// <summary>A scaled t law.</summary>
internal sealed class StudentTail(double scale, double degreesOfFreedom) : ClosedTail(scale)
{
    protected override double Above(double z) => StudentT.Above(z, degreesOfFreedom);

    protected override double FirstMoment(double z) => degreesOfFreedom == 1.0
        ? Math.Log(1.0 + (z * z)) / (2.0 * Math.PI)
        : ((Density(0.0) * degreesOfFreedom) - (Density(z) * (degreesOfFreedom + (z * z)))) / (degreesOfFreedom - 1.0);

    protected override double SecondMoment(double z, double above) => degreesOfFreedom == 2.0
        ? Math.Asinh(z / Math.Sqrt(2.0)) - (z / Math.Sqrt(2.0 + (z * z)))
        : ((degreesOfFreedom * (0.5 - above)) - (z * Density(z) * (degreesOfFreedom + (z * z)))) / (degreesOfFreedom - 2.0);

    private double Density(double z) => StudentT.Density(z, degreesOfFreedom);
}
