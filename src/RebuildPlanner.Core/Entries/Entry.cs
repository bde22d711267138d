namespace RebuildPlanner.Core.Entries;

/// <summary>What an entry says.</summary>
public enum EntryKind
{
    /// <summary>Number, date, title, complaint, what was asked; the last one counts.</summary>
    Job,

    /// <summary>The customer; the last one counts.</summary>
    Customer,

    /// <summary>The engine; the last one counts.</summary>
    Engine,

    /// <summary>A gauge, copied from the shop's so that an old sheet stays true.</summary>
    Gauge,

    /// <summary>A reading.</summary>
    Reading,

    /// <summary>A figure given.</summary>
    Given,

    /// <summary>A figure assumed.</summary>
    Assumed,

    /// <summary>A set of pistons.</summary>
    Piston,

    /// <summary>A gasket.</summary>
    Gasket,

    /// <summary>A part fitted.</summary>
    Fitted,

    /// <summary>A cut planned or made.</summary>
    Cut,

    /// <summary>A limit.</summary>
    Limit,

    /// <summary>A target.</summary>
    Target,

    /// <summary>A process of the shop.</summary>
    Process,

    /// <summary>Something looked at.</summary>
    Check,

    /// <summary>A note.</summary>
    Note,

    /// <summary>An earlier entry struck out, with the reason.</summary>
    Strike,

    /// <summary>The job closed, or opened again: true or false; the last one counts.</summary>
    Closed,

    /// <summary>A sheet issued: what, when, and what it was made from.</summary>
    Sheet,
}

/// <summary>One thing written down about a job: never changed, never taken out.</summary>
/// <param name="Key">Its own key: the same entry written twice is one entry.</param>
/// <param name="Kind">What it says.</param>
/// <param name="Body">The job file's own JSON element, in one line.</param>
/// <param name="At">When it was written.</param>
/// <param name="By">Who wrote it, or null.</param>
public sealed record Entry(string Key, EntryKind Kind, string Body, DateTimeOffset At, string? By = null);
