using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>what</c> from the closed list.</summary>
internal static class WhatSection
{
    /// <summary>The line of the word, or null and a fault; nothing else about the entry can be judged without it.</summary>
    public static WhatLine? Read(Fields fields)
    {
        if (fields.Take("what", required: true) is null || fields.Text("what") is not { } word)
        {
            return null;
        }

        if (WhatTable.Find(word) is { } line)
        {
            return line;
        }

        fields.Faults.Add(fields.Take("what")!, Wording.Unknown("what", word, [.. WhatTable.Lines.Select(known => known.Word)]));
        return null;
    }
}
