namespace RebuildPlanner.Cli.Tests;

/// <summary>A folder of its own for a test, gone after it.</summary>
internal sealed class Scratch : IDisposable
{
    private readonly string _folder = Directory.CreateTempSubdirectory("rebuild-test-").FullName;

    /// <summary>A path in it.</summary>
    public string this[string name] => Path.Combine(_folder, name);

    /// <summary>Writes a file in it.</summary>
    public string Write(string name, string text)
    {
        File.WriteAllText(this[name], text);
        return this[name];
    }

    /// <summary>Everything in it.</summary>
    public string[] Names => [.. Directory.GetFileSystemEntries(_folder).Select(path => Path.GetFileName(path)!).Order(StringComparer.Ordinal)];

    public void Dispose() => Directory.Delete(_folder, recursive: true);
}
