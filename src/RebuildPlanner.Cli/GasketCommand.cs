using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>gasket</c>: a head gasket, fitted or on offer.</summary>
public static class GasketCommand
{
    private const string Example = """
        Example:
          rebuild gasket 2026-041 G1.20 --opening "86.0 mm ± 0.1 mm" --thickness "1.20 mm ± 0.03 mm"
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) => EntryCommand.Make(
        "gasket", "Adds a head gasket, fitted or on offer.", Example, EntryKind.Gasket,
        [
            EntryField.Word("id", "id", "What it is called in the job."), EntryField.Text("opening", "--opening", "Its opening, a diameter or a traced area.", "figure"),
            EntryField.Text("thickness", "--thickness", "Its thickness, compressed.", "figure"), EntryField.Text("grade", "--grade", "Its grade.", "words"),
            EntryField.Text("protrusion", "--protrusion", "The piston protrusion it is for.", "figure"), EntryField.Number("price", "--price", "What it costs.", "price"),
            EntryField.Flag("onOffer", "--not-on-offer", "Not to be had for a plan.", value: false),
        ],
        terminal);
}
