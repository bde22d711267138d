using System.CommandLine;
using System.Security.Cryptography;
using System.Text;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>import</c>: a job file or a sheet into the store.</summary>
public static class ImportCommand
{
    private const string Example = """
        Example:
          rebuild import samples/van-four.json

        A job that is there already gets the readings whose id is new, and the gauges they name. What else differs is left as it is.
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Argument<string> file = new("file") { Description = "The job file, or a sheet with one inside." };
        Option<string> by = new("--by") { Description = "Who writes this.", HelpName = "name" };
        StoreOption storeOption = new();
        ExampleCommand command = new("import", "Takes a job file into the store.", Example) { file, by };
        storeOption.AddTo(command);
        command.SetAction(parsed =>
        {
            string path = parsed.GetValue(file)!;
            if (JobInput.Read(path, terminal.Error) is not { } job)
            {
                return ExitCode.Wrong;
            }

            Entry[] entries = [.. Keyed(job).Select(entry => new Entry(entry.Key, entry.Kind, entry.Body, terminal.Now(), parsed.GetValue(by)))];
            using JobStore store = storeOption.Open(parsed, terminal);
            if (store.Start(entries))
            {
                terminal.Output.WriteLine($"job {job.Number}: taken in, {entries.Length} entries");
                return ExitCode.Done;
            }

            return Merge(store, job, entries, path, terminal);
        });
        return command;
    }

    private static int Merge(JobStore store, Job job, Entry[] entries, string path, Terminal terminal)
    {
        int added = 0, left = 0;
        WrittenJob? written = WriteOptions.Write(
            store, job.Number,
            before =>
            {
                Job there = JobSource.Folded(job.Number, before);
                if (Refusal(there, job) is { } refusal)
                {
                    return ([], refusal);
                }

                HashSet<string> known = [.. there.Readings.Select(reading => reading.Id).OfType<string>()];
                HashSet<string> gauges = [.. there.Gauges.Select(gauge => gauge.Id)], named = [];
                string[] fresh = [.. job.Readings.Where(reading => reading.Id is { } id && !known.Contains(id)).Select(reading => reading.Id!)];
                foreach (Reading reading in job.Readings.Where(reading => fresh.Contains(reading.Id)))
                {
                    AddWithSetter(job, reading.Gauge, named);
                }

                Entry[] readings = [.. Pairs(job.Readings, EntryKind.Reading).Where(pair => fresh.Contains(pair.Item.Id)).Select(pair => pair.Entry)];
                Entry[] news = [.. Pairs(job.Gauges, EntryKind.Gauge).Where(pair => named.Contains(pair.Item.Id) && !gauges.Contains(pair.Item.Id)).Select(pair => pair.Entry), .. readings];
                HashSet<(EntryKind, string)> bodies = [.. before.Select(entry => (entry.Kind, entry.Body))];
                (added, left) = (news.Length, entries.Count(entry => !bodies.Contains((entry.Kind, entry.Body)) && !news.Contains(entry)));
                return (news, null);
            },
            path, terminal);
        if (written is null)
        {
            return ExitCode.Wrong;
        }

        terminal.Output.WriteLine($"job {job.Number}: was there already; {added} entries added{(left > 0 ? $", {left} that differ left as they are in the store" : "")}");
        return ExitCode.Done;

        IEnumerable<(T Item, Entry Entry)> Pairs<T>(EquatableList<T> items, EntryKind kind) => items.Zip(entries.Where(entry => entry.Kind == kind));
    }

    private static string? Refusal(Job there, Job job)
    {
        Dictionary<string, Reading> known = there.Readings.Where(reading => reading.Id is not null).ToDictionary(reading => reading.Id!);
        if (job.Readings.Any(reading => reading.Id is null) && !job.Equals(there))
        {
            return $"job {job.Number} is in the store already, and readings without an id cannot be told from those that are there; give them ids, or the job another number";
        }

        // What was struck in the store since is no change of the reading.
        Reading? changed = job.Readings.FirstOrDefault(reading =>
            reading.Id is { } id && known.TryGetValue(id, out Reading? old) && old with { Struck = null } != reading with { Struck = null });
        if (changed is not null)
        {
            return $"reading {changed.Id} is in the store already and says something else; strike the wrong one and give the right one an id of its own";
        }

        Gauge? gauge = job.Gauges.FirstOrDefault(gauge => there.Gauges.Any(old => old.Id == gauge.Id && old != gauge));
        return gauge is null ? null : $"gauge {gauge.Id} is in the job already and is another; give it another id";
    }

    private static void AddWithSetter(Job job, string? id, HashSet<string> named)
    {
        while (id is not null && named.Add(id))
        {
            id = job.Gauges.FirstOrDefault(gauge => gauge.Id == id)?.SetWith;
        }
    }

    /// <summary>Each entry with a key that the same file gives it again: the job's number, and what it says, told from its equals by their count.</summary>
    private static IEnumerable<(string Key, EntryKind Kind, string Body)> Keyed(Job job)
    {
        Dictionary<(EntryKind, string), int> equals = [];
        foreach ((EntryKind kind, string body) in JobEntries.Of(job))
        {
            int before = equals.GetValueOrDefault((kind, body));
            equals[(kind, body)] = before + 1;
            byte[] hash = SHA256.HashData(Encoding.UTF8.GetBytes($"{job.Number}\n{kind}\n{body}\n{before}"));
            yield return (Convert.ToHexStringLower(hash)[..32], kind, body);
        }
    }
}
