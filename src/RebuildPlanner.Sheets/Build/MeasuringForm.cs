using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>The measuring form: blank, for one engine and a pencil, in the order of the round, with room for repeats and gauges.</summary>
public static class MeasuringForm
{
    private const double RowMm = 7.5, CellMm = 17.5, LabelMm = 36.0, GaugeMm = 24.0, TemperatureMm = 13.0;

    private const int BlankGauges = 3, Repeats = 3;

    /// <summary>Puts the form together.</summary>
    /// <param name="input">Job, shop, words, paper, units, date.</param>
    /// <param name="stage">The stage it is for.</param>
    /// <param name="places">The places on it, in the order of the round.</param>
    public static Sheet Of(SheetInput input, Stage stage, IReadOnlyList<RoundPlace> places)
    {
        SheetWording words = input.Words;
        string title = words.Of(Phrase.FormTitle);
        List<Block> blocks =
        [
            .. input.Head(title),
            new Facts(
            [
                (words.Of(Phrase.Customer), input.Job.CustomerName ?? words.Of(Phrase.FormBlank)), (words.Of(Phrase.Job), input.Job.Number),
                (words.Of(Phrase.Engine), input.Engine), (words.Of(Phrase.Stage), StageWords.Of(stage)), (words.Of(Phrase.FormBy), words.Of(Phrase.FormBlank)),
            ]),
            new Paragraph(words.Of(Phrase.FormLead)),
            new Heading(words.Of(Phrase.FormGaugesHead), 2),
            Gauges(input.Job, words),
            .. Part(Phrase.FormRatioHead, [.. places.Where(place => place.ForRatio)], input),
            .. Part(Phrase.FormFitsHead, [.. places.Where(place => !place.ForRatio)], input),
            new Heading(words.Of(Phrase.FormRemarks), 2),
            new Table([new Column("", WidthMm: input.Paper.TextWidthMm)], [.. Enumerable.Repeat<IReadOnlyList<string>>([""], 6)], RowMm),
        ];
        return new Sheet(
            $"{title}, {input.Job.Number}", input.Shop.Name, words.Of(Phrase.Subject, ("engine", input.Engine), ("stage", StageWords.Of(stage))), input.Date,
            words.Of(Phrase.FormFoot, ("job", input.Job.Number), ("stage", StageWords.Of(stage)), ("date", input.Issued)),
            words.Of(Phrase.PageOf, ("page", "{page}"), ("pages", "{pages}")), input.Paper, blocks);
    }

    private static Table Gauges(Job job, SheetWording words)
    {
        IEnumerable<IReadOnlyList<string>> known = job.Gauges.Select(gauge => (IReadOnlyList<string>)
        [
            gauge.Id, gauge.Kind, gauge.Resolution?.Text ?? "", gauge.LimitOfError?.Text ?? "", gauge.SetWith ?? "", gauge.Calibrated ?? "",
        ]);
        return new Table(
            [
                new Column(words.Of(Phrase.FormGauge), IsText: true, 36.0), new Column(words.Of(Phrase.FormKind), IsText: true, 30.0),
                new Column(words.Of(Phrase.FormResolution), IsText: true, 25.0), new Column(words.Of(Phrase.FormLimit), IsText: true, 25.0),
                new Column(words.Of(Phrase.FormSetWith), IsText: true, 30.0), new Column(words.Of(Phrase.FormCalibrated), IsText: true, 25.0),
            ],
            [.. known, .. Enumerable.Repeat<IReadOnlyList<string>>(["", "", "", "", "", ""], BlankGauges)], RowMm);
    }

    private static IEnumerable<Block> Part(Phrase head, RoundPlace[] places, SheetInput input)
    {
        if (places.Length == 0)
        {
            yield break;
        }

        yield return new Heading(input.Words.Of(head), 2);
        foreach (IGrouping<What, RoundPlace> thing in places.GroupBy(place => place.What))
        {
            WhatLine line = WhatTable.Line(thing.Key);
            QuantityKind kind = line.Rule.Kinds[0];

            // A burette is graduated in cm³ in every shop.
            yield return new Heading($"{line.Word}, {QuantityPrint.Unit(kind, kind == QuantityKind.Volume ? UnitSystem.Metric : input.Units)}", 3);
            if (Hint(line, input.Words) is { } hint)
            {
                yield return new Paragraph(hint, Style.Small);
            }

            Place[] where = [.. thing.Select(place => place.Place)];
            yield return line.Rule.Kinds[0] == QuantityKind.Volume ? BuretteTable(line, where, input.Words) : GaugeTable(where, input.Words);
        }
    }

