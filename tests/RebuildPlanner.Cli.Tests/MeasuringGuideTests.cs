using System.Text.RegularExpressions;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Cli.Tests;

/// <summary>What docs/measuring.md shows was typed is typed again, and the screen must be the same.</summary>
public sealed partial class MeasuringGuideTests : IDisposable
{
    private readonly Scratch _scratch = new();

    public void Dispose() => _scratch.Dispose();

    /// <summary>Types the lines, and shows them on the screen as a terminal does.</summary>
    private sealed class Keyboard(Queue<string> lines, TextWriter screen) : TextReader
    {
        public override string? ReadLine()
        {
            if (!lines.TryDequeue(out string? line))
            {
                return null;
            }

            screen.WriteLine(line);
            return line;
        }
    }

    [Fact]
    public void The_recorded_round_runs_as_it_was_recorded()
    {
        string recorded = Recorded().Match(RepositoryFiles.Text("docs", "measuring.md")).Groups[1].Value;
        Queue<string> typed = new(recorded.Split('\n').Select(line => Prompt().Match(line)).Where(prompt => prompt.Success).Select(prompt => prompt.Groups[1].Value));
        Assert.Equal(51, typed.Count);
        Screen.At(_scratch["data"], "start", "2026-080", "--from", "inline-four-overhead-cam", "--customer", "Low Fen Drainage");
        using StringWriter screen = new() { NewLine = "\n" };
        Keyboard keyboard = new(typed, screen);
        Terminal terminal = new(screen, screen, Terminal.UsualWidthColumns, IsScreen: false, () => Screen.Now, _scratch["data"]) { Input = () => keyboard };

        int code = Shell.Run(["measure", "2026-080", "--stage", "as received"], terminal);

        Assert.Equal(0, code);
        Assert.Equal(TrimEnds(recorded), TrimEnds(screen.ToString()));
    }

    private static string TrimEnds(string text) => string.Join('\n', text.ReplaceLineEndings("\n").Split('\n').Select(line => line.TrimEnd())).TrimEnd();

    [GeneratedRegex(@"```text\n([^`]*)```")]
    private static partial Regex Recorded();

    [GeneratedRegex(@"^(?:Gauge for [^)]*\):|\[\d+ left\] [^:]*\):|  .* why it was wrong:) ?(.*)$")]
    private static partial Regex Prompt();
}
