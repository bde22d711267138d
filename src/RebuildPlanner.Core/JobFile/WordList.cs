namespace RebuildPlanner.Core.JobFile;

/// <summary>A closed list of words of the job file and what each stands for: read and written through the same list.</summary>
/// <typeparam name="T">What the words stand for.</typeparam>
/// <param name="entries">Word and meaning, in the order they are listed to a person.</param>
public sealed class WordList<T>(params (string Word, T Meaning)[] entries)
    where T : struct
{
    /// <summary>The words, in order.</summary>
    public IReadOnlyList<string> Words { get; } = Array.ConvertAll(entries, entry => entry.Word);

    /// <summary>What a word stands for, or null for a word not on the list.</summary>
    public T? Find(string word)
    {
        foreach ((string known, T meaning) in entries)
        {
            if (known == word)
            {
                return meaning;
            }
        }

        return null;
    }

    /// <summary>The word for a meaning.</summary>
    public string WordFor(T meaning) => entries.First(entry => EqualityComparer<T>.Default.Equals(entry.Meaning, meaning)).Word;
}
