using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>limits</c> and <c>targets</c>, which are written alike.</summary>
internal static class LimitSection
{
    private const double LeastLevel = 0.5;

    public static List<Limit> Read(Fields file, string name, Known known)
    {
        List<Limit> limits = [];
        foreach (JsonTree item in file.List(name))
        {
            if (Fields.Open(item, file.Faults, $"each of '{name}'") is { } fields && ReadSubject(fields) is { } subject)
            {
                limits.Add(ReadOne(fields, subject, known));
                fields.Close();
            }
        }

        return limits;
    }

    private static Subject? ReadSubject(Fields fields)
    {
        if (fields.Take("what", required: true) is null || fields.Text("what") is not { } word)
        {
            return null;
        }

        if (Subjects.Find(word) is { } subject)
        {
            return subject;
        }

        fields.Faults.Add(fields.Take("what")!, Wording.Unknown("what", word, [.. Subjects.All.Select(known => known.Word)]));
        return null;
    }

    private static Limit ReadOne(Fields fields, Subject subject, Known known)
    {
        Place place = ReadPlace(fields, subject, known);
        Quantity? min = fields.Quantity("min", subject.Rule), max = fields.Quantity("max", subject.Rule);
        if (fields.Take("min") is null && fields.Take("max") is null)
        {
            fields.Missing("min", "a bound is missing; write 'min', 'max' or both");
        }

        // Opening as a diameter against opening as an area cannot be put in order.
        if (min is not null && max is not null && min.Kind != max.Kind)
        {
            fields.Faults.Add(fields.Take("max")!, $"'min' is {min.Text}; write both bounds in one kind of unit");
        }
        else if (min is not null && max is not null && min.Value > max.Value)
        {
            fields.Faults.Add(fields.Take("max")!, $"'max' is below 'min', {min.Text}; nothing lies between them");
        }

        return new(subject, min, max, ReadLevel(fields), fields.Word("stage", JobWords.Stages), place);
    }

    private static double? ReadLevel(Fields fields)
    {
        const string right = "a number above 0.5 and below 1, such as 0.95";
        double? level = fields.Number("level", right);
        if (level is <= LeastLevel or >= 1.0)
        {
            fields.Faults.Add(fields.Take("level")!, $"this must be {right}");
        }

        return level;
    }

    private static Place ReadPlace(Fields fields, Subject subject, Known known)
    {
        WhatLine? line = subject.What is { } what ? WhatTable.Line(what) : null;
        bool spread = subject.Derived is Derived.ChamberSpread or Derived.RatioSpread;
        bool cylinder = line is null ? !spread : line.Belongs != Belongs.Bank;
        bool face = line?.What == What.Flatness;
        bool head = line?.Belongs == Belongs.Head || face, bank = line?.Belongs == Belongs.Bank || face;
        bool valve = line?.Keys.HasFlag(PlaceKeys.Valve) ?? false;
        foreach ((string key, bool allowed) in new[] { ("cylinder", cylinder), ("head", head), ("bank", bank), ("valve", valve) })
        {
            if (!allowed)
            {
                fields.NotToldOf(subject.Word, key);
            }
        }

        return new(
            Cylinder: cylinder ? known.Cylinders.Read(fields, "cylinder") : null,
            Head: head ? known.Heads.Read(fields, "head") : null,
            Bank: bank ? known.Banks.Read(fields, "bank") : null,
            Valve: valve ? fields.Word("valve", JobWords.Valves) : null);
    }
}
