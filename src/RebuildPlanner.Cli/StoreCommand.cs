using System.CommandLine;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>store</c>: looks after the store as a whole.</summary>
public static class StoreCommand
{
    private const string Example = """
        Example:
          rebuild store check
          rebuild store backup jobs-2026-12-01.db
          rebuild store restore jobs-2026-12-01.db
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        ExampleCommand command = new("store", "Checks, backs up or restores the store.", Example) { Check(terminal), Backup(terminal), Restore(terminal) };
        return command;
    }

    private static ExampleCommand Check(Terminal terminal)
    {
        StoreOption storeOption = new();
        ExampleCommand command = new("check", "Reads the whole store and says what is wrong with it.", "");
        storeOption.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = storeOption.Open(parsed, terminal);
            IReadOnlyList<string> wrong = StoreCare.Check(store, out int jobs);
            foreach (string line in wrong)
            {
                terminal.Error.WriteLine(line);
            }

            if (wrong.Count > 0)
            {
                terminal.Error.WriteLine("Write nothing more to this store; restore the last backup, or have the faults mended.");
                return ExitCode.StoreFailed;
            }

            terminal.Output.WriteLine($"sound: {jobs} jobs");
            return ExitCode.Done;
        });
        return command;
    }

    private static ExampleCommand Backup(Terminal terminal)
    {
        Argument<string> to = new("file") { Description = "The new file." };
        StoreOption storeOption = new();
        ExampleCommand command = new("backup", "Copies the store into a new file, while others may be writing.", "") { to };
        storeOption.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = storeOption.Open(parsed, terminal);
            StoreCare.Backup(store, parsed.GetValue(to)!);
            terminal.Output.WriteLine(parsed.GetValue(to));
            return ExitCode.Done;
        });
        return command;
    }

    private static ExampleCommand Restore(Terminal terminal)
    {
        Argument<string> from = new("file") { Description = "The backup." };
        StoreOption storeOption = new();
        ExampleCommand command = new("restore", "Puts a backup in the store's place; what stood there is kept beside it.", "") { from };
        storeOption.AddTo(command);
        command.SetAction(parsed =>
        {
            string path = storeOption.Path(parsed, terminal);
            string? kept = StoreCare.Restore(parsed.GetValue(from)!, path, terminal.Now().ToLocalTime());
            terminal.Output.WriteLine(kept is null ? path : $"{path}; what stood there is {kept}");
            return ExitCode.Done;
        });
        return command;
    }
}
