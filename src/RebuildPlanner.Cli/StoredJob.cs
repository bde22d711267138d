using System.CommandLine;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary>A job that a command only looks at, by its number in the store.</summary>
internal sealed class StoredJob
{
    private readonly Argument<string> _number = new("job") { Description = "The job's number." };
    private readonly StoreOption _store = new();

    /// <summary>Adds number and store to a command, the number as its first argument.</summary>
    public void AddTo(Command command)
    {
        command.Arguments.Insert(0, _number);
        _store.AddTo(command);
    }

    /// <summary>The job, or null after its nearest namesake has been said.</summary>
    public WrittenJob? Read(ParseResult parsed, Terminal terminal)
    {
        string number = parsed.GetValue(_number)!;
        using JobStore store = _store.Open(parsed, terminal);
        return JobSource.Find(store, number, terminal) is { } entries ? new WrittenJob(number, entries, null) : null;
    }
}
