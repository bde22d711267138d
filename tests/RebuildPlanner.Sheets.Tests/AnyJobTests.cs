using System.Globalization;
using System.Text;
using System.Text.Json;
using System.Xml.Linq;
using CsCheck;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Figures;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Pdf;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Sheets.Tests;

/// <summary>What must hold of the paper of any job that can be read: figures anywhere, half of them missing, words of any kind.</summary>
[Collection(OneDocument.AtATime)]
public class AnyJobTests
{
    // Among them: control characters, right to left, pairs of surrogates, names in braces as the wording has them, a word without end, many lines.
    private static readonly Gen<string> Strange = Gen.OneOf(
        Gen.OneOf(
            "\u0001\u0007\u001f", "a\tb\nc\r\nd\u2028e\u0085f", "שלום \u202eעולם", "😀🏁𝄞", "{low} {page} of {pages} {", "}{", "\uFEFF\uFFFE\uFFFF", "</script>&amp;]]>",
            new string('w', 5000), string.Concat(Enumerable.Repeat("drinks oil ", 900)), "  ", "(a) \\ )"),
        Gen.Char.Array[1, 40].Select(letters => new string([.. letters.Where(letter => !char.IsSurrogate(letter))]) + "x"));

    private static readonly Gen<Job> Named =
        from job in Gen.OneOf(RandomJobs.Job, RandomEngine.Gen.Select(engine => engine.Job()))
        from words in Strange.Array[7]
        select Renamed(
            job with
            {
                Title = words[0],
                Complaint = words[1],
                Asked = words[2],
                CustomerName = words[3],
                Notes = [words[4], .. job.Notes],
                Checks = [new Core.Jobs.Check(Name(words[5]), words[6], Stage.Before), .. job.Checks],
                Engine = job.Engine with { Description = words[6] },
            },
            Name(words[0]), Name(words[1]), Name(words[2]));

    // A name has no blank before or after it.
    private static string Name(string words) => $"‹{words}›";

    private static readonly Gen<(Job Job, Stage Stage, UnitSystem Units, Paper Paper)> Asked =
        Gen.Select(Named, Gen.Enum<Stage>(), Gen.Enum<UnitSystem>(), Gen.OneOf([.. Paper.All]));

    [Fact]
    public void Any_job_has_a_sheet_a_form_and_figures_at_every_stage() => Named.Sample(
        job =>
        {
            SheetInput input = SheetFiles.Input(job);
            foreach (Stage stage in Enum.GetValues<Stage>())
            {
                Results results = StageResults.Of(job, stage);
                Sheet sheet = BuildSheet.Of(input, results);
                Assert.NotEmpty(SheetText.Of(sheet));
                Assert.NotEmpty(MeasuringForm.Of(input, stage, Round.Left(job, stage)).Blocks);
                Picture?[] pictures = [VolumeBars.Draw(results, UnitSystem.Inch, input.Words), .. results.Cylinders.Select(cylinder => FiguresPart.Section(input, results, cylinder))];
                foreach (Picture picture in pictures.OfType<Picture>())
                {
                    Assert.NotEmpty(picture.Alternative.Trim());
                    Assert.DoesNotContain("NaN", Svg.Write(picture), StringComparison.Ordinal);
                    Assert.NotNull(XDocument.Parse(Svg.Write(picture)).Root);
                    Assert.All(picture.Shapes.SelectMany(SheetFiles.Extremes), spot => AssertWithin(picture, spot));
                }

                Assert.All(Tables(sheet.Blocks), AssertFilled);
            }
        },
        iter: 20);

    [Fact]
    public void Text_of_any_job_keeps_within_the_margins() => Asked.Sample(
        asked =>
        {
            SheetInput input = SheetFiles.Input(asked.Job, asked.Units, asked.Paper);
            AssertWithinMargins(BuildSheet.Of(input, StageResults.Of(asked.Job, asked.Stage)));
            AssertWithinMargins(MeasuringForm.Of(input, asked.Stage, Round.Of(asked.Job.Engine)));
        },
        iter: 15, threads: 1);

    [Fact]
    public void Any_job_reads_back_from_its_sheet_and_gives_the_same_bytes_again() => Asked.Sample(
        asked =>
        {
            byte[] Write() => PdfSheet.Write(
                BuildSheet.Of(SheetFiles.Input(asked.Job, asked.Units, asked.Paper), StageResults.Of(asked.Job, asked.Stage)), out _);

            byte[] first = Write();

            Assert.Equal(asked.Job, JobFileReader.Read(AttachedFile.Read(first, BuildSheet.JobFileName)).Job);
            Assert.Equal(first, Write());
        },
        iter: 6);

