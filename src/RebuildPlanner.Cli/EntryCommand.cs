using System.CommandLine;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary>A command that writes one element of the job file into a job: its fields are the options, its rules the job file's own.</summary>
internal static class EntryCommand
{
    /// <summary>Makes the command.</summary>
    /// <param name="name">Its word.</param>
    /// <param name="description">What it does.</param>
    /// <param name="example">What the help ends with.</param>
    /// <param name="kind">What the entry says.</param>
    /// <param name="fields">The element's fields.</param>
    /// <param name="terminal">Where output goes.</param>
    /// <param name="body">The element, where it is not an object of its fields.</param>
    public static Command Make(
        string name, string description, string example, EntryKind kind, IReadOnlyList<EntryField> fields, Terminal terminal, Func<ParseResult, string>? body = null)
    {
        ExampleCommand command = new(name, description, example);
        EntryField.AddTo(command, fields);
        WriteOptions write = new();
        write.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = write.Open(parsed, terminal);
            Entry entry = write.Entry(kind, body?.Invoke(parsed) ?? EntryField.Body(fields, parsed), parsed, terminal);
            if (WriteOptions.Write(store, write.Number(parsed), [entry], name, terminal) is null)
            {
                return ExitCode.Wrong;
            }

            terminal.Output.WriteLine(EntryLine.Of(entry));
            return ExitCode.Done;
        });
        return command;
    }
}
