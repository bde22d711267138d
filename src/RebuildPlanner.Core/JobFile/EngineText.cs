using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Writes <c>engine</c>.</summary>
internal static class EngineText
{
    public static void Write(FieldWriter file, Engine engine)
    {
        file.Text("description", engine.Description);
        file.Word("cycle", JobWords.Cycles, engine.Cycle);
        file.Word("ignition", JobWords.Ignitions, engine.Ignition);
        file.Word("layout", JobWords.Layouts, engine.Layout);
        file.Number("cylinders", engine.Cylinders);
        file.Texts("labels", engine.Labels);
        file.Quantity("veeAngle", engine.VeeAngle);
        file.Each("banks", engine.Banks, bank =>
        {
            file.Text("label", bank.Label);
            file.Texts("cylinders", bank.Cylinders);
        });
        file.Each("heads", engine.Heads, head =>
        {
            file.Text("label", head.Label);
            file.Texts("cylinders", head.Cylinders);
            file.Word("metal", JobWords.Metals, head.Metal);
            file.Quantity("intakeFaceAngle", head.IntakeFaceAngle);
        });
        file.Word("blockMetal", JobWords.Metals, engine.BlockMetal);
        file.Quantity("stroke", engine.Stroke);
        file.Quantity("rodLength", engine.RodLength);
        file.Word("rodMetal", JobWords.Metals, engine.RodMetal);
        file.Quantity("pinOffset", engine.PinOffset);
        file.Quantity("originalBore", engine.OriginalBore);
        file.Quantity("claimedDisplacement", engine.ClaimedDisplacement);
        if (engine.Cam is { } cam)
        {
            file.Object("cam", () => WriteCam(file, cam));
        }

        file.Number("valvesPerCylinder", engine.ValvesPerCylinder);
        file.Text("injection", engine.Injection);
        file.Text("induction", engine.Induction);
        file.Quantity("boost", engine.Boost);
        file.Quantity("altitude", engine.Altitude);
        file.Text("fuel", engine.Fuel);
    }

    private static void WriteCam(FieldWriter file, Cam cam)
    {
        file.Word("place", JobWords.CamPlaces, cam.Overhead);
        file.Word("drive", JobWords.CamDrives, cam.Drive);
        file.Quantity("sprocketPitchDiameter", cam.SprocketPitchDiameter);
        file.Texts("runAngles", cam.RunAngles?.Select(angle => angle.Text));
        file.Quantity("inletCloses", cam.InletCloses);
        file.Quantity("exhaustCloses", cam.ExhaustCloses);
        file.Text("at", cam.At);
        file.Quantity("rockerRatio", cam.RockerRatio);
        file.Quantity("pushrodTilt", cam.PushrodTilt);
    }
}