    // The reader refuses half a character, but a job need not come from a file.
    [Fact]
    public void Half_a_character_is_shown_as_the_one_that_stands_for_what_is_broken()
    {
        PdfSheet.Write(SheetFiles.Of(new Heading("\ud83d", 1), new Paragraph("a\udc00b")), out IReadOnlyList<Rune> unprintable);

        Assert.Equal("a\ufffdb", PlainText.Of("a\udc00b"));
        Assert.True(unprintable.Count <= 1);
    }

    /// <summary>The job with other names for cylinders, parts and pieces; a name of everything it may be, and no two alike.</summary>
    private static Job Renamed(Job job, string cylinder, string part, string number)
    {
        string json = Encoding.UTF8.GetString(JobFileWriter.Write(job));
        foreach (string label in job.Engine.Labels)
        {
            json = json.Replace(Quoted(label), Quoted(cylinder + label), StringComparison.Ordinal);
        }

        foreach (string id in new[] { "std", "G", "P1", "P2", "left", "right" })
        {
            json = json.Replace(Quoted(id), Quoted(part + id), StringComparison.Ordinal);
        }

        return JobText.Read(json.Replace(Quoted(job.Number), Quoted(number), StringComparison.Ordinal));
    }

    private static string Quoted(string text) => JsonSerializer.Serialize(text, _asWritten);

    // As the job file is written: letters as they are, so that what is looked for is found.
    private static readonly JsonSerializerOptions _asWritten = new() { Encoder = System.Text.Encodings.Web.JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    private static void AssertWithin(Picture picture, Spot spot)
    {
        const double Slack = 0.01; // mm; a double's rounding is far less, an eye sees far more
        Assert.InRange(spot.XMm, -Slack, picture.WidthMm + Slack);
        Assert.InRange(spot.YMm, -Slack, picture.HeightMm + Slack);
    }

    // In a column of figures every cell says something, be it that nothing is known; and every row says what it is about.
    private static void AssertFilled(Table table)
    {
        foreach (IReadOnlyList<string> row in table.Rows)
        {
            Assert.Equal(table.Columns.Count, row.Count);
            Assert.True(row.Count > 1); // a row that is a name and nothing else says nothing
            Assert.All(row.Where((_, column) => column == 0 || !table.Columns[column].IsText), cell => Assert.NotEmpty(cell));
            Assert.All(row, cell => Assert.False(cell.Contains("NaN", StringComparison.Ordinal) || cell.Contains('∞', StringComparison.Ordinal), cell));
        }
    }

    private static IEnumerable<Table> Tables(IEnumerable<Block> blocks) => blocks.SelectMany(block => block switch
    {
        Table table => [table],
        Framed framed => Tables(framed.Blocks),
        Together together => Tables(together.Blocks),
        _ => Array.Empty<Table>(),
    });

    private static void AssertWithinMargins(Sheet sheet)
    {
        const double Slack = 0.01; // mm: widths are sums of a font's advances in doubles
        PdfRuler ruler = new();
        double rightMm = sheet.Paper.WidthMm - Paper.RightMm;
        double floorMm = sheet.Paper.FloorMm;

        // The foot stands below the floor, in its own place; so first without it.
        AssertLabels(PageFlow.Of(sheet with { Foot = "", PageOf = "" }, ruler));
        floorMm = sheet.Paper.HeightMm - 8.0; // what a printer can reach
        AssertLabels(PageFlow.Of(sheet, ruler));

        void AssertLabels(IEnumerable<Mark> marks) => Assert.All(marks.OfType<ShapeMark>().Select(mark => mark.Shape).OfType<Label>(), label =>
        {
            double widthMm = ruler.WidthMm(label.Text.TrimEnd(), label.SizePt, label.Bold);
            (double along, double across) = label.Upright ? (0.0, widthMm) : (widthMm, 0.0);
            double before = label.Anchor switch { Anchor.Start => 0.0, Anchor.Middle => 0.5, _ => 1.0 };
            string where = string.Create(CultureInfo.InvariantCulture, $"'{label.Text[..Math.Min(40, label.Text.Length)]}' at {label.At}, {widthMm:F1} mm wide");
            Assert.True(label.At.XMm - (before * along) >= Paper.LeftMm - Slack, where);
            Assert.True(label.At.XMm + ((1.0 - before) * along) <= rightMm + Slack, where);
            Assert.True(label.At.YMm - across >= Paper.TopMm - Slack, where);
            Assert.True(label.At.YMm <= floorMm + Slack, where);
        });
    }
}
