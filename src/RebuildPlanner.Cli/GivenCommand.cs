using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>given</c>: a figure from maker or customer.</summary>
public static class GivenCommand
{
    private const string Example = """
        Example:
          rebuild given 2026-041 crown "4.2 cc ± 0.1 cc dish" --from maker
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) => EntryCommand.Make(
        "given", "Writes down a figure that maker or customer gives.", Example, EntryKind.Given,
        [.. Fields(), EntryField.Text("from", "--from", "Who gives it.", "who")], terminal);

    /// <summary>The fields of figures given and assumed.</summary>
    internal static EntryField[] Fields() =>
    [
        EntryField.Word("what", "what", "What it is of, such as crown."), EntryField.Word("value", "figure", "The figure with unit and limits, such as \"5.0 mm ± 0.5 mm\"."),
        .. EntryField.Place(), EntryField.Stage(), EntryField.Flag("common", "--common", "One part, the same for all its cylinders."),
    ];
}
