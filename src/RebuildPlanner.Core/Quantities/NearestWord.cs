namespace RebuildPlanner.Core.Quantities;

/// <summary>Finds the known word that a mistyped one was probably meant to be.</summary>
public static class NearestWord
{
    /// <summary>The nearest known word, the first of equals, or null when none is near enough.</summary>
    /// <param name="typed">What was typed.</param>
    /// <param name="known">The words that would be right.</param>
    /// <remarks>
    /// Letters put in, left out, changed or two neighbours swapped each count one (Damerau–Levenshtein, no letter edited twice); upper
    /// and lower case count the same. Near enough is a third of the longer word, at least one, and never the whole of it: beyond that
    /// the suggestion misleads more than it helps.
    /// </remarks>
    public static string? Of(string typed, IEnumerable<string> known)
    {
        string? nearest = null;
        int least = int.MaxValue;
        foreach (string word in known)
        {
            int longer = Math.Max(typed.Length, word.Length);
            int distance = Distance(typed.ToUpperInvariant(), word.ToUpperInvariant());
            if (distance <= Math.Max(1, longer / 3) && distance < longer && distance < least)
            {
                (nearest, least) = (word, distance);
            }
        }

        return nearest;
    }

    private static int Distance(string from, string to)
    {
        int[,] cost = new int[from.Length + 1, to.Length + 1];
        for (int i = 0; i <= from.Length; i++)
        {
            cost[i, 0] = i;
        }

        for (int j = 0; j <= to.Length; j++)
        {
            cost[0, j] = j;
        }

        for (int i = 1; i <= from.Length; i++)
        {
            for (int j = 1; j <= to.Length; j++)
            {
                int change = from[i - 1] == to[j - 1] ? 0 : 1;
                int best = Math.Min(cost[i - 1, j - 1] + change, Math.Min(cost[i - 1, j], cost[i, j - 1]) + 1);
                if (i > 1 && j > 1 && from[i - 1] == to[j - 2] && from[i - 2] == to[j - 1])
                {
                    best = Math.Min(best, cost[i - 2, j - 2] + 1);
                }

                cost[i, j] = best;
            }
        }

        return cost[from.Length, to.Length];
    }
}
