using Microsoft.Data.Sqlite;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Store.Tests;

public sealed class StoreCareTests : IDisposable
{
    private readonly StoreFiles _files = new();

    public void Dispose() => _files.Dispose();

    [Fact]
    public void A_sound_store_is_found_sound()
    {
        using JobStore store = Filled();

        Assert.Empty(StoreCare.Check(store, out int jobs));
        Assert.Equal(3, jobs);
    }

    [Theory]
    [InlineData("DROP TRIGGER entry_is_never_changed", "the trigger entry_is_never_changed is missing")]
    [InlineData("DROP TRIGGER entry_is_never_taken_out; CREATE TRIGGER entry_is_never_taken_out BEFORE DELETE ON entry BEGIN SELECT 1; END", "the trigger entry_is_never_taken_out is not as it should be")]
    [InlineData("DROP INDEX entry_of_job", "the index entry_of_job is missing")]
    [InlineData("UPDATE job SET customer = 'another' WHERE number = '2026-041'", "job 2026-041: its line in lists is not what its entries say")]
    [InlineData("INSERT INTO entry (job, key, at, kind, body) SELECT id, 'x', '2026-11-03T10:20:00.000Z', 'reading', '{\"what\":\"bor\"}' FROM job WHERE number = '2026-041'", "job 2026-041: readings[")]
    [InlineData("INSERT INTO entry (job, key, at, kind, body) SELECT id, 'x', '2026-11-03T10:20:00.000Z', 'riddle', '{}' FROM job WHERE number = '2026-041'", "an entry of kind riddle")]
    public void What_is_wrong_is_found_and_named(string sql, string found)
    {
        Filled().Dispose();
        using (SqliteConnection anyone = new($"Data Source={_files.Store};Pooling=False"))
        {
            anyone.Open();
            Sql.Run(anyone, sql);
        }

        using JobStore store = _files.Open();

        Assert.Contains(StoreCare.Check(store, out _), line => line.Contains(found, StringComparison.Ordinal));
    }

    [Fact]
    public void A_damaged_page_is_found()
    {
        Filled().Dispose();
        byte[] file = File.ReadAllBytes(_files.Store);
        const int Page = 4096;
        Random random = new(7);
        for (int at = 5 * Page; at < 12 * Page; at++)
        {
            file[at] = (byte)random.Next(256);
        }

        File.WriteAllBytes(_files.Store, file);

        bool found;
        try
        {
            using JobStore store = _files.Open();
            found = StoreCare.Check(store, out _).Count > 0;
        }
        catch (StoreException problem)
        {
            found = problem.Message.Contains("damaged", StringComparison.Ordinal);
        }

        Assert.True(found);
    }

    [Fact]
    public void A_backup_holds_what_the_store_held_and_is_put_back_with_the_other_kept()
    {
        using (JobStore store = Filled())
        {
            StoreCare.Backup(store, _files.At("backup.db"));
            store.Append("2026-041", StoreFiles.Add(StoreFiles.Reading("later", "88 mm")));
            Assert.Throws<StoreException>(() => StoreCare.Backup(store, _files.At("backup.db")));
        }

        string kept = StoreCare.Restore(_files.At("backup.db"), _files.Store, StoreFiles.When)!;

        using JobStore restored = _files.Open(), before = JobStore.Open(kept);
        Assert.DoesNotContain(restored.Entries("2026-041")!, entry => entry.Key == "later");
        Assert.Contains(before.Entries("2026-041")!, entry => entry.Key == "later");
        Assert.Empty(StoreCare.Check(restored, out int jobs));
        Assert.Equal(3, jobs);
    }

    [Fact]
    public void What_is_no_sound_backup_is_not_put_in_the_stores_place()
    {
        Filled().Dispose();
        File.WriteAllText(_files.At("text.db"), "this is no database, though its name says so");
        byte[] before = File.ReadAllBytes(_files.Store);

        Assert.Throws<StoreException>(() => StoreCare.Restore(_files.At("text.db"), _files.Store, StoreFiles.When));
        Assert.Throws<StoreException>(() => StoreCare.Restore(_files.At("no.db"), _files.Store, StoreFiles.When));

        Assert.Equal(before, File.ReadAllBytes(_files.Store));
    }

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    public void A_store_of_every_earlier_version_is_brought_up_to_date_after_a_copy(int version)
    {
        Job job = StoreFiles.Sample("van-four.json");
        using (SqliteConnection old = new($"Data Source={_files.Store};Pooling=False"))
        {
            old.Open();
            for (int script = 0; script < version; script++)
            {
                Sql.Run(old, Schema.Scripts()[script]);
            }

            if (version > 0)
            {
                Sql.Run(old, $"PRAGMA application_id = {Schema.ApplicationId}; PRAGMA user_version = {version};");
                Sql.Run(old, "INSERT INTO job (number, closed, entries, changed) VALUES ('2026-041', 0, 0, '2026-11-03T10:20:00.000Z')");
                foreach (Entry entry in StoreFiles.EntriesOf(job))
                {
                    Sql.Run(
                        old, "INSERT INTO entry (job, key, at, kind, body) VALUES (1, @key, '2026-11-03T10:20:00.000Z', @kind, @body)",
                        ("key", entry.Key), ("kind", EntryWords.Kinds.WordFor(entry.Kind)), ("body", entry.Body));
                }
            }
        }

        using JobStore store = _files.Open();

        Assert.Equal(Schema.Version, Sql.Scalar(store.Connection, "PRAGMA user_version"));
        Assert.Equal(version > 0, File.Exists($"{_files.Store}.version-{version}"));
        if (version > 0)
        {
            Assert.Equal(job, JobFold.Of(store.Entries("2026-041")!).Job);
            Assert.NotEmpty(Sql.Rows(store.Connection, "SELECT * FROM reading", row => row.GetString(0)));
        }
    }

