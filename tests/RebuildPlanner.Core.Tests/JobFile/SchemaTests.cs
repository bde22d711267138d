using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using Json.Schema;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.JobFile;

public class SchemaTests
{
    private static readonly JsonDocumentOptions Lenient = new() { CommentHandling = JsonCommentHandling.Skip, AllowTrailingCommas = true };

    private static readonly string SchemaText = RepositoryFiles.Text("docs", "job-file.schema.json");

    private static readonly JsonSchema Schema = JsonSchema.FromText(SchemaText);

    public static TheoryData<string> Files =>
    [
        "tests/Reference/complete-job.json",
        .. new[] { "samples", "templates" }
            .Where(folder => Directory.Exists(RepositoryFiles.At(folder)))
            .SelectMany(folder => Directory.EnumerateFiles(RepositoryFiles.At(folder), "*.json", SearchOption.AllDirectories))
            .Where(file => File.ReadAllText(file).Contains($"\"{JobWords.Format}\"", StringComparison.Ordinal))
            .Select(file => Path.GetRelativePath(RepositoryFiles.Root, file).Replace('\\', '/')),
    ];

    [Theory]
    [MemberData(nameof(Files))]
    public void Every_job_in_the_repository_is_valid(string file) => AssertValid(RepositoryFiles.Text(file.Split('/')));

    [Fact]
    public void What_the_program_writes_is_valid() =>
        AssertValid(JobFiles.Written(JobFiles.Whole(Encoding.UTF8.GetString(JobFiles.Complete))));

    [Fact]
    public void The_closed_lists_are_the_programs_own()
    {
        Assert.Equal(WhatTable.Lines.Select(line => line.Word), Enum("what"));
        Assert.Equal(Subjects.All.Select(subject => subject.Word), Enum("subject"));
        Assert.Equal(JobWords.Cuts.Words, Enum("cutKind"));
        Assert.Equal(JobWords.Stages.Words, Enum("stage"));
        Assert.Equal(JobWords.Stages.Words, Enum("stageOrNull"));
        Assert.Equal(JobWords.Metals.Words, Enum("metal"));
        Assert.Equal([.. JobWords.Depths.Words, .. JobWords.PinEnds.Words], Enum("at"));
        Assert.Equal(JobWords.Axes.Words, Enum("axis"));
        Assert.Equal(JobWords.Valves.Words, Enum("valve"));
    }

    [Theory]
    [InlineData(JobFiles.FormatLine, "\"format\": \"something\",")]
    [InlineData(JobFiles.VersionLine, "\"version\": 2,")]
    [InlineData(JobFiles.JobLine, "\"job\": {},")]
    [InlineData(JobFiles.EngineLine, "\"engine\": { \"cylinders\": 25 },")]
    [InlineData(JobFiles.EngineLine, "\"engine\": { \"cylinders\": 2, \"stroke\": 88 },")]
    [InlineData(JobFiles.EngineLine, "\"engine\": { \"cylinders\": 2, \"layout\": \"vee\" },")]
    [InlineData(JobFiles.EngineLine, "\"engine\": { \"cylinders\": 2, \"blockMetal\": \"zinc\" },")]
    [InlineData(JobFiles.ReadingsLine, "\"readings\": [ { \"what\": \"boer\", \"cylinder\": \"1\", \"value\": \"84 mm\" } ],")]
    [InlineData(JobFiles.ReadingsLine, "\"readings\": [ { \"what\": \"bore\", \"cylinder\": \"1\", \"valeu\": \"84 mm\" } ],")]
    [InlineData(JobFiles.ReadingsLine, "\"readings\": [ { \"what\": \"bore\", \"cylinder\": \"1\", \"value\": \"84.5\" } ],")]
    [InlineData(JobFiles.ReadingsLine, "\"readings\": [ { \"what\": \"bore\", \"cylinder\": \"1\" } ],")]
    [InlineData(JobFiles.ReadingsLine, "\"readings\": [ { \"what\": \"crown fill\", \"cylinder\": \"1\", \"value\": \"30 cc\" } ],")]
    [InlineData(JobFiles.PartsLine, "\"parts\": { \"pistons\": [ { \"id\": \"a\", \"crown\": \"4 cc\" } ] },")]
    [InlineData(JobFiles.CutsLine, "\"cuts\": [ { \"what\": \"head skim\", \"value\": \"0.2 mm\" } ],")]
    [InlineData(JobFiles.LimitsLine, "\"limits\": [ { \"what\": \"compression ratio\" } ],")]
    [InlineData(JobFiles.LimitsLine, "\"limits\": [ { \"what\": \"compression ratio\", \"max\": 9, \"level\": 1.0 } ],")]
    public void A_broken_file_is_not_valid_and_not_read(int line, string text)
    {
        string file = JobFiles.With((line, text));

        Assert.False(Schema.Evaluate(Element(file)).IsValid);
        Assert.NotEmpty(JobFiles.Read(file).Faults);
    }

    [Fact]
    public void The_small_file_is_valid() => AssertValid(JobFiles.With());

    private static void AssertValid(string text)
    {
        EvaluationResults results = Schema.Evaluate(Element(text), new EvaluationOptions { OutputFormat = OutputFormat.List });
        string wrong = string.Join('\n', (results.Details ?? []).Where(detail => detail.Errors is not null)
            .Select(detail => $"{detail.InstanceLocation}: {string.Join("; ", detail.Errors!.Values)}"));
        Assert.True(results.IsValid, wrong);
        Assert.Empty(JobFiles.Read(text).Faults);
    }

    private static JsonElement Element(string text) => JsonDocument.Parse(text, Lenient).RootElement;

    private static IEnumerable<string> Enum(string name) =>
        JsonNode.Parse(SchemaText)!["$defs"]![name]!["enum"]!.AsArray().Where(word => word is not null).Select(word => (string)word!);
}
