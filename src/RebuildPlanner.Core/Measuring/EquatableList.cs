using System.Collections;
using System.Runtime.CompilerServices;

namespace RebuildPlanner.Core.Measuring;

/// <summary>A list that is equal to another of the same items, so that records holding lists compare by content.</summary>
/// <typeparam name="T">The items.</typeparam>
[CollectionBuilder(typeof(EquatableList), nameof(EquatableList.Create))]
public sealed class EquatableList<T>(IReadOnlyList<T> items) : IReadOnlyList<T>, IEquatable<EquatableList<T>>
{
    /// <summary>No items.</summary>
    public static EquatableList<T> Empty { get; } = new([]);

    /// <inheritdoc/>
    public int Count => items.Count;

    /// <inheritdoc/>
    public T this[int index] => items[index];

    /// <inheritdoc/>
    public IEnumerator<T> GetEnumerator() => items.GetEnumerator();

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();

    /// <inheritdoc/>
    public bool Equals(EquatableList<T>? other) => other is not null && items.SequenceEqual(other);

    /// <inheritdoc/>
    public override bool Equals(object? obj) => Equals(obj as EquatableList<T>);

    /// <inheritdoc/>
    public override int GetHashCode() => items.Aggregate(items.Count, (hash, item) => HashCode.Combine(hash, item));
}

/// <summary>Builds an <see cref="EquatableList{T}"/> from a collection expression.</summary>
public static class EquatableList
{
    /// <summary>Copies the items into a list.</summary>
    public static EquatableList<T> Create<T>(ReadOnlySpan<T> items) => new(items.ToArray());
}
