namespace RebuildPlanner.Core.JobFile;

/// <summary>An item that was read and where it stood, kept until what it refers to can be checked.</summary>
internal readonly record struct Sited<T>(T Item, JsonTree Node);
