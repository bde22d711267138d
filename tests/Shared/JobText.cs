using System.Text;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Tests.Shared;

/// <summary>Jobs out of the text of a job file.</summary>
internal static class JobText
{
    /// <summary>Reads a job that must be without fault.</summary>
    public static Job Read(string json)
    {
        (Job? job, IReadOnlyList<Fault> faults) = JobFileReader.Read(Encoding.UTF8.GetBytes(json));
        Assert.True(job is not null, string.Join("\n", faults));
        return job!;
    }
}
