using System.Runtime.CompilerServices;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Cylinders;

/// <summary>The volume stack of one cylinder: from its figures to volumes, ratio, pressure and gap.</summary>
/// <typeparam name="T">The scalar it is read in.</typeparam>
[InlineArray(Count)]
public struct CylinderStack<T>
    where T : struct, IScalar<T>
{
    /// <summary>How many outputs there are.</summary>
    public const int Count = (int)Output.CrossCheck + 1;

    private T _first;

    /// <summary>One output.</summary>
    public readonly T Of(Output output) => this[(int)output];

    /// <summary>Computes every output; one whose figures are missing comes out as a number without meaning, which the caller leaves unread.</summary>
    /// <param name="figures">The figures, absent ones zero.</param>
    /// <param name="form">Which formulas apply.</param>
    /// <param name="stack">The outputs.</param>
    public static void Compute(in CylinderFigures<T> figures, CylinderForm form, out CylinderStack<T> stack)
    {
        Unsafe.SkipInit(out stack);
        T zero = T.From(0.0);

        T travel = form.TravelMeasured ? figures.Travel
            : form.OffsetPin ? SliderCrank.Travel(figures.Stroke, figures.RodLength, figures.PinOffset)
            : figures.Stroke;
        T swept = Volumes.OfCylinder(figures.Bore, travel);
        T gasket = Volumes.OfGasket(figures.GasketOpening, figures.GasketArea, figures.GasketThickness);
        T deck = Volumes.OfCylinder(figures.Bore, figures.Deck);
        T topLand = form.TopLand ? Volumes.OfTopLand(figures.Bore, figures.TopLandDiameter, figures.TopLandHeight) : zero;
        T parts = figures.Chamber + gasket + deck + figures.Crown + topLand + figures.Pocket;
        T whole = figures.WholeChamber - figures.PlugHole;
        T clearance = form.WholeChamber ? whole : parts;
        T ratio = Volumes.CompressionRatio(swept, clearance);

        stack[(int)Output.Bore] = figures.Bore;
        stack[(int)Output.SweptVolume] = swept;
        stack[(int)Output.Chamber] = figures.Chamber;
        stack[(int)Output.Gasket] = gasket;
        stack[(int)Output.Deck] = deck;
        stack[(int)Output.Crown] = figures.Crown;
        stack[(int)Output.TopLand] = topLand;
        stack[(int)Output.ClearanceVolume] = clearance;
        stack[(int)Output.CompressionRatio] = ratio;
        stack[(int)Output.PistonToHead] = figures.GasketThickness + figures.LeastDeck + figures.HeadRecess - figures.Rock;
        stack[(int)Output.CrossCheck] = whole - parts;
        stack[(int)Output.TrappedRatio] = zero;
        stack[(int)Output.CrankingPressure] = zero;
        if (form.Closing)
        {
            T belowTop = SliderCrank.BelowTopAtClosing(
                figures.Stroke, figures.RodLength, figures.PinOffset, figures.Closing, form.TwoStroke);
            T trapped = Charge.TrappedRatio(belowTop, travel, ratio);
            stack[(int)Output.TrappedRatio] = trapped;
            stack[(int)Output.CrankingPressure] =
                Charge.CrankingPressure(trapped, Charge.AmbientPressure(figures.Altitude), figures.CrankingExponent);
        }
    }
}
