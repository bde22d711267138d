using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>gauges</c>.</summary>
internal static class GaugeSection
{
    private const string Burette = "burette";
    private const int MostStudyReadings = 100_000;

    public static List<Gauge> Read(Fields file)
    {
        List<Gauge> gauges = [];
        Dictionary<string, (Gauge Gauge, Fields Fields)> byId = [];
        foreach (JsonTree item in file.List("gauges"))
        {
            if (Fields.Open(item, file.Faults, "a gauge") is not { } fields)
            {
                continue;
            }

            Gauge gauge = ReadOne(fields);
            gauges.Add(gauge);
            if (gauge.Id.Length > 0 && !byId.TryAdd(gauge.Id, (gauge, fields)))
            {
                file.Faults.Add(fields.Take("id")!, $"'{gauge.Id}' is the id of another gauge already; each id once");
            }
        }

        foreach ((Gauge gauge, Fields fields) in byId.Values)
        {
            CheckSetWith(gauge, fields, byId);
        }

        return gauges;
    }

    private static Gauge ReadOne(Fields fields)
    {
        Gauge gauge = new(
            fields.Label("id", required: true) ?? "",
            ReadKind(fields),
            fields.Quantity("resolution", EngineRules.GaugeStep),
            fields.Quantity("limitOfError", EngineRules.GaugeStep),
            fields.Label("setWith"),
            fields.Word("glass", JobWords.Glasses),
            fields.Quantity("repeatability", EngineRules.GaugeStep),
            fields.Whole("repeatabilityReadings", 2, MostStudyReadings),
            Dates.Day(fields, "calibrated"));
        CheckRepeatability(fields);
        CheckOneKind(fields, gauge);
        if (!gauge.IsBurette && gauge.Kind.Length > 0)
        {
            fields.Refuse("glass", $"glass is told of a burette, and this is a {gauge.Kind}");
        }

        fields.Close();
        return gauge;
    }

    private static string ReadKind(Fields fields)
    {
        string? kind = fields.Label("kind", required: true);
        if (kind is not null && kind != Burette && Wording.Nearest(kind, [Burette]) is not null)
        {
            // Any kind may be written; but one meant as a burette and misspelt would lose its glass and its two readings a fill.
            fields.Faults.Add(fields.Take("kind")!, $"did you mean '{Burette}'? A burette is told by this word alone");
        }

        return kind ?? "";
    }

    private static void CheckRepeatability(Fields fields)
    {
        bool spread = fields.Take("repeatability") is not null, count = fields.Take("repeatabilityReadings") is not null;
        if (spread && !count)
        {
            fields.Missing("repeatabilityReadings", "a repeatability needs the number of readings it was found from, 2 or more");
        }
        else if (count && !spread)
        {
            fields.Missing("repeatability", "the number of readings is written and the repeatability found from them is not");
        }
    }

    private static void CheckOneKind(Fields fields, Gauge gauge)
    {
        QuantityKind? kind = null;
        foreach ((string name, Quantity? quantity) in
            new[] { ("resolution", gauge.Resolution), ("limitOfError", gauge.LimitOfError), ("repeatability", gauge.Repeatability) })
        {
            kind ??= quantity?.Kind;
            if (quantity is not null && quantity.Kind != kind)
            {
                fields.Faults.Add(fields.Take(name)!, "one gauge reads one kind of quantity: write lengths throughout or volumes throughout");
            }
        }
    }

    private static void CheckSetWith(Gauge gauge, Fields fields, Dictionary<string, (Gauge Gauge, Fields Fields)> byId)
    {
        if (gauge.SetWith is not { } first)
        {
            return;
        }

        JsonTree place = fields.Take("setWith")!;
        if (!byId.ContainsKey(first))
        {
            fields.Faults.Add(place, Wording.Unknown("gauge", first, [.. byId.Keys]));
            return;
        }

        // Reported on every gauge of the ring, each being where it can be broken; a gauge merely hung on a ring is not to blame.
        HashSet<string> seen = [];
        string? id = first;
        while (id is not null && id != gauge.Id && seen.Add(id) && byId.TryGetValue(id, out (Gauge Gauge, Fields Fields) next))
        {
            id = next.Gauge.SetWith;
        }

        if (id == gauge.Id)
        {
            fields.Faults.Add(place, $"'{gauge.Id}' comes to be set with itself; one gauge of the ring is set with something outside it");
        }
    }
}
