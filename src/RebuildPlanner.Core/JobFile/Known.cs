using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>All that the readings, parts fitted, cuts and limits of a file may refer to.</summary>
internal sealed class Known
{
    private readonly Dictionary<string, Gauge> _gauges;
    private readonly Dictionary<string, string> _setOfPiece = [];
    private readonly Dictionary<string, string> _headOf;

    public Known(Engine? engine, IReadOnlyList<Gauge> gauges, IReadOnlyList<PistonSet> pistons, IReadOnlyList<GasketChoice> gaskets)
    {
        Cylinders = new("cylinder", Readable(engine?.Labels));
        Heads = new("head", Readable(engine?.Heads)?.Select(head => head.Label).ToArray());
        Banks = new("bank", Readable(engine?.Banks)?.Select(bank => bank.Label).ToArray());
        Gauges = new("gauge", [.. gauges.Select(gauge => gauge.Id)]);
        Pistons = new("piston", [.. pistons.Select(set => set.Id)]);
        Gaskets = new("gasket", [.. gaskets.Select(gasket => gasket.Id)]);
        Pieces = new("piece", [.. pistons.SelectMany(set => set.Pieces ?? [])]);
        _gauges = gauges.DistinctBy(gauge => gauge.Id).ToDictionary(gauge => gauge.Id);
        _headOf = (engine?.Heads ?? []).SelectMany(head => head.Cylinders.Select(cylinder => (cylinder, head.Label)))
            .DistinctBy(pair => pair.cylinder).ToDictionary(pair => pair.cylinder, pair => pair.Label);
        foreach (PistonSet set in pistons)
        {
            foreach (string piece in set.Pieces ?? [])
            {
                _setOfPiece.TryAdd(piece, set.Id);
            }
        }
    }

    public NameSet Cylinders { get; }

    public NameSet Heads { get; }

    public NameSet Banks { get; }

    public NameSet Gauges { get; }

    public NameSet Pistons { get; }

    public NameSet Gaskets { get; }

    public NameSet Pieces { get; }

    public Gauge? Gauge(string? id) => id is not null && _gauges.TryGetValue(id, out Gauge? gauge) ? gauge : null;

    public string? SetOfPiece(string? piece) => piece is not null && _setOfPiece.TryGetValue(piece, out string? set) ? set : null;

    public string? HeadOf(string? cylinder) => cylinder is not null && _headOf.TryGetValue(cylinder, out string? head) ? head : null;

    // An engine that could not be read has empty lists; nothing is called unknown on its account.
    private static EquatableList<T>? Readable<T>(EquatableList<T>? list) => list is { Count: > 0 } ? list : null;
}
