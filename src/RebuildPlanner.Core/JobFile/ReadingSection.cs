using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>readings</c>.</summary>
internal static class ReadingSection
{
    public static List<Sited<Reading>> Read(Fields file, Known known)
    {
        List<Sited<Reading>> readings = [];
        HashSet<string> ids = [];
        foreach (JsonTree item in file.List("readings"))
        {
            if (Fields.Open(item, file.Faults, "a reading") is not { } fields)
            {
                continue;
            }

            string? id = fields.Label("id");
            if (id is not null && !ids.Add(id))
            {
                file.Faults.Add(fields.Take("id")!, $"'{id}' is the id of another reading already; each id once");
            }

            if (WhatSection.Read(fields) is { } line)
            {
                readings.Add(new(ReadOne(fields, line, known) with { Id = id }, item));
                fields.Close();
            }
        }

        return readings;
    }

    private static Reading ReadOne(Fields fields, WhatLine line, Known known)
    {
        Place place = PlaceSection.Read(fields, line, known);
        PlaceSection.CheckNamed(fields, line, place, known);
        bool takesDrop = line.Keys.HasFlag(PlaceKeys.Drop);
        if (!takesDrop)
        {
            fields.NotToldOf(line.Word, "drop");
        }

        (EquatableList<Fill> fills, bool fromToWritten) = FillSection.Read(fields, line);
        Reading reading = new(
            line.What, place, fields.Quantity("value", line.Rule), fills, fromToWritten,
            takesDrop ? fields.Quantity("drop", EngineRules.Drop, required: true) : null,
            known.Gauges.Read(fields, "gauge"),
            fields.Quantity("temperature", EngineRules.Temperature),
            fields.Flag("torquePlate"),
            fields.Word("stage", JobWords.Stages),
            ReadStruck(fields),
            By: fields.Text("by"),
            When: Dates.Moment(fields, "when"));
        CheckGauge(fields, reading, known.Gauge(reading.Gauge));
        return reading;
    }

    private static string? ReadStruck(Fields fields)
    {
        string? reason = fields.Text("struck");
        if (reason is not null && string.IsNullOrWhiteSpace(reason))
        {
            fields.Faults.Add(fields.Take("struck")!, "a reading is struck with a reason; write why, or leave 'struck' out");
        }

        return reason;
    }

    private static void CheckGauge(Fields fields, Reading reading, Gauge? gauge)
    {
        QuantityKind? read = reading.Value?.Kind ?? (reading.Fills.Count > 0 ? reading.Fills[0].To.Kind : null);
        QuantityKind? gauged = (gauge?.Resolution ?? gauge?.LimitOfError ?? gauge?.Repeatability)?.Kind;

        // An area is traced or found from two fills: no gauge reads it straight.
        if (read is { } of && gauged is { } by && of != by && of != QuantityKind.Area)
        {
            fields.Faults.Add(
                fields.Take("gauge")!,
                $"gauge '{gauge!.Id}' reads a {Named(by)} and this reading is a {Named(of)}; name the gauge it was read with");
        }
    }

    private static string Named(QuantityKind kind) => kind switch
    {
        QuantityKind.Length => "length",
        QuantityKind.Volume => "volume",
        _ => "quantity of another kind",
    };
}
