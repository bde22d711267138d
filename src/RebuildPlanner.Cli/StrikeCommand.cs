using System.CommandLine;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>strike</c>: takes an entry out of account, with a reason; it stays in the record.</summary>
public static class StrikeCommand
{
    private const string Example = """
        Example:
          rebuild strike 2026-041 0198f0c2 --reason "gauge slipped"

        The key stands behind each line of history; its first letters will do where they are the only ones.
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Argument<string> key = new("key") { Description = "The entry's key, or its first letters." };
        Option<string> reason = new("--reason") { Description = "Why.", HelpName = "words", Required = true };
        ExampleCommand command = new("strike", "Strikes an entry out, with a reason; it stays in the record.", Example) { key, reason };
        WriteOptions write = new();
        write.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = write.Open(parsed, terminal);
            string number = write.Number(parsed), start = parsed.GetValue(key)!;
            Entry? struck = null;
            WrittenJob? written = WriteOptions.Write(
                store, number,
                before =>
                {
                    Entry[] meant = [.. before.Where(entry => entry.Key == start)];
                    meant = meant.Length > 0 ? meant : [.. before.Where(entry => entry.Key.StartsWith(start, StringComparison.Ordinal))];
                    if (meant.Length != 1)
                    {
                        return ([], meant.Length == 0 ? $"no entry of job {number} begins with {start}" : $"{meant.Length} entries begin with {start}; write more of the key");
                    }

                    struck = meant[0];
                    return JobVerbs.Strike(before, struck.Key, parsed.GetValue(reason)!, out string? problem) is { } body
                        ? ([write.Entry(EntryKind.Strike, body, parsed, terminal)], null)
                        : ([], problem);
                },
                "strike", terminal);
            if (written is null)
            {
                return ExitCode.Wrong;
            }

            terminal.Output.WriteLine($"struck: {EntryLine.Of(struck!)}");
            return ExitCode.Done;
        });
        return command;
    }
}
