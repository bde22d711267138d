using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Writes gauges, readings and the figures given and assumed.</summary>
internal static class MeasuringText
{
    public static void Write(FieldWriter file, Gauge gauge)
    {
        file.Text("id", gauge.Id);
        file.Text("kind", gauge.Kind);
        file.Quantity("resolution", gauge.Resolution);
        file.Quantity("limitOfError", gauge.LimitOfError);
        file.Text("setWith", gauge.SetWith);
        file.Word("glass", JobWords.Glasses, gauge.Glass);
        file.Quantity("repeatability", gauge.Repeatability);
        file.Number("repeatabilityReadings", gauge.RepeatabilityReadings);
        file.Text("calibrated", gauge.Calibrated);
    }

    public static void Write(FieldWriter file, Reading reading)
    {
        file.Text("id", reading.Id);
        file.Text("what", WhatTable.Line(reading.What).Word);
        WritePlace(file, reading.Place);
        file.Quantity("value", reading.Value);
        if (reading is { FromToWritten: true, Fills.Count: 1 })
        {
            WriteFill(file, reading.Fills[0]);
        }
        else
        {
            file.Each("fills", reading.Fills, fill => WriteFill(file, fill));
        }

        file.Quantity("drop", reading.Drop);
        file.Text("gauge", reading.Gauge);
        file.Quantity("temperature", reading.Temperature);
        file.Flag("torquePlate", reading.TorquePlate);
        file.Word("stage", JobWords.Stages, reading.Stage);
        file.Text("struck", reading.Struck);
        file.Text("by", reading.By);
        file.Text("when", reading.When);
    }

    public static void Write(FieldWriter file, StatedFigure figure)
    {
        file.Text("what", WhatTable.Line(figure.What).Word);
        WritePlace(file, figure.Place);
        file.Quantity("value", figure.Value);
        file.Text("from", figure.From);
        file.Word("stage", JobWords.Stages, figure.Stage);
        file.Flag("common", figure.Common ? true : null);
    }

    public static void WritePlace(FieldWriter file, Place place)
    {
        file.Text("cylinder", place.Cylinder);
        file.Text("piece", place.Piece);
        file.Text("head", place.Head);
        file.Text("bank", place.Bank);
        file.Text("at", place.At is { } at ? JobWords.WordFor(at) : null);
        file.Word("axis", JobWords.Axes, place.Axis);
        file.Word("valve", JobWords.Valves, place.Valve);
        file.Number("clock", place.ClockHours);
    }

    private static void WriteFill(FieldWriter file, Fill fill)
    {
        file.Quantity("from", fill.From);
        file.Quantity("to", fill.To);
    }
}
