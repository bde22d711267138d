using System.Text;
using System.Xml.Linq;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Pdf;
using RebuildPlanner.Sheets.Templates;
using RebuildPlanner.Tests.Shared;
using UglyToad.PdfPig;
using UglyToad.PdfPig.Content;
using UglyToad.PdfPig.Outline;
using UglyToad.PdfPig.Tokens;

namespace RebuildPlanner.Sheets.Tests.Pdf;

[Collection(OneDocument.AtATime)]
public class PdfSheetTests
{
    private const string Awkward = "Smith & Sons <x> \"Łódź\" 'Ærø' ]]> \\ (a) –";

    public static TheoryData<string> Samples => [.. SheetFiles.Samples];

    [Theory]
    [MemberData(nameof(Samples))]
    public void The_job_inside_is_the_job(string sample)
    {
        Job job = SheetFiles.Sample(sample);

        byte[] inside = AttachedFile.Read(Written(SheetFiles.BuildSheetOf(job)), BuildSheet.JobFileName)!;

        Assert.Equal(job, JobFileReader.Read(inside).Job);
    }

    [Fact]
    public void The_fullest_job_file_travels_inside_whole()
    {
        Job job = SheetFiles.Read(RepositoryFiles.Text("tests", "Reference", "complete-job.json"));

        Assert.Equal(job, JobFileReader.Read(AttachedFile.Read(Written(SheetFiles.BuildSheetOf(job)), BuildSheet.JobFileName)).Job);
    }

    [Fact]
    public void Another_reader_of_PDF_finds_the_job_inside_too()
    {
        Job job = SheetFiles.Sample("van-four.json");
        using PdfDocument pdf = PdfDocument.Open(Written(SheetFiles.BuildSheetOf(job)));

        Assert.True(pdf.Advanced.TryGetEmbeddedFiles(out IReadOnlyList<EmbeddedFile>? files));
        Assert.Equal(BuildSheet.JobFileName, Assert.Single(files!).Name);
        Assert.Equal(job, JobFileReader.Read(files![0].Memory.Span).Job);
        Assert.Matches($@"/Size {JobFileWriter.Write(job).Length}\b", Encoding.Latin1.GetString(Written(SheetFiles.BuildSheetOf(job))));
    }

    [Fact]
    public void What_is_no_sheet_holds_no_job()
    {
        byte[] sheet = Written(SheetFiles.BuildSheetOf(SheetFiles.Sample("van-four.json")));

        Assert.Null(AttachedFile.Read("%PDF-1.7 and then nothing"u8.ToArray(), BuildSheet.JobFileName));
        Assert.Null(AttachedFile.Read(sheet[..(sheet.Length / 2)], BuildSheet.JobFileName));
        Assert.Null(AttachedFile.Read(sheet, "other.json"));
        Assert.Null(AttachedFile.Read(Written(SheetFiles.Of(new Paragraph("no file inside"))), BuildSheet.JobFileName));
    }

    [Fact]
    public void The_same_sheet_has_the_same_bytes_and_another_day_others()
    {
        Sheet sheet = SheetFiles.BuildSheetOf(SheetFiles.Sample("van-four.json"));

        Assert.Equal(Written(sheet), Written(sheet));
        Assert.NotEqual(Written(sheet), Written(sheet with { Date = SheetFiles.Date.AddDays(1) }));
    }

    // Programs that keep many files tell them apart by this.
    [Fact]
    public void Another_sheet_has_another_identity()
    {
        static string Identity(Sheet sheet) => System.Text.RegularExpressions.Regex.Match(Encoding.Latin1.GetString(Written(sheet)), @"/ID\s*\[[^\]]*\]").Value;

        Sheet one = SheetFiles.Of(new Paragraph("one")), two = SheetFiles.Of(new Paragraph("two"));

        Assert.NotEmpty(Identity(one));
        Assert.NotEqual(Identity(one), Identity(two));
    }

    [Fact]
    public void A_table_over_pages_is_one_to_who_cannot_see_it_with_its_head_once()
    {
        string text = Encoding.Latin1.GetString(Written(SheetFiles.Of(new Table([new Column("HEAD", IsText: true)], [.. Enumerable.Repeat<IReadOnlyList<string>>(["row"], 120)]))));

        Assert.True(Count(text, "/Type/Page\n") + Count(text, "/Type/Page/") >= 3);
        Assert.Equal((1, 121, 1), (Count(text, "/S/Table/"), Count(text, "/S/TR/"), Count(text, "/S/TH/")));
    }

