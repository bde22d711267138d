using System.Text;

namespace RebuildPlanner.Cli;

/// <summary>Writes a file whole or not at all: beside its place first, then put there in one step.</summary>
internal static class OutputFile
{
    /// <summary>Writes the file; false after the reason has been written.</summary>
    /// <param name="path">Where to.</param>
    /// <param name="content">Its bytes.</param>
    /// <param name="kind">What a file of the kind begins with: another kind is not overwritten, since the name is then a slip.</param>
    /// <param name="error">Where the reason goes.</param>
    public static bool Write(string path, byte[] content, ReadOnlySpan<byte> kind, TextWriter error)
    {
        string? beside = null;
        try
        {
            string full = Path.GetFullPath(path);
            if (File.Exists(full) && !StartsWith(full, kind))
            {
                error.WriteLine($"{path}: there is a file of another kind here already; it was left as it is. Name another file.");
                return false;
            }

            beside = $"{full}.{Environment.ProcessId}.part";
            File.WriteAllBytes(beside, content);
            File.Move(beside, full, overwrite: true);
            return true;
        }
        catch (Exception problem) when (InputFile.IsOfFiles(problem))
        {
            string why = problem switch
            {
                DirectoryNotFoundException => "there is no such folder",
                UnauthorizedAccessException when Directory.Exists(path) => "that is a folder; a file is wanted",
                UnauthorizedAccessException => "this user may not write there",
                _ => problem.Message.TrimEnd('.'),
            };
            error.WriteLine($"{path}: {why}. Nothing was written.");
            Discard(beside);
            return false;
        }
    }

    /// <summary>Writes the file and says its path; false after the reason has been written.</summary>
    public static bool WriteAndSay(string path, byte[] content, ReadOnlySpan<byte> kind, Terminal terminal)
    {
        if (!Write(path, content, kind, terminal.Error))
        {
            return false;
        }

        terminal.Output.WriteLine(path);
        return true;
    }

    /// <summary>Writes text into the file, or prints it where none is named.</summary>
    public static bool WriteOrPrint(string text, string? path, ReadOnlySpan<byte> kind, Terminal terminal)
    {
        if (path is not null)
        {
            return WriteAndSay(path, Encoding.UTF8.GetBytes(text), kind, terminal);
        }

        terminal.Output.Write(text);
        return true;
    }

    private static bool StartsWith(string path, ReadOnlySpan<byte> kind)
    {
        using FileStream stream = File.OpenRead(path);
        byte[] start = new byte[kind.Length];
        int read = stream.ReadAtLeast(start, start.Length, throwOnEndOfStream: false);
        return stream.Length == 0 || start.AsSpan(0, read).SequenceEqual(kind);
    }

    private static void Discard(string? beside)
    {
        try
        {
            if (beside is not null)
            {
                File.Delete(beside);
            }
        }
        catch (Exception problem) when (InputFile.IsOfFiles(problem))
        {
            // What could not be written can often not be deleted either; the reason has been said.
        }
    }
}
