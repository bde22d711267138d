using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Measuring;

/// <summary>Which places of the round have been read at a stage.</summary>
/// <remarks>
/// Every reading is brought once to the place it counts for, by the rules the figures follow; then each place of the round is looked up and the
/// readings are not gone through again. A reading that does not say at which depth, end, axis or valve it was taken answers for none of them.
/// </remarks>
internal sealed class PlacesRead
{
    private readonly Engine _engine;
    private readonly Dictionary<string, EquatableList<string>> _cylindersOfHead;
    private readonly HashSet<(What, Place)> _read;
    private readonly Dictionary<string, What> _heightOf;

    public PlacesRead(Job job, Stage stage)
    {
        _engine = job.Engine;
        _cylindersOfHead = _engine.Heads.ToDictionary(head => head.Label, head => head.Cylinders);
        ILookup<string, (string Cylinder, Stage Since)> fitted = Fitted(job, stage);
        Reading[] standing = [.. job.Readings.Where(reading => reading.Struck is null)];
        _read =
        [
            .. standing.Where(reading => reading.Place.Piece is null && reading.Stage == stage).Select(reading => (reading.What, Unnamed(reading))),

            // A piece is measured on the bench; in the engine it counts from the stage it was fitted at, or read at if that was later.
            .. standing.Where(reading => reading.Place.Piece is not null).SelectMany(
                reading => fitted[reading.Place.Piece!].Where(piece => (reading.Stage > piece.Since ? reading.Stage : piece.Since) == stage),
                (reading, piece) => (reading.What, reading.Place with { Piece = null, Cylinder = piece.Cylinder })),
        ];
        _heightOf = Heights(job, standing, stage);
    }

    /// <summary>The place in the word its cylinder was begun in: a deck and a protrusion of one cylinder and stage are refused together.</summary>
    public RoundPlace AsBegun(RoundPlace place) =>
        place is { What: What.Deck or What.PistonProtrusion, Place.Cylinder: { } cylinder } && _heightOf.TryGetValue(cylinder, out What begun)
            ? place with { What = begun }
            : place;

    /// <summary>Whether a place was read; the place of a crown fill also where the crown was read straight.</summary>
    public bool Has(RoundPlace place) =>
        Stands(place.What, place.Place) || (place.What == What.CrownFill && Stands(What.Crown, place.Place));

    private bool Stands(What what, Place place)
    {
        if (_read.Contains((what, place)))
        {
            return true;
        }

        // Read without a cylinder it is of them all; what they share is read when it was read at each of them.
        return place.Cylinder is not null
            ? _read.Contains((what, place with { Cylinder = null }))
            : what != What.Flatness && Sharing(place).All(cylinder => _read.Contains((what, place with { Cylinder = cylinder, Head = null })));
    }

    private EquatableList<string> Sharing(Place place) => place.Head is { } head ? _cylindersOfHead[head] : _engine.Labels;

    private Place Unnamed(Reading reading)
    {
        // Of flatness the head and the block are two faces, named even where there is one of each.
        if (reading.What == What.Flatness)
        {
            return reading.Place;
        }

        return reading.Place with
        {
            Head = _engine.Heads.Count == 1 || reading.Place.Cylinder is not null ? null : reading.Place.Head,
            Bank = _engine.Banks.Count == 1 ? null : reading.Place.Bank,
        };
    }

    private static ILookup<string, (string Cylinder, Stage Since)> Fitted(Job job, Stage stage)
    {
        EngineParts parts = new(job, stage);
        return job.Engine.Labels
            .Select((label, index) => (Label: label, Piston: parts.Piston(index, stage)))
            .Where(cylinder => cylinder.Piston?.Piece is not null)
            .ToLookup(cylinder => cylinder.Piston!.Piece!, cylinder => (cylinder.Label, cylinder.Piston!.Since));
    }

    private static Dictionary<string, What> Heights(Job job, IEnumerable<Reading> standing, Stage stage)
    {
        Dictionary<string, What> heightOf = [];
        IEnumerable<(What What, Place Place)> begun = standing.Where(reading => reading.Stage == stage).Select(reading => (reading.What, reading.Place))
            .Concat(job.Given.Concat(job.Assumed).Where(figure => figure.Stage == stage).Select(figure => (figure.What, figure.Place)));
        foreach ((What what, Place place) in begun.Where(entry => entry.What is What.Deck or What.PistonProtrusion))
        {
            foreach (string cylinder in place.Cylinder is { } one ? [one] : job.Engine.Labels)
            {
                heightOf.TryAdd(cylinder, what);
            }
        }

        return heightOf;
    }
}
