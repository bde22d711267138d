using System.Globalization;
using System.Text.Json;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Pdf;
using UglyToad.PdfPig;
using UglyToad.PdfPig.Content;

namespace RebuildPlanner.Sheets.Tests.Build;

/// <summary>What stands on the paper, read back by another library, against the results as other programs get them.</summary>
[Collection(OneDocument.AtATime)]
public class PrintedFiguresTests
{
    private const double Mm3PerCubicInch = 16387.064, MmPerInch = 25.4, KPaPerPsi = 6.894757293168; // exact, exact, NIST SP 811 (from memory)

    private static readonly (string Head, string[] Json)[] RatioColumns =
    [
        ("ratio", ["compressionRatio", "value"]), ("95 % from", ["compressionRatio", "low"]), ("to", ["compressionRatio", "high"]),
        ("worst from", ["compressionRatio", "worstLow"]), ("to", ["compressionRatio", "worstHigh"]), ("bore", ["bore", "value"]),
        ("swept", ["sweptVolume", "value"]), ("clearance", ["clearanceVolume", "value"]),
    ];

    private static readonly (string Head, string[] Json)[] GapColumns =
    [
        ("piston to head", ["pistonToHead", "value"]), ("95 % from", ["pistonToHead", "low"]), ("to", ["pistonToHead", "high"]), ("taper", ["taper", "value"]),
        ("out-of-round", ["outOfRound", "value"]), ("trapped ratio", ["trappedRatio", "value"]), ("cranking", ["crankingPressure", "value"]),
    ];

    private static readonly (string Head, string[] Json)[] VolumeColumns =
    [
        ("chamber", ["volumes", "chamber", "value"]), ("gasket", ["volumes", "gasket", "value"]), ("deck", ["volumes", "deck", "value"]),
        ("crown", ["volumes", "crown", "value"]), ("top land", ["volumes", "topLand", "value"]), ("clearance", ["clearanceVolume", "value"]),
    ];

    public static TheoryData<string?, UnitSystem> Sheets { get; } = new()
    {
        { "van-four.json", UnitSystem.Metric }, { "van-four.json", UnitSystem.Inch }, { "hill-climb-vee-eight.json", UnitSystem.Metric },
        { "hill-climb-vee-eight.json", UnitSystem.Inch }, { "fen-boat-three.json", UnitSystem.Metric }, { "fen-boat-three.json", UnitSystem.Inch }, { null, UnitSystem.Metric },
    };

    [Theory]
    [MemberData(nameof(Sheets))]
    public void Every_figure_of_every_cylinder_is_the_results_own(string? sample, UnitSystem units)
    {
        Job job = sample is null ? SheetFiles.Largest : SheetFiles.Sample(sample);
        JsonElement results = JsonDocument.Parse(ResultsJson.Write(StageResults.Of(job, LastStage.Of(job)))).RootElement;
        string[][] lines = Lines(SheetFiles.BuildSheetOf(job, units));
        Dictionary<string, JsonElement> cylinders = results.GetProperty("cylinders").EnumerateArray().ToDictionary(cylinder => cylinder.GetProperty("cylinder").GetString()!);

        int compared = 0;
        foreach ((string Head, string[] Json)[] columns in new[] { RatioColumns, GapColumns, VolumeColumns })
        {
            // A column of which no cylinder knows anything is not printed.
            (string Head, string[] Json)[] known = [.. columns.Where(column => cylinders.Values.Any(cylinder => Find(cylinder, column.Json) is not null))];
            string[][] rows = [.. RowsUnder(lines, columns == RatioColumns ? "ratio" : columns == GapColumns ? "taper" : "chamber", [.. cylinders.Keys])];
            Assert.Equal(cylinders.Keys, rows.Select(row => row[0]));
            foreach (string[] row in rows)
            {
                for (int column = 0; column < known.Length; column++)
                {
                    Compare(row[column + 1], Find(cylinders[row[0]], known[column].Json), known[column].Json, units, $"{row[0]} {known[column].Head}");
                    compared++;
                }
            }
        }

        Assert.True(compared >= cylinders.Count * 15, $"{compared}");
    }

