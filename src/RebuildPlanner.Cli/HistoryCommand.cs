using System.CommandLine;
using System.Globalization;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Cli;

/// <summary><c>history</c>: everything ever written into a job, or about one figure of it.</summary>
public static class HistoryCommand
{
    private const string Example = """
        Example:
          rebuild history 2026-041 chamber --cylinder 2
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Argument<string?> what = new("what") { Description = "Of one thing only, such as chamber.", Arity = ArgumentArity.ZeroOrOne };
        Option<string> cylinder = new("--cylinder") { Description = "Of one cylinder only.", HelpName = "label" };
        ExampleCommand command = new("history", "Shows everything ever written into a job, struck or not.", Example) { what, cylinder };
        StoredJob stored = new();
        stored.AddTo(command);
        command.SetAction(parsed =>
        {
            if (parsed.GetValue(what) is { } word && WhatTable.Find(word) is null)
            {
                string? near = Core.Quantities.NearestWord.Of(word, [.. WhatTable.Lines.Select(line => line.Word)]);
                terminal.Error.WriteLine($"{word}: there is no such thing{(near is null ? "." : $"; did you mean {near}?")}");
                return ExitCode.Wrong;
            }

            if (stored.Read(parsed, terminal) is not { Entries: { } entries })
            {
                return ExitCode.Wrong;
            }

            Dictionary<string, string> struck = JobFold.Struck(entries);
            foreach (Entry entry in entries.Where(entry => IsAbout(entry, entries, parsed.GetValue(what), parsed.GetValue(cylinder))))
            {
                string at = entry.At.LocalDateTime.ToString("yyyy-MM-dd HH:mm", CultureInfo.InvariantCulture);
                string by = entry.By is null ? "" : $" {entry.By}:";
                string gone = struck.TryGetValue(entry.Key, out string? reason) ? $"  STRUCK: {reason}" : "";
                terminal.Output.WriteLine($"{at}{by} {EntryLine.Of(entry)}{gone}");
            }

            return ExitCode.Done;
        });
        return command;
    }

    private static bool IsAbout(Entry entry, IReadOnlyList<Entry> entries, string? what, string? cylinder)
    {
        if (what is null && cylinder is null)
        {
            return true;
        }

        // A strike is about what it strikes.
        if (entry.Kind == EntryKind.Strike)
        {
            string? key = JsonText.Field(entry.Body, "entry");
            return entries.FirstOrDefault(other => other.Key == key && other.Kind != EntryKind.Strike) is { } other && IsAbout(other, entries, what, cylinder);
        }

        return (what is null || JsonText.Field(entry.Body, "what") == what) && (cylinder is null || JsonText.Field(entry.Body, "cylinder") == cylinder);
    }
}
