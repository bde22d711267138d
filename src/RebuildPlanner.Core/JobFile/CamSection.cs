using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads the engine's <c>cam</c>.</summary>
internal static class CamSection
{
    private const string AtSeat = "seat";

    public static Cam? Read(Fields? cam)
    {
        if (cam is null)
        {
            return null;
        }

        Cam read = new(
            cam.Word("place", JobWords.CamPlaces),
            cam.Word("drive", JobWords.CamDrives),
            cam.Quantity("sprocketPitchDiameter", EngineRules.SprocketPitchDiameter),
            ReadRunAngles(cam),
            cam.Quantity("inletCloses", EngineRules.InletCloses),
            cam.Quantity("exhaustCloses", EngineRules.ExhaustCloses),
            ReadAt(cam),
            cam.Quantity("rockerRatio", EngineRules.RockerRatio),
            cam.Quantity("pushrodTilt", EngineRules.PushrodTilt));
        cam.Close();
        return read;
    }

    private static EquatableList<Quantity>? ReadRunAngles(Fields cam)
    {
        if (cam.Take("runAngles") is null)
        {
            return null;
        }

        List<Quantity> angles = [];
        foreach (JsonTree item in cam.List("runAngles"))
        {
            if (cam.QuantityOf(item, EngineRules.RunAngle) is { } angle)
            {
                angles.Add(angle);
            }
        }

        return [.. angles];
    }

    private static string? ReadAt(Fields cam)
    {
        if (cam.Take("at") is not { } at)
        {
            return null;
        }

        if (at is { Kind: JsonKind.Text, Text: AtSeat })
        {
            return AtSeat;
        }

        // A text without a digit was meant as a word, and is answered as one.
        if (at.Kind == JsonKind.Text && !at.Text.Any(char.IsAsciiDigit))
        {
            cam.Faults.Add(at, Wording.Unknown("word", at.Text, [AtSeat]) + ", or the lift at which the closing is stated, such as \"1 mm\"");
            return null;
        }

        return cam.QuantityOf(at, EngineRules.TimingLift)?.Text;
    }
}
