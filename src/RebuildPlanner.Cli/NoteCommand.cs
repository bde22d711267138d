using System.CommandLine;
using System.Text.Json;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>note</c>: a line of words.</summary>
public static class NoteCommand
{
    private const string Example = """
        Example:
          rebuild note 2026-041 "Customer wants the old pistons back."
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Argument<string> text = new("text") { Description = "The note." };
        ExampleCommand command = new("note", "Writes a note into a job.", Example) { text };
        WriteOptions write = new();
        write.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = write.Open(parsed, terminal);
            Entry entry = write.Entry(EntryKind.Note, $"\"{JsonEncodedText.Encode(parsed.GetValue(text)!, System.Text.Encodings.Web.JavaScriptEncoder.UnsafeRelaxedJsonEscaping)}\"", parsed, terminal);
            if (WriteOptions.Write(store, write.Number(parsed), [entry], "note", terminal) is null)
            {
                return ExitCode.Wrong;
            }

            terminal.Output.WriteLine(EntryLine.Of(entry));
            return ExitCode.Done;
        });
        return command;
    }
}
