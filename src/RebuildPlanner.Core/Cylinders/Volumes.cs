using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Cylinders;

/// <summary>The volumes of one cylinder, each formula once.</summary>
public static class Volumes
{
    private const double QuarterPi = Math.PI / 4.0;

    /// <summary>Volume of a right cylinder, mm³: swept volume, deck volume, gasket from its opening diameter.</summary>
    /// <param name="diameterMm">Diameter, mm, &gt; 0.</param>
    /// <param name="lengthMm">Length along the axis, mm; negative for a piston proud of the deck.</param>
    /// <remarks>V = π/4 · d² · l. Source: geometry. Valid for: any bore; an oval one by its mean diameter. Error: (Δ/2D)² for an oval of Δ.</remarks>
    public static T OfCylinder<T>(T diameterMm, T lengthMm)
        where T : struct, IScalar<T> => QuarterPi * (T.Square(diameterMm) * lengthMm);

    /// <summary>Gasket volume, mm³.</summary>
    /// <param name="openingMm">Opening diameter, mm, or zero where the area was traced.</param>
    /// <param name="areaMm2">Traced opening area, mm², or zero where the diameter is known.</param>
    /// <param name="thicknessMm">Compressed thickness, mm, ≥ 0.</param>
    /// <remarks>V_g = A_g · t_g. Source: geometry. Valid for: a flat gasket of even thickness. Error: none beyond its inputs.</remarks>
    public static T OfGasket<T>(T openingMm, T areaMm2, T thicknessMm)
        where T : struct, IScalar<T> => ((QuarterPi * T.Square(openingMm)) + areaMm2) * thicknessMm;

    /// <summary>Top-land crevice down to the top ring, mm³.</summary>
    /// <param name="boreMm">Bore, mm.</param>
    /// <param name="landDiameterMm">Top land diameter, mm, below the bore.</param>
    /// <param name="landHeightMm">Height from crown edge to top ring, mm.</param>
    /// <remarks>V_l = π/4 · (B² − D_l²) · h_l, as (B − D_l)(B + D_l): the difference of near-equal squares loses digits and widens bounds.
    /// Source: geometry. Valid for: a round land. Error: none beyond its inputs.</remarks>
    public static T OfTopLand<T>(T boreMm, T landDiameterMm, T landHeightMm)
        where T : struct, IScalar<T> => QuarterPi * ((boreMm - landDiameterMm) * (boreMm + landDiameterMm) * landHeightMm);

    /// <summary>Crown volume from a fill over the lowered piston, mm³, &gt; 0 for a dish.</summary>
    /// <param name="fillMm3">Fill between plate and crown, sealed at the crown's edge, mm³.</param>
    /// <param name="boreMm">Bore where the piston stood, mm.</param>
    /// <param name="dropMm">How far the piston stood below the deck, mm, more than a dome's height.</param>
    /// <remarks>V_cr = V_f − π/4 · B² · x. Source: geometry. Valid for: a crown edge level with the deck's plane. Error: none beyond its inputs.</remarks>
    public static T OfCrownByFill<T>(T fillMm3, T boreMm, T dropMm)
        where T : struct, IScalar<T> => fillMm3 - OfCylinder(boreMm, dropMm);

    /// <summary>Static compression ratio, 1.</summary>
    /// <param name="sweptMm3">Swept volume, mm³, &gt; 0.</param>
    /// <param name="clearanceMm3">Clearance volume, mm³, &gt; 0.</param>
    /// <remarks>CR = (V_s + V_c)/V_c, written 1 + V_s/V_c so that V_c stands once. Source: geometry. Valid for: V_c &gt; 0. Error: none beyond its inputs.</remarks>
    public static T CompressionRatio<T>(T sweptMm3, T clearanceMm3)
        where T : struct, IScalar<T> => T.From(1.0) + (sweptMm3 / clearanceMm3);
}
