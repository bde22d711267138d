using System.Globalization;
using System.IO.Compression;
using Microsoft.Data.Sqlite;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Store;

/// <summary>The jobs of a shop in one SQLite file. Entries are only ever added; a job is the fold of its entries.</summary>
/// <remarks>Every change reads, judges and writes in one immediate transaction, with full durability: what was acknowledged is on the disk.</remarks>
public sealed class JobStore : IDisposable
{
    private readonly SqliteConnection _connection;
    private readonly string _path;

    private JobStore(SqliteConnection connection, string path) => (_connection, _path) = (connection, path);

    /// <summary>What a change comes to: entries to add, or why not.</summary>
    /// <param name="Added">The entries; empty where nothing is to be written.</param>
    /// <param name="Faults">Why not.</param>
    /// <param name="Job">The job with them, where the judge folded it; else it is folded here.</param>
    public sealed record Change(IReadOnlyList<Entry> Added, IReadOnlyList<Fault> Faults, Job? Job = null);

    /// <summary>Opens a store, making it where there is none, and brings an older one up to date after a copy.</summary>
    /// <exception cref="StoreException">It cannot be opened, is none, is damaged or is newer than this program.</exception>
    public static JobStore Open(string path)
    {
        SqliteConnection? connection = null;
        try
        {
            connection = Connect(path);
            Prepare(connection, path);
            return new JobStore(connection, path);
        }
        catch (SqliteException problem)
        {
            connection?.Dispose();
            throw StoreException.Of(problem, path);
        }
        catch
        {
            connection?.Dispose();
            throw;
        }
    }

    /// <inheritdoc/>
    public void Dispose() => _connection.Dispose();

    /// <summary>Starts a job.</summary>
    /// <param name="entries">Its first entries, which must fold to a job.</param>
    /// <returns>False where a job of that number is there already.</returns>
    public bool Start(IReadOnlyList<Entry> entries) => Guarded(() =>
    {
        Job job = Folded(entries);
        using SqliteTransaction transaction = _connection.BeginTransaction();
        int made = Sql.Run(
            _connection,
            "INSERT INTO job (number, closed, entries, changed) VALUES (@number, 0, 0, @changed) ON CONFLICT (number) DO NOTHING",
            ("number", job.Number), ("changed", Written(entries[^1].At)));
        if (made == 0)
        {
            return false;
        }

        Insert(Sql.Scalar(_connection, "SELECT id FROM job WHERE number = @number", ("number", job.Number)), entries);
        UpdateRow(job, entries);
        transaction.Commit();
        return true;
    });

    /// <summary>Changes a job: its entries are read, judged and added to while nobody else writes.</summary>
    /// <param name="number">Its number.</param>
    /// <param name="judge">From the entries there are to those to add, or faults. An entry whose key is there already, saying the same, is not added again.</param>
    /// <param name="issued">An issued sheet to keep as it is, with the key of its entry, or null.</param>
    /// <returns>What came of it, or null where there is no such job.</returns>
    public Change? Append(string number, Func<IReadOnlyList<Entry>, Change> judge, (string Key, byte[] Pdf)? issued = null) => Guarded(() =>
    {
        using SqliteTransaction transaction = _connection.BeginTransaction();
        if (Id(number) is not { } id)
        {
            return null;
        }

        IReadOnlyList<Entry> before = EntriesOf(id);
        Change change = judge(before);
        if (change.Faults.Count > 0 || change.Added.Count == 0)
        {
            return change;
        }

        Insert(id, change.Added);
        IReadOnlyList<Entry> all = [.. before, .. change.Added];
        UpdateRow(change.Job ?? Folded(all), all);
        if (issued is { } sheet)
        {
            Sql.Run(
                _connection, "INSERT INTO issued (entry, pdf) SELECT id, @pdf FROM entry WHERE key = @key ON CONFLICT (entry) DO NOTHING",
                ("key", sheet.Key), ("pdf", Deflated(sheet.Pdf)));
        }

        transaction.Commit();
        return change;
    });

    /// <summary>The entries of a job in order, or null where there is none of that number.</summary>
    public IReadOnlyList<Entry>? Entries(string number) => Guarded(() => Id(number) is { } id ? EntriesOf(id) : null);

    /// <summary>Whose entry has a key: the job's number, or null.</summary>
    public string? Owner(string key) => Guarded(() =>
        Sql.Rows(_connection, "SELECT job.number FROM entry JOIN job ON job.id = entry.job WHERE entry.key = @key", row => row.GetString(0), ("key", key)).FirstOrDefault());

