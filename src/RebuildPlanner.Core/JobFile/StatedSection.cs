using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>given</c> and <c>assumed</c>: figures nobody measured.</summary>
internal static class StatedSection
{
    public static List<Sited<StatedFigure>> Read(Fields file, string name, Known known)
    {
        List<Sited<StatedFigure>> figures = [];
        foreach (JsonTree item in file.List(name))
        {
            if (Fields.Open(item, file.Faults, $"each of '{name}'") is { } fields && WhatSection.Read(fields) is { } line)
            {
                figures.Add(new(ReadOne(fields, line, known), item));
                fields.Close();
            }
        }

        return figures;
    }

    private static StatedFigure ReadOne(Fields fields, WhatLine line, Known known)
    {
        if (line.What == What.CrownFill)
        {
            fields.Faults.Add(
                fields.Take("what")!, "a crown fill is measured with its drop; what is given or assumed is the crown, such as \"4.2 cc dish\"");
        }

        Place place = PlaceSection.Read(fields, line, known);
        return new(
            line.What, place,
            fields.Quantity("value", line.Rule, required: true)!,
            fields.Text("from"),
            fields.Word("stage", JobWords.Stages),
            fields.Flag("common") ?? false);
    }
}
