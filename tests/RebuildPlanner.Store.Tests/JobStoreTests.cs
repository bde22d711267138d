using Microsoft.Data.Sqlite;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Store.Tests;

public sealed class JobStoreTests : IDisposable
{
    private readonly StoreFiles _files = new();

    public void Dispose() => _files.Dispose();

    [Theory]
    [InlineData("van-four.json")]
    [InlineData("hill-climb-vee-eight.json")]
    [InlineData("fen-boat-three.json")]
    public void A_job_comes_back_as_it_went_in(string sample)
    {
        Job job = StoreFiles.Sample(sample);
        using (JobStore store = _files.Open())
        {
            Assert.True(store.Start(StoreFiles.EntriesOf(job)));
        }

        using JobStore again = _files.Open();
        IReadOnlyList<Entry> entries = again.Entries(job.Number)!;
        Assert.Equal(StoreFiles.EntriesOf(job), entries);
        Assert.Equal(job, JobFold.Of(entries).Job);
    }

    [Fact]
    public void A_number_is_given_once()
    {
        using JobStore store = _files.Open();

        Assert.True(store.Start(StoreFiles.Small()));
        Assert.False(store.Start(StoreFiles.Small()));
        Assert.Equal(1, store.Count(new JobFilter()));
        Assert.Null(store.Entries("2026-999"));
        Assert.Null(store.Append("2026-999", StoreFiles.Add(StoreFiles.Reading("r", "78 mm"))));
    }

    [Fact]
    public void What_is_judged_wrong_is_not_written()
    {
        using JobStore store = _files.Open();
        store.Start(StoreFiles.Small());

        JobStore.Change change = store.Append("2026-001", _ => new JobStore.Change([StoreFiles.Reading("r", "78 mm")], [new Fault(0, "value", null, "wrong")]))!;

        Assert.Single(change.Faults);
        Assert.Equal(StoreFiles.Small(), store.Entries("2026-001"));
    }

