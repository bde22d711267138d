using System.Globalization;
using System.Text.RegularExpressions;

namespace RebuildPlanner.Benchmarks;

/// <summary>
/// <c>rebuild sheet</c> as a whole process: against a spreadsheet program printing a prepared sheet of the same tables, and against
/// <c>rebuild results</c> of the same job.
/// </summary>
internal static partial class SheetBenchmark
{
    private const double WantedFaster = 10.0, WantedSlower = 3.0;
    private const int Warm = 2, Runs = 15;

    /// <summary>Runs it.</summary>
    public static void Run()
    {
        string folder = Directory.CreateTempSubdirectory("rebuild-benchmark-").FullName;
        try
        {
            string job = Path.Combine(folder, "vee-eight.json"), sheet = Path.Combine(folder, "sheet.pdf");
            File.WriteAllText(job, EightCylinderJob.Text());
            if (Builds.Native(Path.Combine(folder, "native")) is { } native)
            {
                Measure("native", folder, sheet, what => ByTurns.Milliseconds(native, Request(what, job, sheet)));
            }

            string ahead = Builds.OnRuntime(Path.Combine(folder, "ahead"));
            Measure("on the runtime", folder, sheet, what => ByTurns.Milliseconds("dotnet", [ahead, .. Request(what, job, sheet)]));
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    private static string[] Request(string what, string job, string sheet) =>
        what == "sheet" ? ["sheet", "--file", job, "--date", "2026-12-01", "--out", sheet] : ["results", "--file", job];

    private static void Measure(string build, string folder, string sheet, Func<string, double> ours)
    {
        (double resultsMs, double sheetMs) = ByTurns.Medians(Warm, Runs, () => ours("results"), () => ours("sheet"));
        Say($"sheet: {build} {sheetMs:0.0} ms, {Pages(sheet)} pages; results {resultsMs:0.0} ms, medians of {Runs}; ratio {sheetMs / resultsMs:0.00} (wanted < {WantedSlower:0})");
        if (RivalSpreadsheet.Prepare(folder) is not { } rival)
        {
            Console.WriteLine("sheet: no spreadsheet program, skipped. It is soffice, of the package libreoffice-calc.");
            return;
        }

        int pages = Pages(sheet), rivalPages = Pages(rival.Printed);
        if (rivalPages < pages)
        {
            // A shorter print would be a lighter task, and the ratio no fair one.
            throw new InvalidOperationException($"The spreadsheet program printed {rivalPages} pages against {pages}: give its sheet more lines.");
        }

        (double rivalMs, double againMs) = ByTurns.Medians(1, Runs / 2, rival.Print, () => ours("sheet"));
        Say($"sheet: {build} {againMs:0.0} ms, {pages} pages; the spreadsheet program {rivalMs:0} ms, {rivalPages} pages, medians of {Runs / 2}; {rivalMs / againMs:0.0} times as fast (wanted ≥ {WantedFaster:0})");
    }

    private static int Pages(string pdf) => PageObject().Count(File.ReadAllText(pdf, System.Text.Encoding.Latin1));

    private static void Say(FormattableString text) => Console.WriteLine(text.ToString(CultureInfo.InvariantCulture));

    [GeneratedRegex(@"/Type\s*/Page\b(?!s)")]
    private static partial Regex PageObject();
}
