using System.CommandLine;
using System.CommandLine.Help;
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
        Command root = Commands(terminal, args);
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
        List<string> known = [];
        foreach (Option option in (IEnumerable<Option>)[.. command.Options, .. parsed.RootCommandResult.Command.Options])
        {
            known.Add(option.Name);
            known.AddRange(option.Aliases);
        }

        string? strange = Array.Find(
            args[..(Array.IndexOf(args, "--") is var end and >= 0 ? end : args.Length)],
            arg => arg.Length > 2 && arg.StartsWith("--", StringComparison.Ordinal) && !Named(arg).Contains(' ', StringComparison.Ordinal) && !known.Contains(Named(arg)));
        if (strange is null)
        {
            return null;
        }

        strange = Named(strange);
        string? near = NearestWord.Of(strange, known);
        string name = command == parsed.RootCommandResult.Command ? "" : $" {command.Name}";
        return $"{strange}: there is no such option here{(near is null ? "." : $"; did you mean {near}?")} See rebuild{name} --help.";
    }

    private static string Named(string arg) => arg.Split('=')[0];

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
        ("process", ProcessCommand.Make),
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

    private static Command Commands(Terminal terminal, string[] args)
    {
        Func<Terminal, Command>? asked = args.Length > 0 ? Array.Find(_commands, command => command.Word == args[0]).Make : null;
        Command root;
        if (asked is not null)
        {
            // What a command needs of the library's root; the rest looks for words and names of its own for half a millisecond.
            root = new Command("rebuild") { ExampleHelp.Option(), asked(terminal) };
        }
        else
        {
            root = new RootCommand("Rebuild Planner: what a measured engine is, how sure that is, and which limits hold.");
            root.Options.Remove(root.Options.OfType<HelpOption>().Single());
            root.Options.Insert(0, ExampleHelp.Option());
            foreach ((_, Func<Terminal, Command> make) in _commands)
            {
                root.Subcommands.Add(make(terminal));
            }
        }

        return root;
    }
}
