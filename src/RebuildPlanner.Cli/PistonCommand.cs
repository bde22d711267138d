using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>piston</c>: a set of pistons, fitted or on offer.</summary>
public static class PistonCommand
{
    private const string Example = """
        Example:
          rebuild piston 2026-041 +0.50 --oversize "84.50 mm" --crown "4.2 cc ± 0.1 cc dish" --compression-height "31.0 mm ± 0.03 mm"
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) => EntryCommand.Make(
        "piston", "Adds a set of pistons, fitted or on offer.", Example, EntryKind.Piston,
        [
            EntryField.Word("id", "id", "What the set is called in the job."), EntryField.Text("oversizeBore", "--oversize", "The bore it is made for.", "figure"),
            EntryField.Text("crown", "--crown", "Its crown, with dish, dome or flat.", "figure"),
            EntryField.Text("compressionHeight", "--compression-height", "Pin to crown.", "figure"),
            EntryField.Text("wantedClearance", "--clearance", "Bore less skirt that it wants.", "figure"), EntryField.Text("skirt", "--skirt", "Its skirt.", "figure"),
            EntryField.Text("topLandHeight", "--top-land-height", "Down to the top ring.", "figure"),
            EntryField.Text("topLandDiameter", "--top-land-diameter", "Across the top land.", "figure"),
            EntryField.Texts("pieces", "--piece", "A piece measured one by one; the option before each.", "label"),
            EntryField.Flag("common", "--common", "All pieces alike: one doubt for all."), EntryField.Number("price", "--price", "What it costs.", "price"),
            EntryField.Flag("onOffer", "--not-on-offer", "Not to be had for a plan.", value: false),
        ],
        terminal);
}
