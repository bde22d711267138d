using System.CommandLine;
using System.CommandLine.Parsing;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Cli;

/// <summary>The command line: its commands, one file each, and how a wrong request is answered.</summary>
public static class Shell
{
    /// <summary>Runs one command.</summary>
    /// <returns>The exit code, see <see cref="ExitCode"/>.</returns>
    public static int Run(string[] args, Terminal terminal)
    {
        RootCommand root = Commands(terminal);
        ParseResult parsed = root.Parse(args, new ParserConfiguration { ResponseFileTokenReplacer = null });
        if (parsed.Errors.Count > 0)
        {
            foreach (ParseError error in parsed.Errors)
            {
                terminal.Error.WriteLine($"rebuild: {error.Message}");
            }

            Command command = parsed.CommandResult.Command;
            string? near = command == root && args.Length > 0 ? NearestWord.Of(args[0], [.. root.Subcommands.Select(known => known.Name)]) : null;
            terminal.Error.WriteLine(
                near is not null ? $"Did you mean rebuild {near}? See rebuild --help." : command == root ? "See rebuild --help." : $"See rebuild {command.Name} --help.");
            return ExitCode.Wrong;
        }

        return parsed.Invoke(new InvocationConfiguration
        {
            Output = terminal.Output,
            Error = terminal.Error,
            EnableDefaultExceptionHandler = false,
        });
    }

    private static RootCommand Commands(Terminal terminal)
    {
        RootCommand root = new("Rebuild Planner: what a measured engine is, how sure that is, and which limits hold.")
        {
            ResultsCommand.Make(terminal),
            SheetCommand.Make(terminal),
            FormCommand.Make(terminal),
            FigureCommand.Make(terminal),
            TemplatesCommand.Make(terminal),
            CompletionsCommand.Make(terminal),
        };
        ExampleHelp.AddTo(root);
        return root;
    }
}
