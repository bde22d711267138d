using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>cuts</c>.</summary>
internal static class CutSection
{
    private static readonly string[] PlaceKeys = ["head", "bank", "cylinder", "valve"];

    public static List<Cut> Read(Fields file, Known known)
    {
        List<Cut> cuts = [];
        foreach (JsonTree item in file.List("cuts"))
        {
            if (Fields.Open(item, file.Faults, "a cut") is not { } fields)
            {
                continue;
            }

            if (fields.Word("what", JobWords.Cuts, required: true) is { } kind)
            {
                cuts.Add(ReadOne(fields, kind, known));
                fields.Close();
            }
        }

        return cuts;
    }

    private static Cut ReadOne(Fields fields, CutKind kind, Known known)
    {
        (string[] keys, QuantityRule rule, bool mayBeLeftOut) = Takes(kind);
        foreach (string key in PlaceKeys.Except(keys))
        {
            fields.NotToldOf($"a {JobWords.Cuts.WordFor(kind)}", key);
        }

        Place place = new(
            Cylinder: keys.Contains("cylinder") ? known.Cylinders.Read(fields, "cylinder") : null,
            Head: keys.Contains("head") ? known.Heads.Read(fields, "head") : null,
            Bank: keys.Contains("bank") ? known.Banks.Read(fields, "bank") : null,
            Valve: keys.Contains("valve") ? fields.Word("valve", JobWords.Valves) : null);
        return new(
            kind, place, fields.Quantity("value", rule, required: !mayBeLeftOut),
            fields.Word("stage", JobWords.Stages, required: true) ?? default);
    }

    // A bore without a size is finished to the piston that goes there.
    private static (string[] Keys, QuantityRule Rule, bool MayBeLeftOut) Takes(CutKind kind) => kind switch
    {
        CutKind.HeadSkim => (["head"], CutRules.Value(kind), false),
        CutKind.DeckCut => (["bank"], CutRules.Value(kind), false),
        CutKind.LineBore => ([], CutRules.Value(kind), false),
        CutKind.ValveSeat => (["cylinder", "valve"], CutRules.Value(kind), false),
        _ => (["cylinder"], CutRules.Value(kind), true),
    };
}
