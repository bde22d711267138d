using System.Text;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.JobFile;

/// <summary>Job files for tests: a whole one, and a small one of which single lines are exchanged.</summary>
internal static class JobFiles
{
    public const int FormatLine = 2, VersionLine = 3, JobLine = 4, EngineLine = 5, GaugesLine = 6, PartsLine = 7, ReadingsLine = 8, GivenLine = 9,
        AssumedLine = 10, FittedLine = 11, CutsLine = 12, LimitsLine = 13, TargetsLine = 14, ProcessLine = 15, ChecksLine = 16, NotesLine = 17;

    private static readonly string[] Lines =
    [
        "{",
        """  "format": "rebuild-planner-job",""",
        """  "version": 1,""",
        """  "job": { "number": "7" },""",
        """  "engine": { "cylinders": 2 },""",
        """  "gauges": [ { "id": "mic", "kind": "micrometer", "resolution": "0.001 mm" }, { "id": "glass", "kind": "burette", "resolution": "0.1 cc" } ],""",
        """  "parts": { "pistons": [ { "id": "std", "pieces": ["P1", "P2"] }, { "id": "over" } ], "gaskets": [ { "id": "G" } ] },""",
        """  "readings": [],""",
        """  "given": [],""",
        """  "assumed": [],""",
        """  "fitted": [],""",
        """  "cuts": [],""",
        """  "limits": [],""",
        """  "targets": [],""",
        """  "process": [],""",
        """  "checks": [],""",
        """  "notes": []""",
        "}",
    ];

    public static byte[] Complete { get; } = Encoding.UTF8.GetBytes(RepositoryFiles.Text("tests", "Reference", "complete-job.json"));

    public static string With(params (int Line, string Text)[] exchanged)
    {
        string[] lines = [.. Lines];
        foreach ((int line, string text) in exchanged)
        {
            lines[line - 1] = text;
        }

        return string.Join('\n', lines) + "\n";
    }

    public static (Job? Job, IReadOnlyList<Fault> Faults) Read(string text) => JobFileReader.Read(Encoding.UTF8.GetBytes(text));

    public static Job Whole(string text)
    {
        (Job? job, IReadOnlyList<Fault> faults) = Read(text);
        Assert.Empty(faults);
        return job!;
    }

    public static string Written(Job job) => Encoding.UTF8.GetString(JobFileWriter.Write(job));
}
