using System.Text;
using Spectre.Console;

namespace RebuildPlanner.Cli;

/// <summary>Where output goes: a screen, a pipe or a test.</summary>
/// <param name="Output">Standard output.</param>
/// <param name="Error">Standard error.</param>
/// <param name="WidthColumns">How wide the output is, columns.</param>
/// <param name="IsScreen">True on a real terminal, where weight and colour mean something.</param>
/// <param name="Now">The time it is; told in the place's own hours only where it is shown, since the system's table of them is slow to read.</param>
/// <param name="DataFolder">Where the user's own templates and jobs are kept, or null for nowhere.</param>
public sealed record Terminal(TextWriter Output, TextWriter Error, int WidthColumns, bool IsScreen, Func<DateTimeOffset> Now, string? DataFolder)
{
    /// <summary>The day it is.</summary>
    public DateOnly Today => DateOnly.FromDateTime(Now().LocalDateTime);

    /// <summary>Standard input, opened when a command first reads of it, which few do.</summary>
    public Func<TextReader> Input { get; init; } = () => TextReader.Null;

    // Set, it moves the data folder; else it is where the system keeps what programs keep for a user.
    private const string DataFolderVariable = "REBUILD_PLANNER_DATA", DataFolderName = "rebuild-planner";

    /// <summary>What a pipe and a narrow mind agree on.</summary>
    public const int UsualWidthColumns = 80;

    /// <summary>The process's own console.</summary>
    public static Terminal OfConsole()
    {
        Console.OutputEncoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false);
        bool screen = !Console.IsOutputRedirected;
        return new Terminal(
            Console.Out, Console.Error, screen ? Math.Max(40, Console.WindowWidth) : UsualWidthColumns, screen,
            () => DateTimeOffset.UtcNow, OwnDataFolder())
        {
            Input = () => Console.In,
        };
    }

    private static string? OwnDataFolder()
    {
        if (Environment.GetEnvironmentVariable(DataFolderVariable) is { Length: > 0 } named)
        {
            return named;
        }

        string system = Environment.GetFolderPath(Environment.SpecialFolder.LocalApplicationData);
        return system.Length == 0 ? null : Path.Combine(system, DataFolderName);
    }

    /// <summary>The output as a console for tables; made when a command draws one, since it is slow to start.</summary>
    public IAnsiConsole Draw()
    {
        IAnsiConsole console = AnsiConsole.Create(new AnsiConsoleSettings
        {
            Ansi = IsScreen ? AnsiSupport.Detect : AnsiSupport.No,
            ColorSystem = ColorSystemSupport.NoColors,
            Interactive = InteractionSupport.No,
            Out = new AnsiConsoleOutput(Output),
        });
        console.Profile.Width = WidthColumns;
        return console;
    }
}
