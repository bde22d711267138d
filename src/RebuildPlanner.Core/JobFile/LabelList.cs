using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads a list of names, each once.</summary>
internal static class LabelList
{
    /// <summary>The names, or null where one of them is at fault.</summary>
    public static EquatableList<string>? Read(Fields fields, string name)
    {
        int before = fields.Faults.Count;
        HashSet<string> seen = [];
        List<string> labels = [];
        foreach (JsonTree item in fields.List(name))
        {
            if (fields.LabelOf(item) is not { } label)
            {
                continue;
            }

            labels.Add(label);
            if (!seen.Add(label))
            {
                fields.Faults.Add(item, $"'{label}' stands twice in this list; each name once");
            }
        }

        return fields.Faults.Count == before ? [.. labels] : null;
    }
}
