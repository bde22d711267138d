using System.Text;
using CsCheck;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.JobFile;

public class RoundTripTests
{
    private static Job Complete => JobFiles.Whole(Encoding.UTF8.GetString(JobFiles.Complete));

    [Fact]
    public void The_complete_file_survives_writing_and_reading()
    {
        Job job = Complete;

        Assert.Equal(job, JobFiles.Whole(JobFiles.Written(job)));
    }

    [Fact]
    public void Every_part_of_a_random_job_survives_writing_and_reading() =>
        RandomJobs.Job.Sample(job => Assert.Equal(job, JobFiles.Whole(JobFiles.Written(job))), iter: 300);

    [Fact]
    public void Writing_again_what_was_read_gives_the_same_bytes() =>
        RandomJobs.Job.Sample(job => Assert.Equal(JobFiles.Written(job), JobFiles.Written(JobFiles.Whole(JobFiles.Written(job)))), iter: 100);

    [Fact]
    public void The_file_is_indented_by_two_ends_with_a_line_and_keeps_text_as_typed()
    {
        string text = JobFiles.Written(Complete);

        Assert.StartsWith("{\n  \"format\": \"rebuild-planner-job\",\n  \"version\": 1,\n  \"job\": {\n", text, StringComparison.Ordinal);
        Assert.EndsWith("}\n", text, StringComparison.Ordinal);
        Assert.Contains("\"2.1 cc ± 0.1 cc dome\"", text, StringComparison.Ordinal);
        Assert.Contains("\"40 µm\"", text, StringComparison.Ordinal);
        Assert.Contains("ask for André”", text, StringComparison.Ordinal);
        Assert.Contains("\"price\": 212.50", text, StringComparison.Ordinal);
        Assert.DoesNotContain("null", text, StringComparison.Ordinal);
        Assert.DoesNotContain("\r", text, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_field_of_the_complete_file_is_written_back()
    {
        // What is null in the file, and the two lists filled by default, are the only differences allowed.
        JsonTree before = JsonTreeReader.Read(JobFiles.Complete, out _)!, after = JsonTreeReader.Read(JobFileWriter.Write(Complete), out _)!;

        Assert.Empty(Leaves(before).Except(Leaves(after)));
        Assert.Equal(["parts.pistons[0].common=true", "parts.pistons[0].onOffer=false"], Leaves(after).Where(leaf => leaf.Contains("pistons[0].", StringComparison.Ordinal) && !leaf.Contains(".id", StringComparison.Ordinal)));
    }

    [Fact]
    public void What_is_left_out_is_filled_as_documented()
    {
        Engine engine = JobFiles.Whole(JobFiles.With()).Engine;

        Assert.Equal(["1", "2"], engine.Labels);
        Assert.Equal([new Bank("block", ["1", "2"])], engine.Banks);
        Assert.Equal([new Head("head", ["1", "2"])], engine.Heads);
        Assert.Equal((EngineCycle.FourStroke, Ignition.Spark, Layout.Inline), (engine.Cycle, engine.Ignition, engine.Layout));
        Assert.Equal(
            Layout.Single, JobFiles.Whole(JobFiles.With((JobFiles.EngineLine, "\"engine\": { \"cylinders\": 1 },"))).Engine.Layout);
    }

    [Fact]
    public void Heads_left_out_are_one_a_bank_under_its_name()
    {
        Engine engine = JobFiles.Whole(JobFiles.With((JobFiles.EngineLine,
            """ "engine": { "cylinders": 2, "layout": "vee", "banks": [ { "label": "l", "cylinders": ["1"] }, { "label": "r", "cylinders": ["2"] } ] },""")))
            .Engine;

        Assert.Equal([new Head("l", ["1"]), new Head("r", ["2"])], engine.Heads);
    }

    [Fact]
    public void A_byte_order_mark_comments_trailing_commas_and_null_change_nothing()
    {
        string plain = JobFiles.With();
        string dressed = "\uFEFF// a comment\n" + plain
            .Replace("\"notes\": []", "\"customer\": null, /* here */ \"notes\": [],", StringComparison.Ordinal)
            .Replace("\"cylinders\": 2", "\"cylinders\": 2, \"stroke\": null,", StringComparison.Ordinal);

        Assert.Equal(JobFiles.Whole(plain), JobFiles.Whole(dressed));
    }

    [Fact]
    public void A_ratio_and_a_clock_may_be_numbers_or_text()
    {
        string text = JobFiles.With(
            (JobFiles.LimitsLine, """ "limits": [ { "what": "compression ratio", "max": 10.5 }, { "what": "compression ratio", "max": "10.5" } ],"""),
            (JobFiles.ReadingsLine,
            """ "readings": [ { "what": "wall", "cylinder": "1", "clock": 3, "value": "5 mm" }, { "what": "wall", "cylinder": "1", "clock": "3", "value": "5 mm" } ],"""));

        Job job = JobFiles.Whole(text);

        Assert.Equal(job.Limits[0], job.Limits[1]);
        Assert.Equal(job.Readings[0], job.Readings[1]);
    }

    [Fact]
    public void A_piece_fitted_without_its_set_is_of_the_set_that_holds_it() =>
        Assert.Equal(
            [new Fitted(Stage.Planned, Piston: "std", Cylinder: "1", Piece: "P2")],
            JobFiles.Whole(JobFiles.With((JobFiles.FittedLine, """ "fitted": [ { "stage": "planned", "cylinder": "1", "piece": "P2" } ],"""))).Fitted);

    private static IEnumerable<string> Leaves(JsonTree node) => node.Kind switch
    {
        JsonKind.Object => node.Fields.ToArray().SelectMany(field => Leaves(field.Value!)),
        JsonKind.List => node.Items.SelectMany(Leaves),
        JsonKind.Nothing => [],
        _ => [$"{node.Path}={node.Text}"],
    };
}
