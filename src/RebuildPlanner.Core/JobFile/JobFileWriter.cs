using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Writes a job as a portable job file.</summary>
public static class JobFileWriter
{
    /// <summary>The job file's text: indented UTF-8 JSON that reads back as the same job.</summary>
    public static byte[] Write(Job job) => throw new NotImplementedException();
}
