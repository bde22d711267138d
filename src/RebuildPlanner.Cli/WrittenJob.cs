using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Cli;

/// <summary>A job in the store: its entries, and the job they fold to, folded once and only where it is asked for.</summary>
/// <param name="number">Its number.</param>
/// <param name="entries">Its entries.</param>
/// <param name="job">The job where it is folded already, as when new entries were judged.</param>
internal sealed class WrittenJob(string number, IReadOnlyList<Entry> entries, Job? job)
{
    private Job? _job = job;

    /// <summary>The job's number.</summary>
    public string Number => number;

    /// <summary>Its entries.</summary>
    public IReadOnlyList<Entry> Entries => entries;

    /// <summary>The job.</summary>
    public Job Job => _job ??= JobSource.Folded(number, entries);
}
