using System.Text;
using Spectre.Console;

namespace RebuildPlanner.Cli;

/// <summary>Where output goes: a screen, a pipe or a test.</summary>
/// <param name="Output">Standard output.</param>
/// <param name="Error">Standard error.</param>
/// <param name="WidthColumns">How wide the output is, columns.</param>
/// <param name="IsScreen">True on a real terminal, where weight and colour mean something.</param>
public sealed record Terminal(TextWriter Output, TextWriter Error, int WidthColumns, bool IsScreen)
{
    /// <summary>What a pipe and a narrow mind agree on.</summary>
    public const int UsualWidthColumns = 80;

    /// <summary>The process's own console.</summary>
    public static Terminal OfConsole()
    {
        Console.OutputEncoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false);
        bool screen = !Console.IsOutputRedirected;
        return new Terminal(Console.Out, Console.Error, screen ? Math.Max(40, Console.WindowWidth) : UsualWidthColumns, screen);
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
