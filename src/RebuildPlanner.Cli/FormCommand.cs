using System.CommandLine;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Sheets.Build;

namespace RebuildPlanner.Cli;

/// <summary><c>form</c>: a job file in, a blank measuring form for its engine out as PDF.</summary>
public static class FormCommand
{
    private const string Description = "A blank measuring form for the engine, for a pencil at the bench.";

    private const string Example = """
        Example:
          rebuild form --file templates/vee-eight-pushrod.json --out form.pdf
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        JobSource source = new();
        Option<Stage?> stage = JobOptions.Stage();
        Option<bool> left = new("--left") { Description = "Only what has not been read at the stage yet." };
        Option<string> output = PdfOutput.Option();
        SheetOptions options = new();
        ExampleCommand command = new("form", Description, Example) { stage, left, output };
        source.AddTo(command);
        options.AddTo(command);
        command.SetAction(parsed =>
        {
            if (source.Read(parsed, terminal) is not var (job, _) || options.Of(job, parsed, terminal) is not { } input)
            {
                return ExitCode.Wrong;
            }

            Stage at = parsed.GetValue(stage) ?? LastStage.Of(job);
            IReadOnlyList<RoundPlace> places = parsed.GetValue(left) ? Round.Left(job, at) : Round.Of(job.Engine);
            return PdfOutput.Write(MeasuringForm.Of(input, at, places), parsed.GetValue(output)!, terminal) is null ? ExitCode.Wrong : ExitCode.Done;
        });
        return command;
    }
}
