using System.CommandLine;
using RebuildPlanner.Core.Entries;

namespace RebuildPlanner.Cli;

/// <summary><c>target</c>: what is wanted.</summary>
public static class TargetCommand
{
    private const string Example = """
        Example:
          rebuild target 2026-041 "compression ratio" --min 9.8 --max 10.2
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal) =>
        EntryCommand.Make("target", "Sets a target: what the customer wants.", Example, EntryKind.Target, LimitCommand.Fields(), terminal);
}
