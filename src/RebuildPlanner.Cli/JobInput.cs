using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Pdf;

namespace RebuildPlanner.Cli;

/// <summary>Opens a job, from its file or from a sheet, or says what is wrong with it: file, line, place, value, what would be right.</summary>
internal static class JobInput
{
    /// <summary>The job, or null after the faults have been written.</summary>
    public static Job? Read(string path, TextWriter error)
    {
        if (InputFile.Read(path, "a job file", error) is not { } bytes)
        {
            return null;
        }

        // A sheet carries the job it was made from.
        if (bytes.AsSpan().StartsWith("%PDF-"u8))
        {
            if (AttachedFile.Read(bytes, BuildSheet.JobFileName) is not { } inside)
            {
                error.WriteLine($"{path}: this PDF has no job file inside; a sheet made by this program, or a job file, is wanted.");
                return null;
            }

            bytes = inside;
        }

        (Job? job, IReadOnlyList<Fault> faults) = JobFileReader.Read(bytes);
        InputFile.Say(path, faults, "nothing was computed", error);
        return job;
    }
}
