using System.CommandLine;
using System.Globalization;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Cli;

/// <summary><c>show</c>: a job as it stands.</summary>
public static class ShowCommand
{
    private const string Example = """
        Example:
          rebuild show 2026-041
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        ExampleCommand command = new("show", "Shows a job as it stands: whose, what was asked, what was read, fitted, cut, limited.", Example);
        StoredJob stored = new();
        stored.AddTo(command);
        command.SetAction(parsed =>
        {
            if (stored.Read(parsed, terminal) is not { } found)
            {
                return ExitCode.Wrong;
            }

            Show(found.Job, found.Entries, terminal.Output);
            return ExitCode.Done;
        });
        return command;
    }

    private static void Show(Job job, IReadOnlyList<Entry> entries, TextWriter output)
    {
        Line("job", job.Number + (JobFold.IsClosed(entries) ? ", closed" : ""));
        Line("title", job.Title);
        Line("customer", string.Join(", ", new[] { job.CustomerName, job.CustomerContact }.OfType<string>()));
        Line("engine", job.Engine.Description);
        Line("taken in", job.Opened);
        Line("complaint", job.Complaint);
        Line("asked for", job.Asked);
        Dictionary<string, string> struck = JobFold.Struck(entries);
        foreach (IGrouping<EntryKind, Entry> kind in entries
            .Where(entry => entry.Kind is not (EntryKind.Job or EntryKind.Customer or EntryKind.Engine or EntryKind.Strike or EntryKind.Closed or EntryKind.Reading) && !struck.ContainsKey(entry.Key))
            .GroupBy(entry => entry.Kind).OrderBy(kind => kind.Key))
        {
            foreach (Entry entry in kind)
            {
                Line(EntryWords.Kinds.WordFor(kind.Key), $"{EntryLine.Said(entry)}  [{entry.Key}]");
            }
        }

        foreach (IGrouping<Stage?, Reading> stage in job.Readings.Where(reading => reading.Struck is null).GroupBy(reading => reading.Stage).OrderBy(stage => stage.Key))
        {
            IEnumerable<string> things = stage.GroupBy(reading => reading.What).Select(thing => string.Create(CultureInfo.InvariantCulture, $"{WhatWords.Of(thing.Key)} {thing.Count()}"));
            Line("readings", $"{(stage.Key is { } at ? StageWords.Of(at) : "of no stage")}: {string.Join(", ", things)}");
        }

        int gone = job.Readings.Count(reading => reading.Struck is not null);
        Line("struck", gone == 0 ? null : string.Create(CultureInfo.InvariantCulture, $"{gone} readings"));
        int left = Round.Left(job, LastStage.Of(job)).Count(place => place.ForRatio);
        Line("left to read", left == 0 ? null : string.Create(CultureInfo.InvariantCulture, $"{left} places that ratio or gap rest on, at the stage {StageWords.Of(LastStage.Of(job))}"));

        void Line(string head, string? text)
        {
            if (!string.IsNullOrEmpty(text))
            {
                output.WriteLine($"{head,-13} {text}");
            }
        }
    }
}
