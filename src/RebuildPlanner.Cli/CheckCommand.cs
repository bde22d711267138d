using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>check</c>: something looked at, with a result in words.</summary>
public static class CheckCommand
{
    private const string Example = """
        Example:
          rebuild check 2026-041 "crack test, head" --result "none found" --stage "as received"
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) => EntryCommand.Make(
        "check", "Writes down something looked at, with its result in words.", Example, EntryKind.Check,
        [EntryField.Word("what", "what", "What was looked at."), EntryField.Text("result", "--result", "What was found.", "words"), EntryField.Stage()], terminal);
}
