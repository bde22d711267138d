namespace RebuildPlanner.Sheets.Tests;

/// <summary>The tests that measure with the PDF library's own fonts, which it keeps for one document at a time: they run one after the other.</summary>
internal static class OneDocument
{
    public const string AtATime = "one document at a time";
}
