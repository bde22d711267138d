using System.Xml.Linq;
using RebuildPlanner.Tests.Shared;
using UglyToad.PdfPig;

namespace RebuildPlanner.Cli.Tests;

public sealed class SheetCommandTests : IDisposable
{
    private readonly Scratch _scratch = new();

    private static string Van => RepositoryFiles.At("samples", "van-four.json");

    public void Dispose() => _scratch.Dispose();

    [Fact]
    public void A_sheet_is_written_and_its_path_said()
    {
        Screen screen = Screen.Of("sheet", "--file", Van, "--stage", "as machined", "--out", _scratch["van.pdf"]);

        Assert.Equal((0, _scratch["van.pdf"] + "\n", ""), (screen.ExitCode, screen.Output, screen.Error));
        Assert.Equal(["van.pdf"], _scratch.Names); // nothing half done beside it
        using PdfDocument pdf = PdfDocument.Open(_scratch["van.pdf"]);
        Assert.Equal("Build sheet, 2026-041, Pellow Bakery", pdf.Information.Title);
        Assert.Contains("issued2026-12-01", Squeezed(pdf), StringComparison.Ordinal);
    }

    [Fact]
    public void Paper_units_and_date_are_asked_for()
    {
        Screen screen = Screen.Of("sheet", "--file", Van, "--paper", "letter", "--units", "inch", "--date", "2027-01-31", "--out", _scratch["van.pdf"]);

        Assert.Equal(0, screen.ExitCode);
        using PdfDocument pdf = PdfDocument.Open(_scratch["van.pdf"]);
        Assert.Equal((612.0, 792.0), (Math.Round(pdf.GetPage(1).Width, 1), Math.Round(pdf.GetPage(1).Height, 1)));
        Assert.Contains("boreinswept", Squeezed(pdf), StringComparison.Ordinal);
        Assert.Contains("issued2027-01-31", Squeezed(pdf), StringComparison.Ordinal);
    }

    [Fact]
    public void The_job_is_read_back_from_the_sheet()
    {
        Screen.Of("sheet", "--file", Van, "--out", _scratch["van.pdf"]);

        Screen fromSheet = Screen.Of("results", "--file", _scratch["van.pdf"], "--json"), fromFile = Screen.Of("results", "--file", Van, "--json");

        Assert.Equal(fromFile, fromSheet);
        Assert.Equal(0, fromFile.ExitCode);
    }

