using RebuildPlanner.Sheets.Drawing;

namespace RebuildPlanner.Sheets.Pages;

/// <summary>Lays a sheet's blocks on pages, top to bottom: wrapped, broken where they may break, kept together where they may not.</summary>
public sealed class PageFlow
{
    private const double MmPerPt = 25.4 / 72.0, Leading = 1.32;

    // Of a list, a heading keeps about two points with it.
    private const double KeptOfTextMm = 15.0;

    private readonly Paper _paper;
    private readonly ITextRuler _ruler;
    private readonly List<Mark> _marks = [];
    private readonly double _leftMm;
    private readonly double _widthMm;
    private readonly bool _endless;
    private double _yMm = Paper.TopMm;
    private bool _isEmptyPage = true;

    private PageFlow(Paper paper, ITextRuler ruler, double leftMm, double widthMm, bool endless)
    {
        (_paper, _ruler, _leftMm, _widthMm, _endless) = (paper, ruler, leftMm, widthMm, endless);
        Wrapping = new Wrapping(ruler);
    }

    /// <summary>What breaks text into lines.</summary>
    internal Wrapping Wrapping { get; }

    /// <summary>How far down the page is filled, mm.</summary>
    internal double YMm => _yMm;

    /// <summary>The left edge of what may be filled, mm.</summary>
    internal double LeftMm => _leftMm;

    /// <summary>How wide it is, mm.</summary>
    internal double WidthMm => _widthMm;

    /// <summary>The marks of every page of a sheet, each page opened by a <see cref="PageMark"/>.</summary>
    /// <param name="sheet">The sheet.</param>
    /// <param name="ruler">What measures its text.</param>
    public static IReadOnlyList<Mark> Of(Sheet sheet, ITextRuler ruler)
    {
        PageFlow flow = new(sheet.Paper, ruler, Paper.LeftMm, sheet.Paper.TextWidthMm, endless: false);
        flow._marks.Add(new PageMark());
        flow.PlaceAll(sheet.Blocks);
        return flow.WithFeet(sheet);
    }

    /// <summary>Height of a line of type, mm.</summary>
    internal static double LineMm(double sizePt) => sizePt * MmPerPt * Leading;

    /// <summary>Moves down.</summary>
    internal void Down(double mm)
    {
        _yMm += mm;
        _isEmptyPage = false;
    }

    /// <summary>Adds a mark.</summary>
    internal void Add(Mark mark) => _marks.Add(mark);

    /// <summary>Adds a stretch with a role.</summary>
    internal void In(Role role, Action content)
    {
        Add(new BeginMark(role));
        content();
        Add(new EndMark());
    }

    /// <summary>A line of text whose top is at the given height.</summary>
    internal void Text(double xMm, double topMm, string text, double sizePt, bool bold = false, Anchor anchor = Anchor.Start)
    {
        if (text.Length > 0)
        {
            Add(new ShapeMark(new Label(new(xMm, topMm + (0.78 * LineMm(sizePt))), PlainText.Of(text), sizePt, anchor, bold)));
        }
    }

    /// <summary>A line of wrapped text; where more follows with the blank it was broken at, for who copies the text out of the page.</summary>
    internal static string Broken(IReadOnlyList<string> lines, int line) => line + 1 < lines.Count ? lines[line] + ' ' : lines[line];

    /// <summary>A rule across.</summary>
    internal void Rule(double fromXMm, double toXMm, double yMm, double widthMm) =>
        In(Role.Artifact, () => Add(new ShapeMark(new Line(new(fromXMm, yMm), new(toXMm, yMm), new Pen(widthMm)))));

    /// <summary>Whether a height still fits on the page; on an empty page everything does, since it would fit on no other.</summary>
    internal bool Fits(double heightMm) => _endless || _isEmptyPage || _yMm + heightMm <= _paper.FloorMm;

    /// <summary>What is left of the page, mm.</summary>
    internal double RoomMm => _endless ? double.PositiveInfinity : _paper.FloorMm - _yMm;

    /// <summary>Starts a new page unless the present one is empty.</summary>
    internal void TurnPage()
    {
        if (!_isEmptyPage && !_endless)
        {
            _marks.Add(new PageMark());
            _yMm = Paper.TopMm;
            _isEmptyPage = true;
        }
    }

