using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>fit</c>: which part is in the engine from a stage on.</summary>
public static class FitCommand
{
    private const string Example = """
        Example:
          rebuild fit 2026-041 --piston +0.50 --gasket G1.20 --stage "as machined"
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) => EntryCommand.Make(
        "fit", "Says which piston and gasket are in the engine from a stage on.", Example, EntryKind.Fitted,
        [
            EntryField.Stage(), EntryField.Text("piston", "--piston", "The piston set.", "id"), EntryField.Text("gasket", "--gasket", "The gasket.", "id"),
            EntryField.Text("cylinder", "--cylinder", "For one cylinder alone.", "label"), EntryField.Text("head", "--head", "For one head alone.", "label"),
            EntryField.Text("piece", "--piece", "Which piece of the set.", "label"),
        ],
        terminal);
}
