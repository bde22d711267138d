using System.CommandLine;
using System.Text;
using RebuildPlanner.Core.JobFile;

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
        Option<string> output = new("--out") { Description = "The file to write; else it is printed.", HelpName = "job.json" };
        ExampleCommand command = new("export", "Gives a job of the store as a job file.", Example) { output };
        StoredJob stored = new();
        stored.AddTo(command);
        command.SetAction(parsed => stored.Read(parsed, terminal) is { } found
            && OutputFile.WriteOrPrint(Encoding.UTF8.GetString(JobFileWriter.Write(found.Job)), parsed.GetValue(output), "{"u8, terminal)
            ? ExitCode.Done
            : ExitCode.Wrong);
        return command;
    }
}