    private void PlaceAll(IReadOnlyList<Block> blocks)
    {
        for (int index = 0; index < blocks.Count; index++)
        {
            if (blocks[index] is Heading heading)
            {
                PlaceHeading(heading, LeastMm(blocks, index + 1));
            }
            else
            {
                // A small paragraph right above a table leads it and stays with it.
                if (blocks[index] is Paragraph { Style: Style.Small } && index + 1 < blocks.Count && blocks[index + 1] is Table)
                {
                    Keep(LeastMm(blocks, index));
                }

                Place(blocks[index]);
            }
        }
    }

    /// <summary>What a heading must not stand without: the paragraphs under it and the least of what follows them, mm.</summary>
    private double LeastMm(IReadOnlyList<Block> blocks, int from)
    {
        double sumMm = 0.0;
        for (int index = from; index < blocks.Count; index++)
        {
            switch (blocks[index])
            {
                case Paragraph or Heading:
                    sumMm += HeightOf([blocks[index]], _leftMm, _widthMm);
                    break;
                case Table table:
                    return sumMm + TableFlow.LeastMm(this, table);
                case Points or Facts:
                    return sumMm + KeptOfTextMm;
                default:
                    return sumMm + HeightOf([blocks[index]], _leftMm, _widthMm);
            }
        }

        return sumMm;
    }

    private void Place(Block block)
    {
        switch (block)
        {
            case Paragraph paragraph:
                PlaceParagraph(paragraph);
                break;
            case Points points:
                PlacePoints(points);
                break;
            case Facts facts:
                FactsFlow.Place(this, facts);
                break;
            case Table table:
                TableFlow.Place(this, table);
                break;
            case Illustration figure:
                PlaceFigure(figure);
                break;
            case Framed framed:
                PlaceFramed(framed);
                break;
            case Together together:
                Keep(HeightOf(together.Blocks, _leftMm, _widthMm));
                PlaceAll(together.Blocks);
                break;
            case Signatures signatures:
                PlaceSignatures(signatures);
                break;
            case NewPage:
                TurnPage();
                break;
        }
    }

    private void Keep(double heightMm)
    {
        if (!Fits(heightMm))
        {
            TurnPage();
        }
    }

    private double HeightOf(IReadOnlyList<Block> blocks, double leftMm, double widthMm)
    {
        PageFlow trial = new(_paper, _ruler, leftMm, widthMm, endless: true);
        trial.PlaceAll(blocks);
        return trial._yMm - Paper.TopMm;
    }

    private void PlaceHeading(Heading heading, double underMm)
    {
        (double sizePt, double aboveMm, double belowMm) = heading.Level switch { 1 => (18.0, 0.0, 1.5), 2 => (12.5, 5.0, 1.5), _ => (10.0, 3.0, 0.8) };
        IReadOnlyList<string> lines = Wrapping.Lines(heading.Text, sizePt, bold: true, _widthMm);
        Keep(aboveMm + (lines.Count * LineMm(sizePt)) + belowMm + underMm);
        if (!_isEmptyPage)
        {
            Down(aboveMm);
        }

        Add(new BookmarkMark(PlainText.Of(heading.Text), heading.Level));
        In(heading.Level switch { 1 => Role.Heading1, 2 => Role.Heading2, _ => Role.Heading3 }, () => Lines(lines, sizePt, bold: true, _leftMm));
        Down(belowMm);
    }

    private void PlaceParagraph(Paragraph paragraph)
    {
        (double sizePt, bool bold) = paragraph.Style switch
        {
            Style.Small => (8.0, false),
            Style.Strong => (9.5, true),
            Style.Answer => (14.0, true),
            _ => (9.5, false),
        };
        In(Role.Paragraph, () => Lines(Wrapping.Lines(paragraph.Text, sizePt, bold, _widthMm), sizePt, bold, _leftMm));
        Down(1.4);
    }

    private void PlacePoints(Points points)
    {
        const double SizePt = 9.5, IndentMm = 4.0;
        In(Role.List, () =>
        {
            foreach (string item in points.Items)
            {
                IReadOnlyList<string> lines = Wrapping.Lines(item, SizePt, bold: false, _widthMm - IndentMm);
                Keep(Math.Min(lines.Count, 2) * LineMm(SizePt));
                In(Role.ListItem, () =>
                {
                    Text(_leftMm, _yMm, "•", SizePt);
                    Lines(lines, SizePt, bold: false, _leftMm + IndentMm);
                });
                Down(0.8);
            }
        });
        Down(0.6);
    }