    /// <summary>A page of jobs, last changed first.</summary>
    /// <param name="filter">Which.</param>
    /// <param name="skip">How many to leave out.</param>
    /// <param name="take">How many at most.</param>
    public IReadOnlyList<JobRow> List(JobFilter filter, int skip, int take) => Guarded(() => Sql.Rows(
        _connection,
        $"SELECT {JobColumns} FROM job {Where(filter)} ORDER BY changed DESC, id DESC LIMIT @take OFFSET @skip",
        Row,
        ("customer", Like(filter.Customer)), ("engine", Like(filter.Engine)), ("closed", filter.Closed), ("text", Like(filter.Text)), ("take", take), ("skip", skip)));

    /// <summary>How many jobs there are.</summary>
    public long Count(JobFilter filter) => Guarded(() => Sql.Scalar(
        _connection, $"SELECT count(*) FROM job {Where(filter)}",
        ("customer", Like(filter.Customer)), ("engine", Like(filter.Engine)), ("closed", filter.Closed), ("text", Like(filter.Text))));

    /// <summary>Adds a gauge to the shop's, or a new version of one.</summary>
    public void AddGauge(string name, Entry entry) => Guarded(() => Sql.Run(
        _connection, "INSERT INTO gauge (key, at, by, name, body) VALUES (@key, @at, @by, @name, @body) ON CONFLICT (key) DO NOTHING",
        ("key", entry.Key), ("at", Written(entry.At)), ("by", entry.By), ("name", name), ("body", entry.Body)));

    /// <summary>The shop's gauges, each as it stands, by name.</summary>
    public IReadOnlyList<(string Name, string Body)> Gauges() => Guarded(() => Sql.Rows(
        _connection, "SELECT name, body FROM gauge WHERE id IN (SELECT max(id) FROM gauge GROUP BY name) ORDER BY name", row => (row.GetString(0), row.GetString(1))));

    /// <summary>An issued sheet as it was, or null.</summary>
    public byte[]? Issued(string key) => Guarded(() => Sql.Rows(
        _connection, "SELECT issued.pdf FROM issued JOIN entry ON entry.id = issued.entry WHERE entry.key = @key", row => Inflated((byte[])row[0]), ("key", key)).FirstOrDefault());

    /// <summary>The connection, for what looks after the whole file.</summary>
    internal SqliteConnection Connection => _connection;

    /// <summary>Runs something that may meet an error of the database.</summary>
    internal T Guarded<T>(Func<T> action)
    {
        try
        {
            return action();
        }
        catch (SqliteException problem)
        {
            throw StoreException.Of(problem, _path);
        }
    }

    internal const string JobColumns = "number, title, customer, engine, opened, closed, entries, changed";

    internal static JobRow Row(SqliteDataReader row) => new(
        row.GetString(0), row.Text(1), row.Text(2), row.Text(3), row.Text(4), row.GetInt64(5) == 1, row.GetInt64(6), Read(row.GetString(7)));

    internal IReadOnlyList<Entry> EntriesOf(long job) => Sql.Rows(
        _connection, "SELECT key, kind, body, at, by FROM entry WHERE job = @job ORDER BY id",
        row => new Entry(row.GetString(0), EntryWords.Kinds.Find(row.GetString(1)) ?? throw Unknown(row.GetString(1)), row.GetString(2), Read(row.GetString(3)), row.Text(4)),
        ("job", job));

    private static SqliteConnection Connect(string path)
    {
        SqliteLibrary.SeekBesideProgram();
        SqliteConnection connection = new(new SqliteConnectionStringBuilder { DataSource = path, ForeignKeys = true, DefaultTimeout = 5, Pooling = false }.ToString());
        connection.Open();
        return connection;
    }

    private static void Prepare(SqliteConnection connection, string path)
    {
        long id = Sql.Scalar(connection, "PRAGMA application_id"), version = Sql.Scalar(connection, "PRAGMA user_version");
        bool isEmpty = version == 0 && Sql.Scalar(connection, "SELECT count(*) FROM sqlite_schema") == 0;
        if (!isEmpty && id != Schema.ApplicationId)
        {
            throw new StoreException($"{path}: this is a database of another program. Name the store's file.");
        }

        if (version > Schema.Version)
        {
            throw new StoreException($"{path}: the store was written by a later version of this program ({version}; this one knows {Schema.Version}). Use that version.");
        }

        Sql.Run(connection, "PRAGMA journal_mode = WAL; PRAGMA synchronous = FULL; PRAGMA trusted_schema = OFF;");
        if (version < Schema.Version)
        {
            if (!isEmpty)
            {
                string copy = string.Create(CultureInfo.InvariantCulture, $"{path}.version-{version}");
                if (!File.Exists(copy))
                {
                    Sql.Run(connection, "VACUUM INTO @copy", ("copy", copy));
                }
            }

            Schema.Upgrade(connection, (int)version);
        }
    }