    private static string? Hint(WhatLine line, SheetWording words) => (line.What, line.Rule.Signs) switch
    {
        (What.Bore, _) => words.Of(Phrase.FormTorquePlate),
        (_, SignWords.Deck) => words.Of(Phrase.FormDeckWords),
        (_, SignWords.Crown) => words.Of(Phrase.FormCrownWords),
        (_, SignWords.Protrusion) => words.Of(Phrase.FormProtrusionWords),
        _ => null,
    };

    /// <summary>What a gauge reads straight: places that differ by one key only stand side by side, as far as there is room with their repeats.</summary>
    private static Table GaugeTable(Place[] places, SheetWording words)
    {
        string[] aside = [.. places.Select(Aside).Distinct()];
        int repeats = aside.Length > 2 ? 1 : Repeats;
        IEnumerable<Column> cells = aside.SelectMany(place => Enumerable.Range(1, repeats).Select(repeat =>
            new Column(repeats == 1 ? place : place.Length == 0 ? $"{repeat}" : $"{place} {repeat}", WidthMm: CellMm)));
        Column[] columns = [Label(words), .. cells, new Column(words.Of(Phrase.FormGaugeColumn), WidthMm: GaugeMm)];
        return Blank(columns, places.Select(place => Row(place, words)).Distinct());
    }

    /// <summary>What is filled from a burette: where the liquid stands before and after each of two fills, and the temperature; a row a repeat.</summary>
    private static Table BuretteTable(WhatLine line, Place[] places, SheetWording words)
    {
        Phrase[] scales = [Phrase.FormStart, Phrase.FormEnd, Phrase.FormRefillStart, Phrase.FormRefillEnd];
        List<Column> columns = [Label(words), .. scales.Select(scale => new Column(words.Of(scale), WidthMm: CellMm))];
        if (line.Keys.HasFlag(PlaceKeys.Drop))
        {
            columns.Add(new Column(words.Of(Phrase.FormDrop), WidthMm: CellMm));
        }

        columns.AddRange([new Column(words.Of(Phrase.FormTemperature), WidthMm: TemperatureMm), new Column(words.Of(Phrase.FormGaugeColumn), WidthMm: GaugeMm)]);
        return Blank(columns, places.SelectMany(place => new[] { Row(place, words), "" }));
    }

    private static Column Label(SheetWording words) => new(words.Of(Phrase.FormPlace), IsText: true, LabelMm);

    private static Table Blank(IReadOnlyList<Column> columns, IEnumerable<string> labels) => new(
        columns, [.. labels.Select(label => (IReadOnlyList<string>)[label, .. Enumerable.Repeat("", columns.Count - 1)])], RowMm);

    /// <summary>The part of a place that tells columns apart.</summary>
    private static string Aside(Place place) => place switch
    {
        { Axis: { } axis } => JobWords.Axes.WordFor(axis),
        { ClockHours: { } hours } => FormattableString.Invariant($"{hours} h"),
        { Valve: { } valve } => JobWords.Valves.WordFor(valve),
        { At: (At.Front or At.Rear) and var end } => JobWords.WordFor(end),
        _ => "",
    };

    /// <summary>The part of a place that tells rows apart.</summary>
    private static string Row(Place place, SheetWording words)
    {
        string[] named =
        [
            .. new[]
            {
                place.Cylinder is { } cylinder ? $"{words.Of(Phrase.Cylinder)} {cylinder}" : place.Head is { } head ? words.Of(Phrase.FormHeadOf, ("head", head))
                    : place.Bank is { } bank ? words.Of(Phrase.FormBankOf, ("bank", bank)) : null,
                place.At is { } at and not (At.Front or At.Rear) ? JobWords.WordFor(at) : null,
            }.OfType<string>(),
        ];
        return named.Length == 0 ? words.Of(Phrase.FormEngine) : string.Join(", ", named);
    }
}
