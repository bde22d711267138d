using System.CommandLine;
using System.CommandLine.Parsing;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary>The command line: its commands, one file each, and how a wrong request is answered.</summary>
public static class Shell
{
    /// <summary>Runs one command.</summary>
    /// <returns>The exit code, see <see cref="ExitCode"/>.</returns>
    public static int Run(string[] args, Terminal terminal)
    {
        RootCommand root = Commands(terminal, args);
        ParseResult parsed = root.Parse(args, new ParserConfiguration { ResponseFileTokenReplacer = null });
        if (StrangeOption(args, parsed) is { } strange)
        {
            terminal.Error.WriteLine($"rebuild: {strange}");
            return ExitCode.Wrong;
        }

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

        try
        {
            return parsed.Invoke(new InvocationConfiguration
            {
                Output = terminal.Output,
                Error = terminal.Error,
                EnableDefaultExceptionHandler = false,
            });
        }
        catch (StoreException problem)
        {
            terminal.Error.WriteLine(problem.Message);
            return ExitCode.StoreFailed;
        }
    }

    // The library takes an option it does not know for an argument, and then says something else is wrong.
    private static string? StrangeOption(string[] args, ParseResult parsed)
    {
        Command command = parsed.CommandResult.Command;
        string[] known = [.. command.Options.Concat(parsed.RootCommandResult.Command.Options).SelectMany(option => option.Aliases.Prepend(option.Name))];
        string? strange = args.TakeWhile(arg => arg != "--").Select(arg => arg.Split('=')[0])
            .FirstOrDefault(arg => arg.Length > 2 && arg.StartsWith("--", StringComparison.Ordinal) && !arg.Contains(' ', StringComparison.Ordinal) && !known.Contains(arg));
        if (strange is null)
        {
            return null;
        }

        string? near = NearestWord.Of(strange, known);
        string name = command is RootCommand ? "" : $" {command.Name}";
        return $"{strange}: there is no such option here{(near is null ? "." : $"; did you mean {near}?")} See rebuild{name} --help.";
    }

    // Every command by its word; only the one asked for is made, unless help or completion wants them all.
    private static readonly (string Word, Func<Terminal, Command> Make)[] _commands =
    [
        ("start", StartCommand.Make),
        ("jobs", JobsCommand.Make),
        ("show", ShowCommand.Make),
        ("set", SetCommand.Make),
        ("measure", MeasureCommand.Make),
        ("strike", StrikeCommand.Make),
        ("history", HistoryCommand.Make),
        ("given", GivenCommand.Make),
        ("assumed", AssumedCommand.Make),
        ("piston", PistonCommand.Make),
        ("gasket", GasketCommand.Make),
        ("fit", FitCommand.Make),
        ("cut", CutCommand.Make),
        ("limit", LimitCommand.Make),
        ("target", TargetCommand.Make),
        ("check", CheckCommand.Make),
        ("note", NoteCommand.Make),
        ("close", CloseCommand.Make),
        ("gauge", GaugeCommand.Make),
        ("results", ResultsCommand.Make),
        ("sheet", SheetCommand.Make),
        ("form", FormCommand.Make),
        ("figure", FigureCommand.Make),
        ("templates", TemplatesCommand.Make),
        ("import", ImportCommand.Make),
        ("export", ExportCommand.Make),
        ("store", StoreCommand.Make),
        ("completions", CompletionsCommand.Make),
    ];

    private static RootCommand Commands(Terminal terminal, string[] args)
    {
        RootCommand root = new("Rebuild Planner: what a measured engine is, how sure that is, and which limits hold.");
        bool one = args.Length > 0 && Array.Exists(_commands, command => command.Word == args[0]);
        foreach ((string word, Func<Terminal, Command> make) in _commands)
        {
            if (!one || word == args[0])
            {
                root.Subcommands.Add(make(terminal));
            }
        }

        ExampleHelp.AddTo(root);
        return root;
    }
}
