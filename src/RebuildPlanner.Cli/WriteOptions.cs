using System.CommandLine;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary>The options of everything that writes into a job: which job, whose hand, and a key that makes a repeat harmless.</summary>
internal sealed class WriteOptions
{
    private readonly Argument<string> _number = new("job") { Description = "The job's number." };
    private readonly Option<string> _by = new("--by") { Description = "Who writes this.", HelpName = "name" };
    private readonly Option<string> _key = new("--key") { Description = "A key of your own: written again under it, nothing is added twice.", HelpName = "key" };
    private readonly StoreOption _store = new();

    /// <summary>Adds them to a command, the job's number as its first argument.</summary>
    public void AddTo(Command command)
    {
        command.Arguments.Insert(0, _number);
        command.Options.Add(_by);
        command.Options.Add(_key);
        _store.AddTo(command);
    }

    /// <summary>The job's number.</summary>
    public string Number(ParseResult parsed) => parsed.GetValue(_number)!;

    /// <summary>The store, opened.</summary>
    public JobStore Open(ParseResult parsed, Terminal terminal) => _store.Open(parsed, terminal);

    /// <summary>Who writes, or null.</summary>
    public string? By(ParseResult parsed) => parsed.GetValue(_by);

    /// <summary>A new entry of these options.</summary>
    public Entry Entry(EntryKind kind, string body, ParseResult parsed, Terminal terminal) =>
        new(parsed.GetValue(_key) ?? NewKey(terminal), kind, body, terminal.Now(), By(parsed));

    /// <summary>A key of its own; those written later come later in order.</summary>
    /// <remarks>
    /// The millisecond in ten letters and six by lot (of a hundred in one millisecond two are alike once in some hundred thousand times), in an
    /// alphabet without l, o, u and z: short enough to be typed, and to be told apart by eye.
    /// </remarks>
    public static string NewKey(Terminal terminal)
    {
        const string Letters = "0123456789abcdefghijkmnpqrstvwxy";
        const int TimeLetters = 10, LotLetters = 6, Base = 32;
        Span<char> key = stackalloc char[TimeLetters + LotLetters];
        long milliseconds = terminal.Now().ToUnixTimeMilliseconds();
        for (int letter = TimeLetters - 1; letter >= 0; letter--)
        {
            key[letter] = Letters[(int)(milliseconds % Base)];
            milliseconds /= Base;
        }

        // A key is no secret, and loading a library of secrets for it would cost as much as the write.
        Random.Shared.GetItems(Letters, key[TimeLetters..]);
        return key.ToString();
    }

    /// <summary>Writes entries into a job.</summary>
    /// <param name="what">What to call them in messages.</param>
    /// <param name="issued">An issued sheet to keep, with its entry's key, or null.</param>
    /// <returns>The job with them, or null after the reason has been written.</returns>
    public static WrittenJob? Write(
        JobStore store, string number, IReadOnlyList<Entry> entries, string what, Terminal terminal, (string Key, byte[] Pdf)? issued = null) =>
        Write(store, number, _ => (entries, null), what, terminal, issued);

    /// <summary>Writes what is made of the entries that are there, while nobody else writes.</summary>
    /// <param name="make">From the entries there are to the new ones, or what is wrong.</param>
    /// <param name="where">What to call one of the new ones in messages, where it has a name of its own.</param>
    public static WrittenJob? Write(
        JobStore store, string number, Func<IReadOnlyList<Entry>, (IReadOnlyList<Entry> Added, string? Problem)> make, string what, Terminal terminal,
        (string Key, byte[] Pdf)? issued = null, Func<Entry, string?>? where = null)
    {
        string? refused = null;
        IReadOnlyList<Entry> all = [];
        IReadOnlyList<(Fault Fault, Entry? Of)> faults = [];
        JobStore.Change? change = store.Append(number, before =>
        {
            (IReadOnlyList<Entry> made, string? problem) = make(before);
            Dictionary<string, Entry> known = before.ToDictionary(entry => entry.Key);
            Entry[] added = [.. made.Where(entry => !(known.TryGetValue(entry.Key, out Entry? there) && Same(there, entry)))];
            refused = problem ?? Clash(known, added);
            all = [.. before, .. added];
            (Job? job, faults) = refused is null && added.Length > 0 ? JobVerbs.Add(before, added) : (null, []);
            return new JobStore.Change(refused is null ? added : [], [.. faults.Select(fault => fault.Fault)], job);
        }, issued);
        if (change is null)
        {
            terminal.Error.WriteLine(JobSource.NotThere(store, number));
            return null;
        }

        foreach ((Fault fault, Entry? of) in faults)
        {
            InputFile.Say(of is null ? what : where?.Invoke(of) ?? what, fault, terminal.Error);
        }

        if (where is not null)
        {
            InputFile.Count(faults.Count, "nothing was written", terminal.Error);
        }

        if (refused is not null)
        {
            terminal.Error.WriteLine($"{what}: {refused}.");
        }

        return faults.Count > 0 || refused is not null ? null : new WrittenJob(number, all, change.Job);
    }

    private static bool Same(Entry known, Entry entry) => known.Kind == entry.Kind && known.Body == entry.Body;

    private static string? Clash(Dictionary<string, Entry> known, IReadOnlyList<Entry> added) =>
        added.FirstOrDefault(entry => known.ContainsKey(entry.Key)) is { } other
            ? $"another entry was written under the key {other.Key} already; take a new key"
            : null;
}
