using CsCheck;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Pages;

namespace RebuildPlanner.Sheets.Tests.Pages;

public class PageFlowTests
{
    /// <summary>Every letter half as wide as the type is high.</summary>
    private sealed class EvenRuler : ITextRuler
    {
        public double WidthMm(string text, double sizePt, bool bold) => 0.5 * sizePt * 25.4 / 72.0 * text.Length;
    }

    private static readonly EvenRuler Ruler = new();

    [Fact]
    public void A_long_table_goes_on_over_the_page_with_its_head_again_and_every_row_once()
    {
        string[] rows = [.. Enumerable.Range(1, 120).Select(number => $"row {number}")];

        string[][] pages = PagesOf(SheetFiles.Of(TableOf(rows)));

        Assert.True(pages.Length >= 3);
        Assert.All(pages, page => Assert.Equal("what", page.First(text => text is not ("foot" or [_, 'a', 'g', 'e', ..]))));
        Assert.Equal(rows, pages.SelectMany(page => page).Where(text => text.StartsWith("row", StringComparison.Ordinal)));
    }

    [Fact]
    public void A_low_table_is_not_broken()
    {
        string[] rows = [.. Enumerable.Range(1, 8).Select(number => $"row {number}")];

        string[][] pages = PagesOf(SheetFiles.Of([.. Enumerable.Repeat(new Paragraph("filling"), 40), TableOf(rows)]));

        Assert.Equal(rows.Prepend("what"), pages[1].Where(text => text == "what" || text.StartsWith("row", StringComparison.Ordinal)));
    }

    [Theory]
    [InlineData(38)]
    [InlineData(39)]
    [InlineData(40)]
    [InlineData(41)]
    [InlineData(42)]
    public void A_heading_is_never_the_last_thing_on_a_page(int paragraphs)
    {
        Block[] blocks =
        [
            .. Enumerable.Repeat(new Paragraph("filling"), paragraphs), new Heading("HEAD", 2), new Paragraph("under it", Style.Small), TableOf("row 1", "row 2"),
        ];

        string[][] pages = PagesOf(SheetFiles.Of(blocks));

        string[] page = Assert.Single(pages, page => page.Contains("HEAD"));
        Assert.Contains("under it", page);
        Assert.Contains("row 2", page);
    }

    [Theory]
    [InlineData(41)]
    [InlineData(42)]
    [InlineData(43)]
    [InlineData(44)]
    public void What_leads_a_table_stays_with_it(int paragraphs)
    {
        string[][] pages = PagesOf(SheetFiles.Of([.. Enumerable.Repeat(new Paragraph("filling"), paragraphs), new Paragraph("lead", Style.Small), TableOf("row 1", "row 2")]));

        Assert.Contains("row 2", Assert.Single(pages, page => page.Contains("lead")));
    }

    [Fact]
    public void A_figure_and_what_is_framed_stay_whole()
    {
        Picture picture = new(50.0, 140.0, "P", "A picture.", [Polygon.Rectangle(0, 0, 50, 140, Pen.Outline)]);

        IReadOnlyList<Mark> marks = PageFlow.Of(
            SheetFiles.Of(new Illustration(picture, "one"), new Illustration(picture, "two"), new Framed([.. Enumerable.Repeat(new Paragraph("framed"), 30)])), Ruler);

        Assert.Equal(3, marks.Count(mark => mark is PageMark));
        Assert.All(Labels(marks), label => Assert.InRange(label.At.YMm, 0.0, Paper.A4.HeightMm));
    }

    public static TheoryData<string> Long => ["table", "facts", "frame", "paragraph", "points"];

