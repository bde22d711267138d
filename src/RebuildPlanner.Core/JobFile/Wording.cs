using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>How faults say what would be right.</summary>
internal static class Wording
{
    private const int LongestList = 30;

    // Where nothing typed comes near, even the whole list of what is better than no answer.
    private const int LongestListAlone = 60;

    // A nearest name among hundreds, asked for once a fault, would make a broken file slower than a whole one.
    private const int MostCandidates = 200;
    private const int LongestTypo = 60;

    public static string Unknown(string noun, string typed, IReadOnlyList<string> known)
    {
        string message = $"unknown {noun} '{JsonTree.Short(typed)}'";
        if (Nearest(typed, known) is { } nearest)
        {
            message += $"; did you mean '{nearest}'?";
        }

        bool suggested = message.EndsWith('?');
        return known.Count switch
        {
            0 => message + $"; no other {noun} is known here",
            <= LongestList => $"{message}{(suggested ? " Known: " : "; known: ")}{Listed(known)}",
            <= LongestListAlone when !suggested => $"{message}; known: {Listed(known)}",
            _ => message,
        };
    }

    public static string? Nearest(string typed, IReadOnlyList<string> known) =>
        typed.Length <= LongestTypo && known.Count <= MostCandidates ? NearestWord.Of(typed, known) : null;

    public static string Listed(IEnumerable<string> words) => string.Join(", ", words.Select(JsonTree.Short));

    /// <summary>A bare number as it would be right, in quotes, with unit and closing word.</summary>
    public static string WithUnit(string number, QuantityRule rule)
    {
        string unit = rule.Kinds[0] switch
        {
            QuantityKind.Length => " mm",
            QuantityKind.Area => " mm2",
            QuantityKind.Volume => " cc",
            QuantityKind.Angle => " deg",
            QuantityKind.Pressure => " kPa",
            QuantityKind.Temperature => " C",
            QuantityKind.SpecificEnergy => " kJ/kg",
            _ => "",
        };
        string word = rule.Signs switch
        {
            SignWords.Crown => " dish",
            SignWords.Deck => " below",
            SignWords.AfterBottom => " ABDC",
            SignWords.BeforeTop => " BTDC",
            _ => "",
        };
        return $"\"{JsonTree.Short(number)}{unit}{word}\"";
    }
}
