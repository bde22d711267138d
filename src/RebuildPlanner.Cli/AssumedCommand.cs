using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>assumed</c>: a figure nobody has measured or given.</summary>
public static class AssumedCommand
{
    private const string Example = """
        Example:
          rebuild assumed 2026-041 "top land height" "5.0 mm ± 0.5 mm"
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) => EntryCommand.Make(
        "assumed", "Writes down a figure that is assumed until it is measured.", Example, EntryKind.Assumed, GivenCommand.Fields(), terminal);
}
