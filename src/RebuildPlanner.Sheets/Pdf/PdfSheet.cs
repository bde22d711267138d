using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using PdfSharp.Drawing;
using PdfSharp.Pdf;
using PdfSharp.UniversalAccessibility;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Pages;

namespace RebuildPlanner.Sheets.Pdf;

/// <summary>A sheet as PDF: tagged, bookmarked, with its file inside, and byte for byte the same for the same sheet.</summary>
/// <remarks>The one door to the PDF library, which works on one document at a time; so does this.</remarks>
public static class PdfSheet
{
    private const double PtPerMm = 72.0 / 25.4;

    private static readonly Lock _oneAtATime = new();

    /// <summary>Writes the sheet.</summary>
    /// <param name="sheet">The sheet.</param>
    /// <param name="unprintable">Characters that the type has no shape for, which the page shows as boxes; in order, once each.</param>
    public static byte[] Write(Sheet sheet, out IReadOnlyList<Rune> unprintable)
    {
        lock (_oneAtATime)
        {
            // The library writes dates as the culture does.
            CultureInfo before = CultureInfo.CurrentCulture;
            CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
            try
            {
                return WriteAlone(sheet, out unprintable);
            }
            finally
            {
                CultureInfo.CurrentCulture = before;
            }
        }
    }

    private static byte[] WriteAlone(Sheet sheet, out IReadOnlyList<Rune> unprintable)
    {
        IReadOnlyList<Mark> marks = PageFlow.Of(sheet, new PdfRuler());
        DateTime date = sheet.Date.ToDateTime(TimeOnly.MinValue, DateTimeKind.Utc);
        using PdfDocument document = new();
        document.Options.NoCompression = true;
        document.Options.CompressContentStreams = false;
        document.Info.Title = PlainText.Of(sheet.Title);
        document.Info.Author = PlainText.Of(sheet.Author);
        document.Info.Subject = PlainText.Of(sheet.Subject);
        document.Info.Creator = XmpPacket.Program;
        document.Info.CreationDate = document.Info.ModificationDate = date;

        List<Rune> boxed = [];
        document.RenderEvents.RenderTextEvent += (_, drawn) => boxed.AddRange(
            drawn.CodePointGlyphIndexPairs.Where(pair => pair.GlyphIndex == 0).Select(pair => new Rune(pair.CodePoint)));
        Draw(document, sheet, marks);
        unprintable = [.. boxed.Distinct()];
        if (sheet.Attachment is { } attachment)
        {
            AttachedFile.Add(document, attachment, date);
        }

        string name = Convert.ToHexString(SHA256.HashData(Encoding.UTF8.GetBytes(SheetText.Of(sheet))))[..16];
        document.Internals.FirstDocumentID = name;
        document.Internals.SecondDocumentID = name;
        using MemoryStream stream = new();
        document.Save(stream, closeStream: false);
        return FinishedPdf.Of(stream.ToArray(), XmpPacket.Of(sheet, date));
    }

    private static void Draw(PdfDocument document, Sheet sheet, IReadOnlyList<Mark> marks)
    {
        StructureBuilder structure = UAManager.ForDocument(document).StructureBuilder;
        List<PdfOutline> bookmarks = [];
        PdfPage? page = null;
        XGraphics? graphics = null;
        foreach (Mark mark in marks)
        {
            switch (mark)
            {
                case PageMark:
                    // What goes on over the page is closed by the library on the old one, which must still be open for that.
                    page = document.AddPage();
                    graphics?.Dispose();
                    page.Width = XUnit.FromMillimeter(sheet.Paper.WidthMm);
                    page.Height = XUnit.FromMillimeter(sheet.Paper.HeightMm);
                    graphics = XGraphics.FromPdfPage(page);
                    break;
                case BeginMark begin:
                    Begin(structure, begin);
                    break;
                case EndMark:
                    structure.End();
                    break;
                case BookmarkMark bookmark:
                    AddBookmark(document, bookmarks, bookmark, page!);
                    break;
                case ShapeMark shape:
                    Draw(graphics!, shape.Shape);
                    break;
            }
        }

        graphics?.Dispose();
    }

