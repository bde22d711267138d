using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Measuring;

/// <summary>A place to be read.</summary>
/// <param name="What">What is read there.</param>
/// <param name="Place">Where.</param>
/// <param name="ForRatio">True where ratio, gap or displacement rest on it; false for walls, fits and heights.</param>
public sealed record RoundPlace(What What, Place Place, bool ForRatio);

/// <summary>The round of an engine: every place to be read, in the order in which it is measured. Prompt, blank list and form all follow it.</summary>
/// <remarks>
/// One gauge is used up before the next is taken: a thing is read on every cylinder before the next thing, but the rock of a piston with its
/// deck, while the dial stands there. Common practice.
/// </remarks>
public static class Round
{
    private static readonly At[] _depths = [At.Top, At.Middle, At.Bottom], _pinEnds = [At.Front, At.Rear];
    private static readonly BoreAxis[] _axes = [BoreAxis.Thrust, BoreAxis.AlongCrank];
    private static readonly Valve[] _valves = [Valve.Inlet, Valve.Exhaust];

    // The two ends and the two thrust faces, where a bored wall is thin first.
    private static readonly double[] _clockHours = [12.0, 3.0, 6.0, 9.0];

    /// <summary>Every place of an engine, in order.</summary>
    public static IReadOnlyList<RoundPlace> Of(Engine engine)
    {
        Place[] cylinders = [.. engine.Labels.Select(label => new Place(Cylinder: label))];

        // The only head or bank needs no name; a reading that names it is of the same place.
        Place[] heads = engine.Heads.Count == 1 ? [Place.Everywhere] : [.. engine.Heads.Select(head => new Place(Head: head.Label))];
        Place[] banks = engine.Banks.Count == 1 ? [Place.Everywhere] : [.. engine.Banks.Select(bank => new Place(Bank: bank.Label))];
        Place[] valves = engine.Cycle == EngineCycle.TwoStroke ? [] : [.. cylinders.SelectMany(_ => _valves, (place, valve) => place with { Valve = valve })];
        What deck = engine.Ignition == Ignition.Compression ? What.PistonProtrusion : What.Deck;
        return
        [
            .. Each(What.Bore, cylinders.SelectMany(place => _depths.SelectMany(_ => _axes, (at, axis) => place with { At = at, Axis = axis }))),
            .. Each(What.Stroke, [Place.Everywhere]),
            .. cylinders.SelectMany(place => Each(deck, _pinEnds.Select(at => place with { At = at })).Concat(Each(What.Rock, [place]))),
            .. Each(What.Chamber, cylinders),
            .. Each(What.CrownFill, cylinders),
            .. Each(What.GasketThickness, heads),
            .. Each(What.GasketOpening, heads),
            .. Each(What.TopLandHeight, cylinders),
            .. Each(What.TopLandDiameter, cylinders),
            .. Each(What.RodLength, cylinders),

            // A change of piston goes through both: the deck by the compression heights, the finished bore by the skirt.
            .. Each(What.CompressionHeight, cylinders),
            .. Each(What.Skirt, cylinders),

            .. Fits(What.Wall, cylinders.SelectMany(_ => _clockHours, (place, hours) => place with { At = At.Middle, ClockHours = hours })),
            .. Fits(What.RingGap, cylinders),
            .. Fits(What.MainJournal, [Place.Everywhere]),
            .. Fits(What.RodJournal, cylinders),
            .. Fits(What.EndFloat, [Place.Everywhere]),
            .. Fits(What.RodSideClearance, cylinders),
            .. Fits(What.Guide, valves),
            .. Fits(What.Stem, valves),
            .. Fits(What.Flatness, [.. engine.Heads.Select(head => new Place(Head: head.Label)), .. engine.Banks.Select(bank => new Place(Bank: bank.Label))]),
            .. Fits(What.HeadHeight, heads),
            .. Fits(What.DeckHeight, banks),
        ];
    }

    /// <summary>The places still to be read at a stage, in order: those with no reading of that stage that stands.</summary>
    /// <remarks>
    /// What the maker states is not read: a crown stated with its piston set is still asked for by fill. Where a deck was begun as a
    /// protrusion, or the reverse, the rest of that cylinder is asked for in the same word, since the job file refuses the two together.
    /// </remarks>
    public static IReadOnlyList<RoundPlace> Left(Job job, Stage stage)
    {
        PlacesRead read = new(job, stage);
        return [.. Of(job.Engine).Select(read.AsBegun).Where(place => !read.Has(place))];
    }

    private static IEnumerable<RoundPlace> Each(What what, IEnumerable<Place> places) => Asked(what, places, forRatio: true);

    private static IEnumerable<RoundPlace> Fits(What what, IEnumerable<Place> places) => Asked(what, places, forRatio: false);

    private static IEnumerable<RoundPlace> Asked(What what, IEnumerable<Place> places, bool forRatio)
    {
        foreach (Place place in places)
        {
            yield return new RoundPlace(what, place, forRatio);
        }
    }
}
