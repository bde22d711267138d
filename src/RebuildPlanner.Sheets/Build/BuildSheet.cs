using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>The build sheet: what a customer takes home and a shop keeps. It prints what the results hold and adds nothing up.</summary>
public static class BuildSheet
{
    /// <summary>The name of the job file inside the sheet.</summary>
    public const string JobFileName = "job.json";

    /// <summary>Puts the sheet together.</summary>
    /// <param name="input">Job, shop, words, paper, units, date.</param>
    /// <param name="results">The job's results at the stage the sheet is for.</param>
    public static Sheet Of(SheetInput input, Results results)
    {
        SheetWording words = input.Words;
        ResultsText text = new(results, input.Units);
        string stage = StageWords.Of(results.Stage);
        List<Block> blocks =
        [
            .. input.Head(words.Of(Phrase.Title)),
            OpeningPart.Facts(input, results),
            new Framed([.. OpeningPart.Answer(results, text, words)]),
            .. OpeningPart.Missing(text, words),
            .. CylindersPart.Of(results, text, words),
            .. LimitsPart.Of(results, text, words),
            .. FiguresPart.Trials(input, results),
            .. FiguresPart.Volumes(input, results, text),
            .. SpreadPart.Of(results, text, words),
            .. WorkPart.Of(input.Job, results.Stage, words),
            .. FiguresPart.Section(input, results),
            .. OriginsPart.Of(results, text, input.Units, words),
            new Heading(words.Of(Phrase.CautionsHead), 2),
            new Points([.. text.Cautions()]),
            new Heading(words.Of(Phrase.SignHead), 2),
            new Together([new Signatures([
                words.Of(Phrase.SignMeasured), words.Of(Phrase.SignMachined), words.Of(Phrase.SignChecked), words.Of(Phrase.SignCustomer)])]),
        ];
        return new Sheet(
            $"{words.Of(Phrase.Title)}, {string.Join(", ", new[] { input.Job.Number, input.Job.CustomerName }.OfType<string>())}",
            input.Shop.Name, words.Of(Phrase.Subject, ("engine", input.Engine), ("stage", stage)), input.Date,
            words.Of(Phrase.Foot, ("job", input.Job.Number), ("stage", stage), ("date", input.Issued)),
            words.Of(Phrase.PageOf, ("page", "{page}"), ("pages", "{pages}")), input.Paper, blocks,
            new Attachment(JobFileName, words.Of(Phrase.Attached), JobFileWriter.Write(input.Job)));
    }
}
