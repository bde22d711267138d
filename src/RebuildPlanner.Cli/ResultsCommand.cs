using System.CommandLine;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Cli;

/// <summary><c>results</c>: a job file in, volumes, ratios, gaps and verdicts out.</summary>
public static class ResultsCommand
{
    private const string Description = "Volumes, ratio and gaps of each cylinder, how sure they are, which limits hold.";

    private const string Example = """
        Example:
          rebuild results --file samples/van-four.json --stage "as machined"

        Exit codes:
          0  done
          1  done, and some verdict is outside
          2  the request or the file is wrong; what would be right is said
          3  the store could not be read or written; what to do is said
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        JobSource source = new();
        Option<Stage?> stage = JobOptions.Stage();
        Option<bool> json = new("--json") { Description = "As JSON: units cm3, mm, kPa and 1, full precision." };
        Option<bool> inch = new("--inch") { Description = "Print in inch, cubic inch and psi." };
        ExampleCommand command = new("results", Description, Example) { stage, json, inch };
        TrialRun trials = new();
        trials.AddTo(command);
        source.AddTo(command);
        command.SetAction(parsed =>
        {
            if (source.Read(parsed, terminal) is not var (job, name))
            {
                return ExitCode.Wrong;
            }

            return trials.Results(job, parsed.GetValue(stage) ?? LastStage.Of(job), parsed, terminal) is { } results
                ? Show(terminal, job, name, results, parsed.GetValue(json), parsed.GetValue(inch) ? UnitSystem.Inch : UnitSystem.Metric)
                : ExitCode.BrokenOff;
        });
        return command;
    }

    private static int Show(Terminal terminal, Job job, string name, Results results, bool asJson, UnitSystem system)
    {
        if (JobOptions.IsEmpty(name, results, terminal))
        {
            return ExitCode.Wrong;
        }

        if (asJson)
        {
            terminal.Output.Write(System.Text.Encoding.UTF8.GetString(ResultsJson.Write(results)));
        }
        else
        {
            ResultsScreen.Show(job, results, system, terminal);
        }

        return JobOptions.ExitCodeOf(results);
    }
}
