using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>Parts fitted, cuts made, things looked at, notes: up to the stage of the sheet.</summary>
internal static class WorkPart
{
    public static IEnumerable<Block> Of(Job job, Stage stage, SheetWording words)
    {
        IReadOnlyList<string>[] rows =
        [
            .. job.Fitted.Where(fitted => fitted.Stage <= stage).SelectMany(fitted => Parts(job, fitted, words)),
            .. job.Cuts.Where(cut => cut.Stage <= stage)
                .GroupBy(cut => (cut.Kind, cut.Value?.Text, cut.Stage))
                .Select(same => (IReadOnlyList<string>)
                [
                    CutWords.Of(same.Key.Kind), string.Join("; ", same.Select(cut => Where(cut.Place, words))),
                    same.Key.Text ?? words.Of(Phrase.FinishedToPiston), StageWords.Of(same.Key.Stage),
                ]),
        ];
        Check[] checks = [.. job.Checks.Where(check => check.Stage is null || check.Stage <= stage)];
        if (rows.Length == 0 && checks.Length == 0 && job.Notes.Count == 0)
        {
            yield break;
        }

        yield return new Heading(words.Of(Phrase.WorkHead), 2);
        if (rows.Length > 0)
        {
            yield return Texts(words, rows, Phrase.WorkPart, Phrase.WorkPlace, Phrase.WorkValue, Phrase.WorkStage);
        }

        if (checks.Length > 0)
        {
            yield return Texts(
                words,
                [
                    .. checks.Select(check => (IReadOnlyList<string>)
                    [
                        check.What, check.Result ?? ResultsText.Dash,
                        string.Join(", ", new[] { check.Stage is { } at ? StageWords.Of(at) : null, check.By, check.When }.OfType<string>()),
                    ]),
                ],
                Phrase.Check, Phrase.CheckResult, Phrase.WorkStage);
        }

        if (job.Notes.Count > 0)
        {
            yield return new Heading(words.Of(Phrase.Notes), 3);
            yield return new Points([.. job.Notes]);
        }
    }

    private static IEnumerable<IReadOnlyList<string>> Parts(Job job, Fitted fitted, SheetWording words)
    {
        string where = Where(new Place(fitted.Cylinder, Head: fitted.Head), words), stage = StageWords.Of(fitted.Stage);
        if (fitted.Piston is { } id)
        {
            PistonSet piston = job.Pistons.First(set => set.Id == id);
            string part = words.Of(Phrase.FittedPiston, ("part", fitted.Piece is { } piece ? words.Of(Phrase.PieceOf, ("part", id), ("piece", piece)) : id));
            yield return [part, where, piston.OversizeBore?.Text ?? "", stage];
        }

        if (fitted.Gasket is { } gasket)
        {
            yield return [words.Of(Phrase.FittedGasket, ("part", gasket)), where, job.Gaskets.First(choice => choice.Id == gasket).Thickness?.Text ?? "", stage];
        }
    }

    private static string Where(Place place, SheetWording words)
    {
        string[] named = [.. place.Cylinder is { } cylinder ? [$"{words.Of(Phrase.Cylinder)} {cylinder}"] : Array.Empty<string>(), .. ResultsText.PartsOf(place)];
        return named.Length == 0 ? words.Of(Phrase.All) : string.Join(", ", named);
    }

    private static Table Texts(SheetWording words, IReadOnlyList<IReadOnlyList<string>> rows, params Phrase[] titles) =>
        new([.. titles.Select(title => new Column(words.Of(title), IsText: true))], rows);
}
