using System.Globalization;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>parts</c>: piston sets and gaskets.</summary>
internal static class PartsSection
{
    public static (List<PistonSet> Pistons, List<GasketChoice> Gaskets) Read(Fields? parts)
    {
        if (parts is null)
        {
            return ([], []);
        }

        HashSet<string> pieces = [];
        List<PistonSet> pistons = ReadEach(parts, "pistons", "a piston set", fields => ReadPistons(fields, pieces));
        List<GasketChoice> gaskets = ReadEach(parts, "gaskets", "a gasket", ReadGasket);
        parts.Close();
        return (pistons, gaskets);
    }

    private static List<TPart> ReadEach<TPart>(Fields parts, string name, string noun, Func<Fields, TPart> read)
    {
        HashSet<string> ids = [];
        List<TPart> list = [];
        foreach (JsonTree item in parts.List(name))
        {
            if (Fields.Open(item, parts.Faults, noun) is not { } fields)
            {
                continue;
            }

            list.Add(read(fields));
            if (fields.Take("id") is { Kind: JsonKind.Text } id && !ids.Add(id.Text))
            {
                parts.Faults.Add(id, $"'{JsonTree.Short(id.Text)}' is the id of another one already; each id once");
            }

            fields.Close();
        }

        return list;
    }

    private static PistonSet ReadPistons(Fields fields, HashSet<string> pieces) => new(
        fields.Label("id", required: true) ?? "",
        fields.Quantity("oversizeBore", EngineRules.OversizeBore),
        fields.Quantity("crown", WhatTable.Line(What.Crown).Rule),
        fields.Quantity("compressionHeight", WhatTable.Line(What.CompressionHeight).Rule),
        fields.Quantity("wantedClearance", EngineRules.WantedClearance),
        fields.Quantity("skirt", WhatTable.Line(What.Skirt).Rule),
        fields.Quantity("topLandHeight", WhatTable.Line(What.TopLandHeight).Rule),
        fields.Quantity("topLandDiameter", WhatTable.Line(What.TopLandDiameter).Rule),
        fields.Flag("common") ?? false,
        ReadPrice(fields),
        fields.Flag("onOffer") ?? true,
        ReadPieces(fields, pieces));

    private static GasketChoice ReadGasket(Fields fields) => new(
        fields.Label("id", required: true) ?? "",
        fields.Quantity("opening", WhatTable.Line(What.GasketOpening).Rule),
        fields.Quantity("thickness", WhatTable.Line(What.GasketThickness).Rule),
        ReadPrice(fields),
        fields.Text("grade"),
        fields.Quantity("protrusion", EngineRules.GasketProtrusion),
        fields.Flag("onOffer") ?? true);

    private static EquatableList<string>? ReadPieces(Fields fields, HashSet<string> pieces)
    {
        if (fields.Take("pieces") is not { } written || LabelList.Read(fields, "pieces") is not { } own)
        {
            return null;
        }

        // A reading names its piece alone, so a piece is one thing across all the sets.
        foreach (JsonTree item in written.Items.Where(item => !pieces.Add(item.Text)))
        {
            fields.Faults.Add(item, $"'{JsonTree.Short(item.Text)}' is a piece of another set already; each piece once");
        }

        return own;
    }

    private static decimal? ReadPrice(Fields fields)
    {
        if (fields.Take("price") is not { } price)
        {
            return null;
        }

        if (price.Kind == JsonKind.Number
            && decimal.TryParse(price.Text, NumberStyles.Float, CultureInfo.InvariantCulture, out decimal amount) && amount >= 0m)
        {
            return amount;
        }

        fields.Faults.Add(price, "a price is a number, not negative, without quotes or currency");
        return null;
    }
}
