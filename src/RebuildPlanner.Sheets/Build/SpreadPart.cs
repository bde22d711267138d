using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>What holds for the engine as a whole: displacement and the spread between its cylinders.</summary>
internal static class SpreadPart
{
    public static IEnumerable<Block> Of(Results results, ResultsText text, SheetWording words)
    {
        List<IReadOnlyList<string>> rows = [];
        Add(Phrase.Displacement, results.Displacement);
        Add(Phrase.SpreadRatio, results.RatioSpread);
        Add(Phrase.SpreadChamber, results.ChamberSpread);
        if (rows.Count == 0)
        {
            yield break;
        }

        yield return new Heading(words.Of(Phrase.SpreadHead), 2);
        yield return new Table(
            [
                new Column(words.Of(Phrase.SpreadName), IsText: true), new Column(words.Of(Phrase.SpreadValue)), new Column(words.Of(Phrase.From95)),
                new Column(words.Of(Phrase.To)), new Column(words.Of(Phrase.WorstFrom)), new Column(words.Of(Phrase.To)),
            ],
            rows);
        if (results.RatiosDiffer == false)
        {
            yield return new Paragraph(words.Of(Phrase.SpreadNone));
        }

        void Add(Phrase name, ResultQuantity? quantity)
        {
            if (quantity is not null)
            {
                rows.Add([
                    words.Of(name, ("unit", text.Unit(quantity.Kind))), text.Value(quantity), text.End(quantity, q => q.Low), text.End(quantity, q => q.High), text.End(quantity, q => q.WorstLow),
                    text.End(quantity, q => q.WorstHigh)]);
            }
        }
    }
}
