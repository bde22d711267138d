using System.CommandLine;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>close</c>: the engine has gone home; or has come back.</summary>
public static class CloseCommand
{
    private const string Example = """
        Example:
          rebuild close 2026-041
          rebuild close 2026-041 --again-open
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Option<bool> open = new("--again-open") { Description = "It has come back: the job is open again." };
        ExampleCommand command = new("close", "Closes a job: the engine has gone home.", Example) { open };
        WriteOptions write = new();
        write.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = write.Open(parsed, terminal);
            bool closed = !parsed.GetValue(open);
            string number = write.Number(parsed);
            WrittenJob? written = WriteOptions.Write(
                store, number,
                before => JobFold.IsClosed(before) == closed
                    ? ([], $"job {number} is {(closed ? "closed" : "open")} already")
                    : ([write.Entry(EntryKind.Closed, closed ? "true" : "false", parsed, terminal)], null),
                "close", terminal);
            if (written is null)
            {
                return ExitCode.Wrong;
            }

            terminal.Output.WriteLine($"job {number}: {(closed ? "closed" : "open")}");
            return ExitCode.Done;
        });
        return command;
    }
}
