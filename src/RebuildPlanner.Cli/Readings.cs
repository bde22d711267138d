using System.Globalization;
using System.Text.Json;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary>Writes readings, with the shop's gauge they name, and says how the job stands after them.</summary>
internal static class Readings
{
    /// <summary>Writes one reading; the job with it, or null after the reason has been written.</summary>
    public static WrittenJob? Write(JobStore store, string number, Entry reading, Terminal terminal) =>
        Write(store, number, [reading], "measure", terminal);

    /// <summary>Writes readings, all or none.</summary>
    /// <param name="what">What to call them in messages.</param>
    /// <param name="where">What to call the one of a key, where each has a name of its own.</param>
    public static WrittenJob? Write(JobStore store, string number, IReadOnlyList<Entry> readings, string what, Terminal terminal, Func<Entry, string?>? where = null)
    {
        Entry[] named = [.. readings.Select(WithId)];
        return WriteOptions.Write(store, number, before => ([.. GaugesOf(store, before, named, terminal), .. named], null), what, terminal, where: where);
    }

    /// <summary>Says what was written last, the spread of chambers so far, and what is left.</summary>
    public static int Say(WrittenJob written, Terminal terminal)
    {
        Job job = written.Job;
        Reading last = job.Readings[^1];
        terminal.Output.WriteLine(EntryLine.Of(written.Entries[^1]));
        if (last is { What: What.Chamber, Stage: { } stage } && ChamberSpread(job, stage) is { } spread)
        {
            terminal.Output.WriteLine(spread);
        }

        if (last.Stage is { } at)
        {
            RoundPlace[] left = [.. Round.Left(job, at).Where(place => place.ForRatio)];
            terminal.Output.WriteLine(left.Length == 0
                ? $"Everything that ratio and gap rest on is read at the stage {StageWords.Of(at)}."
                : string.Create(CultureInfo.InvariantCulture, $"{left.Length} places left for ratio and gap; next: {PlaceWords.Of(left[0])}"));
        }

        return ExitCode.Done;
    }

    /// <summary>The spread of the chambers read so far, or null for fewer than two.</summary>
    public static string? ChamberSpread(Job job, Stage stage)
    {
        StageModel model = new(job, stage);
        StageFigures figures = new(model);
        if (figures.SpreadSoFar(Output.Chamber, out int known) is not { } spread)
        {
            return null;
        }

        ResultQuantity quantity = figures.Quantity(spread, QuantityKind.Volume, neverNegative: true);
        ResultsText text = new(new Results(job.Number, stage), UnitSystem.Metric);
        return string.Create(
            CultureInfo.InvariantCulture,
            $"chambers: {known} of {job.Engine.Cylinders} read, spread {text.Value(quantity)} {text.Unit(QuantityKind.Volume)} (95 % from {text.End(quantity, q => q.Low)} to {text.End(quantity, q => q.High)})");
    }

    // A reading without an id could not be told from another when the job comes back from elsewhere.
    private static Entry WithId(Entry reading)
    {
        using JsonDocument body = JsonDocument.Parse(reading.Body);
        return body.RootElement.TryGetProperty("id", out _) ? reading : reading with
        {
            Body = JsonText.Write(json =>
            {
                json.WriteStartObject();
                json.WriteString("id", reading.Key);
                foreach (JsonProperty field in body.RootElement.EnumerateObject())
                {
                    field.WriteTo(json);
                }

                json.WriteEndObject();
            }),
        };
    }

    /// <summary>The shop's gauges that readings name and the job has no copy of yet.</summary>
    private static List<Entry> GaugesOf(JobStore store, IReadOnlyList<Entry> before, IReadOnlyList<Entry> readings, Terminal terminal)
    {
        HashSet<string?> known = [];
        foreach (Entry entry in before)
        {
            if (entry.Kind == EntryKind.Gauge)
            {
                known.Add(JsonText.Field(entry.Body, "id"));
            }
        }

        List<Entry> copied = [];
        foreach (Entry reading in readings)
        {
            foreach (string body in JsonText.Field(reading.Body, "gauge") is { } name && !known.Contains(name) ? GaugeCommand.WithSetters(store, name) : [])
            {
                if (known.Add(JsonText.Field(body, "id")))
                {
                    copied.Add(new Entry(WriteOptions.NewKey(terminal), EntryKind.Gauge, body, terminal.Now()));
                }
            }
        }

        return copied;
    }
}
