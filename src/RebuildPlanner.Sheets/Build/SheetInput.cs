using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>What a sheet is made from.</summary>
/// <param name="Job">The job.</param>
/// <param name="Shop">The shop that issues it.</param>
/// <param name="Words">The words it is made in.</param>
/// <param name="Paper">The paper.</param>
/// <param name="Units">The units printed in.</param>
/// <param name="Date">The day of issue.</param>
public sealed record SheetInput(Job Job, Shop Shop, SheetWording Words, Paper Paper, UnitSystem Units, DateOnly Date)
{
    /// <summary>The engine in words.</summary>
    public string Engine => Job.Engine.Description
        ?? (Job.Engine.Cylinders == 1 ? Words.Of(Phrase.EngineOfOne) : null)
        ?? Words.Of(Phrase.EngineUnnamed, ("cylinders", Job.Engine.Cylinders.ToString(System.Globalization.CultureInfo.InvariantCulture)));

    /// <summary>The day of issue as ISO 8601 writes it.</summary>
    public string Issued => Date.ToString("yyyy-MM-dd", System.Globalization.CultureInfo.InvariantCulture);

    /// <summary>The shop's name and address, and a sheet's title under it.</summary>
    internal IEnumerable<Block> Head(string title)
    {
        string[] lines = [Shop.Name, .. Shop.Address, .. new[] { Shop.Contact }.OfType<string>()];
        yield return new Paragraph(string.Join(" · ", lines.Where(line => line.Length > 0)), Style.Small);
        yield return new Heading(title, 1);
    }
}