    // Read back by another library: how wide a circle is, which way a label reads, whether a line is dashed.
    [Fact]
    public void Shapes_are_drawn_as_large_as_they_are()
    {
        Picture picture = new(60.0, 60.0, "P", "A picture.", [new Circle(new(30.0, 30.0), 12.0, Pen.Outline), new Line(new(0.0, 5.0), new(50.0, 5.0), Pen.Dashed), new Label(new(10.0, 50.0), "UP", 9.0, Upright: true)]);
        using PdfDocument pdf = PdfDocument.Open(Written(SheetFiles.Of(new Illustration(picture, "")) with { Foot = "", PageOf = "" }));
        Page page = pdf.GetPage(1);

        const double PtPerMm = 72.0 / 25.4;
        double[] widths = [.. page.Paths.Select(path => path.GetBoundingRectangle()).OfType<UglyToad.PdfPig.Core.PdfRectangle>().Where(box => Math.Abs(box.Width - box.Height) < 0.1).Select(box => box.Width)];
        Assert.Contains(widths, width => Math.Abs(width - (24.0 * PtPerMm)) < 0.1); // four curves of Bézier stand for a circle, a tenth of a point is more than they stray
        Assert.Equal([TextOrientation.Rotate270, TextOrientation.Rotate270], page.Letters.Where(letter => letter.Value is "U" or "P").Select(letter => letter.TextOrientation));
        Assert.Contains(page.Paths, path => path.LineDashPattern is { } dashes && dashes.Array.Any(dash => Math.Abs(dash - (1.2 * PtPerMm)) < 0.01));
    }

    [Theory]
    [InlineData(Awkward)]
    [InlineData("plain")]
    [InlineData("Ἕλλην 山田 😀")]
    public void What_a_sheet_says_of_itself_is_right_for_any_name(string name)
    {
        string title = string.Concat(Enumerable.Repeat(name + " ", 60)).TrimEnd();
        Sheet sheet = SheetFiles.Of(new Paragraph("text")) with { Title = title, Author = name, Subject = name + "\u0001" };
        using PdfDocument pdf = PdfDocument.Open(Written(sheet));

        Assert.Equal((title, name, name + " "), (pdf.Information.Title, pdf.Information.Author, pdf.Information.Subject));
        Assert.True(pdf.TryGetXmpMetadata(out XmpMetadata? metadata));
        using MemoryStream utf8 = new(metadata!.GetXmlBytes().ToArray());
        XElement packet = XDocument.Load(utf8).Root!;
        XNamespace dc = "http://purl.org/dc/elements/1.1/";
        Assert.Equal([title, name, name + " "], new[] { "title", "creator", "description" }.Select(field => packet.Descendants(dc + field).Single().Value));
        XNamespace xmp = "http://ns.adobe.com/xap/1.0/";
        Assert.Equal("2026-12-01T00:00:00Z", packet.Descendants(xmp + "CreateDate").Single().Value);
        Assert.Equal("D:20261201000000", pdf.Information.CreationDate![..16]);
    }

    [Theory]
    [MemberData(nameof(Samples))]
    public void Bookmarks_are_the_headings_on_their_pages(string sample)
    {
        Sheet sheet = SheetFiles.BuildSheetOf(SheetFiles.Sample(sample));
        using PdfDocument pdf = PdfDocument.Open(Written(sheet));

        Assert.True(pdf.TryGetBookmarks(out Bookmarks? bookmarks));
        BookmarkNode[] nodes = [.. bookmarks!.GetNodes()];
        Assert.Equal(sheet.Blocks.OfType<Heading>().Select(heading => heading.Text), nodes.Select(node => node.Title));
        Assert.Equal(sheet.Blocks.OfType<Heading>().Select(heading => heading.Level - 1), nodes.Select(node => node.Level));
        Assert.All(nodes, node => Assert.Contains(Squeezed(node.Title), Squeezed(pdf.GetPage(((DocumentBookmarkNode)node).PageNumber).Text), StringComparison.Ordinal));
    }

