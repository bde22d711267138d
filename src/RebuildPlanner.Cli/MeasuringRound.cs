using System.Globalization;
using System.Text.Json;
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

    private readonly Dictionary<What, string?> _gauges = [];
    private readonly Dictionary<string, string> _drops = [];
    private IReadOnlyList<Entry> _entries = [];
    private IReadOnlyList<RoundPlace> _left = [];
    private Job _job = null!;
    private int _written;

    /// <summary>Asks until nothing is left, or the one at the bench stops.</summary>
    public int Run()
    {
        Load(new WrittenJob(number, store.Entries(number)!, null));
        HashSet<RoundPlace> skipped = [];
        Say($"Job {number}, {StageWords.Of(stage)}. Enter leaves a place for later; ? shows what else can be typed.");
        Stack<RoundPlace> asked = [];
        RoundPlace? next = null;
        while ((next ?? _left.FirstOrDefault(left => !skipped.Contains(left))) is { } place)
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
            string? typed = Prompt(string.Create(CultureInfo.InvariantCulture, $"[{_left.Count} left] {PlaceWords.Of(place)} ({unit}{(burette ? ", start end" : "")}{read}): "));
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
        Entry reading = New(EntryKind.Reading, JsonText.Write(body =>
        {
            body.WriteStartObject();
            body.WriteString("what", WhatWords.Of(place.What));
            foreach ((string name, string value) in PlaceWords.Fields(place.Place))
            {
                if (name == "clock")
                {
                    body.WriteNumber(name, place.Place.ClockHours!.Value);
                }
                else
                {
                    body.WriteString(name, value);
                }
            }

            WriteFigure(body, fields);
            if (place.Place.Cylinder is { } cylinder && WhatTable.Line(place.What).Keys.HasFlag(PlaceKeys.Drop))
            {
                body.WriteString("drop", _drops[cylinder]);
            }

            if (_gauges[place.What] is { } gauge)
            {
                body.WriteString("gauge", gauge);
            }

            body.WriteString("stage", StageWords.Of(stage));
            body.WriteEndObject();
        }));
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

    // More than one fill stands in a list; one, or a plain figure, on the reading itself.
    private static void WriteFigure(Utf8JsonWriter body, IReadOnlyList<(string Name, string Value)> fields)
    {
        bool several = fields.Count > 2;
        if (several)
        {
            body.WriteStartArray("fills");
        }

        foreach ((string Name, string Value)[] fill in fields.Chunk(2))
        {
            if (several)
            {
                body.WriteStartObject();
            }

            foreach ((string name, string value) in fill)
            {
                body.WriteString(name, value);
            }

            if (several)
            {
                body.WriteEndObject();
            }
        }

        if (several)
        {
            body.WriteEndArray();
        }
    }

    /// <summary>Read again, a place has a repeat; or the reading before was wrong, which is said with a reason.</summary>
    private void AskStrike(Reading before)
    {
        string? reason = Prompt($"  {Figure(before)} stands as a repeat; Enter keeps it, or write why it was wrong: ");
        Entry? struck = _entries.LastOrDefault(entry => entry.Kind == EntryKind.Reading && JsonText.Field(entry.Body, "id") == before.Id);
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
        Say(string.Create(CultureInfo.InvariantCulture, $"{_written} readings written. {(_left.Count == 0 ? "Nothing is left to read." : $"{_left.Count} places are left, {_left.Count(place => place.ForRatio)} of them for ratio and gap.")}"));
        return ExitCode.Done;
    }

    /// <summary>The least step of a gauge as it is written, in the job or in the shop.</summary>
    private string? Step(string? gauge)
    {
        if (_job.Gauges.FirstOrDefault(known => known.Id == gauge) is { } own)
        {
            return (own.Resolution ?? own.LimitOfError)?.Text;
        }

        return store.Gauges().FirstOrDefault(known => known.Name == gauge).Body is { } body ? JsonText.Field(body, "resolution") : null;
    }

    private string LastValue(RoundPlace place) =>
        _job.Readings.LastOrDefault(reading => reading.What == place.What && reading.Struck is null) is { } last ? $"; last {Figure(last)}" : "";

    private static string Figure(Reading reading) => reading.Value?.Text ?? string.Join(" + ", reading.Fills.Select(fill => $"{fill.From.Text} to {fill.To.Text}"));

    private Entry New(EntryKind kind, string body) => new(WriteOptions.NewKey(terminal), kind, body, terminal.Now(), by);

    private void Load(WrittenJob written) => (_entries, _job, _left) = (written.Entries, written.Job, Round.Left(written.Job, stage));

    private string? Prompt(string text)
    {
        terminal.Output.Write(text);
        terminal.Output.Flush();
        return terminal.Input().ReadLine()?.Trim();
    }

    private void Say(string text) => terminal.Output.WriteLine(text);
}
