using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>fitted</c>.</summary>
internal static class FittedSection
{
    public static List<Fitted> Read(Fields file, Known known)
    {
        List<Fitted> fitted = [];
        foreach (JsonTree item in file.List("fitted"))
        {
            if (Fields.Open(item, file.Faults, "each of 'fitted'") is { } fields)
            {
                fitted.Add(ReadOne(fields, known));
                fields.Close();
            }
        }

        return fitted;
    }

    private static Fitted ReadOne(Fields fields, Known known)
    {
        Stage? stage = fields.Word("stage", JobWords.Stages, required: true);
        string? piston = known.Pistons.Read(fields, "piston"), gasket = known.Gaskets.Read(fields, "gasket");
        string? cylinder = known.Cylinders.Read(fields, "cylinder"), head = known.Heads.Read(fields, "head");
        string? piece = known.Pieces.Read(fields, "piece");
        if (fields.Take("piston") is null && fields.Take("gasket") is null && fields.Take("piece") is null)
        {
            fields.Missing("piston", "nothing is fitted; name a 'piston', a 'gasket' or both");
        }

        string? owner = known.SetOfPiece(piece);
        if (owner is not null && piston is not null && owner != piston)
        {
            fields.Faults.Add(fields.Take("piece")!, $"piece '{piece}' is of the set '{owner}', not of '{piston}'");
        }

        if (known.Cylinders.Names is [string only])
        {
            cylinder ??= piece is null ? null : only;
        }
        else if (piece is not null && fields.Take("cylinder") is null)
        {
            fields.Missing("cylinder", $"one piece goes into one cylinder; say which takes '{piece}'");
        }

        if (head is not null && cylinder is not null && known.HeadOf(cylinder) is { } own && own != head)
        {
            fields.Faults.Add(fields.Take("head")!, $"cylinder {cylinder} is under head '{own}'");
        }

        return new(stage ?? default, piston ?? owner, gasket, cylinder, head, piece);
    }
}
