using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Cli;

/// <summary>Where templates come from: the folder named, else the one in the data folder; what is in neither comes with the program.</summary>
/// <param name="named">The folder named on the command line, or null.</param>
/// <param name="terminal">Where faults go.</param>
internal sealed class TemplateFolder(string? named, Terminal terminal)
{
    /// <summary>Reads a template.</summary>
    /// <typeparam name="T">What it holds.</typeparam>
    /// <param name="utf8">Its bytes.</param>
    public delegate (T? Read, IReadOnlyList<Fault> Faults) Reader<T>(ReadOnlySpan<byte> utf8);

    /// <summary>What a template holds, or null after its faults have been written.</summary>
    public T? Read<T>(string name, Reader<T> reader)
        where T : class
    {
        if (named is not null && !Directory.Exists(named))
        {
            terminal.Error.WriteLine($"{named}: there is no such folder.");
            return null;
        }

        string? path = named ?? (terminal.DataFolder is { } data ? Path.Combine(data, "templates") : null);
        path = path is null ? null : Path.Combine(path, name);
        if (path is null || !File.Exists(path))
        {
            return reader(TemplateFiles.Read(name)).Read;
        }

        if (InputFile.Read(path, "a template", terminal.Error) is not { } bytes)
        {
            return null;
        }

        (T? read, IReadOnlyList<Fault> faults) = reader(bytes);
        InputFile.Say(path, faults, "nothing was printed", terminal.Error);
        return read;
    }
}
