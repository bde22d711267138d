using System.CommandLine;
using System.Text;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>export</c>: a job of the store as a job file.</summary>
public static class ExportCommand
{
    private const string Example = """
        Example:
          rebuild export 2026-041 --out van.json
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Argument<string> number = new("job") { Description = "The job's number." };
        Option<string> output = new("--out") { Description = "The file to write; else it is printed.", HelpName = "job.json" };
        StoreOption storeOption = new();
        ExampleCommand command = new("export", "Gives a job of the store as a job file.", Example) { number, output };
        storeOption.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = storeOption.Open(parsed, terminal);
            string name = parsed.GetValue(number)!;
            if (JobSource.Find(store, name, terminal) is not { } entries)
            {
                return ExitCode.Wrong;
            }

            byte[] file = JobFileWriter.Write(JobSource.Folded(name, entries));
            if (parsed.GetValue(output) is not { } path)
            {
                terminal.Output.Write(Encoding.UTF8.GetString(file));
                return ExitCode.Done;
            }

            if (!OutputFile.Write(path, file, "{"u8, terminal.Error))
            {
                return ExitCode.Wrong;
            }

            terminal.Output.WriteLine(path);
            return ExitCode.Done;
        });
        return command;
    }
}
