namespace RebuildPlanner.Core.Jobs;

/// <summary>A stage of the job, in order of time.</summary>
public enum Stage
{
    /// <summary>Before this rebuild: earlier rebuilds' cuts only.</summary>
    Before,

    /// <summary>As taken in and measured.</summary>
    AsReceived,

    /// <summary>As the plan will leave it.</summary>
    Planned,

    /// <summary>As machined and measured again.</summary>
    AsMachined,
}
