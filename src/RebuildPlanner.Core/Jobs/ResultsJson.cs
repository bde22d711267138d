using System.Text.Encodings.Web;
using System.Text.Json;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Results in the JSON that other programs read: units always cm3, mm, kPa (gauge) and 1, full precision.</summary>
public static class ResultsJson
{
    /// <summary>The version written.</summary>
    public const int Version = 1;

    /// <summary>Writes results as indented UTF-8 JSON.</summary>
    public static byte[] Write(Results results)
    {
        using MemoryStream stream = new();
        JsonWriterOptions options = new() { Indented = true, NewLine = "\n", Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };
        using (Utf8JsonWriter json = new(stream, options))
        {
            json.WriteStartObject();
            json.WriteString("format", "rebuild-planner-results");
            json.WriteNumber("version", Version);
            json.WriteString("job", results.Job);
            json.WriteString("stage", StageWords.Of(results.Stage));
            TrialReport? counted = results.Trials is { FirstOrderHolds: false } report ? report : null;
            json.WriteString("method", counted is null ? "first order" : "Monte Carlo");
            Number(json, "seed", counted?.Options.Seed);
            Number(json, "trials", counted?.Trials);
            Quantity(json, "displacement", results.Displacement);
            Array(json, "cylinders", results.Cylinders, Cylinder);
            json.WriteStartObject("spread");
            Quantity(json, "compressionRatio", results.RatioSpread);
            Quantity(json, "chamber", results.ChamberSpread);
            json.WriteEndObject();
            Array(json, "verdicts", results.Verdicts, Verdict);
            Array(json, "cautions", results.Cautions, Caution);
            Array(json, "missing", results.Missing, Missing);
            Array(json, "provenance", results.Provenance, Provenance);
            json.WriteEndObject();
        }

        return [.. stream.ToArray(), (byte)'\n'];
    }

    private static void Cylinder(Utf8JsonWriter json, CylinderResult cylinder)
    {
        json.WriteString("cylinder", cylinder.Cylinder);
        Quantity(json, "bore", cylinder.Bore);
        Quantity(json, "sweptVolume", cylinder.SweptVolume);
        Quantity(json, "clearanceVolume", cylinder.ClearanceVolume);
        Quantity(json, "compressionRatio", cylinder.CompressionRatio);
        Quantity(json, "trappedRatio", cylinder.TrappedRatio);
        Quantity(json, "crankingPressure", cylinder.CrankingPressure);
        Quantity(json, "pistonToHead", cylinder.PistonToHead);
        Quantity(json, "taper", cylinder.Taper);
        Quantity(json, "outOfRound", cylinder.OutOfRound);
        json.WriteStartObject("volumes");
        Quantity(json, "chamber", cylinder.Chamber);
        Quantity(json, "gasket", cylinder.Gasket);
        Quantity(json, "deck", cylinder.Deck);
        Quantity(json, "crown", cylinder.Crown);
        Quantity(json, "topLand", cylinder.TopLand);
        json.WriteEndObject();
        Quantity(json, "crossCheck", cylinder.CrossCheck);
        Array(json, "shares", cylinder.Shares, (writer, share) =>
        {
            writer.WriteString("input", share.Input);
            writer.WriteNumber("share", share.Share);
        });
    }

    private static void Verdict(Utf8JsonWriter json, Verdict verdict)
    {
        json.WriteString("what", verdict.What);
        json.WriteString("cylinder", verdict.Cylinder);
        json.WriteString("limit", verdict.Limit);
        Quantity(json, "min", verdict.Min);
        Quantity(json, "max", verdict.Max);
        json.WriteString("state", WordOf(verdict.State));
        Number(json, "probability", verdict.Probability);
        json.WriteNumber("level", verdict.Level);
        json.WriteString("settle", verdict.Settle);
    }

    private static void Caution(Utf8JsonWriter json, Caution caution)
    {
        json.WriteString("code", caution.Code);
        json.WriteString("text", caution.Text);
        json.WriteString("cylinder", caution.Cylinder);
        json.WriteString("figure", caution.Figure);
    }

    private static void Missing(Utf8JsonWriter json, MissingFigure missing)
    {
        json.WriteString("what", missing.What);
        json.WriteString("cylinder", missing.Cylinder);
    }

    private static void Provenance(Utf8JsonWriter json, ProvenanceLine line)
    {
        json.WriteString("what", line.What);
        json.WriteString("cylinder", line.Cylinder);
        json.WriteString("kind", WordOf(line.Kind));
        json.WriteString("stage", line.Stage is { } stage ? StageWords.Of(stage) : null);
        json.WriteString("from", line.From);
        json.WriteString("gauge", line.Gauge);
    }

    /// <summary>The verdict's word.</summary>
    public static string WordOf(VerdictState state) => state switch
    {
        VerdictState.Within => "within",
        VerdictState.Outside => "outside",
        _ => "not proven",
    };

    /// <summary>The kind's word.</summary>
    public static string WordOf(FigureKind kind) => kind switch
    {
        FigureKind.Measured => "measured",
        FigureKind.Computed => "computed",
        FigureKind.Given => "given",
        _ => "assumed",
    };

    private static void Array<T>(Utf8JsonWriter json, string name, IReadOnlyList<T> items, Action<Utf8JsonWriter, T> fields)
    {
        json.WriteStartArray(name);
        foreach (T item in items)
        {
            json.WriteStartObject();
            fields(json, item);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void Quantity(Utf8JsonWriter json, string name, ResultQuantity? quantity)
    {
        if (quantity is null)
        {
            json.WriteNull(name);
            return;
        }

        (string unit, double perUnit) = quantity.Kind switch
        {
            QuantityKind.Volume => ("cm3", 1000.0),
            QuantityKind.Length => ("mm", 1.0),
            QuantityKind.Pressure => ("kPa", 1.0),
            _ => ("1", 1.0),
        };
        json.WriteStartObject(name);
        json.WriteNumber("value", quantity.Value / perUnit);
        json.WriteString("unit", unit);
        Number(json, "standardUncertainty", quantity.StandardUncertainty / perUnit);
        Number(json, "low", quantity.Low / perUnit);
        Number(json, "high", quantity.High / perUnit);
        Number(json, "worstLow", quantity.WorstLow / perUnit);
        Number(json, "worstHigh", quantity.WorstHigh / perUnit);
        json.WriteEndObject();
    }

    // A bound that is not finite is not known, and JSON has no word for infinity.
    private static void Number(Utf8JsonWriter json, string name, double? value)
    {
        if (value is { } number && double.IsFinite(number))
        {
            json.WriteNumber(name, number);
        }
        else
        {
            json.WriteNull(name);
        }
    }
}
