using System.CommandLine;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary>Where a command gets its job: by number from the store, or from a file with no store at all.</summary>
internal sealed class JobSource
{
    private readonly Argument<string?> _number = new("job") { Description = "The job's number in the store.", Arity = ArgumentArity.ZeroOrOne };
    private readonly Option<string> _file = new("--file") { Description = "A job file, or a sheet with one inside, in place of the store.", HelpName = "job.json" };
    private readonly StoreOption _store = new();

    /// <summary>Adds number, file and store to a command.</summary>
    public void AddTo(Command command)
    {
        command.Arguments.Add(_number);
        command.Options.Add(_file);
        _store.AddTo(command);
    }

    /// <summary>The job's number in the store, or null where it comes from a file.</summary>
    public string? Number(ParseResult parsed) => parsed.GetValue(_number);

    /// <summary>The store, opened.</summary>
    public JobStore Open(ParseResult parsed, Terminal terminal) => _store.Open(parsed, terminal);

    /// <summary>The job and what to call it in messages, or null after the reason has been written.</summary>
    public (Job Job, string Name)? Read(ParseResult parsed, Terminal terminal)
    {
        string? number = parsed.GetValue(_number), file = parsed.GetValue(_file);
        if (number is null == file is null)
        {
            terminal.Error.WriteLine(
                number is null ? "Say which job: its number in the store, or --file with a job file." : "Name the job once: by its number, or by --file.");
            return null;
        }

        if (file is not null)
        {
            return JobInput.Read(file, terminal.Error) is { } job ? (job, file) : null;
        }

        using JobStore store = _store.Open(parsed, terminal);
        return Find(store, number!, terminal) is { } entries ? (Folded(number!, entries), $"job {number}") : null;
    }

    /// <summary>The entries of a job in the store, or null after its nearest namesake has been said.</summary>
    public static IReadOnlyList<Entry>? Find(JobStore store, string number, Terminal terminal)
    {
        if (store.Entries(number) is { } entries)
        {
            return entries;
        }

        terminal.Error.WriteLine(NotThere(store, number));
        return null;
    }

    /// <summary>That a job is not in the store, and which number comes near.</summary>
    public static string NotThere(JobStore store, string number)
    {
        const int Recent = 200;
        string? near = NearestWord.Of(number, [.. store.List(new JobFilter(), 0, Recent).Select(row => row.Number)]);
        return $"There is no job {number} in the store{(near is null ? "" : $"; did you mean {near}?")}";
    }

    /// <summary>The job of its entries, which were judged when they were written.</summary>
    public static Job Folded(string number, IReadOnlyList<Entry> entries)
    {
        (Job? job, IReadOnlyList<Fault> faults) = JobFold.Of(entries);
        return job ?? throw new StoreException($"Job {number} cannot be read: {faults[0].Path}: {faults[0].Message}. Run store check.");
    }
}