    [Theory]
    [MemberData(nameof(Sheets))]
    public void Every_verdict_on_the_whole_engine_is_said_with_its_belief(string? sample, UnitSystem units)
    {
        Job job = sample is null ? SheetFiles.Largest : SheetFiles.Sample(sample);
        JsonElement results = JsonDocument.Parse(ResultsJson.Write(StageResults.Of(job, LastStage.Of(job)))).RootElement;
        string text = string.Join(' ', Lines(SheetFiles.BuildSheetOf(job, units)).SelectMany(line => line));

        JsonElement[] engine = [.. results.GetProperty("verdicts").EnumerateArray().Where(verdict => verdict.GetProperty("cylinder").ValueKind == JsonValueKind.Null)];
        Assert.NotEmpty(engine);
        foreach (JsonElement verdict in engine)
        {
            string limit = $"{verdict.GetProperty("what").GetString()} {verdict.GetProperty("limit").GetString()}: ";
            string says = verdict.GetProperty("state").GetString() switch { "within" => "held.", "outside" => "NOT held.", _ => "not proven" };
            Assert.Contains(limit + says, text, StringComparison.Ordinal);
        }
    }

    private static double? Find(JsonElement element, string[] path)
    {
        foreach (string name in path)
        {
            if (element.ValueKind == JsonValueKind.Null)
            {
                return null;
            }

            element = element.GetProperty(name);
        }

        return element.ValueKind == JsonValueKind.Number ? element.GetDouble() : null;
    }

    private static void Compare(string printed, double? json, string[] path, UnitSystem units, string where)
    {
        if (json is not { } value)
        {
            Assert.True(printed == "–", $"{where}: '{printed}' where nothing is known");
            return;
        }

        double perUnit = units == UnitSystem.Metric ? 1.0 : path[0] switch
        {
            "bore" or "pistonToHead" or "taper" or "outOfRound" => MmPerInch,
            "compressionRatio" or "trappedRatio" => 1.0,
            "crankingPressure" => KPaPerPsi,
            _ => Mm3PerCubicInch / 1000.0, // JSON is in cm³
        };
        int decimals = printed.Contains('.', StringComparison.Ordinal) ? printed.Length - printed.IndexOf('.', StringComparison.Ordinal) - 1 : 0;

        // Half of the last digit; pressures in tens and hundreds are rounded there.
        double step = decimals > 0 ? Math.Pow(10.0, -decimals) : Math.Pow(10.0, printed.Length - printed.TrimEnd('0').Length);
        Assert.True(
            Math.Abs(double.Parse(printed, CultureInfo.InvariantCulture) - (value / perUnit)) <= (0.5 * step) + 1e-9, $"{where}: printed {printed}, results {value / perUnit}");
    }

    /// <summary>The rows of the table whose head holds a word, over all its pages.</summary>
    private static IEnumerable<string[]> RowsUnder(string[][] lines, string headWord, string[] labels)
    {
        int index = 0;
        HashSet<string> seen = [];
        while (seen.Count < labels.Length && index < lines.Length)
        {
            if (lines[index] is not ["cyl", ..] || !lines[index].Any(cell => cell.StartsWith(headWord, StringComparison.Ordinal)))
            {
                index++;
                continue;
            }

            // Heads may run over several lines; rows begin with a cylinder's label and a figure or dash.
            for (index++; index < lines.Length && lines[index] is not ["cyl", ..] && seen.Count < labels.Length; index++)
            {
                if (lines[index].Length > 2 && labels.Contains(lines[index][0]) && seen.Add(lines[index][0]))
                {
                    yield return lines[index];
                }
            }
        }
    }

    /// <summary>The words of each line of each page, cell by cell: words that stand apart by more than a blank are cells of their own.</summary>
    private static string[][] Lines(Sheet sheet)
    {
        using PdfDocument pdf = PdfDocument.Open(PdfSheet.Write(sheet, out _));
        List<string[]> lines = [];
        foreach (Page page in pdf.GetPages())
        {
            foreach (IGrouping<double, Word> line in page.GetWords().GroupBy(word => Math.Round(word.Letters[0].StartBaseLine.Y, 0)).OrderByDescending(line => line.Key))
            {
                List<string> cells = [];
                Word? before = null;
                foreach (Word word in line.OrderBy(word => word.BoundingBox.Left))
                {
                    if (before is not null && word.BoundingBox.Left - before.BoundingBox.Right < 4.0)
                    {
                        cells[^1] += " " + word.Text;
                    }
                    else
                    {
                        cells.Add(word.Text);
                    }

                    before = word;
                }

                lines.Add([.. cells]);
            }
        }

        return [.. lines];
    }
}