    private void Lines(IReadOnlyList<string> lines, double sizePt, bool bold, double xMm)
    {
        for (int line = 0; line < lines.Count; line++)
        {
            Keep(LineMm(sizePt));
            Text(xMm, _yMm, Broken(lines, line), sizePt, bold);
            Down(LineMm(sizePt));
        }
    }

    private void PlaceFigure(Illustration figure)
    {
        const double CaptionPt = 8.0;
        Picture picture = figure.Picture;
        IReadOnlyList<string> caption = Wrapping.Lines(figure.Caption, CaptionPt, bold: false, _widthMm);
        Keep(picture.HeightMm + 2.5 + (caption.Count * LineMm(CaptionPt)));
        double leftMm = _leftMm + (0.5 * (_widthMm - picture.WidthMm)), topMm = _yMm + 1.0;
        Add(new BeginMark(Role.Figure, PlainText.Of(picture.Alternative), (leftMm, topMm, picture.WidthMm, picture.HeightMm)));
        foreach (Shape shape in picture.Shapes)
        {
            Add(new ShapeMark(Placing.At(shape, leftMm, topMm)));
        }

        Add(new EndMark());
        Down(picture.HeightMm + 1.5);
        In(Role.Paragraph, () => Lines(caption, CaptionPt, bold: false, _leftMm));
        Down(1.4);
    }

    private void PlaceFramed(Framed framed)
    {
        const double PadMm = 3.0;
        double heightMm = HeightOf(framed.Blocks, _leftMm + PadMm, _widthMm - (2.0 * PadMm)) + (2.0 * PadMm);
        if (!_endless && heightMm > _paper.FloorMm - Paper.TopMm)
        {
            // No page holds the frame: better without it than off the paper.
            PlaceAll(framed.Blocks);
            return;
        }

        Keep(heightMm);
        double topMm = _yMm;
        PageFlow inner = new(_paper, _ruler, _leftMm + PadMm, _widthMm - (2.0 * PadMm), endless: true) { _yMm = topMm + PadMm, _isEmptyPage = false };
        inner.PlaceAll(framed.Blocks);
        _marks.AddRange(inner._marks);
        In(Role.Artifact, () => Add(new ShapeMark(Polygon.Rectangle(_leftMm, topMm, _leftMm + _widthMm, inner._yMm + PadMm, new Pen(0.5)))));
        Down(inner._yMm + PadMm - topMm + 2.0);
    }

    private void PlaceSignatures(Signatures signatures)
    {
        const double SizePt = 8.0, RowMm = 17.0, BetweenMm = 10.0;
        double halfMm = 0.5 * (_widthMm - BetweenMm);
        for (int index = 0; index < signatures.Labels.Count; index += 2)
        {
            Keep(RowMm + LineMm(SizePt));
            double ruleMm = _yMm + RowMm - 4.0;
            for (int side = 0; side < 2 && index + side < signatures.Labels.Count; side++)
            {
                double xMm = _leftMm + (side * (halfMm + BetweenMm));
                Rule(xMm, xMm + halfMm, ruleMm, 0.25);
                In(Role.Paragraph, () => Text(xMm, ruleMm + 0.6, signatures.Labels[index + side], SizePt));
            }

            Down(RowMm);
        }
    }

    private List<Mark> WithFeet(Sheet sheet)
    {
        const double SizePt = 8.0;
        int pages = _marks.Count(mark => mark is PageMark), page = 0;
        double yMm = sheet.Paper.FloorMm + 5.0, rightMm = Paper.LeftMm + sheet.Paper.TextWidthMm;
        List<Mark> all = [];
        foreach (Mark mark in _marks)
        {
            all.Add(mark);
            if (mark is not PageMark)
            {
                continue;
            }

            string number = sheet.PageOf.Replace("{page}", $"{++page}", StringComparison.Ordinal).Replace("{pages}", $"{pages}", StringComparison.Ordinal);
            PageFlow foot = new(_paper, _ruler, Paper.LeftMm, sheet.Paper.TextWidthMm, endless: true);
            foot.Rule(Paper.LeftMm, rightMm, yMm - 1.5, 0.2);
            foot.In(Role.Artifact, () =>
            {
                double roomMm = sheet.Paper.TextWidthMm - _ruler.WidthMm(number, SizePt, bold: false) - 5.0;
                foot.Text(Paper.LeftMm, yMm, Wrapping.Lines(sheet.Foot, SizePt, bold: false, roomMm)[0], SizePt);
                foot.Text(rightMm, yMm, number, SizePt, anchor: Anchor.End);
            });
            all.AddRange(foot._marks);
        }

        return all;
    }
}
