using System.CommandLine;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Cli;

/// <summary><c>templates</c>: writes out the files a shop may edit.</summary>
public static class TemplatesCommand
{
    private const string Description = "Writes out blank jobs, the sheets' words and the shop's own file, to be edited.";

    private const string Example = """
        Example:
          rebuild templates --to my-templates

        A file that is there already is left as it is. Edited copies are used with --templates my-templates, or always from the
        folder templates in the data folder: REBUILD_PLANNER_DATA names it, else the system's place for a user's data.
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Option<string> folder = new("--to") { Description = "The folder; made where there is none.", HelpName = "folder", Required = true };
        ExampleCommand command = new("templates", Description, Example) { folder };
        command.SetAction(parsed => Run(terminal, parsed.GetValue(folder)!));
        return command;
    }

    private static int Run(Terminal terminal, string folder)
    {
        try
        {
            Directory.CreateDirectory(folder);
        }
        catch (Exception problem) when (InputFile.IsOfFiles(problem))
        {
            terminal.Error.WriteLine($"{folder}: {(File.Exists(folder) ? "that is a file; a folder is wanted" : problem.Message.TrimEnd('.'))}.");
            return ExitCode.Wrong;
        }

        foreach (string name in TemplateFiles.Names)
        {
            string path = Path.Combine(folder, name);
            if (File.Exists(path))
            {
                terminal.Output.WriteLine($"{path}: was there already, left as it is");
            }
            else if (!OutputFile.WriteAndSay(path, TemplateFiles.Read(name), [], terminal))
            {
                return ExitCode.Wrong;
            }
        }

        return ExitCode.Done;
    }
}
