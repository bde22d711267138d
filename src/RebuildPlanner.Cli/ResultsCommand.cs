using System.CommandLine;
using System.CommandLine.Parsing;
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
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Option<string> file = new("--file") { Description = "The job file.", HelpName = "job.json", Required = true };
        Option<Stage?> stage = new("--stage")
        {
            Description = "before, \"as received\", planned or \"as machined\"; else the last stage with entries.",
            HelpName = "stage",
            CustomParser = ParseStage,
        };
        stage.CompletionSources.Clear(); // the names of the enumeration are not words of the trade
        stage.CompletionSources.Add(_ => StageWords.All.Select(word => new System.CommandLine.Completions.CompletionItem(word)));
        Option<bool> json = new("--json") { Description = "As JSON: units cm3, mm, kPa and 1, full precision." };
        Option<bool> inch = new("--inch") { Description = "Print in inch, cubic inch and psi." };
        ExampleCommand command = new("results", Description, Example) { file, stage, json, inch };
        command.SetAction(parsed => Run(
            terminal, parsed.GetValue(file)!, parsed.GetValue(stage), parsed.GetValue(json),
            parsed.GetValue(inch) ? UnitSystem.Inch : UnitSystem.Metric));
        return command;
    }

    private static int Run(Terminal terminal, string path, Stage? asked, bool asJson, UnitSystem system)
    {
        if (JobInput.Read(path, terminal.Error) is not { } job)
        {
            return ExitCode.Wrong;
        }

        Stage stage = asked ?? LastStage.Of(job);
        Results results = StageResults.Of(job, stage);
        if (results.IsEmpty)
        {
            terminal.Error.WriteLine($"{path}: no cylinder can be computed at the stage {StageWords.Of(stage)}. Missing:");
            foreach (string missing in ResultsScreen.MissingLines(results))
            {
                terminal.Error.WriteLine($"  {missing}");
            }

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

        return results.Verdicts.Any(verdict => verdict.State == VerdictState.Outside) ? ExitCode.Outside : ExitCode.Done;
    }

    private static Stage? ParseStage(ArgumentResult argument)
    {
        string typed = string.Join(' ', argument.Tokens.Select(token => token.Value));
        if (StageWords.Find(typed) is { } stage)
        {
            return stage;
        }

        string? near = NearestWord.Of(typed, StageWords.All);
        argument.AddError(
            $"--stage {typed}: there is no such stage{(near is null ? "" : $"; did you mean \"{near}\"?")} The stages are "
            + string.Join(", ", StageWords.All.Select(word => $"\"{word}\"")) + ".");
        return null;
    }
}
