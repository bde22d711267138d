using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>cut</c>: metal that came off or is to come off.</summary>
public static class CutCommand
{
    private const string Example = """
        Example:
          rebuild cut 2026-041 "head skim" --value "0.20 mm ± 0.02 mm" --head head --stage "as machined"
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) => EntryCommand.Make(
        "cut", "Writes down a cut, planned or made.", Example, EntryKind.Cut,
        [
            EntryField.Word("what", "what", "\"head skim\", \"deck cut\", \"line bore\", bore, hone, sleeve or \"valve seat\"."),
            EntryField.Text("value", "--value", "What comes off, or the finished size of a bore.", "figure"),
            EntryField.Text("cylinder", "--cylinder", "Which cylinder; none named is all.", "label"), EntryField.Text("head", "--head", "Which head.", "label"),
            EntryField.Text("bank", "--bank", "Which bank.", "label"), EntryField.Text("valve", "--valve", "inlet or exhaust.", "valve"), EntryField.Stage(),
        ],
        terminal);
}
