using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads a portable job file: a job, or every fault at once.</summary>
public static class JobFileReader
{
    /// <summary>Reads the UTF-8 text of a job file.</summary>
    /// <param name="utf8">The file's bytes.</param>
    /// <returns>The job with no faults, or no job and every fault in the order of the file.</returns>
    public static (Job? Job, IReadOnlyList<Fault> Faults) Read(ReadOnlySpan<byte> utf8) => throw new NotImplementedException();
}
