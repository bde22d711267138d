using System.Globalization;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>The tables with a row for each cylinder.</summary>
internal static class CylindersPart
{
    public static IEnumerable<Block> Of(Results results, ResultsText text, SheetWording words)
    {
        (string, string) length = ("unit", text.Unit(QuantityKind.Length)), volume = ("unit", text.Unit(QuantityKind.Volume));
        yield return new Heading(words.Of(Phrase.CylindersHead), 2);
        yield return new Paragraph(words.Of(Phrase.CylindersLead), Style.Small);
        foreach (MethodNote note in results.Method())
        {
            yield return new Paragraph(Said(note, results.Trials!, text, words), Style.Small);
        }

        Table first = Known(
            results, words,
            (words.Of(Phrase.Ratio), cylinder => cylinder.CompressionRatio is null ? null : text.Value(cylinder.CompressionRatio)),
            (words.Of(Phrase.From95), cylinder => End(cylinder.CompressionRatio, q => q.Low)),
            (words.Of(Phrase.To), cylinder => End(cylinder.CompressionRatio, q => q.High)),
            (words.Of(Phrase.WorstFrom), cylinder => End(cylinder.CompressionRatio, q => q.WorstLow)),
            (words.Of(Phrase.To), cylinder => End(cylinder.CompressionRatio, q => q.WorstHigh)),
            (words.Of(Phrase.Bore, length), cylinder => Value(cylinder.Bore)),
            (words.Of(Phrase.Swept, volume), cylinder => Value(cylinder.SweptVolume)),
            (words.Of(Phrase.Clearance, volume), cylinder => Value(cylinder.ClearanceVolume)));
        Table second = Known(
            results, words,
            (words.Of(Phrase.PistonToHead, length), cylinder => Value(cylinder.PistonToHead)),
            (words.Of(Phrase.From95), cylinder => End(cylinder.PistonToHead, q => q.Low)),
            (words.Of(Phrase.To), cylinder => End(cylinder.PistonToHead, q => q.High)),
            (words.Of(Phrase.Taper, length), cylinder => Value(cylinder.Taper)),
            (words.Of(Phrase.OutOfRound, length), cylinder => Value(cylinder.OutOfRound)),
            (words.Of(Phrase.Trapped), cylinder => Value(cylinder.TrappedRatio)),
            (words.Of(Phrase.Cranking, ("unit", text.Unit(QuantityKind.Pressure))), cylinder => Value(cylinder.CrankingPressure)),
            (words.Of(Phrase.Doubt), cylinder => cylinder.Shares is [{ } most, ..]
                ? words.Of(Phrase.Share, ("what", most.Input), ("percent", (100.0 * most.Share).ToString("F0", CultureInfo.InvariantCulture)))
                : null));
        foreach (Table table in new[] { first, second }.Where(table => table.Columns.Count > 1))
        {
            yield return table;
        }

        if (results.Cylinders.Any(cylinder => cylinder.CrankingPressure is not null))
        {
            yield return new Paragraph(words.Of(Phrase.CrankingNote), Style.Small);
        }

        string? Value(ResultQuantity? quantity) => quantity is null ? null : text.Value(quantity);

        string? End(ResultQuantity? quantity, Func<ResultQuantity, double?> end) => quantity is null ? null : text.End(quantity, end);
    }

    private static string Said(MethodNote note, TrialReport trials, ResultsText text, SheetWording words)
    {
        (string, string) run = ("trials", text.Trials), seed = ("seed", trials.Options.Seed.ToString(CultureInfo.InvariantCulture));
        (string, string) digits = ("digits", words.Of(trials.Options.Digits == 1 ? Phrase.DigitOne : Phrase.DigitTwo));
        string fails = trials.FailsAt ?? "";
        string figure = trials.FailsOn is { } cylinder ? words.Of(Phrase.MethodFigure, ("figure", fails), ("cylinder", cylinder)) : fails;
        return note switch
        {
            MethodNote.FirstOrder => words.Of(Phrase.MethodFirstOrder, run, seed, digits),
            MethodNote.Trials => words.Of(Phrase.MethodTrials, run, seed, digits, ("figure", figure)),
            MethodNote.SpreadIsBiased => words.Of(Phrase.MethodSpread),
            _ => words.Of(Phrase.MethodUnsure),
        };
    }

    /// <summary>The parts of the clearance volume.</summary>
    public static Table Volumes(Results results, ResultsText text, SheetWording words)
    {
        string? Value(ResultQuantity? quantity) => quantity is null ? null : text.Value(quantity);
        return Known(
            results, words,
            (words.Of(Phrase.Chamber), cylinder => Value(cylinder.Chamber)),
            (words.Of(Phrase.Gasket), cylinder => Value(cylinder.Gasket)),
            (words.Of(Phrase.Deck), cylinder => Value(cylinder.Deck)),
            (words.Of(Phrase.Crown), cylinder => Value(cylinder.Crown)),
            (words.Of(Phrase.TopLand), cylinder => Value(cylinder.TopLand)),
            (words.Of(Phrase.Clearance, ("unit", text.Unit(QuantityKind.Volume))), cylinder => Value(cylinder.ClearanceVolume)));
    }

    /// <summary>A table of the columns of which anything is known; in the others nothing could stand but dashes.</summary>
    private static Table Known(Results results, SheetWording words, params (string Title, Func<CylinderResult, string?> Cell)[] columns)
    {
        (string Title, Func<CylinderResult, string?> Cell)[] known = [.. columns.Where(column => results.Cylinders.Any(cylinder => column.Cell(cylinder) is not null))];
        return new Table(
            [new Column(words.Of(Phrase.Cylinder), IsText: true), .. known.Select(column => new Column(column.Title))],
            [
                .. results.Cylinders.Select(cylinder =>
                    (IReadOnlyList<string>)[cylinder.Cylinder, .. known.Select(column => column.Cell(cylinder) ?? ResultsText.Dash)]),
            ]);
    }
}
