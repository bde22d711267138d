using CsCheck;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Tests.JobFile;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Entries;

public class JobFoldTests
{
    private static readonly DateTimeOffset When = new(2026, 11, 3, 10, 20, 0, TimeSpan.Zero);

    [Fact]
    public void The_fold_of_a_jobs_entries_is_the_job() => RandomJobs.Job.Sample(
        job =>
        {
            (Job? folded, IReadOnlyList<Fault> faults) = JobFold.Of(EntriesOf(job));

            Assert.Empty(faults);
            Assert.Equal(job, folded);
        },
        iter: 300);

    [Fact]
    public void The_fullest_job_folds_to_itself_and_to_the_same_file()
    {
        Job job = JobFileReader.Read(JobFiles.Complete).Job!;

        Job folded = JobFold.Of(EntriesOf(job)).Job!;

        Assert.Equal(job, folded);
        Assert.Equal(JobFileWriter.Write(job), JobFileWriter.Write(folded));
        Assert.All(EntriesOf(job), entry => Assert.DoesNotContain('\n', entry.Body));
    }

    [Fact]
    public void A_struck_reading_stays_with_its_reason_and_counts_no_more()
    {
        List<Entry> entries = [.. Small(), New("r1", EntryKind.Reading, """{"what":"stroke","value":"78.1 mm"}""")];

        entries.Add(New("s1", EntryKind.Strike, JobVerbs.Strike(entries, "r1", "dial slipped", out string? problem)!));

        Assert.Null(problem);
        Assert.Equal("dial slipped", Assert.Single(JobFold.Of(entries).Job!.Readings).Struck);
    }

    [Fact]
    public void Anything_else_struck_is_gone_from_the_job_but_not_from_its_entries()
    {
        List<Entry> entries = [.. Small(), New("l1", EntryKind.Limit, """{"what":"piston to head","min":"1 mm"}"""), New("l2", EntryKind.Limit, """{"what":"taper","max":"0.02 mm"}""")];
        entries.Add(New("s1", EntryKind.Strike, JobVerbs.Strike(entries, "l1", "typed for another job", out _)!));

        Assert.Equal("taper", Assert.Single(JobFold.Of(entries).Job!.Limits).Subject.Word);
        Assert.Equal(6, entries.Count);
    }

    [Theory]
    [InlineData("nothing", "why", "there is no entry nothing")]
    [InlineData("r1", " ", "struck with a reason")]
    [InlineData("e", "why", "write a new one, and the last counts")]
    [InlineData("r0", "why", "struck already: first reason")]
    public void A_strike_that_makes_no_sense_is_refused(string key, string reason, string message)
    {
        List<Entry> entries = [.. Small(), New("r0", EntryKind.Reading, """{"what":"stroke","value":"78.1 mm"}"""), New("r1", EntryKind.Reading, """{"what":"stroke","value":"78.0 mm"}""")];
        entries.Add(New("s", EntryKind.Strike, JobVerbs.Strike(entries, "r0", "first reason", out _)!));

        Assert.Null(JobVerbs.Strike(entries, key, reason, out string? problem));
        Assert.Contains(message, problem, StringComparison.Ordinal);
    }

    [Fact]
    public void A_wrong_element_is_refused_and_its_faults_are_told_from_the_element_on()
    {
        Entry wrong = New("r1", EntryKind.Reading, """{"what":"bore","cylinder":"3","value":"84,1 mm"}""");

        (Job? job, IReadOnlyList<(Fault Fault, Entry? Of)> faults) = JobVerbs.Add(Small(), wrong);

        Assert.Null(job);
        Assert.Equal(["cylinder", "value"], faults.Select(fault => fault.Fault.Path).Order());
    }

    [Fact]
    public void A_fault_that_lies_with_an_earlier_entry_keeps_its_place()
    {
        Entry[] entries = [.. Small(), New("r1", EntryKind.Reading, """{"what":"deck","cylinder":"1","value":"0.2 mm below","stage":"planned"}""")];

        (Job? job, IReadOnlyList<(Fault Fault, Entry? Of)> faults) = JobVerbs.Add(entries, New("r2", EntryKind.Reading, """{"what":"piston protrusion","cylinder":"1","value":"0.1 mm proud","stage":"planned"}"""));

        Assert.Null(job);
        Assert.NotEmpty(faults);
    }

    [Fact]
    public void A_field_is_set_and_the_last_word_counts()
    {
        List<Entry> entries = [.. Small()];
        foreach ((string path, string? value) in new[] { ("customer.name", "\"Smith & Sons\""), ("engine.cam.inletCloses", "\"52 deg ABDC\""), ("engine.cam.at", "\"seat\""), ("engine.stroke", null) })
        {
            (EntryKind kind, string body) = JobVerbs.Set(entries, path, value, out string? problem)!.Value;
            Assert.Null(problem);
            entries.Add(New(path, kind, body));
        }

        Job job = JobFold.Of(entries).Job!;

        Assert.Equal(("Smith & Sons", "52 deg ABDC", "seat", (string?)null), (job.CustomerName, job.Engine.Cam!.InletCloses!.Text, job.Engine.Cam.At, job.Engine.Stroke?.Text));
        Assert.Null(JobVerbs.Set(entries, "readings.0", "1", out string? refused));
        Assert.Contains("customer.name", refused, StringComparison.Ordinal);
    }

    [Fact]
    public void A_job_is_closed_and_opened_again()
    {
        List<Entry> entries = [.. Small()];
        Assert.False(JobFold.IsClosed(entries));
        entries.Add(New("c1", EntryKind.Closed, "true"));
        Assert.True(JobFold.IsClosed(entries));
        entries.Add(New("c2", EntryKind.Closed, "false"));
        Assert.False(JobFold.IsClosed(entries));
        Assert.NotNull(JobFold.Of(entries).Job);
    }

    private static Entry[] Small() =>
    [
        New("j", EntryKind.Job, """{"number":"2026-001"}"""), New("c", EntryKind.Customer, """{"name":"A Customer"}"""),
        New("e", EntryKind.Engine, """{"cylinders":2,"stroke":"78 mm"}"""),
    ];

    private static Entry New(string key, EntryKind kind, string body) => new(key, kind, body, When);

    private static Entry[] EntriesOf(Job job) => [.. JobEntries.Of(job).Select((entry, index) => New($"{index}", entry.Kind, entry.Body))];
}