    [Fact]
    public void An_entry_is_never_changed_or_taken_out_by_anyone()
    {
        using (JobStore store = _files.Open())
        {
            store.Start(StoreFiles.Small());
            store.AddGauge("dial", new Entry("g", EntryKind.Gauge, """{"id":"dial","kind":"dial gauge"}""", StoreFiles.When));
            store.Append("2026-001", StoreFiles.Add(new Entry("s", EntryKind.Sheet, "{}", StoreFiles.When)), ("s", [1, 2, 3]));
        }

        using SqliteConnection anyone = new($"Data Source={_files.Store};Pooling=False");
        anyone.Open();
        foreach (string table in new[] { "entry", "gauge", "issued" })
        {
            SqliteException change = Assert.Throws<SqliteException>(() => Sql.Run(anyone, $"UPDATE {table} SET {(table == "issued" ? "pdf = x'00'" : "body = '1'")}"));
            SqliteException removal = Assert.Throws<SqliteException>(() => Sql.Run(anyone, $"DELETE FROM {table}"));
            Assert.Contains("never changed", change.Message, StringComparison.Ordinal);
            Assert.Contains("never taken out", removal.Message, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Anyones_SQL_sees_readings_and_figures_as_columns_and_what_was_struck()
    {
        using (JobStore store = _files.Open())
        {
            store.Start(StoreFiles.Small());
            store.Append("2026-001", StoreFiles.Add(StoreFiles.Reading("r1", "78.1 mm"), StoreFiles.Reading("r2", "78.0 mm"), new Entry("g1", EntryKind.Given, """{"what":"crown","value":"1 cc dish","from":"maker"}""", StoreFiles.When)));
            store.Append("2026-001", before => new JobStore.Change([new Entry("s1", EntryKind.Strike, JobVerbs.Strike(before, "r1", "slipped", out _)!, StoreFiles.When)], []));
        }

        using SqliteConnection anyone = new($"Data Source={_files.Store};Mode=ReadOnly;Pooling=False");
        anyone.Open();

        Assert.Equal(
            [("2026-001", "stroke", "78.1 mm", "as received", "T. Arkwell", "slipped"), ("2026-001", "stroke", "78.0 mm", "as received", "T. Arkwell", null)],
            Sql.Rows(anyone, "SELECT job, what, value, stage, by, struck FROM reading ORDER BY key", row => (row.GetString(0), row.GetString(1), row.GetString(2), row.GetString(3), row.GetString(4), row.Text(5))));
        Assert.Equal([("given", "crown", "maker")], Sql.Rows(anyone, "SELECT kind, what, \"from\" FROM figure", row => (row.GetString(0), row.GetString(1), row.GetString(2))));
    }

    [Fact]
    public void A_list_is_last_changed_first_filtered_and_paged()
    {
        using JobStore store = _files.Open();
        foreach ((string number, int minute) in new[] { ("A-1", 5), ("A-2", 9), ("B-1", 7) })
        {
            Entry[] entries =
            [
                new Entry(number + "j", EntryKind.Job, $$"""{"number":"{{number}}","title":"Title 100% of {{number}}"}""", StoreFiles.When),
                new Entry(number + "c", EntryKind.Customer, $$"""{"name":"Customer_{{number[0]}}"}""", StoreFiles.When),
                new Entry(number + "e", EntryKind.Engine, """{"cylinders":1,"description":"pump engine"}""", StoreFiles.When.AddMinutes(minute)),
            ];
            store.Start(entries);
        }

        store.Append("A-1", StoreFiles.Add(new Entry("closed", EntryKind.Closed, "true", StoreFiles.When.AddMinutes(6))));

        string[] Numbers(JobFilter filter, int skip = 0, int take = 10) => [.. store.List(filter, skip, take).Select(row => row.Number)];
        Assert.Equal(["A-2", "B-1", "A-1"], Numbers(new JobFilter()));
        Assert.Equal(["B-1"], Numbers(new JobFilter(), skip: 1, take: 1));
        Assert.Equal(["A-2", "B-1"], Numbers(new JobFilter(Closed: false)));
        Assert.Equal(["A-1"], Numbers(new JobFilter(Closed: true)));
        Assert.Equal(["B-1"], Numbers(new JobFilter(Customer: "customer_b")));
        Assert.Equal(["A-2", "A-1"], Numbers(new JobFilter(Text: "100% of A")));
        Assert.Empty(Numbers(new JobFilter(Text: "100_ of A"))); // signs of LIKE are only signs
        Assert.Equal(2, store.Count(new JobFilter(Text: "100% of A")));
    }

    [Fact]
    public void Opening_a_job_and_paging_the_list_go_by_index()
    {
        using JobStore store = _files.Open();
        string[] Plan(string sql) => [.. Sql.Rows(store.Connection, "EXPLAIN QUERY PLAN " + sql, row => row.GetString(3))];

        Assert.Equal(["SEARCH job USING COVERING INDEX sqlite_autoindex_job_1 (number=?)"], Plan("SELECT id FROM job WHERE number = 'x'"));
        Assert.Equal(["SEARCH entry USING INDEX entry_of_job (job=?)"], Plan("SELECT key, kind, body, at, by FROM entry WHERE job = 1 ORDER BY id"));
        Assert.Equal(["SCAN job USING INDEX job_by_change"], Plan($"SELECT {JobStore.JobColumns} FROM job ORDER BY changed DESC, id DESC LIMIT 20 OFFSET 0"));
    }

    [Fact]
    public void Of_a_gauge_the_last_entry_counts()
    {
        using JobStore store = _files.Open();
        store.AddGauge("dial", new Entry("g1", EntryKind.Gauge, """{"id":"dial","kind":"dial gauge","resolution":"0.01 mm"}""", StoreFiles.When));
        store.AddGauge("burette", new Entry("g2", EntryKind.Gauge, """{"id":"burette","kind":"burette"}""", StoreFiles.When));
        store.AddGauge("dial", new Entry("g3", EntryKind.Gauge, """{"id":"dial","kind":"dial gauge","resolution":"0.002 mm"}""", StoreFiles.When));
        store.AddGauge("dial", new Entry("g1", EntryKind.Gauge, """{"id":"dial","kind":"dial gauge","resolution":"0.01 mm"}""", StoreFiles.When)); // the same again

        Assert.Equal([("burette", """{"id":"burette","kind":"burette"}"""), ("dial", """{"id":"dial","kind":"dial gauge","resolution":"0.002 mm"}""")], store.Gauges());
    }

    [Fact]
    public void An_issued_sheet_is_kept_as_it_was()
    {
        byte[] pdf = [.. Enumerable.Range(0, 5000).Select(number => (byte)(number % 7))];
        using JobStore store = _files.Open();
        store.Start(StoreFiles.Small());
        store.Append("2026-001", StoreFiles.Add(new Entry("s", EntryKind.Sheet, "{}", StoreFiles.When)), ("s", pdf));

        Assert.Equal(pdf, store.Issued("s"));
        Assert.Null(store.Issued("other"));
    }
}
