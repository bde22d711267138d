using System.CommandLine;
using System.CommandLine.Help;
using System.CommandLine.Invocation;

namespace RebuildPlanner.Cli;

/// <summary>A command whose help ends with an example.</summary>
/// <param name="name">Its word.</param>
/// <param name="description">What it does, in one sentence.</param>
/// <param name="example">What the help ends with.</param>
internal sealed class ExampleCommand(string name, string description, string example) : Command(name, description)
{
    /// <summary>What the help ends with.</summary>
    public string Example { get; } = example;
}

/// <summary>The library's help with the command's example after it.</summary>
internal sealed class ExampleHelp(HelpAction help) : SynchronousCommandLineAction
{
    /// <summary>Who asks for help is not told what is missing.</summary>
    public override bool ClearsParseErrors => true;

    /// <inheritdoc/>
    public override int Invoke(ParseResult parseResult)
    {
        int code = help.Invoke(parseResult);
        if (parseResult.CommandResult.Command is ExampleCommand command)
        {
            parseResult.InvocationConfiguration.Output.WriteLine(command.Example);
        }

        return code;
    }

    /// <summary>The option that asks for it, of a root and all its commands.</summary>
    public static Option<bool> Option() => new("--help", "-?", "-h", "/?", "/h")
    {
        Description = "Show help and usage information",
        Recursive = true,
        Arity = ArgumentArity.Zero,
        Action = new ExampleHelp(new HelpAction()),
    };
}
