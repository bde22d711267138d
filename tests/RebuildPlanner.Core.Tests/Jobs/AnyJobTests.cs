using CsCheck;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Jobs;

public class AnyJobTests
{
    // Whatever a job file may hold, the answer is results: nothing throws, no number is printed that is not one, probabilities are probabilities.
    [Fact]
    public void Any_job_that_reads_without_fault_has_results_at_every_stage() => RandomJobs.Job.Sample(job =>
    {
        foreach (Stage stage in Enum.GetValues<Stage>())
        {
            Results results = StageResults.Of(job, stage);
            Assert.Equal(job.Engine.Cylinders, results.Cylinders.Count);
            Assert.All(results.Cylinders, cylinder => Assert.True(cylinder.CompressionRatio is null || double.IsFinite(cylinder.CompressionRatio.Value)));
            Assert.All(results.Verdicts, verdict => Assert.InRange(verdict.Probability ?? 0.5, 0.0, 1.0));
            Assert.NotEmpty(ResultsJson.Write(results));
        }
    }, iter: 100);
}
