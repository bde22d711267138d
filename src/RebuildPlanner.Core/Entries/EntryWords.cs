using RebuildPlanner.Core.JobFile;

namespace RebuildPlanner.Core.Entries;

/// <summary>The words of entries, and where each kind stands in a job file.</summary>
public static class EntryWords
{
    /// <summary>Each kind's word.</summary>
    public static WordList<EntryKind> Kinds { get; } = new(Array.ConvertAll(Enum.GetValues<EntryKind>(), kind => (kind.ToString().ToLowerInvariant(), kind)));

    /// <summary>The lists of a job file in its order, each with the kind of its rows; those of parts stand one level deeper.</summary>
    internal static IReadOnlyList<(string List, EntryKind Kind)> Lists { get; } =
    [
        ("gauges", EntryKind.Gauge), ("readings", EntryKind.Reading), ("given", EntryKind.Given), ("assumed", EntryKind.Assumed),
        ("parts.pistons", EntryKind.Piston), ("parts.gaskets", EntryKind.Gasket), ("fitted", EntryKind.Fitted), ("cuts", EntryKind.Cut),
        ("limits", EntryKind.Limit), ("targets", EntryKind.Target), ("process", EntryKind.Process), ("checks", EntryKind.Check), ("notes", EntryKind.Note),
    ];

    /// <summary>The objects a job file has one of.</summary>
    internal static IReadOnlyList<(string Name, EntryKind Kind)> Singles { get; } =
        [("job", EntryKind.Job), ("customer", EntryKind.Customer), ("engine", EntryKind.Engine)];
}
