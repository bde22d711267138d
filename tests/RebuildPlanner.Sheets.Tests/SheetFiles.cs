using System.Text;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Sheets.Tests;

/// <summary>Jobs and sheets for the tests, put together as the command does.</summary>
internal static class SheetFiles
{
    public static DateOnly Date { get; } = new(2026, 12, 1);

    public static string[] Samples { get; } =
        [.. Directory.GetFiles(RepositoryFiles.At("samples"), "*.json").Select(path => Path.GetFileName(path)!).Order(StringComparer.Ordinal)];

    public static Job Sample(string file) => Read(RepositoryFiles.Text("samples", file));

    public static Job Read(string json) => JobText.Read(json);

    public static SheetInput Input(Job job, UnitSystem units = UnitSystem.Metric, Paper? paper = null) => new(
        job, Shop.Read(TemplateFiles.Read(TemplateFiles.Shop)).Shop!, SheetWording.Original, paper ?? Paper.A4, units, Date);

    public static Sheet BuildSheetOf(Job job, UnitSystem units = UnitSystem.Metric, Paper? paper = null) =>
        BuildSheet.Of(Input(job, units, paper), StageResults.Of(job, LastStage.Of(job)));

    /// <summary>A sheet of a few blocks.</summary>
    public static Sheet Of(params Block[] blocks) =>
        new("Title", "Author", "Subject", Date, "foot", "page {page} of {pages}", Paper.A4, blocks);

    /// <summary>The points of a shape that lie farthest out.</summary>
    public static IEnumerable<Spot> Extremes(Shape shape) => shape switch
    {
        Line line => [line.From, line.To],
        Polygon polygon => polygon.Corners,
        Circle circle => [new(circle.Centre.XMm - circle.RadiusMm, circle.Centre.YMm - circle.RadiusMm), new(circle.Centre.XMm + circle.RadiusMm, circle.Centre.YMm + circle.RadiusMm)],
        Label label => [label.At],
        _ => [],
    };

    /// <summary>Twenty-four cylinders in a vee, three chambers missing, a customer whose name tries the page.</summary>
    public static Job Largest { get; } = Read(LargestText());

    private static string LargestText()
    {
        string[] labels = [.. Enumerable.Range(1, 24).Select(number => $"{number}")];
        string Listed(IEnumerable<string> cylinders) => "[" + string.Join(", ", cylinders.Select(label => $"\"{label}\"")) + "]";
        string banks = $$"""[{ "label": "left", "cylinders": {{Listed(labels[..12])}} }, { "label": "right", "cylinders": {{Listed(labels[12..])}} }]""";
        StringBuilder readings = new();
        foreach (string label in labels)
        {
            int odd = int.Parse(label, System.Globalization.CultureInfo.InvariantCulture) * 7 % 10;
            foreach (string at in new[] { "top", "bottom" })
            {
                foreach (string axis in new[] { "thrust", "along crank" })
                {
                    readings.Append(System.Globalization.CultureInfo.InvariantCulture, $$"""{ "what": "bore", "cylinder": "{{label}}", "at": "{{at}}", "axis": "{{axis}}", "value": "96.0{{odd}}{{at.Length}} mm", "stage": "as machined" },""");
                }
            }

            readings.Append(System.Globalization.CultureInfo.InvariantCulture, $$"""{ "what": "deck", "cylinder": "{{label}}", "value": "0.1{{odd}} mm below", "stage": "as machined" },""");
            if (label is not ("6" or "10" or "24"))
            {
                readings.Append(System.Globalization.CultureInfo.InvariantCulture, $$"""{ "what": "chamber", "cylinder": "{{label}}", "value": "50.{{odd}} cc", "stage": "as machined" },""");
            }
        }

        string longName = string.Concat(Enumerable.Repeat("Smith & Sons <Engineering> Łódź-Ærøskøbing, ", 8));
        return $$"""
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "L-24", "asked": "{{new string('x', 300)}}" }, "customer": { "name": "{{longName}}" },
              "engine": { "cylinders": 24, "layout": "vee", "veeAngle": "60 deg", "labels": {{Listed(labels)}}, "banks": {{banks}}, "heads": {{banks}},
                "stroke": "90 mm ± 0.05 mm", "rodLength": "150 mm ± 0.1 mm", "cam": { "inletCloses": "50 deg ABDC", "at": "seat" } },
              "readings": [ {{readings}} ],
              "given": [ { "what": "gasket thickness", "value": "1.3 mm ± 0.03 mm" }, { "what": "gasket opening", "value": "98 mm ± 0.1 mm" }, { "what": "crown", "value": "3 cc ± 0.2 cc dish" } ],
              "limits": [ { "what": "compression ratio", "max": "12.4" }, { "what": "piston to head", "min": "0.9 mm" }, { "what": "taper", "max": "0.0125 mm" }, { "what": "out-of-round", "max": "0.0125 mm" },
                { "what": "gasket overhang", "min": "0.25 mm" }, { "what": "ratio spread", "max": "0.3" }, { "what": "trapped ratio", "max": "10.5" } ] }
            """;
    }
}
