using System.CommandLine;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>measure</c>: a reading in one line, many from a list, or at a terminal place by place.</summary>
public static class MeasureCommand
{
    private const string Example = """
        Examples:
          rebuild measure 2026-041 bore "84.512 mm" --cylinder 1 --at top --axis thrust --gauge "bore gauge 2" --stage "as received"
          rebuild measure 2026-041 chamber --cylinder 2 --from "0 cc" --to "46.2 cc" --gauge "burette 100" --stage "as received"
          rebuild measure 2026-041 chamber --cylinder 3 --fill "0 cc..50.0 cc" --fill "0 cc..12.4 cc" --gauge "burette 100"
          rebuild measure 2026-041 --stage "as received" --blank-csv > round.csv
          rebuild measure 2026-041 --csv round.csv
          rebuild measure 2026-041 --stage "as received"
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        ReadingFields fields = new();
        Option<string> csv = new("--csv") { Description = "Many readings: a list as --blank-csv prints it.", HelpName = "file" };
        Option<bool> blank = new("--blank-csv") { Description = "Prints a blank list of what is left to read." };
        ExampleCommand command = new("measure", "Writes readings into a job; with no reading named, asks place by place.", Example) { csv, blank };
        fields.AddTo(command);
        WriteOptions write = new();
        write.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = write.Open(parsed, terminal);
            string number = write.Number(parsed);
            if (fields.IsOne(parsed))
            {
                return fields.Body(parsed, terminal) is { } body && Readings.Write(store, number, write.Entry(EntryKind.Reading, body, parsed, terminal), terminal) is { } written
                    ? Readings.Say(written, terminal)
                    : ExitCode.Wrong;
            }

            if (JobSource.Find(store, number, terminal) is not { } entries)
            {
                return ExitCode.Wrong;
            }

            Job job = JobSource.Folded(number, entries);
            Stage stage = fields.Stage(parsed) ?? LastStage.Of(job);
            if (parsed.GetValue(blank))
            {
                terminal.Output.Write(ReadingList.Blank(job, stage));
                return ExitCode.Done;
            }

            return parsed.GetValue(csv) is { } path
                ? ReadingList.Import(store, number, path, parsed, write, terminal)
                : new MeasuringRound(store, number, stage, write.By(parsed), terminal).Run();
        });
        return command;
    }
}
