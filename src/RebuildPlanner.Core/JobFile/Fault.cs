namespace RebuildPlanner.Core.JobFile;

/// <summary>One thing wrong with a job file: where, what stood there and what would be right.</summary>
/// <param name="Line">Line in the file, from 1.</param>
/// <param name="Path">Place in the document, such as <c>readings[3].value</c>.</param>
/// <param name="Value">What stood there, or null where something is missing.</param>
/// <param name="Message">What is wrong and what would be right.</param>
public sealed record Fault(int Line, string Path, string? Value, string Message);
