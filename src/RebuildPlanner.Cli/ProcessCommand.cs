using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>process</c>: what the shop's machines hold, for one kind of cut.</summary>
public static class ProcessCommand
{
    private const string Example = """
        Examples:
          rebuild process 2026-041 "head skim" --tolerance "0.02 mm" --step "0.01 mm" --max "0.60 mm"
          rebuild process 2026-041 bore --tolerance "0.008 mm" --clean-up "0.06 mm" --hone-stock "0.10 mm"
        A process stands once a kind of cut; strike the old one before writing another.
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) => EntryCommand.Make(
        "process", "Writes down what a machine of the shop holds and may take off.", Example, EntryKind.Process,
        [
            EntryField.Word("what", "what", "\"head skim\", \"deck cut\", \"line bore\", bore, hone, sleeve or \"valve seat\"."),
            EntryField.Text("tolerance", "--tolerance", "How far a cut may end from where it was set, either way.", "figure"),
            EntryField.Text("step", "--step", "The machine's step.", "figure"),
            EntryField.Text("max", "--max", "The most it may take off on this job.", "figure"),
            EntryField.Text("cleanUp", "--clean-up", "What a bore needs to clean up.", "figure"),
            EntryField.Text("honeStock", "--hone-stock", "What is left to hone.", "figure"),
            EntryField.Text("offset", "--offset", "How far the bar may be set over.", "figure"),
        ],
        terminal);
}
