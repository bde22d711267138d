using System.Globalization;
using System.Text.Json.Nodes;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary>Asks for readings at a terminal, place by place in the order of the round. Every answer is on the disk before the next question.</summary>
internal sealed class MeasuringRound(JobStore store, string number, Stage stage, string? by, Terminal terminal)
{
    private const string Help = """
          a figure      84.512, or with another unit 3.327 in; a deck or crown with its word, 0.52 below
          of a burette  start and end, 0 46.2; a refill after a plus, 0 50 + 0 12.4
          Enter         leave this place for later          b   back to the place before
          r             read the place before again         g   another gauge
          q             stop here                           ?   this
        """;

    private static readonly System.Text.Json.JsonSerializerOptions _relaxed = new() { Encoder = System.Text.Encodings.Web.JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    private readonly Dictionary<What, string?> _gauges = [];
    private readonly Dictionary<string, string> _drops = [];
    private IReadOnlyList<Entry> _entries = [];
    private Job _job = null!;
    private int _written;

    /// <summary>Asks until nothing is left, or the one at the bench stops.</summary>
    public int Run()
    {
        Load(new WrittenJob(number, store.Entries(number)!, null));
        IReadOnlyList<RoundPlace> round = Round.Of(_job.Engine);
        HashSet<RoundPlace> skipped = [];
        Say($"Job {number}, {StageWords.Of(stage)}. Enter leaves a place for later; ? shows what else can be typed.");
        Stack<RoundPlace> asked = [];
        RoundPlace? next = null;
        while ((next ?? Next(round, skipped)) is { } place)
        {
            next = null;
            switch (Ask(place))
            {
                case Answer.Read:
                    asked.Push(place);
                    break;
                case Answer.Later:
                    skipped.Add(place);
                    asked.Push(place);
                    break;
                case Answer.Back:
                    next = asked.Count > 0 ? asked.Pop() : place;
                    break;
                case Answer.Again:
                    next = asked.Count > 0 ? asked.Peek() : place;
                    break;
                case Answer.Stop:
                    return Close();
            }
        }

        return Close();
    }

    private enum Answer
    {
        Read,
        Later,
        Back,
        Again,
        Stop,
    }

    private RoundPlace? Next(IReadOnlyList<RoundPlace> round, HashSet<RoundPlace> skipped)
    {
        // The round's own list where nothing was begun in another word; what is left is asked in that order.
        HashSet<RoundPlace> left = [.. Round.Left(_job, stage)];
        return round.Concat(left).FirstOrDefault(place => left.Contains(place) && !skipped.Contains(place));
    }

    private Answer Ask(RoundPlace place)
    {
        WhatLine line = WhatTable.Line(place.What);
        bool burette = line.Rule.Kinds[0] == QuantityKind.Volume;
        if (!_gauges.ContainsKey(place.What) && !AskGauge(line))
        {
            return Answer.Stop;
        }

        while (true)
        {
            if (line.Keys.HasFlag(PlaceKeys.Drop) && !_drops.ContainsKey(place.Place.Cylinder!) && AskDrop(place) is { } early)
            {
                return early;
            }

            string unit = TypedReading.Unit(Step(_gauges[place.What]), line);
            Reading[] before = [.. _job.Readings.Where(reading => reading.What == place.What && reading.Place == place.Place && reading.Stage == stage && reading.Struck is null)];
            string read = before.Length == 0 ? LastValue(place) : $"; read {string.Join(", ", before.Select(Figure))}";
            int left = Round.Left(_job, stage).Count;
            string? typed = Prompt(string.Create(CultureInfo.InvariantCulture, $"[{left} left] {PlaceWords.Of(place)} ({unit}{(burette ? ", start end" : "")}{read}): "));
            switch (typed)
            {
                case null or "q":
                    return Answer.Stop;
                case "":
                    return Answer.Later;
                case "b":
                    return Answer.Back;
                case "r":
                    return Answer.Again;
                case "?":
                    Say(Help);
                    continue;
                case "g":
                    if (!AskGauge(line))
                    {
                        return Answer.Stop;
                    }

                    continue;
            }

            if (TypedReading.Fields(typed, burette, unit, out string? problem) is not { } fields)
            {
                terminal.Error.WriteLine($"  {problem}.");
                continue;
            }

            if (Record(place, fields, before))
            {
                return Answer.Read;
            }
        }
    }

    private bool Record(RoundPlace place, IReadOnlyList<(string Name, string Value)> fields, Reading[] before)
    {
        JsonObject body = new() { ["what"] = WhatWords.Of(place.What) };
        foreach ((string name, string value) in PlaceWords.Fields(place.Place))
        {
            body[name] = name == "clock" ? JsonNode.Parse(value) : value;
        }

        if (fields.Count > 2)
        {
            body["fills"] = new JsonArray([.. fields.Chunk(2).Select(fill => new JsonObject { ["from"] = fill[0].Value, ["to"] = fill[1].Value })]);
        }
        else
        {
            foreach ((string name, string value) in fields)
            {
                body[name] = value;
            }
        }

        if (place.Place.Cylinder is { } cylinder && WhatTable.Line(place.What).Keys.HasFlag(PlaceKeys.Drop))
        {
            body["drop"] = _drops[cylinder];
        }

        if (_gauges[place.What] is { } gauge)
        {
            body["gauge"] = gauge;
        }

        body["stage"] = StageWords.Of(stage);
        Entry reading = New(EntryKind.Reading, body.ToJsonString(_relaxed));
        if (Readings.Write(store, number, reading, terminal) is not { } written)
        {
            return false;
        }

        _written++;
        Load(written);
        if (before.Length > 0)
        {
            AskStrike(before[^1]);
        }

        if (place.What == What.Chamber && Readings.ChamberSpread(_job, stage) is { } spread)
        {
            Say($"  {spread}");
        }

        return true;
    }

    /// <summary>Read again, a place has a repeat; or the reading before was wrong, which is said with a reason.</summary>
    private void AskStrike(Reading before)
    {
        string? reason = Prompt($"  {Figure(before)} stands as a repeat; Enter keeps it, or write why it was wrong: ");
        Entry? struck = _entries.LastOrDefault(entry => entry.Kind == EntryKind.Reading && (entry.Key == before.Id || entry.Body.Contains($"\"id\":\"{before.Id}\"", StringComparison.Ordinal)));
        if (string.IsNullOrWhiteSpace(reason) || struck is null)
        {
            return;
        }

        WrittenJob? written = WriteOptions.Write(
            store, number,
            known => JobVerbs.Strike(known, struck.Key, reason, out string? problem) is { } body ? ([New(EntryKind.Strike, body)], null) : ([], problem), "strike", terminal);
        if (written is not null)
        {
            Load(written);
            Say($"  struck: {Figure(before)}");
        }
    }

    private bool AskGauge(WhatLine line)
    {
        string? last = _gauges.GetValueOrDefault(line.What) ?? _job.Readings.LastOrDefault(reading => reading.What == line.What && reading.Gauge is not null)?.Gauge;
        string[] known = [.. _job.Gauges.Select(gauge => gauge.Id).Union(store.Gauges().Select(gauge => gauge.Name))];
        while (true)
        {
            string? typed = Prompt($"Gauge for {line.Word}{(last is null ? "" : $" [{last}]")} (? lists, - none): ");
            switch (typed)
            {
                case null or "q":
                    return false;
                case "?":
                    Say(known.Length == 0 ? "  No gauge is known yet; rebuild gauge adds one." : $"  {string.Join(", ", known)}");
                    continue;
                case "-":
                    _gauges[line.What] = null;
                    return true;
                case "":
                    _gauges[line.What] = last;
                    return true;
            }

            if (known.Contains(typed))
            {
                _gauges[line.What] = typed;
                return true;
            }

            string? near = NearestWord.Of(typed, known);
            terminal.Error.WriteLine($"  {typed}: there is no such gauge{(near is null ? "" : $"; did you mean {near}?")}");
        }
    }

    private Answer? AskDrop(RoundPlace place)
    {
        while (true)
        {
            string? typed = Prompt($"{PlaceWords.Of(place)}: how far does the crown stand below the deck? (mm): ");
            switch (typed)
            {
                case null or "q":
                    return Answer.Stop;
                case "":
                    return Answer.Later;
                case "b":
                    return Answer.Back;
            }

            string drop = TypedReading.Fields(typed, burette: false, "mm", out _)![0].Value;
            if (QuantityText.Read(drop, EngineRules.Drop, out string? problem) is not null)
            {
                _drops[place.Place.Cylinder!] = drop;
                return null;
            }

            terminal.Error.WriteLine($"  {problem}");
        }
    }

    private int Close()
    {
        RoundPlace[] left = [.. Round.Left(_job, stage)];
        Say(string.Create(CultureInfo.InvariantCulture, $"{_written} readings written. {(left.Length == 0 ? "Nothing is left to read." : $"{left.Length} places are left, {left.Count(place => place.ForRatio)} of them for ratio and gap.")}"));
        return ExitCode.Done;
    }

    /// <summary>The least step of a gauge as it is written, in the job or in the shop.</summary>
    private string? Step(string? gauge)
    {
        if (_job.Gauges.FirstOrDefault(known => known.Id == gauge) is { } own)
        {
            return (own.Resolution ?? own.LimitOfError)?.Text;
        }

        return store.Gauges().FirstOrDefault(known => known.Name == gauge).Body is { } body ? JsonNode.Parse(body)!["resolution"]?.GetValue<string>() : null;
    }

    private string LastValue(RoundPlace place) =>
        _job.Readings.LastOrDefault(reading => reading.What == place.What && reading.Struck is null) is { } last ? $"; last {Figure(last)}" : "";

    private static string Figure(Reading reading) => reading.Value?.Text ?? string.Join(" + ", reading.Fills.Select(fill => $"{fill.From.Text} to {fill.To.Text}"));

    private Entry New(EntryKind kind, string body) => new(WriteOptions.NewKey(terminal), kind, body, terminal.Now(), by);

    private void Load(WrittenJob written) => (_entries, _job) = (written.Entries, written.Job);

    private string? Prompt(string text)
    {
        terminal.Output.Write(text);
        terminal.Output.Flush();
        return terminal.Input.ReadLine()?.Trim();
    }

    private void Say(string text) => terminal.Output.WriteLine(text);
}
