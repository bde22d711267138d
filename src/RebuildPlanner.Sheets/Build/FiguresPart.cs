using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Figures;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>The figures of a sheet with what belongs to them.</summary>
public static class FiguresPart
{
    /// <summary>The clearance volume, drawn and in figures.</summary>
    public static IEnumerable<Block> Volumes(SheetInput input, Results results, ResultsText text)
    {
        SheetWording words = input.Words;
        if (VolumeBars.Draw(results, input.Units, words) is not { } bars)
        {
            yield break;
        }

        yield return new Heading(words.Of(Phrase.VolumesHead), 2);
        yield return new Illustration(bars, words.Of(Phrase.VolumesCaption));
        yield return CylindersPart.Volumes(results, text, words);
        foreach (CylinderResult cylinder in results.Cylinders.Where(cylinder => cylinder.CrossCheck is not null))
        {
            ResultQuantity check = cylinder.CrossCheck!;
            yield return new Paragraph(words.Of(
                Phrase.CrossCheck, ("cylinder", cylinder.Cylinder), ("value", text.Value(check)), ("unit", text.Unit(QuantityKind.Volume)),
                ("low", text.End(check, q => q.Low)), ("high", text.End(check, q => q.High))));
        }
    }

    /// <summary>How the trials of the ratio fell.</summary>
    public static IEnumerable<Block> Trials(SheetInput input, Results results)
    {
        if (RatioTrials.Draw(results, input.Units, input.Words) is { } trials)
        {
            yield return new Heading(trials.Title, 2);
            yield return new Illustration(trials, input.Words.Of(Phrase.TrialsCaption));
        }
    }

    /// <summary>The section through the cylinder whose section says most.</summary>
    public static IEnumerable<Block> Section(SheetInput input, Results results)
    {
        if (CylinderSection.Choose(results) is { } chosen && Section(input, results, chosen) is { } section)
        {
            yield return new Heading(section.Title, 2);
            yield return new Illustration(section, Caption(results, chosen, input.Words, CompressionHeightMm(input.Job, results, chosen) is not null));
        }
    }

    /// <summary>The section through a cylinder, or null where too little is known of it.</summary>
    public static Picture? Section(SheetInput input, Results results, CylinderResult cylinder) =>
        CylinderSection.Draw(results, cylinder, CompressionHeightMm(input.Job, results, cylinder), input.Units, input.Words);

    private static string Caption(Results results, CylinderResult cylinder, SheetWording words, bool hasHeight) => string.Join(
        ' ',
        new[]
        {
            words.Of(Phrase.SectionCaption),
            results.Used(Core.Measuring.What.RodLength, cylinder.Cylinder) is null ? words.Of(Phrase.SectionNoRod) : null,
            hasHeight ? null : words.Of(Phrase.SectionNoHeight),
        }.OfType<string>());

    private static double? CompressionHeightMm(Job job, Results results, CylinderResult cylinder) =>
        new EngineParts(job, results.Stage).Piston(job.Engine.Labels.ToList().IndexOf(cylinder.Cylinder), results.Stage)?.Part.CompressionHeight?.Midpoint;
}
