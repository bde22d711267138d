using System.CommandLine;
using System.Globalization;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Templates;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>start</c>: takes an engine in, from a blank job.</summary>
public static class StartCommand
{
    private const string Example = """
        Example:
          rebuild start 2026-071 --from single --customer "Low Fen Drainage" --complaint "smokes"
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Argument<string> number = new("job") { Description = "The job's number, new in the store." };
        Option<string> from = new("--from") { Description = "The blank job: its name, such as inline-six.", HelpName = "template", Required = true };
        from.CompletionSources.Add(_ => Blanks().Select(name => new System.CommandLine.Completions.CompletionItem(name)));
        (Option<string> Option, string Path)[] heads =
        [
            (Head("--title", "What the job is called."), "job.title"), (Head("--customer", "Whose engine it is."), "customer.name"),
            (Head("--contact", "How to reach them."), "customer.contact"), (Head("--engine", "The engine in words."), "engine.description"),
            (Head("--complaint", "What is wrong with it."), "job.complaint"), (Head("--asked", "What was asked for."), "job.asked"),
        ];
        Option<string> by = new("--by") { Description = "Who writes this.", HelpName = "name" }, templates = new("--templates") { Description = "Folder of the shop's own templates.", HelpName = "folder" };
        StoreOption storeOption = new();
        ExampleCommand command = new("start", "Starts a job from a blank one.", Example) { number, from, by, templates };
        Array.ForEach(heads, head => command.Options.Add(head.Option));
        storeOption.AddTo(command);
        command.SetAction(parsed =>
        {
            string name = parsed.GetValue(from)!, file = name.EndsWith(".json", StringComparison.Ordinal) ? name : name + ".json";
            if (!TemplateFiles.Names.Contains(file))
            {
                string? near = NearestWord.Of(name, [.. Blanks()]);
                terminal.Error.WriteLine($"--from {name}: there is no such blank job{(near is null ? "" : $"; did you mean {near}?")} There are {string.Join(", ", Blanks())}.");
                return ExitCode.Wrong;
            }

            if (new TemplateFolder(parsed.GetValue(templates), terminal).Read<Job>(file, JobFileReader.Read) is not { } blank)
            {
                return ExitCode.Wrong;
            }

            Job job = blank with { Number = parsed.GetValue(number)!, Opened = terminal.Today.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture) };
            List<Entry> entries = [.. JobEntries.Of(job).Select(entry => New(entry.Kind, entry.Body))];
            foreach ((Option<string> option, string path) in heads)
            {
                if (parsed.GetValue(option) is { } value)
                {
                    (EntryKind kind, string body) = JobVerbs.Set(entries, path, JsonText.Quoted(value), out _)!.Value;
                    entries.RemoveAll(entry => entry.Kind == kind);
                    entries.Add(New(kind, body));
                }
            }

            (Job? started, IReadOnlyList<Fault> faults) = JobFold.Of(entries);
            InputFile.Say($"job {job.Number}", faults, "nothing was started", terminal.Error);
            if (started is null)
            {
                return ExitCode.Wrong;
            }

            using JobStore store = storeOption.Open(parsed, terminal);
            if (!store.Start(entries))
            {
                terminal.Error.WriteLine($"Job {job.Number} is in the store already; take another number, or add to that one.");
                return ExitCode.Wrong;
            }

            terminal.Output.WriteLine($"job {job.Number}: {started.Engine.Description}");
            return ExitCode.Done;

            Entry New(EntryKind kind, string body) => new(WriteOptions.NewKey(terminal), kind, body, terminal.Now(), parsed.GetValue(by));
        });
        return command;
    }

    private static IEnumerable<string> Blanks() =>
        TemplateFiles.Names.Where(name => name is not (TemplateFiles.Wording or TemplateFiles.Shop)).Select(Path.GetFileNameWithoutExtension).OfType<string>();

    private static Option<string> Head(string name, string description) => new(name) { Description = description, HelpName = "words" };
}
