using System.Globalization;
using Microsoft.Data.Sqlite;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Store;

/// <summary>Looks after a store as a whole: checks it, copies it, puts a copy in its place.</summary>
public static class StoreCare
{
    /// <summary>Everything wrong with a store, in words; empty where all is well.</summary>
    /// <param name="store">The store.</param>
    /// <param name="jobs">How many jobs were folded.</param>
    public static IReadOnlyList<string> Check(JobStore store, out int jobs)
    {
        SqliteConnection connection = store.Connection;
        List<string> wrong = [];
        int folded = 0;
        store.Guarded(() =>
        {
            wrong.AddRange(Sql.Rows(connection, "PRAGMA integrity_check", row => row.GetString(0)).Where(line => line != "ok").Select(line => $"the file: {line}"));
            if (wrong.Count > 0)
            {
                return 0;
            }

            wrong.AddRange(Sql.Rows(connection, "PRAGMA foreign_key_check", row => $"the file: a row of {row.GetString(0)} belongs to nothing"));
            wrong.AddRange(SchemaFaults(connection));
            foreach ((long id, string number) in Sql.Rows(connection, "SELECT id, number FROM job ORDER BY id", row => (row.GetInt64(0), row.GetString(1))))
            {
                folded++;
                wrong.AddRange(JobFaults(store, id, number));
            }

            return 0;
        });
        jobs = folded;
        return wrong;
    }

    /// <summary>Copies a store, while others may be writing, into a new file.</summary>
    /// <exception cref="StoreException">The file is there already, or cannot be written.</exception>
    public static void Backup(JobStore store, string to)
    {
        if (File.Exists(to))
        {
            throw new StoreException($"{to}: there is a file here already; it was left as it is. Name another.");
        }

        store.Guarded(() => Sql.Run(store.Connection, "VACUUM INTO @to", ("to", to)));
    }

    /// <summary>Puts a backup in a store's place; what stood there is kept beside it.</summary>
    /// <param name="from">The backup.</param>
    /// <param name="path">The store's file.</param>
    /// <param name="now">The time, for the name of what is kept.</param>
    /// <returns>Where what stood there is kept, or null where nothing did.</returns>
    /// <exception cref="StoreException">The backup is no store or is damaged; nothing was done.</exception>
    public static string? Restore(string from, string path, DateTimeOffset now)
    {
        if (!File.Exists(from))
        {
            throw new StoreException($"{from}: there is no such file.");
        }

        string beside = path + ".restoring";
        File.Delete(beside);
        try
        {
            CopyOf(from, beside);
            using JobStore copy = JobStore.Open(beside);
            IReadOnlyList<string> wrong = Check(copy, out _);
            if (wrong.Count > 0)
            {
                throw new StoreException($"{from}: the backup is damaged ({wrong[0]}). Nothing was done; take another.");
            }
        }
        catch (StoreException)
        {
            File.Delete(beside);
            throw;
        }

        string? kept = null;
        if (File.Exists(path))
        {
            kept = string.Create(CultureInfo.InvariantCulture, $"{path}.before-{now:yyyyMMdd'T'HHmmss}");
            MoveAside(path, kept);
        }

        File.Move(beside, path);
        return kept;
    }

    // The backup itself is only read: an older one is brought up to date in the copy.
    private static void CopyOf(string from, string to)
    {
        try
        {
            using SqliteConnection backup = new(new SqliteConnectionStringBuilder { DataSource = from, Mode = SqliteOpenMode.ReadOnly, Pooling = false }.ToString());
            backup.Open();
            Sql.Run(backup, "VACUUM INTO @to", ("to", to));
        }
        catch (SqliteException problem)
        {
            throw StoreException.Of(problem, from);
        }
    }

    /// <summary>The log of a store that was not closed in order belongs to it and goes with it.</summary>
    private static void MoveAside(string path, string kept)
    {
        File.Move(path, kept);
        foreach (string part in new[] { "-wal", "-shm" })
        {
            if (File.Exists(path + part))
            {
                File.Move(path + part, kept + part);
            }
        }
    }

    /// <summary>Tables, views and triggers that are not as the scripts make them.</summary>
    private static IEnumerable<string> SchemaFaults(SqliteConnection connection)
    {
        using SqliteConnection fresh = new("Data Source=:memory:");
        fresh.Open();
        foreach (string script in Schema.Scripts())
        {
            Sql.Run(fresh, script);
        }

        const string Objects = "SELECT type || ' ' || name, sql FROM sqlite_schema WHERE sql IS NOT NULL";
        Dictionary<string, string> there = Sql.Rows(connection, Objects, row => (Name: row.GetString(0), Text: row.GetString(1))).ToDictionary(row => row.Name, row => row.Text);
        return Sql.Rows(fresh, Objects, row => (Name: row.GetString(0), Text: row.GetString(1)))
            .Where(wanted => !there.TryGetValue(wanted.Name, out string? text) || text != wanted.Text)
            .Select(wanted => there.ContainsKey(wanted.Name) ? $"the {wanted.Name} is not as it should be" : $"the {wanted.Name} is missing");
    }

    private static IEnumerable<string> JobFaults(JobStore store, long id, string number)
    {
        IReadOnlyList<Entry> entries;
        JobRow row;
        try
        {
            entries = store.EntriesOf(id);
            row = Sql.Rows(store.Connection, $"SELECT {JobStore.JobColumns} FROM job WHERE id = @id", JobStore.Row, ("id", id))[0];
        }
        catch (Exception problem) when (problem is StoreException or FormatException)
        {
            return [$"job {number}: {problem.Message}"];
        }

        (Job? job, IReadOnlyList<Fault> faults) = JobFold.Of(entries);
        if (job is null)
        {
            return faults.Select(fault => $"job {number}: {fault.Path}: {fault.Message}");
        }

        return JobRow.Of(job, JobFold.IsClosed(entries), entries.Count, entries[^1].At) == row ? [] : [$"job {number}: its line in lists is not what its entries say"];
    }
}
