using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>What the figures rest on: assumed, given, computed, measured, the weakest first.</summary>
internal static class OriginsPart
{
    public static IEnumerable<Block> Of(Results results, ResultsText text, UnitSystem units, SheetWording words)
    {
        if (results.Provenance.Count == 0)
        {
            yield break;
        }

        IEnumerable<IReadOnlyList<string>> rows = results.Provenance
            .GroupBy(line => (line.What, line.Kind, line.Stage, line.From, line.Gauge, line.Written))
            .OrderByDescending(same => same.Key.Kind)
            .Select(same => (IReadOnlyList<string>)
            [
                ResultsJson.WordOf(same.Key.Kind), same.Key.What, text.Cylinders(same.Select(line => line.Cylinder)),
                same.Key.Written ?? Values([.. same], units, words),
                string.Join(", ", new[] { same.Key.From, same.Key.Gauge, same.Key.Stage is { } stage ? StageWords.Of(stage) : null }.OfType<string>()),
            ]);
        yield return new Heading(words.Of(Phrase.OriginsHead), 2);
        yield return new Paragraph(words.Of(Phrase.OriginsLead), Style.Small);
        yield return new Table(
            [
                new Column(words.Of(Phrase.OriginKind), IsText: true), new Column(words.Of(Phrase.OriginFigure), IsText: true),
                new Column(words.Of(Phrase.OriginCylinders), IsText: true), new Column(words.Of(Phrase.OriginValue), IsText: true),
                new Column(words.Of(Phrase.OriginFrom), IsText: true),
            ],
            [.. rows]);
    }

    private static string Values(ProvenanceLine[] lines, UnitSystem units, SheetWording words)
    {
        string least = Text(lines.MinBy(line => line.Value.Value)!), most = Text(lines.MaxBy(line => line.Value.Value)!);
        return least == most ? least : words.Of(Phrase.OriginRange, ("low", least), ("high", most));

        string Text(ProvenanceLine line)
        {
            SignWords signs = WhatTable.Find(line.What)?.Rule.Signs ?? SignWords.None;
            return QuantityPrint.Text(line.Value.Value, line.Value.Kind, line.Value.StandardUncertainty, units, signs);
        }
    }
}
