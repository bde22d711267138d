using System.CommandLine;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Sheets.Build;

namespace RebuildPlanner.Cli;

/// <summary><c>sheet</c>: a job file in, the build sheet out as PDF.</summary>
public static class SheetCommand
{
    private const string Description = "The build sheet as PDF: what the engine is, how sure, which limits hold; the job file inside.";

    private const string Example = """
        Example:
          rebuild sheet --file samples/van-four.json --stage "as machined" --out van-four.pdf

        Exit codes:
          0  done
          1  done, and some verdict is outside
          2  the request or the file is wrong; what would be right is said
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Option<string> file = JobOptions.File();
        Option<Stage?> stage = JobOptions.Stage();
        Option<string> output = PdfOutput.Option();
        SheetOptions options = new();
        ExampleCommand command = new("sheet", Description, Example) { file, stage, output };
        options.AddTo(command);
        command.SetAction(parsed =>
        {
            string path = parsed.GetValue(file)!;
            if (JobInput.Read(path, terminal.Error) is not { } job || options.Of(job, parsed, terminal) is not { } input)
            {
                return ExitCode.Wrong;
            }

            Results results = StageResults.Of(job, parsed.GetValue(stage) ?? LastStage.Of(job));
            return JobOptions.IsEmpty(path, results, terminal) || !PdfOutput.Write(BuildSheet.Of(input, results), parsed.GetValue(output)!, terminal)
                ? ExitCode.Wrong
                : JobOptions.ExitCodeOf(results);
        });
        return command;
    }
}
