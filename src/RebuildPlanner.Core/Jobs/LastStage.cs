namespace RebuildPlanner.Core.Jobs;

/// <summary>How far a job has come.</summary>
public static class LastStage
{
    /// <summary>The last stage the job holds anything of; as received for a job that names none.</summary>
    public static Stage Of(Job job) =>
        job.Readings.Where(reading => reading.Struck is null).Select(reading => reading.Stage)
            .Concat(job.Given.Concat(job.Assumed).Select(stated => stated.Stage))
            .Concat(job.Fitted.Select(fitted => (Stage?)fitted.Stage))
            .Concat(job.Cuts.Select(cut => (Stage?)cut.Stage))
            .Max() ?? Stage.AsReceived;
}