    // Outside PDFsharp: the structure as the file holds it, read from its plain objects.
    [Theory]
    [MemberData(nameof(Samples))]
    public void The_structure_names_headings_tables_and_figures_with_words_for_them(string sample)
    {
        Sheet sheet = SheetFiles.BuildSheetOf(SheetFiles.Sample(sample));
        string text = Encoding.Latin1.GetString(Written(sheet));

        Assert.Contains("/MarkInfo", text, StringComparison.Ordinal);
        Assert.Contains("/StructTreeRoot", text, StringComparison.Ordinal);
        Assert.Contains("/Lang(en)", text, StringComparison.Ordinal);
        Assert.Equal(1, Count(text, "/S/H1/"));
        Assert.Equal(sheet.Blocks.OfType<Heading>().Count(heading => heading.Level == 2), Count(text, "/S/H2/"));
        Assert.Equal(sheet.Blocks.Count(block => block is Table or Facts), Count(text, "/S/Table/"));
        Assert.Equal(sheet.Blocks.OfType<Table>().Sum(table => table.Rows.Count + 1), Count(text, "/S/TR/") - FactRows(text, sheet));
        Assert.Equal(sheet.Blocks.OfType<Illustration>().Count(), Count(text, "/S/Figure/"));
        using PdfDocument pdf = PdfDocument.Open(Written(sheet));
        string[] alternatives =
        [
            .. pdf.Structure.CrossReferenceTable.ObjectOffsets.Keys.Select(key => pdf.Structure.GetObject(key).Data).OfType<DictionaryToken>()
                .Where(element => element.Data.TryGetValue("S", out IToken? kind) && kind is NameToken { Data: "Figure" })
                .Select(element => element.Data.TryGetValue("Alt", out IToken? words) && words is IDataToken<string> said ? said.Data : ""),
        ];
        Assert.Equal(sheet.Blocks.OfType<Illustration>().Select(figure => figure.Picture.Alternative).Order(StringComparer.Ordinal), alternatives.Order(StringComparer.Ordinal));
    }

    [Theory]
    [InlineData("van-four.json", UnitSystem.Metric)]
    [InlineData("hill-climb-vee-eight.json", UnitSystem.Inch)]
    [InlineData("fen-boat-three.json", UnitSystem.Metric)]
    [InlineData(null, UnitSystem.Inch)]
    public void Text_reads_back_in_the_order_in_which_it_is_said(string? sample, UnitSystem units)
    {
        Sheet sheet = SheetFiles.BuildSheetOf(sample is null ? SheetFiles.Largest : SheetFiles.Sample(sample), units, Paper.Letter);
        using PdfDocument pdf = PdfDocument.Open(Written(sheet));
        string read = Squeezed(string.Concat(pdf.GetPages().Select(page => page.Text)));

        int at = 0;
        foreach (string piece in Pieces(sheet.Blocks).Select(Squeezed).Where(piece => piece.Length > 0))
        {
            // A long piece may go on over a page, with that page's foot between.
            string start = piece.Length > 60 ? piece[..30] : piece;
            int found = read.IndexOf(start, at, StringComparison.Ordinal);
            Assert.True(found >= 0, $"'{start}' is not after '{read[Math.Max(0, at - 40)..at]}'");
            at = found + start.Length;
        }
    }

    [Theory]
    [InlineData("van-four.json", UnitSystem.Metric, "A4")]
    [InlineData("hill-climb-vee-eight.json", UnitSystem.Inch, "Letter")]
    [InlineData(null, UnitSystem.Inch, "A4")]
    public void Nothing_is_printed_beyond_the_margins(string? sample, UnitSystem units, string paper)
    {
        Paper sheetPaper = Paper.Find(paper)!;
        Sheet sheet = SheetFiles.BuildSheetOf(sample is null ? SheetFiles.Largest : SheetFiles.Sample(sample), units, sheetPaper);
        using PdfDocument pdf = PdfDocument.Open(Written(sheet));

        const double MmPerPt = 25.4 / 72.0, Slack = 0.5; // a letter's shape may reach a little past its advance
        Assert.All(pdf.GetPages(), page =>
        {
            Assert.Equal((sheetPaper.WidthMm, sheetPaper.HeightMm), (Math.Round(page.Width * MmPerPt, 1), Math.Round(page.Height * MmPerPt, 1)));
            Assert.All(page.Letters.Where(letter => letter.Value.Trim().Length > 0), letter =>
            {
                Assert.InRange(letter.BoundingBox.Left * MmPerPt, Paper.LeftMm - Slack, sheetPaper.WidthMm - Paper.RightMm + Slack);
                Assert.InRange(letter.BoundingBox.Right * MmPerPt, Paper.LeftMm - Slack, sheetPaper.WidthMm - Paper.RightMm + Slack);
                Assert.InRange(letter.BoundingBox.Bottom * MmPerPt, 8.0, sheetPaper.HeightMm - 8.0);
            });
        });
    }

