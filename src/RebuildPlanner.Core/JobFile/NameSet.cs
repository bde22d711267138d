namespace RebuildPlanner.Core.JobFile;

/// <summary>Names that something may refer to. Names that could not be read refuse nothing: one fault does not breed a hundred.</summary>
/// <param name="noun">What they are names of.</param>
/// <param name="names">The names, or null where they could not be read.</param>
internal sealed class NameSet(string noun, IReadOnlyList<string>? names)
{
    private readonly HashSet<string> _set = [.. names ?? []];

    public IReadOnlyList<string>? Names => names;

    /// <summary>The name written in a field, checked to be one of these.</summary>
    public string? Read(Fields fields, string field)
    {
        string? name = fields.Label(field);
        if (name is not null && names is not null && !_set.Contains(name))
        {
            fields.Faults.Add(fields.Take(field)!, Wording.Unknown(noun, name, names));
        }

        return name;
    }
}