    [Fact]
    public void There_are_as_many_versions_as_scripts() => Assert.Equal(Schema.Version, Schema.Scripts().Count);

    [Fact]
    public void A_later_store_a_foreign_one_and_what_is_none_are_refused_untouched()
    {
        using (SqliteConnection foreign = new($"Data Source={_files.At("foreign.db")};Pooling=False"))
        {
            foreign.Open();
            Sql.Run(foreign, "CREATE TABLE recipe (name TEXT); INSERT INTO recipe VALUES ('bread')");
        }

        Filled().Dispose();
        using (SqliteConnection later = new($"Data Source={_files.Store};Pooling=False"))
        {
            later.Open();
            Sql.Run(later, "PRAGMA user_version = 99");
        }

        File.WriteAllText(_files.At("text.db"), string.Concat(Enumerable.Repeat("no database at all. ", 100)));
        Assert.Contains("another program", Assert.Throws<StoreException>(() => JobStore.Open(_files.At("foreign.db"))).Message, StringComparison.Ordinal);
        Assert.Contains("later version", Assert.Throws<StoreException>(_files.Open).Message, StringComparison.Ordinal);
        Assert.Contains("not a store", Assert.Throws<StoreException>(() => JobStore.Open(_files.At("text.db"))).Message, StringComparison.Ordinal);
        Assert.Contains("cannot be opened", Assert.Throws<StoreException>(() => JobStore.Open(_files.At(Path.Combine("no", "jobs.db")))).Message, StringComparison.Ordinal);
        using SqliteConnection still = new($"Data Source={_files.At("foreign.db")};Pooling=False");
        still.Open();
        Assert.Equal(["bread"], Sql.Rows(still, "SELECT name FROM recipe", row => row.GetString(0)));
    }

    [Fact]
    public void Who_waits_too_long_for_another_writer_is_told_so()
    {
        using JobStore store = Filled();
        using SqliteConnection other = new($"Data Source={_files.Store};Pooling=False");
        other.Open();
        using SqliteTransaction writing = other.BeginTransaction();
        Sql.Run(other, "UPDATE job SET title = title");
        store.Connection.DefaultTimeout = 1;

        StoreException problem = Assert.Throws<StoreException>(() => store.Append("2026-041", StoreFiles.Add(StoreFiles.Reading("r", "88 mm"))));

        Assert.Contains("another program has been writing", problem.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_full_disk_is_told_and_nothing_is_half_written()
    {
        using JobStore store = Filled();
        IReadOnlyList<Entry> before = store.Entries("2026-041")!;
        long pages = Sql.Scalar(store.Connection, "PRAGMA page_count");
        Sql.Run(store.Connection, $"PRAGMA max_page_count = {pages}"); // SQLite's own way to stand on a full disk

        StoreException problem = Assert.Throws<StoreException>(() => store.Append(
            "2026-041", StoreFiles.Add(StoreFiles.Reading("small", "88 mm"), new Entry("large", EntryKind.Note, $"\"{new string('x', 200_000)}\"", StoreFiles.When))));

        Assert.Contains("the disk is full. Nothing was written", problem.Message, StringComparison.Ordinal);
        Assert.Equal(before, store.Entries("2026-041"));
        Assert.Empty(StoreCare.Check(store, out _));
    }

    [Fact]
    public void A_store_that_may_only_be_read_is_read_and_not_written()
    {
        using JobStore store = Filled();
        Sql.Run(store.Connection, "PRAGMA query_only = ON");

        StoreException problem = Assert.Throws<StoreException>(() => store.Append("2026-041", StoreFiles.Add(StoreFiles.Reading("r", "88 mm"))));

        Assert.Contains("may be read but not written", problem.Message, StringComparison.Ordinal);
        Assert.NotNull(store.Entries("2026-041"));
    }

    private JobStore Filled()
    {
        JobStore store = _files.Open();
        foreach (string sample in new[] { "van-four.json", "hill-climb-vee-eight.json", "fen-boat-three.json" })
        {
            store.Start(StoreFiles.EntriesOf(StoreFiles.Sample(sample)));
        }

        return store;
    }
}