    [Theory]
    [InlineData(1)]
    [InlineData(5)]
    public void Text_that_goes_on_over_a_page_stays_one_stretch(int pages)
    {
        string text = string.Concat(Enumerable.Repeat("a note of some words ", 300 * pages)).TrimEnd();
        byte[] written = Written(SheetFiles.Of(new Paragraph("before"), new Points([text]), new Paragraph("after")) with { Foot = "", PageOf = "" });
        using PdfDocument pdf = PdfDocument.Open(written);

        Assert.True(pdf.NumberOfPages > pages);
        Assert.Equal(Squeezed($"before•{text}after"), Squeezed(string.Concat(pdf.GetPages().Select(page => page.Text))));
        Assert.Equal(1, Count(Encoding.Latin1.GetString(written), "/S/LI/"));
    }

    [Fact]
    public void The_type_has_a_shape_for_everything_the_program_says()
    {
        string said = string.Concat(
            RepositoryFiles.Text("templates", TemplateFiles.Wording), string.Concat(WhatTable.Lines.Select(line => line.Word)),
            string.Concat(Enum.GetValues<QuantityKind>().SelectMany(kind => new[] { QuantityPrint.Unit(kind, UnitSystem.Metric), QuantityPrint.Unit(kind, UnitSystem.Inch) })),
            string.Concat(RepositoryFiles.Text("src", "RebuildPlanner.Core", "Jobs", "Cautions.cs")), "Ø±µ³²≤≥→×½°–“”’…•·");
        string letters = string.Concat(said.EnumerateRunes().Where(rune => !Rune.IsWhiteSpace(rune) && !Rune.IsControl(rune)).Distinct().Select(rune => rune.ToString()));

        PdfSheet.Write(SheetFiles.Of(new Paragraph(letters), new Paragraph(letters, Style.Strong)), out IReadOnlyList<Rune> unprintable);

        Assert.True(letters.Length > 80);
        Assert.Empty(unprintable);
    }

    [Fact]
    public void A_letter_the_type_has_no_shape_for_is_told()
    {
        PdfSheet.Write(SheetFiles.Of(new Paragraph("山田 & 山 😀")), out IReadOnlyList<Rune> unprintable);

        Assert.Equal(["山", "田", "😀"], unprintable.Select(rune => rune.ToString()));
    }

    private static byte[] Written(Sheet sheet) => PdfSheet.Write(sheet, out _);

    private static int Count(string text, string part) => text.Split(part).Length - 1;

    // Facts are a table whose rows depend on the width of what stands in them: what is left over must be theirs, one to each name at most.
    private static int FactRows(string text, Sheet sheet)
    {
        int rows = Count(text, "/S/TR/") - sheet.Blocks.OfType<Table>().Sum(table => table.Rows.Count + 1);
        Assert.InRange(rows, 1, sheet.Blocks.OfType<Facts>().Sum(facts => facts.Pairs.Count));
        return rows;
    }

    private static IEnumerable<string> Pieces(IEnumerable<Block> blocks) => blocks.SelectMany(block => block switch
    {
        Heading heading => [heading.Text],
        Paragraph paragraph => [paragraph.Text],
        Points points => points.Items,
        Facts facts => facts.Pairs.SelectMany(pair => new[] { pair.Name, pair.Value }),
        Table table => table.Columns.Select(column => column.Title).Concat(table.Rows.SelectMany(row => row)),
        Illustration figure => [figure.Caption],
        Framed framed => Pieces(framed.Blocks),
        Together together => Pieces(together.Blocks),
        Signatures signatures => signatures.Labels,
        _ => Array.Empty<string>(),
    });

    private static string Squeezed(string text) => string.Concat(text.Where(letter => !char.IsWhiteSpace(letter)));
}
