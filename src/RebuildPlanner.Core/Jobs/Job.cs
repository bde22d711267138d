using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Something looked at with a result in words.</summary>
public sealed record Check(string What, string? Result = null, Stage? Stage = null, string? By = null, string? When = null);

/// <summary>One engine's job: what was asked, measured, given, fitted, cut and limited. The job file's content, whole.</summary>
public sealed record Job(
    string Number, Engine Engine, string? Opened = null, string? Title = null, string? Complaint = null, string? Asked = null,
    string? CustomerName = null, string? CustomerContact = null)
{
    /// <summary>The gauges used, by id.</summary>
    public EquatableList<Gauge> Gauges { get; init; } = [];

    /// <summary>The readings, struck ones too.</summary>
    public EquatableList<Reading> Readings { get; init; } = [];

    /// <summary>Figures given.</summary>
    public EquatableList<StatedFigure> Given { get; init; } = [];

    /// <summary>Figures assumed.</summary>
    public EquatableList<StatedFigure> Assumed { get; init; } = [];

    /// <summary>Piston sets.</summary>
    public EquatableList<PistonSet> Pistons { get; init; } = [];

    /// <summary>Gaskets.</summary>
    public EquatableList<GasketChoice> Gaskets { get; init; } = [];

    /// <summary>What was fitted when.</summary>
    public EquatableList<Fitted> Fitted { get; init; } = [];

    /// <summary>Cuts planned and made.</summary>
    public EquatableList<Cut> Cuts { get; init; } = [];

    /// <summary>Limits.</summary>
    public EquatableList<Limit> Limits { get; init; } = [];

    /// <summary>Targets.</summary>
    public EquatableList<Limit> Targets { get; init; } = [];

    /// <summary>The shop's processes.</summary>
    public EquatableList<Process> Processes { get; init; } = [];

    /// <summary>Checks.</summary>
    public EquatableList<Check> Checks { get; init; } = [];

    /// <summary>Notes.</summary>
    public EquatableList<string> Notes { get; init; } = [];
}
