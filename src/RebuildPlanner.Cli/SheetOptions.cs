using System.CommandLine;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Cli;

/// <summary>The options by which everything printed says how: paper, units, date, and whose templates.</summary>
internal sealed class SheetOptions
{
    private static readonly string[] _unitWords = ["mm", "inch"];

    private readonly Option<Paper?> _paper = JobOptions.Word(
        "--paper", "A4 or Letter; else the shop's own.", "paper", [.. Paper.All.Select(paper => paper.Word)], Paper.Find);

    private readonly Option<UnitSystem?> _unitSystem = UnitsOption();

    private readonly Option<DateOnly?> _date = JobOptions.Word<DateOnly?>(
        "--date", "The day of issue, as 2026-12-01; else today.", "date", ["a date such as 2026-12-01"], ParseDate);

    private readonly Option<string> _templates = new("--templates") { Description = "Folder of the shop's own templates.", HelpName = "folder" };

    /// <summary>Adds them to a command that prints pages.</summary>
    public void AddTo(Command command)
    {
        command.Options.Add(_paper);
        command.Options.Add(_date);
        AddWithoutPageTo(command);
    }

    /// <summary>Adds those that matter to a figure by itself.</summary>
    public void AddWithoutPageTo(Command command)
    {
        command.Options.Add(_unitSystem);
        command.Options.Add(_templates);
    }

    /// <summary>What a sheet of the job is made from, or null after the faults of a template have been written.</summary>
    public SheetInput? Of(Job job, ParseResult parsed, Terminal terminal)
    {
        TemplateFolder templates = new(parsed.GetValue(_templates), terminal);
        if (templates.Read(TemplateFiles.Wording, SheetWording.Read) is not { } words || templates.Read(TemplateFiles.Shop, Shop.Read) is not { } shop)
        {
            return null;
        }

        return new SheetInput(
            job, shop, words, parsed.GetValue(_paper) ?? shop.Paper, parsed.GetValue(_unitSystem) ?? shop.Units, parsed.GetValue(_date) ?? terminal.Today);
    }

    private static Option<UnitSystem?> UnitsOption() => JobOptions.Word<UnitSystem?>(
        "--units", "mm or inch; else the shop's own.", "units", _unitWords,
        word => word == _unitWords[0] ? UnitSystem.Metric : word == _unitWords[1] ? UnitSystem.Inch : null);

    private static DateOnly? ParseDate(string typed) =>
        DateOnly.TryParseExact(typed, "yyyy-MM-dd", System.Globalization.CultureInfo.InvariantCulture, System.Globalization.DateTimeStyles.None, out DateOnly date)
            ? date
            : null;
}
