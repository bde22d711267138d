using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Store;

/// <summary>What a list shows of a job.</summary>
/// <param name="Number">Its number.</param>
/// <param name="Title">Its title.</param>
/// <param name="Customer">The customer.</param>
/// <param name="Engine">The engine in words.</param>
/// <param name="Opened">The day it was taken in.</param>
/// <param name="Closed">Whether it is closed.</param>
/// <param name="Entries">How many entries it has.</param>
/// <param name="Changed">When the last was written.</param>
public sealed record JobRow(string Number, string? Title, string? Customer, string? Engine, string? Opened, bool Closed, long Entries, DateTimeOffset Changed)
{
    /// <summary>The row of a job.</summary>
    public static JobRow Of(Job job, bool closed, long entries, DateTimeOffset changed) =>
        new(job.Number, job.Title, job.CustomerName, job.Engine.Description, job.Opened, closed, entries, changed);
}

/// <summary>Which jobs a list is of; null is any.</summary>
/// <param name="Customer">Part of the customer's name.</param>
/// <param name="Engine">Part of the engine's words.</param>
/// <param name="Closed">Closed or open ones.</param>
/// <param name="Text">Part of number, title, customer or engine.</param>
public sealed record JobFilter(string? Customer = null, string? Engine = null, bool? Closed = null, string? Text = null);
