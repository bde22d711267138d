namespace RebuildPlanner.Core.Jobs;

/// <summary>The words of the stages.</summary>
public static class StageWords
{
    /// <summary>Every stage's word, in order of time.</summary>
    public static IReadOnlyList<string> All { get; } = ["before", "as received", "planned", "as machined"];

    /// <summary>The stage's word.</summary>
    public static string Of(Stage stage) => All[(int)stage];

    /// <summary>The stage of a word, or null.</summary>
    public static Stage? Find(string word)
    {
        int index = All.ToList().IndexOf(word);
        return index < 0 ? null : (Stage)index;
    }
}
