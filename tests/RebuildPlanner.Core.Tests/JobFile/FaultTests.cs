using System.Text;
using RebuildPlanner.Core.JobFile;

namespace RebuildPlanner.Core.Tests.JobFile;

public class FaultTests
{
    public static TheoryData<int> Broken => [.. Enumerable.Range(0, BrokenFiles.All.Length)];

    [Theory]
    [MemberData(nameof(Broken))]
    public void One_thing_wrong_is_one_fault_with_line_place_value_and_what_would_be_right(int number)
    {
        (int line, string text, string path, string? value, string fragment) = BrokenFiles.All[number];

        (_, IReadOnlyList<Fault> faults) = JobFiles.Read(JobFiles.With((line, text)));

        // A field typed wrong may be missed as well; the table names the fault that is on its own place.
        Fault fault = Assert.Single(faults, fault => fault.Path == path);
        Assert.Equal((line, value), (fault.Line, fault.Value));
        Assert.Contains(fragment, fault.Message, StringComparison.Ordinal);
        Assert.InRange(faults.Count, 1, path == "readings[0].value" ? 2 : 1);
    }

    [Fact]
    public void The_table_of_broken_files_is_whole() => Assert.InRange(BrokenFiles.All.Length, 120, int.MaxValue);

    [Fact]
    public void The_small_file_itself_has_no_fault() => Assert.Empty(JobFiles.Read(JobFiles.With()).Faults);

    [Fact]
    public void Every_fault_is_told_at_once_and_in_the_order_of_the_file()
    {
        string text = JobFiles.With(
            (JobFiles.NotesLine, "\"notes\": [ 1, \"x\", 2 ]"),
            (JobFiles.EngineLine, "\"engine\": { \"cylinders\": 2, \"stroke\": 88 },"),
            (JobFiles.ReadingsLine, "\"readings\": [ { \"what\": \"bore\", \"cylinder\": \"3\", \"valeu\": \"84 mm\", \"gauge\": \"mik\" } ],"),
            (JobFiles.JobLine, "\"job\": {},"));

        (_, IReadOnlyList<Fault> faults) = JobFiles.Read(text);

        Assert.Equal(
            ["job.number", "engine.stroke", "readings[0].value", "readings[0].cylinder", "readings[0].valeu", "readings[0].gauge", "notes[0]", "notes[2]"],
            faults.Select(fault => fault.Path));
        Assert.Equal([4, 5, 8, 8, 8, 8, 17, 17], faults.Select(fault => fault.Line));
    }

    [Fact]
    public void Labels_that_cannot_be_read_make_no_reference_unknown()
    {
        string text = JobFiles.With(
            (JobFiles.EngineLine, "\"engine\": { \"cylinders\": \"two\" },"),
            (JobFiles.ReadingsLine, "\"readings\": [ { \"what\": \"bore\", \"cylinder\": \"1\", \"value\": \"84 mm\" } ],"));

        Assert.Equal("engine.cylinders", Assert.Single(JobFiles.Read(text).Faults).Path);
    }

    [Fact]
    public void A_field_that_would_be_refused_here_is_not_offered()
    {
        string text = JobFiles.With(
            (JobFiles.ReadingsLine, """ "readings": [ { "what": "bore", "cylinder": "1", "value": "84 mm", "colour": "red" } ],"""));

        string message = Assert.Single(JobFiles.Read(text).Faults).Message;

        Assert.Contains("axis", message, StringComparison.Ordinal);
        Assert.DoesNotContain("piece", message, StringComparison.Ordinal);
        Assert.DoesNotContain("drop", message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_later_version_is_the_only_thing_said()
    {
        string text = JobFiles.With((JobFiles.VersionLine, "\"version\": 3,"), (JobFiles.NotesLine, "\"notes\": 5"));

        Assert.Contains("version 1 only", Assert.Single(JobFiles.Read(text).Faults).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_gauge_of_a_ring_is_named_and_one_that_hangs_on_it_is_not()
    {
        string text = JobFiles.With((JobFiles.GaugesLine,
            """
            "gauges": [ { "id": "a", "kind": "dial", "setWith": "b" }, { "id": "b", "kind": "dial", "setWith": "a" }, { "id": "c", "kind": "dial", "setWith": "a" } ],
            """));

        Assert.Equal(["gauges[0].setWith", "gauges[1].setWith"], JobFiles.Read(text).Faults.Select(fault => fault.Path));
    }

    [Theory]
    [InlineData("given", "{ \"what\": \"piston protrusion\", \"value\": \"0.3 mm proud\", \"stage\": \"as received\" }", "given[0].what")]
    [InlineData("assumed", "{ \"what\": \"piston protrusion\", \"cylinder\": \"1\", \"value\": \"0.3 mm proud\", \"stage\": \"as received\" }", "assumed[0].what")]
    [InlineData("given", "{ \"what\": \"piston protrusion\", \"cylinder\": \"2\", \"value\": \"0.3 mm proud\", \"stage\": \"as received\" }", null)]
    [InlineData("given", "{ \"what\": \"piston protrusion\", \"value\": \"0.3 mm proud\", \"stage\": \"as machined\" }", null)]
    public void Deck_and_protrusion_meet_only_on_one_cylinder_and_stage(string list, string figure, string? path)
    {
        string text = JobFiles.With(
            (JobFiles.ReadingsLine, """ "readings": [ { "what": "deck", "cylinder": "1", "value": "0.2 mm below", "stage": "as received" } ],"""),
            (list == "given" ? JobFiles.GivenLine : JobFiles.AssumedLine, $"\"{list}\": [ {figure} ],"));

        Assert.Equal(path, JobFiles.Read(text).Faults.SingleOrDefault()?.Path);
    }

    [Fact]
    public void A_struck_reading_contradicts_nothing()
    {
        string text = JobFiles.With((JobFiles.ReadingsLine,
            """
            "readings": [ { "what": "deck", "cylinder": "1", "value": "0.2 mm below", "struck": "slipped" }, { "what": "piston protrusion", "cylinder": "1", "value": "0.2 mm proud" }, { "what": "crown fill", "cylinder": "1", "value": "30 cc", "drop": "5 mm" }, { "what": "crown fill", "cylinder": "1", "value": "30 cc", "drop": "5 mm ± 1 mm", "struck": "leaked" } ],
            """));

        Assert.Empty(JobFiles.Read(text).Faults);
    }

    [Fact]
    public void A_head_is_named_where_there_are_several()
    {
        string text = JobFiles.With(
            (JobFiles.EngineLine, """ "engine": { "cylinders": 2, "heads": [ { "label": "a", "cylinders": ["1"] }, { "label": "b", "cylinders": ["2"] } ] },"""),
            (JobFiles.ReadingsLine,
            """ "readings": [ { "what": "head height", "value": "120 mm" }, { "what": "gasket thickness", "cylinder": "1", "head": "b", "value": "1 mm" } ],"""));

        Assert.Equal(["readings[0].head", "readings[1].head"], JobFiles.Read(text).Faults.Select(fault => fault.Path));
    }

    [Fact]
    public void A_fault_deep_in_a_long_file_stands_on_its_own_line()
    {
        string text = Encoding.UTF8.GetString(JobFiles.Complete).Replace("\"value\": \"131.42 mm\"", "\"value\": 131.42", StringComparison.Ordinal);
        int line = text[..text.IndexOf("131.42", StringComparison.Ordinal)].Count(letter => letter == '\n') + 1;

        Fault fault = Assert.Single(JobFiles.Read(text).Faults);

        Assert.Equal((line, "readings[10].value", "131.42"), (fault.Line, fault.Path, fault.Value));
    }
}
