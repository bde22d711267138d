namespace RebuildPlanner.Core.JobFile;

/// <summary>The faults found so far, by whoever found them first, given back in the order of the file.</summary>
/// <remarks>References are checked after everything is read, so the order of finding is not the order a person mends in.</remarks>
internal sealed class FaultList
{
    private readonly List<(int Offset, Fault Fault)> _faults = [];

    public int Count => _faults.Count;

    /// <summary>Something wrong with a value that stands there.</summary>
    public void Add(JsonTree node, string message) => Add(node.Spot, node.Path, node.Shown, message);

    /// <summary>Something missing from an object: the place is that of the field that should be there.</summary>
    public void Missing(JsonTree owner, string field, string message) => Add(owner.Spot, owner.PathOf(field), null, message);

    public void Add(JsonSpot spot, string path, string? value, string message) =>
        _faults.Add((spot.Offset, new Fault(spot.Line, path, value, message)));

    public IReadOnlyList<Fault> InFileOrder() => [.. _faults.OrderBy(found => found.Offset).Select(found => found.Fault)];
}
