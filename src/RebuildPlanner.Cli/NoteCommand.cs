using System.CommandLine;
using RebuildPlanner.Core.Entries;

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
        EntryField text = EntryField.Word("text", "text", "The note.");
        return EntryCommand.Make(
            "note", "Writes a note into a job.", Example, EntryKind.Note, [text], terminal, parsed => JsonText.Quoted(parsed.GetValue((Argument<string>)text.Symbol)!));
    }
}
