using System.CommandLine;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Figures;

namespace RebuildPlanner.Cli;

/// <summary><c>figure</c>: one of the sheet's figures by itself, as SVG or in words.</summary>
public static class FigureCommand
{
    private const string Section = "section", Volumes = "volumes";

    private const string Description = "A figure of the sheet by itself: the section through a cylinder, or the volume bars.";

    private const string Example = """
        Example:
          rebuild figure --file samples/van-four.json --show section --cylinder 2 --svg --out section.svg
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        JobSource source = new();
        Option<Stage?> stage = JobOptions.Stage();
        Option<string?> show = JobOptions.Word<string>(
            "--show", "section or volumes; else section.", "figure", [Section, Volumes], word => word is Section or Volumes ? word : null);
        Option<string> cylinder = new("--cylinder") { Description = "The cylinder; else the one with the least gap.", HelpName = "label" };
        Option<bool> svg = new("--svg") { Description = "As SVG; else what it says, in words." };
        Option<string> output = new("--out") { Description = "The file to write; else it is printed.", HelpName = "figure.svg" };
        SheetOptions options = new();
        ExampleCommand command = new("figure", Description, Example) { stage, show, cylinder, svg, output };
        source.AddTo(command);
        options.AddWithoutPageTo(command);
        command.SetAction(parsed =>
        {
            if (source.Read(parsed, terminal) is not var (job, name) || options.Of(job, parsed, terminal) is not { } input)
            {
                return ExitCode.Wrong;
            }

            Results results = StageResults.Of(job, parsed.GetValue(stage) ?? LastStage.Of(job));
            if (parsed.GetValue(cylinder) is { } label && !job.Engine.Labels.Contains(label))
            {
                terminal.Error.WriteLine($"--cylinder {label}: there is no such cylinder; there are {string.Join(", ", job.Engine.Labels)}.");
                return ExitCode.Wrong;
            }

            Picture? picture = (parsed.GetValue(show) ?? Section) == Volumes
                ? VolumeBars.Draw(results, input.Units, input.Words)
                : Chosen(results, parsed.GetValue(cylinder)) is { } chosen ? FiguresPart.Section(input, results, chosen) : null;
            if (picture is null)
            {
                terminal.Error.WriteLine($"{name}: too little is known at the stage {StageWords.Of(results.Stage)} to draw this. Missing:");
                JobOptions.SayMissing(results, terminal);
                return ExitCode.Wrong;
            }

            string text = parsed.GetValue(svg) ? Svg.Write(picture) : $"{picture.Title}\n{picture.Alternative}\n";
            return OutputFile.WriteOrPrint(text, parsed.GetValue(output), "<svg"u8, terminal) ? ExitCode.Done : ExitCode.Wrong;
        });
        return command;
    }

    private static CylinderResult? Chosen(Results results, string? label) =>
        label is null ? CylinderSection.Choose(results) : results.Cylinders.First(cylinder => cylinder.Cylinder == label);
}
