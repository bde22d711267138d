using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>process</c>: what the shop's machines do.</summary>
internal static class ProcessSection
{
    private static readonly string[] BoreKeys = ["cleanUp", "honeStock", "offset"];

    public static List<Process> Read(Fields file)
    {
        List<Process> processes = [];
        HashSet<CutKind> seen = [];
        foreach (JsonTree item in file.List("process"))
        {
            if (Fields.Open(item, file.Faults, "each of 'process'") is not { } fields
                || fields.Word("what", JobWords.Cuts, required: true) is not { } kind)
            {
                continue;
            }

            if (!seen.Add(kind))
            {
                file.Faults.Add(fields.Take("what")!, $"the process of {JobWords.Cuts.WordFor(kind)} stands here already; write it once");
            }

            processes.Add(ReadOne(fields, kind));
            fields.Close();
        }

        return processes;
    }

    private static Process ReadOne(Fields fields, CutKind kind)
    {
        bool bores = kind is CutKind.Bore or CutKind.Hone or CutKind.Sleeve;
        foreach (string key in bores ? [] : BoreKeys)
        {
            fields.Refuse(key, $"'{key}' is told of boring, honing and sleeving, not of a {JobWords.Cuts.WordFor(kind)}");
        }

        return new(
            kind,
            fields.Quantity("tolerance", CutRules.Tolerance),
            fields.Quantity("step", CutRules.Step),
            fields.Quantity("max", CutRules.Max),
            bores ? fields.Quantity("cleanUp", CutRules.CleanUp) : null,
            bores ? fields.Quantity("honeStock", CutRules.HoneStock) : null,
            bores ? fields.Quantity("offset", CutRules.Offset) : null);
    }
}
