using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Cylinders;

/// <summary>Where the piston stands, from crank throw, rod and pin offset.</summary>
/// <remarks>
/// r = stroke/2, L the rod, e the pin offset, θ from the crank position parallel to the bore. Source: geometry.
/// Valid for: L &gt; r + |e|. Error: none beyond its inputs.
/// </remarks>
public static class SliderCrank
{
    /// <summary>Height of the pin above the crank line at top dead centre, mm.</summary>
    /// <param name="strokeMm">Twice the crank throw, mm.</param>
    /// <param name="rodMm">Rod between centres, mm.</param>
    /// <param name="offsetMm">Pin offset, mm.</param>
    /// <remarks>√((L + r)² − e²).</remarks>
    public static T Reach<T>(T strokeMm, T rodMm, T offsetMm)
        where T : struct, IScalar<T> => T.Sqrt(T.Square(rodMm + (0.5 * strokeMm)) - T.Square(offsetMm));

    /// <summary>Piston travel, mm: more than the stroke when the pin is offset.</summary>
    /// <inheritdoc cref="Reach{T}"/>
    /// <remarks>S_t = √((L + r)² − e²) − √((L − r)² − e²).</remarks>
    public static T Travel<T>(T strokeMm, T rodMm, T offsetMm)
        where T : struct, IScalar<T> =>
        Reach(strokeMm, rodMm, offsetMm) - T.Sqrt(T.Square(rodMm - (0.5 * strokeMm)) - T.Square(offsetMm));

    /// <summary>Distance of the pin below its highest point, mm, with the degree wheel zeroed at true top dead centre.</summary>
    /// <param name="sineTheta">Sine of the crank angle θ from the position parallel to the bore.</param>
    /// <param name="cosineTheta">Cosine of the same angle.</param>
    /// <inheritdoc cref="Reach{T}"/>
    /// <remarks>x = √((L + r)² − e²) − r·cos θ − √(L² − (r·sin θ − e)²).</remarks>
    public static T BelowTop<T>(T strokeMm, T rodMm, T offsetMm, T sineTheta, T cosineTheta)
        where T : struct, IScalar<T>
    {
        T throwMm = 0.5 * strokeMm;
        T sidewaysMm = (throwMm * sineTheta) - offsetMm;
        return Reach(strokeMm, rodMm, offsetMm) - (throwMm * cosineTheta) - T.Sqrt(T.Square(rodMm) - T.Square(sidewaysMm));
    }

    /// <summary>Distance of the pin below its highest point when the charge is trapped, mm.</summary>
    /// <param name="closingRad">Inlet closing after bottom dead centre, or for a two-stroke exhaust closing before top, rad.</param>
    /// <param name="twoStroke">Which of the two.</param>
    /// <inheritdoc cref="Reach{T}"/>
    /// <remarks>
    /// θ = θ_TDC + 180° + IVC, or θ_TDC − EC; sin θ_TDC = e/(L + r). The addition theorems stand in for an arcsine,
    /// which the scalars do without.
    /// </remarks>
    public static T BelowTopAtClosing<T>(T strokeMm, T rodMm, T offsetMm, T closingRad, bool twoStroke)
        where T : struct, IScalar<T>
    {
        T sineTop = offsetMm / (rodMm + (0.5 * strokeMm));
        T cosineTop = T.Sqrt(T.From(1.0) - T.Square(sineTop));
        T sine = T.Sin(closingRad), cosine = T.Cos(closingRad);
        return twoStroke
            ? BelowTop(strokeMm, rodMm, offsetMm, (sineTop * cosine) - (cosineTop * sine), (cosineTop * cosine) + (sineTop * sine))
            : BelowTop(strokeMm, rodMm, offsetMm, -((sineTop * cosine) + (cosineTop * sine)), -((cosineTop * cosine) - (sineTop * sine)));
    }
}
