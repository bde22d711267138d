using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Cli;

/// <summary>Opens a job file, or says what is wrong with it: file, line, place, value, what would be right.</summary>
internal static class JobInput
{
    /// <summary>The job, or null after the faults have been written.</summary>
    public static Job? Read(string path, TextWriter error)
    {
        byte[] utf8;
        try
        {
            utf8 = File.ReadAllBytes(path);
        }
        catch (Exception problem) when (problem is IOException or UnauthorizedAccessException or NotSupportedException or ArgumentException)
        {
            string why = problem switch
            {
                FileNotFoundException or DirectoryNotFoundException => "there is no such file",
                UnauthorizedAccessException when Directory.Exists(path) => "that is a folder; a job file is wanted",
                UnauthorizedAccessException => "it may not be read by this user",
                _ => problem.Message,
            };
            error.WriteLine($"{path}: {why}.");
            return null;
        }

        (Job? job, IReadOnlyList<Fault> faults) = JobFileReader.Read(utf8);
        foreach (Fault fault in faults)
        {
            string place = fault.Path.Length == 0 ? "" : $"{fault.Path}: ";
            string value = fault.Value is null ? "" : $"\"{fault.Value}\": ";
            error.WriteLine($"{path}, line {fault.Line}: {place}{value}{fault.Message}");
        }

        if (faults.Count > 0)
        {
            error.WriteLine(faults.Count == 1 ? "1 fault; nothing was computed." : $"{faults.Count} faults; nothing was computed.");
        }

        return job;
    }
}