    private static void Begin(StructureBuilder structure, BeginMark begin)
    {
        switch (begin.Role)
        {
            case Role.Artifact:
                structure.BeginArtifact();
                break;
            case Role.Figure:
                structure.BeginElement(
                    PdfIllustrationElementTag.Figure, begin.Alternative ?? "",
                    new XRect(begin.Box.LeftMm * PtPerMm, begin.Box.TopMm * PtPerMm, begin.Box.WidthMm * PtPerMm, begin.Box.HeightMm * PtPerMm));
                break;
            default:
                structure.BeginElement(begin.Role switch
                {
                    Role.Heading1 => PdfBlockLevelElementTag.Heading1,
                    Role.Heading2 => PdfBlockLevelElementTag.Heading2,
                    Role.Heading3 => PdfBlockLevelElementTag.Heading3,
                    Role.List => PdfBlockLevelElementTag.List,
                    Role.ListItem => PdfBlockLevelElementTag.ListItem,
                    Role.Table => PdfBlockLevelElementTag.Table,
                    Role.Row => PdfBlockLevelElementTag.TableRow,
                    Role.HeadCell => PdfBlockLevelElementTag.TableHeaderCell,
                    Role.Cell => PdfBlockLevelElementTag.TableDataCell,
                    _ => PdfBlockLevelElementTag.Paragraph,
                });
                break;
        }
    }

    private static void AddBookmark(PdfDocument document, List<PdfOutline> open, BookmarkMark bookmark, PdfPage page)
    {
        while (open.Count >= bookmark.Level)
        {
            open.RemoveAt(open.Count - 1);
        }

        PdfOutlineCollection under = open.Count == 0 ? document.Outlines : open[^1].Outlines;
        open.Add(under.Add(bookmark.Text, page, opened: true));
    }

    private static void Draw(XGraphics graphics, Shape shape)
    {
        switch (shape)
        {
            case Line line:
                graphics.DrawLine(PenOf(line.Pen), PointOf(line.From), PointOf(line.To));
                break;
            case Polygon polygon:
                graphics.DrawPolygon(
                    polygon.Pen is { } outline ? PenOf(outline) : null, polygon.Grey is { } tone ? BrushOf(tone) : null,
                    [.. polygon.Corners.Select(PointOf)], XFillMode.Alternate);
                break;
            case Circle circle:
                XPoint corner = PointOf(new(circle.Centre.XMm - circle.RadiusMm, circle.Centre.YMm - circle.RadiusMm));
                double across = 2.0 * circle.RadiusMm * PtPerMm;
                graphics.DrawEllipse(
                    circle.Pen is { } ring ? PenOf(ring) : null, circle.Grey is { } fill ? BrushOf(fill) : null, corner.X, corner.Y, across, across);
                break;
            case Label label:
                DrawLabel(graphics, label);
                break;
        }
    }

    private static void DrawLabel(XGraphics graphics, Label label)
    {
        XFont font = SheetFonts.Of(label.SizePt, label.Bold);
        XPoint at = PointOf(label.At);
        double width = label.Anchor == Anchor.Start ? 0.0 : graphics.MeasureString(label.Text, font).Width;
        double back = label.Anchor switch { Anchor.Start => 0.0, Anchor.Middle => 0.5 * width, _ => width };
        if (!label.Upright)
        {
            graphics.DrawString(label.Text, font, XBrushes.Black, at.X - back, at.Y);
            return;
        }

        XGraphicsState level = graphics.Save();
        graphics.RotateAtTransform(-90.0, at);
        graphics.DrawString(label.Text, font, XBrushes.Black, at.X - back, at.Y);
        graphics.Restore(level);
    }

    private static XPen PenOf(Pen pen)
    {
        XPen drawn = new(XColors.Black, pen.WidthMm * PtPerMm);
        if (pen.DashMm > 0.0)
        {
            double dash = pen.DashMm / pen.WidthMm; // the library counts dashes in widths of the pen
            drawn.DashPattern = [dash, dash];
        }

        return drawn;
    }

    private static XSolidBrush BrushOf(double grey) => new(XColor.FromGrayScale(grey));

    private static XPoint PointOf(Spot spot) => new(spot.XMm * PtPerMm, spot.YMm * PtPerMm);
}
