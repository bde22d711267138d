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
        _read = [];
        _heightOf = [];
        List<(string Piece, string Cylinder, Stage Since)> fitted = Fitted(job, stage);
        foreach (Reading reading in job.Readings)
        {
            if (reading.Struck is null)
            {
                Take(reading, stage, fitted);
            }
        }

        foreach (StatedFigure figure in job.Given.Concat(job.Assumed))
        {
            if (figure.Stage == stage)
            {
                TakeHeight(figure.What, figure.Place);
            }
        }
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

    private void Take(Reading reading, Stage stage, List<(string Piece, string Cylinder, Stage Since)> fitted)
    {
        if (reading.Stage == stage)
        {
            TakeHeight(reading.What, reading.Place);
        }

        if (reading.Place.Piece is null)
        {
            if (reading.Stage == stage)
            {
                _read.Add((reading.What, Unnamed(reading)));
            }

            return;
        }

        // A piece is measured on the bench; in the engine it counts from the stage it was fitted at, or read at if that was later.
        foreach ((string piece, string cylinder, Stage since) in fitted)
        {
            if (piece == reading.Place.Piece && (reading.Stage > since ? reading.Stage : since) == stage)
            {
                _read.Add((reading.What, reading.Place with { Piece = null, Cylinder = cylinder }));
            }
        }
    }

    // The first word a cylinder was begun in stands.
    private void TakeHeight(What what, Place place)
    {
        if (what is What.Deck or What.PistonProtrusion)
        {
            foreach (string cylinder in place.Cylinder is { } one ? [one] : _engine.Labels)
            {
                _heightOf.TryAdd(cylinder, what);
            }
        }
    }

    private static List<(string Piece, string Cylinder, Stage Since)> Fitted(Job job, Stage stage)
    {
        EngineParts parts = new(job, stage);
        List<(string, string, Stage)> fitted = [];
        for (int cylinder = 0; cylinder < job.Engine.Labels.Count; cylinder++)
        {
            if (parts.Piston(cylinder, stage) is { Piece: { } piece } piston)
            {
                fitted.Add((piece, job.Engine.Labels[cylinder], piston.Since));
            }
        }

        return fitted;
    }
}
