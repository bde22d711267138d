using System.CommandLine;
using System.Text;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>gauge</c>: the shop's gauges. A job copies the one it uses when the first reading names it.</summary>
public static class GaugeCommand
{
    private const string Example = """
        Example:
          rebuild gauge "bore gauge 2" --kind "bore gauge" --resolution "0.001 mm" --limit "0.002 mm" --set-with "micrometer 4"

        Without a name the shop's gauges are listed. A gauge written again takes the place of the old one in new jobs; jobs that used
        the old one keep it.
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Argument<string?> name = new("name") { Description = "What the shop calls it.", Arity = ArgumentArity.ZeroOrOne };
        EntryField[] fields =
        [
            new("id", name, (parsed, body) => body.WriteString("id", parsed.GetValue(name)!)), EntryField.Text("kind", "--kind", "bore gauge, micrometer, dial gauge, burette, …", "words"),
            EntryField.Text("resolution", "--resolution", "The least step that can be read.", "figure"),
            EntryField.Text("limitOfError", "--limit", "How far it may be off, either way.", "figure"),
            EntryField.Text("setWith", "--set-with", "The gauge it is set with.", "name"), EntryField.Text("calibrated", "--calibrated", "The day of calibration.", "date"),
            EntryField.Text("glass", "--glass", "A burette's: borosilicate or soda-lime.", "glass"),
            EntryField.Text("repeatability", "--repeatability", "One standard deviation of repeats.", "figure"),
            EntryField.Number("repeatabilityReadings", "--repeatability-readings", "From how many readings.", "n"),
        ];
        Option<string> by = new("--by") { Description = "Who writes this.", HelpName = "name" };
        StoreOption storeOption = new();
        ExampleCommand command = new("gauge", "Adds a gauge to the shop's, or lists them.", Example) { by };
        EntryField.AddTo(command, fields);
        storeOption.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = storeOption.Open(parsed, terminal);
            if (parsed.GetValue(name) is not { } id)
            {
                foreach ((string _, string known) in store.Gauges())
                {
                    terminal.Output.WriteLine(EntryLine.Said(known));
                }

                return ExitCode.Done;
            }

            string body = EntryField.Body(fields, parsed);
            if (!IsRight(id, body, store, terminal))
            {
                return ExitCode.Wrong;
            }

            store.AddGauge(id, new Entry(WriteOptions.NewKey(terminal), EntryKind.Gauge, body, terminal.Now(), parsed.GetValue(by)));
            terminal.Output.WriteLine(EntryLine.Said(body));
            return ExitCode.Done;
        });
        return command;
    }

    /// <summary>The shop's gauge of a name with the gauges it is set with, those first, as bodies; empty where it is not the shop's.</summary>
    internal static IReadOnlyList<string> WithSetters(JobStore store, string name)
    {
        Dictionary<string, string> shop = store.Gauges().ToDictionary(gauge => gauge.Name, gauge => gauge.Body);
        List<string> chain = [];
        HashSet<string> seen = [];
        for (string? next = name; next is not null && seen.Add(next) && shop.TryGetValue(next, out string? body);)
        {
            chain.Insert(0, body);
            next = JsonText.Field(body, "setWith");
        }

        return chain;
    }

    // The job file's reader is the judge: a job of nothing but the shop's gauges, this one among them.
    private static bool IsRight(string id, string body, JobStore store, Terminal terminal)
    {
        string all = string.Join(",", store.Gauges().Where(known => known.Name != id).Select(known => known.Body).Append(body));
        (Job? job, IReadOnlyList<Fault> faults) = JobFileReader.Read(Encoding.UTF8.GetBytes(
            $$"""{"format":"rebuild-planner-job","version":1,"job":{"number":"gauges"},"engine":{"cylinders":1},"gauges":[{{all}}]}"""));
        foreach (Fault fault in faults)
        {
            terminal.Error.WriteLine($"gauge {id}: {fault.Path[(fault.Path.IndexOf(']', StringComparison.Ordinal) + 1)..].TrimStart('.')}: {fault.Message}");
        }

        return job is not null;
    }
}