    private void Insert(long job, IReadOnlyList<Entry> entries)
    {
        foreach (Entry entry in entries)
        {
            Sql.Run(
                _connection, "INSERT INTO entry (job, key, at, by, kind, body) VALUES (@job, @key, @at, @by, @kind, @body)",
                ("job", job), ("key", entry.Key), ("at", Written(entry.At)), ("by", entry.By), ("kind", EntryWords.Kinds.WordFor(entry.Kind)), ("body", entry.Body));
        }
    }

    private static Job Folded(IReadOnlyList<Entry> entries) => JobFold.Of(entries).Job ?? throw new ArgumentException("The entries are no job.", nameof(entries));

    private void UpdateRow(Job job, IReadOnlyList<Entry> entries)
    {
        JobRow row = JobRow.Of(job, JobFold.IsClosed(entries), entries.Count, entries[^1].At);
        Sql.Run(
            _connection,
            "UPDATE job SET title = @title, customer = @customer, engine = @engine, opened = @opened, closed = @closed, entries = @entries, changed = @changed WHERE number = @number",
            ("title", row.Title), ("customer", row.Customer), ("engine", row.Engine), ("opened", row.Opened), ("closed", row.Closed), ("entries", row.Entries),
            ("changed", Written(row.Changed)), ("number", job.Number));
    }

    private long? Id(string number) => Sql.Rows(_connection, "SELECT id FROM job WHERE number = @number", row => (long?)row.GetInt64(0), ("number", number)).FirstOrDefault();

    private static string Where(JobFilter filter)
    {
        string[] conditions =
        [
            .. new[]
            {
                filter.Customer is null ? null : "customer LIKE @customer ESCAPE '\\'", filter.Engine is null ? null : "engine LIKE @engine ESCAPE '\\'",
                filter.Closed is null ? null : "closed = @closed",
                filter.Text is null ? null : "(number LIKE @text ESCAPE '\\' OR title LIKE @text ESCAPE '\\' OR customer LIKE @text ESCAPE '\\' OR engine LIKE @text ESCAPE '\\')",
            }.OfType<string>(),
        ];
        return conditions.Length == 0 ? "" : $"WHERE {string.Join(" AND ", conditions)}";
    }

    private static string? Like(string? part) => part is null
        ? null
        : $"%{part.Replace("\\", "\\\\", StringComparison.Ordinal).Replace("%", "\\%", StringComparison.Ordinal).Replace("_", "\\_", StringComparison.Ordinal)}%";

    internal static string Written(DateTimeOffset at) => at.ToUniversalTime().ToString("yyyy-MM-dd'T'HH:mm:ss.fff'Z'", CultureInfo.InvariantCulture);

    // As Written has it, figure by figure: the framework's reader of any format takes a twentieth of the time in which a job is read and judged.
    private static DateTimeOffset Read(string at) => new(
        Whole(at, 0, 4), Whole(at, 5, 2), Whole(at, 8, 2), Whole(at, 11, 2), Whole(at, 14, 2), Whole(at, 17, 2), Whole(at, 20, 3), TimeSpan.Zero);

    private static int Whole(string text, int from, int length) => int.Parse(text.AsSpan(from, length), NumberStyles.None, CultureInfo.InvariantCulture);

    private static StoreException Unknown(string kind) => new($"The store holds an entry of kind {kind}, which this version does not know. Use a later version.");

    private static byte[] Deflated(byte[] content)
    {
        using MemoryStream packed = new();
        using (ZLibStream zlib = new(packed, CompressionLevel.Optimal, leaveOpen: true))
        {
            zlib.Write(content);
        }

        return packed.ToArray();
    }

    private static byte[] Inflated(byte[] packed)
    {
        using ZLibStream zlib = new(new MemoryStream(packed), CompressionMode.Decompress);
        using MemoryStream content = new();
        zlib.CopyTo(content);
        return content.ToArray();
    }
}