    [Fact]
    public void A_sheet_with_a_verdict_outside_is_written_and_the_exit_code_says_so()
    {
        string job = _scratch.Write(
            "gap.json",
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "G-1" }, "engine": { "cylinders": 1 },
              "given": [ { "what": "gasket thickness", "value": "1.2 mm ± 0.05 mm" }, { "what": "deck", "value": "0.2 mm ± 0.03 mm below" } ],
              "limits": [ { "what": "piston to head", "min": "1.6 mm", "stage": "as received" } ] }
            """);

        Screen screen = Screen.Of("sheet", "--file", job, "--out", _scratch["gap.pdf"]);

        Assert.Equal(1, screen.ExitCode);
        using PdfDocument pdf = PdfDocument.Open(_scratch["gap.pdf"]);
        Assert.Contains("NOTheld:pistontoheadmin1.6mm.", Squeezed(pdf), StringComparison.Ordinal);
    }

    [Fact]
    public void What_is_no_PDF_is_not_overwritten_and_what_is_one_is()
    {
        string job = _scratch.Write("job.json", File.ReadAllText(Van));
        File.WriteAllText(_scratch["old.pdf"], "%PDF-1.4 an older sheet");

        Screen refused = Screen.Of("sheet", "--file", job, "--out", job), replaced = Screen.Of("sheet", "--file", job, "--out", _scratch["old.pdf"]);

        Assert.Equal((2, 0), (refused.ExitCode, replaced.ExitCode));
        Assert.Contains("left as it is", refused.Error.Replace("it was left", "left", StringComparison.Ordinal), StringComparison.Ordinal);
        Assert.Equal(File.ReadAllText(Van), File.ReadAllText(job));
        Assert.True(new FileInfo(_scratch["old.pdf"]).Length > 10_000);
        Assert.Equal(["job.json", "old.pdf"], _scratch.Names);
    }

    [Fact]
    public void Where_nothing_can_be_written_it_is_said_and_nothing_is()
    {
        Screen noFolder = Screen.Of("sheet", "--file", Van, "--out", _scratch[Path.Combine("no", "van.pdf")]), folder = Screen.Of("sheet", "--file", Van, "--out", _scratch["."]);

        Assert.Equal((2, 2), (noFolder.ExitCode, folder.ExitCode));
        Assert.Contains("there is no such folder. Nothing was written.", noFolder.Error, StringComparison.Ordinal);
        Assert.Contains("Nothing was written.", folder.Error, StringComparison.Ordinal);
        Assert.Empty(_scratch.Names);
    }

    [Theory]
    [InlineData("--paper", "A5", "A4 or Letter")]
    [InlineData("--units", "metric", "mm or inch")]
    [InlineData("--date", "31.1.2027", "2026-12-01")]
    [InlineData("--templates", "no-such-folder", "there is no such folder")]
    public void A_wrong_option_is_answered_with_what_would_be_right(string option, string value, string right)
    {
        Screen screen = Screen.Of("sheet", "--file", Van, "--out", _scratch["van.pdf"], option, value);

        Assert.Equal(2, screen.ExitCode);
        Assert.Contains(right, screen.Error, StringComparison.Ordinal);
        Assert.Empty(_scratch.Names);
    }

    [Fact]
    public void An_engine_of_which_nothing_can_be_computed_gets_no_sheet_but_a_form()
    {
        string blank = RepositoryFiles.At("templates", "flat-four.json");

        Screen sheet = Screen.Of("sheet", "--file", blank, "--out", _scratch["sheet.pdf"]), form = Screen.Of("form", "--file", blank, "--out", _scratch["form.pdf"]);

        Assert.Equal((2, 0), (sheet.ExitCode, form.ExitCode));
        Assert.Contains("Missing:\n  bore: all\n", sheet.Error, StringComparison.Ordinal);
        Assert.Equal(["form.pdf"], _scratch.Names);
        using PdfDocument pdf = PdfDocument.Open(_scratch["form.pdf"]);
        Assert.Contains("cyl4,bottom", Squeezed(pdf), StringComparison.Ordinal);
    }

    [Fact]
    public void A_form_of_what_is_left_is_shorter()
    {
        Screen.Of("form", "--file", Van, "--out", _scratch["all.pdf"]);
        Screen.Of("form", "--file", Van, "--left", "--out", _scratch["left.pdf"]);

        using PdfDocument all = PdfDocument.Open(_scratch["all.pdf"]), left = PdfDocument.Open(_scratch["left.pdf"]);
        Assert.Contains("chamber,cm³", Squeezed(all), StringComparison.Ordinal);
        Assert.DoesNotContain("chamber,cm³", Squeezed(left), StringComparison.Ordinal);
    }

    [Fact]
    public void A_letter_without_a_shape_is_told_and_the_sheet_written()
    {
        string job = _scratch.Write("job.json", File.ReadAllText(Van).Replace("Pellow Bakery", "山田", StringComparison.Ordinal));

        Screen screen = Screen.Of("sheet", "--file", job, "--out", _scratch["van.pdf"]);

        Assert.Equal(0, screen.ExitCode);
        Assert.Contains("no shape for 山 (U+5C71), 田 (U+7530)", screen.Error, StringComparison.Ordinal);
        Assert.Contains("山田", Screen.Of("results", "--file", _scratch["van.pdf"]).Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_PDF_without_a_job_inside_is_refused()
    {
        Screen.Of("form", "--file", Van, "--out", _scratch["form.pdf"]);
        File.WriteAllText(_scratch["broken.pdf"], "%PDF-1.7\nand nothing more");

        foreach (string name in new[] { "form.pdf", "broken.pdf" })
        {
            Screen screen = Screen.Of("results", "--file", _scratch[name]);

            Assert.Equal(2, screen.ExitCode);
            Assert.Contains($"{name}: this PDF has no job file inside", screen.Error, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void A_figure_is_SVG_or_words()
    {
        Screen svg = Screen.Of("figure", "--file", Van, "--show", "section", "--cylinder", "3", "--svg"), words = Screen.Of("figure", "--file", Van, "--show", "volumes");

        Assert.Equal((0, 0), (svg.ExitCode, words.ExitCode));
        Assert.Equal("Section through cylinder 3", XDocument.Parse(svg.Output).Root!.Elements().First().Value);
        Assert.StartsWith("The clearance volume and its parts\ncyl 1: chamber 45.46", words.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_figure_goes_into_a_file_that_is_no_other_kind()
    {
        Screen first = Screen.Of("figure", "--file", Van, "--svg", "--out", _scratch["section.svg"]), again = Screen.Of("figure", "--file", Van, "--svg", "--out", _scratch["section.svg"]);
        string job = _scratch.Write("job.json", File.ReadAllText(Van));
        Screen refused = Screen.Of("figure", "--file", job, "--svg", "--out", job);

        Assert.Equal((0, 0, 2), (first.ExitCode, again.ExitCode, refused.ExitCode));
        Assert.StartsWith("<svg", File.ReadAllText(_scratch["section.svg"]), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--cylinder", "9", "there is no such cylinder; there are 1, 2, 3, 4.")]
    [InlineData("--show", "picture", "section or volumes")]
    public void A_figure_that_is_not_there_is_refused(string option, string value, string right)
    {
        Screen screen = Screen.Of("figure", "--file", Van, option, value, "--svg");

        Assert.Equal(2, screen.ExitCode);
        Assert.Contains(right, screen.Error, StringComparison.Ordinal);
    }

    private static string Squeezed(PdfDocument pdf) =>
        string.Concat(pdf.GetPages().SelectMany(page => page.Text).Where(letter => !char.IsWhiteSpace(letter)));
}
