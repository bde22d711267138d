namespace RebuildPlanner.Cli.Tests;

/// <summary>Runs a command in process and keeps what it wrote.</summary>
internal sealed record Screen(int ExitCode, string Output, string Error)
{
    public static DateTimeOffset Now { get; } = new(2026, 12, 1, 9, 30, 0, TimeZoneInfo.Local.GetUtcOffset(new DateTime(2026, 12, 1)));

    public static Screen Of(params string[] args) => At(dataFolder: null, args);

    /// <summary>Runs a command for a user whose data folder this is.</summary>
    public static Screen At(string? dataFolder, params string[] args) => Typed(dataFolder, [], args);

    /// <summary>Runs a command with someone typing at it.</summary>
    public static Screen Typed(string? dataFolder, string[] lines, params string[] args)
    {
        using StringWriter output = new() { NewLine = "\n" }, error = new() { NewLine = "\n" };
        using StringReader input = new(string.Join('\n', lines));
        int code = Shell.Run(args, new Terminal(output, error, Terminal.UsualWidthColumns, IsScreen: false, () => Now, dataFolder) { Input = () => input });
        return new Screen(code, output.ToString().ReplaceLineEndings("\n"), error.ToString().ReplaceLineEndings("\n"));
    }

    /// <summary>Writes a job file, runs a command on it and removes it.</summary>
    public static Screen OfFile(string json, params string[] options)
    {
        string path = Path.Combine(Path.GetTempPath(), $"job-{Guid.NewGuid():N}.json");
        File.WriteAllText(path, json);
        try
        {
            Screen screen = Of(["results", "--file", path, .. options]);
            return screen with { Error = screen.Error.Replace(path, "job.json", StringComparison.Ordinal) };
        }
        finally
        {
            File.Delete(path);
        }
    }
}
