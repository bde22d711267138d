using System.CommandLine;
using System.Globalization;
using System.Text.Json;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Store;

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
        Argument<string> number = new("job") { Description = "The job's number." };
        Argument<string?> what = new("what") { Description = "Of one thing only, such as chamber.", Arity = ArgumentArity.ZeroOrOne };
        Option<string> cylinder = new("--cylinder") { Description = "Of one cylinder only.", HelpName = "label" };
        StoreOption storeOption = new();
        ExampleCommand command = new("history", "Shows everything ever written into a job, struck or not.", Example) { number, what, cylinder };
        storeOption.AddTo(command);
        command.SetAction(parsed =>
        {
            if (parsed.GetValue(what) is { } word && WhatTable.Find(word) is null)
            {
                string? near = Core.Quantities.NearestWord.Of(word, [.. WhatTable.Lines.Select(line => line.Word)]);
                terminal.Error.WriteLine($"{word}: there is no such thing{(near is null ? "." : $"; did you mean {near}?")}");
                return ExitCode.Wrong;
            }

            using JobStore store = storeOption.Open(parsed, terminal);
            if (JobSource.Find(store, parsed.GetValue(number)!, terminal) is not { } entries)
            {
                return ExitCode.Wrong;
            }

            Dictionary<string, string> struck = JobVerbs.Struck(entries);
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

        using JsonDocument body = JsonDocument.Parse(entry.Body);
        if (body.RootElement.ValueKind != JsonValueKind.Object)
        {
            return false;
        }

        // A strike is about what it strikes.
        if (entry.Kind == EntryKind.Strike)
        {
            string key = body.RootElement.GetProperty("entry").GetString()!;
            return entries.FirstOrDefault(other => other.Key == key && other.Kind != EntryKind.Strike) is { } other && IsAbout(other, entries, what, cylinder);
        }

        return Is("what", what) && Is("cylinder", cylinder);

        bool Is(string field, string? wanted) => wanted is null || (body.RootElement.TryGetProperty(field, out JsonElement value) && value.ValueKind == JsonValueKind.String && value.GetString() == wanted);
    }
}
