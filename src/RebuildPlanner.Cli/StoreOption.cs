using System.CommandLine;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary>Which store a command works on: the one named, else the one of the environment, else the one in the data folder.</summary>
internal sealed class StoreOption
{
    private const string Variable = "REBUILD_PLANNER_STORE", FileName = "jobs.db";

    private readonly Option<string> _store = new("--store") { Description = "The store's file; else the user's own.", HelpName = "jobs.db" };

    /// <summary>Adds it to a command.</summary>
    public void AddTo(Command command) => command.Options.Add(_store);

    /// <summary>The store's file.</summary>
    public string Path(ParseResult parsed, Terminal terminal)
    {
        if (parsed.GetValue(_store) is { } named)
        {
            return named;
        }

        if (Environment.GetEnvironmentVariable(Variable) is { Length: > 0 } fromEnvironment)
        {
            return fromEnvironment;
        }

        string folder = terminal.DataFolder ?? throw new StoreException($"The system names no place for a user's data; name the store with --store or {Variable}.");
        try
        {
            Directory.CreateDirectory(folder);
        }
        catch (Exception problem) when (InputFile.IsOfFiles(problem))
        {
            throw new StoreException($"{folder}: the folder of the store cannot be made ({problem.Message.TrimEnd('.')}). Name another with --store.", problem);
        }

        return System.IO.Path.Combine(folder, FileName);
    }

    /// <summary>The store, opened.</summary>
    public JobStore Open(ParseResult parsed, Terminal terminal) => JobStore.Open(Path(parsed, terminal));
}
