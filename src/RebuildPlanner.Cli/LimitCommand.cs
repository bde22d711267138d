using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>limit</c>: what must not be passed.</summary>
public static class LimitCommand
{
    private const string Example = """
        Example:
          rebuild limit 2026-041 "piston to head" --min "0.90 mm" --level 0.99
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) =>
        EntryCommand.Make("limit", "Sets a limit: what must not be passed.", Example, EntryKind.Limit, Fields(), terminal);

    /// <summary>The fields of limits and targets.</summary>
    internal static EntryField[] Fields() =>
    [
        EntryField.Word("what", "what", "What it is of, such as \"compression ratio\"."),
        EntryField.Text("min", "--min", "The least allowed, with its unit.", "figure"), EntryField.Text("max", "--max", "The most allowed, with its unit.", "figure"),
        EntryField.Number("level", "--level", "The belief wanted, 0.5 to 1; else the trade's own.", "belief"), EntryField.Stage(),
        EntryField.Text("cylinder", "--cylinder", "Which cylinder; none named is all.", "label"), EntryField.Text("head", "--head", "Which head.", "label"),
        EntryField.Text("bank", "--bank", "Which bank.", "label"), EntryField.Text("valve", "--valve", "inlet or exhaust.", "valve"),
    ];
}
