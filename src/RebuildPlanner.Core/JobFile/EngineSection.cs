using System.Globalization;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>engine</c>.</summary>
internal static class EngineSection
{
    private const int MostCylinders = 24;
    private const int MostValves = 8;

    public static Engine? Read(Fields? engine)
    {
        if (engine is null)
        {
            return null;
        }

        int? cylinders = engine.Whole("cylinders", 1, MostCylinders, required: true);
        Layout layout = ReadLayout(engine, cylinders);
        EquatableList<string>? labels = ReadLabels(engine, cylinders);
        (EquatableList<Bank>? banks, EquatableList<Head>? heads) = RowSection.Read(engine, layout, labels);
        Engine read = new(
            cylinders ?? 0, labels ?? [], banks ?? [], heads ?? [],
            engine.Text("description"),
            engine.Word("cycle", JobWords.Cycles) ?? EngineCycle.FourStroke,
            engine.Word("ignition", JobWords.Ignitions) ?? Ignition.Spark,
            layout,
            engine.Quantity("veeAngle", EngineRules.VeeAngle),
            engine.Word("blockMetal", JobWords.Metals),
            engine.Quantity("stroke", EngineRules.Stroke),
            engine.Quantity("rodLength", EngineRules.RodLength),
            engine.Word("rodMetal", JobWords.Metals),
            engine.Quantity("pinOffset", EngineRules.PinOffset),
            engine.Quantity("originalBore", EngineRules.OriginalBore),
            engine.Quantity("claimedDisplacement", EngineRules.ClaimedDisplacement),
            CamSection.Read(engine.Object("cam")),
            engine.Whole("valvesPerCylinder", 1, MostValves),
            engine.Text("injection"),
            engine.Text("induction"),
            engine.Quantity("boost", EngineRules.Boost),
            engine.Quantity("altitude", EngineRules.Altitude),
            engine.Text("fuel"));
        CheckRod(engine, read);
        engine.Close();
        return read;
    }

    private static Layout ReadLayout(Fields engine, int? cylinders)
    {
        Layout? written = engine.Word("layout", JobWords.Layouts);
        if (written == Layout.Single && cylinders > 1)
        {
            engine.Faults.Add(
                engine.Take("layout")!, $"'single' is one cylinder, and 'cylinders' says {cylinders}; write inline, vee or flat");
        }
        else if (written == Layout.Vee && cylinders == 1)
        {
            engine.Faults.Add(engine.Take("layout")!, "a vee has at least two cylinders; write single");
        }

        return written ?? (cylinders == 1 ? Layout.Single : Layout.Inline);
    }

    private static EquatableList<string>? ReadLabels(Fields engine, int? cylinders)
    {
        if (engine.Take("labels") is not { } written)
        {
            return cylinders is { } count
                ? [.. Enumerable.Range(1, count).Select(number => number.ToString(CultureInfo.InvariantCulture))]
                : null;
        }

        if (LabelList.Read(engine, "labels") is not { } labels)
        {
            return null;
        }

        if (cylinders is { } wanted && labels.Count != wanted)
        {
            engine.Faults.Add(written, $"'cylinders' says {wanted} and there are {labels.Count} labels; write one a cylinder");
            return null;
        }

        return labels;
    }

    private static void CheckRod(Fields engine, Engine read)
    {
        if (read.Stroke is not { } stroke || read.RodLength is not { } rod)
        {
            return;
        }

        double least = (stroke.Value / 2.0) + Math.Abs(read.PinOffset?.Value ?? 0.0);
        if (rod.Value <= least)
        {
            string offset = read.PinOffset is { } pin ? $" with a pin offset of {pin.Text}" : "";
            engine.Faults.Add(
                engine.Take("rodLength")!,
                $"a rod of {rod.Text} cannot pass a stroke of {stroke.Text}{offset}; it is longer than half the stroke and the offset together");
        }
    }
}