    // Each of these keeps together what it can; of what no page can hold, nothing may run off the paper or be lost.
    [Theory]
    [MemberData(nameof(Long))]
    public void What_no_page_can_hold_goes_on_over_the_next(string kind)
    {
        string[] words = [.. Enumerable.Range(1, 3000).Select(number => $"w{number}")];
        string text = string.Join(' ', words);
        Block block = kind switch
        {
            "table" => new Table([new Column("HEAD", IsText: true), new Column("n")], [[text, "1"], ["last", "2"]]),
            "facts" => new Facts([("NAME", text), ("last", "2")]),
            "frame" => new Framed([new Paragraph(text), new Paragraph("last 2")]),
            "points" => new Points([text, "last 2"]),
            _ => new Paragraph(text + " last 2"),
        };

        string[][] pages = PagesOf(SheetFiles.Of(new Heading("TITLE", 2), block));

        Assert.True(pages.Length > 1);
        Assert.Equal(words, pages.SelectMany(page => page).SelectMany(line => line.Split(' ')).Where(word => word.StartsWith('w')));
        Assert.All(
            Labels(PageFlow.Of(SheetFiles.Of(new Heading("TITLE", 2), block) with { Foot = "", PageOf = "" }, Ruler)),
            label => Assert.InRange(label.At.YMm, Paper.TopMm, Paper.A4.FloorMm));
        Assert.Contains(pages[0], line => line.StartsWith("w1 ", StringComparison.Ordinal)); // the heading is not left alone on the first page
        if (kind is "table" or "facts")
        {
            Assert.All(pages, page => Assert.Single(page, line => line is "HEAD" or "NAME")); // what it is stands on every page
        }
    }

    [Fact]
    public void Pages_are_numbered_n_of_m()
    {
        string[][] pages = PagesOf(SheetFiles.Of(new Paragraph("one"), new NewPage(), new Paragraph("two"), new NewPage(), new Paragraph("three")));

        Assert.Equal(["page 1 of 3", "page 2 of 3", "page 3 of 3"], pages.Select(page => page.Single(text => text.StartsWith("page", StringComparison.Ordinal))));
    }

    [Fact]
    public void A_new_page_at_the_top_of_a_page_adds_no_empty_one() =>
        Assert.Single(PagesOf(SheetFiles.Of(new NewPage(), new NewPage(), new Paragraph("one"))));

    [Fact]
    public void What_begins_ends_and_every_shape_has_a_role() => Assert.Equal(0, Depth(PageFlow.Of(SheetFiles.BuildSheetOf(SheetFiles.Largest), Ruler)));

    private static readonly Gen<string> AnyText = Gen.Char["ab ü–山\t\n&"].Array[0, 60].Select(letters => new string(letters));

    [Fact]
    public void Wrapped_text_loses_no_letter_and_fits() => Gen.Select(AnyText, Gen.Double[6.0, 120.0]).Sample((text, widthMm) =>
    {
        IReadOnlyList<string> lines = new Wrapping(Ruler).Lines(text, 9.0, bold: false, widthMm);

        Assert.Equal(Letters(text), Letters(string.Concat(lines)));
        Assert.All(lines, line => Assert.True(Ruler.WidthMm(line, 9.0, bold: false) <= widthMm || line.Length == 1));
    });

    [Fact]
    public void A_word_wider_than_the_line_is_broken_between_whole_characters() =>
        Assert.Equal(["😀😀", "😀"], new Wrapping(Ruler).Lines("😀😀😀", 9.0, bold: false, 5.0 * 0.5 * 9.0 * 25.4 / 72.0));

    [Fact]
    public void A_cell_of_one_endless_word_leaves_the_figures_beside_it_whole()
    {
        Table table = new([new Column("name", IsText: true), new Column("figure")], [[new string('x', 400), "1234.5678"]]);

        string[] texts = PagesOf(SheetFiles.Of(table))[0];

        Assert.Contains("1234.5678", texts);
        Assert.Equal(400, texts.Where(text => text.StartsWith('x')).Sum(text => text.Trim().Length));
    }

    private static Table TableOf(params string[] rows) => new([new Column("what", IsText: true)], [.. rows.Select(row => (IReadOnlyList<string>)[row])]);

    private static string Letters(string text) => string.Concat(text.Where(letter => !char.IsWhiteSpace(letter)));

    private static IEnumerable<Label> Labels(IEnumerable<Mark> marks) => marks.OfType<ShapeMark>().Select(mark => mark.Shape).OfType<Label>();

    private static string[][] PagesOf(Sheet sheet)
    {
        List<List<string>> pages = [];
        foreach (Mark mark in PageFlow.Of(sheet, Ruler))
        {
            if (mark is PageMark)
            {
                pages.Add([]);
            }
            else if (mark is ShapeMark { Shape: Label label })
            {
                pages[^1].Add(label.Text);
            }
        }

        return [.. pages.Select(page => page.ToArray())];
    }

    private static int Depth(IEnumerable<Mark> marks)
    {
        int depth = 0;
        foreach (Mark mark in marks)
        {
            depth += mark switch { BeginMark => 1, EndMark => -1, _ => 0 };
            Assert.True(depth > 0 || mark is not ShapeMark);
        }

        return depth;
    }
}
