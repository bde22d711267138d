using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Cli;

/// <summary>A job just written to: its entries, and the job they fold to, which was folded when they were judged.</summary>
/// <param name="number">Its number.</param>
/// <param name="entries">Its entries with the new ones.</param>
/// <param name="job">The job, or null where nothing new had to be judged.</param>
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
