using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.JobFile;

/// <summary>The guide to the job file is read by people and by this test: its examples are one job, and all of it must be read.</summary>
public class GuideTests
{
    private const string Fence = "```";

    private static readonly string[] Blocks =
    [
        .. RepositoryFiles.Text("docs", "job-file.md").ReplaceLineEndings("\n").Split(Fence).Where((_, at) => at % 2 == 1)
            .Select(block => block["json\n".Length..].Trim()),
    ];

    [Fact]
    public void The_smallest_job_of_the_guide_is_a_job() => Assert.Equal("2031-7", JobFiles.Whole(Blocks[0]).Number);

    [Fact]
    public void The_smallest_job_and_all_the_other_examples_together_are_a_job()
    {
        Job job = JobFiles.Whole(Blocks[0].TrimEnd('}') + ",\n" + string.Join(",\n", Blocks[1..]) + "\n}");

        Assert.NotNull(job.CustomerName);
        Assert.All(
            new[]
            {
                job.Gauges.Count, job.Readings.Count, job.Given.Count, job.Assumed.Count, job.Pistons.Count, job.Gaskets.Count, job.Fitted.Count,
                job.Cuts.Count, job.Limits.Count, job.Targets.Count, job.Processes.Count, job.Checks.Count, job.Notes.Count,
            },
            count => Assert.NotEqual(0, count));
    }
}
