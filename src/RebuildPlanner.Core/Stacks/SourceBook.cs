namespace RebuildPlanner.Core.Stacks;

/// <summary>The sources of a model as they are found: the same physical doubt, met twice, is one source.</summary>
public sealed class SourceBook
{
    private readonly List<Source> _sources = [];
    private readonly Dictionary<object, int> _indexes = [];
    private int _pools;

    /// <summary>All sources so far, in the order met.</summary>
    public IReadOnlyList<Source> Sources => _sources;

    /// <summary>Adds a doubt that nothing else shares.</summary>
    /// <returns>Its index.</returns>
    public int Add(Source source)
    {
        _sources.Add(source);
        return _sources.Count - 1;
    }

    /// <summary>The index of a doubt that may be met again.</summary>
    /// <param name="identity">What it physically is: equal identities are one doubt.</param>
    /// <param name="source">What it is like, where it is met for the first time.</param>
    public int Shared(object identity, Source source)
    {
        if (!_indexes.TryGetValue(identity, out int index))
        {
            index = Add(source);
            _indexes.Add(identity, index);
        }

        return index;
    }

    /// <summary>A number for a new pool of repeats.</summary>
    public int NewPool() => _pools++;
}
