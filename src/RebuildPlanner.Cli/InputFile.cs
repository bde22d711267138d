using RebuildPlanner.Core.JobFile;

namespace RebuildPlanner.Cli;

/// <summary>Reads files, and says what is wrong where one cannot be read or is not what was wanted.</summary>
internal static class InputFile
{
    /// <summary>The file's bytes, or null after the reason has been written.</summary>
    public static byte[]? Read(string path, string wanted, TextWriter error)
    {
        try
        {
            return File.ReadAllBytes(path);
        }
        catch (Exception problem) when (IsOfFiles(problem))
        {
            string why = problem switch
            {
                FileNotFoundException or DirectoryNotFoundException => "there is no such file",
                UnauthorizedAccessException when Directory.Exists(path) => $"that is a folder; {wanted} is wanted",
                UnauthorizedAccessException => "it may not be read by this user",
                _ => problem.Message.TrimEnd('.'),
            };
            error.WriteLine($"{path}: {why}.");
            return null;
        }
    }

    /// <summary>Says every fault found in a file, and what came of it.</summary>
    public static void Say(string path, IReadOnlyList<Fault> faults, string outcome, TextWriter error)
    {
        foreach (Fault fault in faults)
        {
            Say($"{path}, line {fault.Line}", fault, error);
        }

        Count(faults.Count, outcome, error);
    }

    /// <summary>Says one fault: where, what stood there, what would be right.</summary>
    public static void Say(string where, Fault fault, TextWriter error)
    {
        string place = fault.Path.Length == 0 ? "" : $"{fault.Path}: ";
        string value = fault.Value is null ? "" : $"\"{fault.Value}\": ";
        error.WriteLine($"{where}: {place}{value}{fault.Message}");
    }

    /// <summary>Says how many faults there were, where there were any, and what came of them.</summary>
    public static void Count(int faults, string outcome, TextWriter error)
    {
        if (faults > 0)
        {
            error.WriteLine(faults == 1 ? $"1 fault; {outcome}." : $"{faults} faults; {outcome}.");
        }
    }

    /// <summary>Whether an exception says that a file cannot be used, rather than that the program is wrong.</summary>
    public static bool IsOfFiles(Exception problem) =>
        problem is IOException or UnauthorizedAccessException or NotSupportedException or ArgumentException;
}
