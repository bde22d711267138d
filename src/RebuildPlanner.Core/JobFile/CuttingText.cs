using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Writes cuts, the processes that make them, and the limits and targets they are held to.</summary>
internal static class CuttingText
{
    public static void Write(FieldWriter file, Cut cut)
    {
        file.Word("what", JobWords.Cuts, (CutKind?)cut.Kind);
        MeasuringText.WritePlace(file, cut.Place);
        file.Quantity("value", cut.Value);
        file.Word("stage", JobWords.Stages, (Stage?)cut.Stage);
    }

    public static void Write(FieldWriter file, Limit limit)
    {
        file.Text("what", limit.Subject.Word);
        MeasuringText.WritePlace(file, limit.Place);
        file.Quantity("min", limit.Min);
        file.Quantity("max", limit.Max);
        file.Number("level", limit.Level);
        file.Word("stage", JobWords.Stages, limit.Stage);
    }

    public static void Write(FieldWriter file, Process process)
    {
        file.Word("what", JobWords.Cuts, (CutKind?)process.Kind);
        file.Quantity("tolerance", process.Tolerance);
        file.Quantity("step", process.Step);
        file.Quantity("max", process.Max);
        file.Quantity("cleanUp", process.CleanUp);
        file.Quantity("honeStock", process.HoneStock);
        file.Quantity("offset", process.Offset);
    }
}
