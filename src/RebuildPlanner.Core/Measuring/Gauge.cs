using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Measuring;

/// <summary>A gauge and what is known of its errors.</summary>
/// <param name="Id">Its name in the job.</param>
/// <param name="Kind">Bore gauge, micrometer, burette, …; a burette reads twice a fill.</param>
/// <param name="Resolution">The smallest step that can be read.</param>
/// <param name="LimitOfError">How far it may be off, either way.</param>
/// <param name="SetWith">The gauge it was set with, whose error it shares.</param>
/// <param name="Glass">A burette's glass.</param>
/// <param name="Repeatability">One standard deviation of repeats, from the gauge's own study.</param>
/// <param name="RepeatabilityReadings">How many readings that study had, ≥ 2.</param>
/// <param name="Calibrated">Date of calibration, as written.</param>
public sealed record Gauge(
    string Id, string Kind, Quantity? Resolution = null, Quantity? LimitOfError = null, string? SetWith = null, Glass? Glass = null,
    Quantity? Repeatability = null, int? RepeatabilityReadings = null, string? Calibrated = null)
{
    /// <summary>Whether it reads a volume at start and end of a fill.</summary>
    public bool IsBurette => Kind == "burette";
}

/// <summary>The glass of a burette.</summary>
public enum Glass
{
    /// <summary>Borosilicate 3.3.</summary>
    Borosilicate,

    /// <summary>Soda-lime.</summary>
    SodaLime,
}
