using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Where a figure comes from; the four are told apart everywhere, to paper.</summary>
public enum FigureKind
{
    /// <summary>Readings and a gauge.</summary>
    Measured,

    /// <summary>An earlier figure carried through a cut or a change of parts.</summary>
    Computed,

    /// <summary>Maker or customer.</summary>
    Given,

    /// <summary>A default.</summary>
    Assumed,
}

/// <summary>The estimate of one place of a figure.</summary>
/// <param name="Place">The place.</param>
/// <param name="Estimate">Its estimate.</param>
public sealed record PlacedEstimate(Place Place, Estimate Estimate)
{
    /// <summary>The figure the places make: their mean with equal weight, but the pockets of several valves add up.</summary>
    public static Estimate Together(What what, IReadOnlyList<PlacedEstimate> places)
    {
        double weight = what == What.Pocket ? 1.0 : 1.0 / places.Count;
        return places.Count == 1 ? places[0].Estimate : Estimate.Combine([.. places.Select(place => (weight, place.Estimate))]);
    }
}

/// <summary>The figure that counts for one thing on one cylinder at a stage.</summary>
/// <param name="What">The thing.</param>
/// <param name="Estimate">Value and doubts, coherent unit; for several places their mean.</param>
/// <param name="Kind">Where it comes from.</param>
/// <param name="Stage">The stage it is of, or null for one that holds throughout.</param>
/// <param name="From">Who gave it, the part it belongs to, or what it was carried through.</param>
/// <param name="Gauge">The gauge that read it.</param>
/// <param name="Places">The places it is the mean of.</param>
public sealed record Figure(
    What What, Estimate Estimate, FigureKind Kind, Stage? Stage, string? From, string? Gauge, IReadOnlyList<PlacedEstimate> Places)
{
    /// <summary>The place with the least value, which for a deck decides the gap; the figure itself where there is one place.</summary>
    public Estimate Least { get; init; } = Places.Count == 0 ? Estimate : Places.MinBy(place => place.Estimate.Value)!.Estimate;

    /// <summary>The earlier figures it was carried from.</summary>
    public IReadOnlyList<Figure> RestsOn { get; init; } = [];

    /// <summary>The words it was given or assumed in; null for one measured or computed, and where several entries make it.</summary>
    public string? Written { get; init; }

    /// <summary>True for a gasket opening traced as an area.</summary>
    public bool IsArea { get; init; }
}
