namespace RebuildPlanner.Core.Quantities;

/// <summary>The closing words and the side each of them means.</summary>
public static class SignWordTable
{
    private static readonly string[] AllWords = ["dish", "dome", "flat", "below", "proud", "flush", "ABDC", "BBDC", "BTDC", "ATDC"];

    /// <summary>The words of a family in the order plus, minus, zero; a family of angles has no word for zero.</summary>
    public static IReadOnlyList<string> Words(SignWords family) => family switch
    {
        SignWords.Crown => ["dish", "dome", "flat"],
        SignWords.Deck => ["below", "proud", "flush"],
        SignWords.Protrusion => ["proud", "below", "flush"],
        SignWords.AfterBottom => ["ABDC", "BBDC"],
        SignWords.BeforeTop => ["BTDC", "ATDC"],
        _ => [],
    };

    /// <summary>The word that closes a figure of the given sign; empty for a family without words.</summary>
    /// <param name="family">The family.</param>
    /// <param name="value">The signed figure as it will be printed: what rounds to zero should be passed as zero.</param>
    public static string Word(SignWords family, double value)
    {
        IReadOnlyList<string> words = Words(family);
        return words.Count == 0 ? "" : value < 0.0 ? words[1] : value > 0.0 || words.Count < 3 ? words[0] : words[2];
    }

    internal static bool IsWord(string typed) => AllWords.Contains(typed);

    internal static string? Nearest(string typed) => NearestWord.Of(typed, AllWords);
}
