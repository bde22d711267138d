using RebuildPlanner.Sheets.Drawing;

namespace RebuildPlanner.Sheets.Pages;

/// <summary>Lays a table: columns as wide as their cells need, rows whole, the head again on every page.</summary>
internal sealed class TableFlow
{
    private const double PadXMm = 1.5, PadYMm = 0.55, HairMm = 0.1, RuleMm = 0.3;

    // A table as low as this is not broken at all; a higher one keeps its first rows with its head.
    private const double UnbrokenMm = 70.0;
    private const int FirstRows = 3;

    // A word without end is broken rather than let squeeze the figures beside it: no word keeps more than this part of the width.
    private const double MostOfWord = 0.3;

    // Types tried until the narrowest setting of all columns fits the page.
    private static readonly double[] _sizesPt = [8.5, 8.0, 7.5, 7.0, 6.5, 6.0];

    private readonly PageFlow _flow;
    private readonly Table _table;
    private readonly double _sizePt;
    private readonly double[] _widthsMm;

    private TableFlow(PageFlow flow, Table table)
    {
        (_flow, _table) = (flow, table);
        _sizePt = _sizesPt.FirstOrDefault(size => Enumerable.Range(0, table.Columns.Count).Sum(column => LeastColumnMm(column, size)) <= flow.WidthMm, _sizesPt[^1]);
        _widthsMm = Widths();
    }

    private bool IsForm => _table.RowMm > 0.0;

    public static void Place(PageFlow flow, Table table)
    {
        TableFlow laid = new(flow, table);
        flow.In(Role.Table, laid.PlaceRows);
        flow.Down(2.5);
    }

    /// <summary>The least of a table that stands on one page, mm.</summary>
    public static double LeastMm(PageFlow flow, Table table) => new TableFlow(flow, table).LeastMm();

    private double HeadMm => HeightMm(_table.Columns.Select(column => column.Title), bold: true);

    private double LeastMm()
    {
        double rowsMm = _table.Rows.Sum(RowHeightMm);
        return HeadMm + (rowsMm <= UnbrokenMm ? rowsMm : _table.Rows.Take(FirstRows).Sum(KeptMm));
    }

    private void PlaceRows()
    {
        double headMm = HeadMm;
        if (!_flow.Fits(LeastMm()))
        {
            _flow.TurnPage();
        }

        _flow.In(Role.Row, () => PlaceHead(Role.HeadCell, headMm));
        foreach (IReadOnlyList<string> row in _table.Rows)
        {
            if (!_flow.Fits(KeptMm(row)))
            {
                TurnPage(headMm);
            }

            PlaceRow([.. row.Select((cell, column) => LinesOf(cell, column, bold: false))], headMm);
            _flow.Rule(_flow.LeftMm, _flow.LeftMm + _widthsMm.Sum(), _flow.YMm, HairMm);
        }
    }

    /// <summary>A row; of a high one, what the page does not hold goes on over the next, as a row of its own.</summary>
    private void PlaceRow(IReadOnlyList<string>[] cells, double headMm)
    {
        double lineMm = PageFlow.LineMm(_sizePt);
        int most = cells.Max(lines => lines.Count), from = 0;
        while (true)
        {
            int count = Math.Clamp((int)((_flow.RoomMm - (2.0 * PadYMm)) / lineMm), 1, most - from), start = from;
            double heightMm = Math.Max(_table.RowMm, (count * lineMm) + (2.0 * PadYMm));
            _flow.In(Role.Row, () => PlaceCells(cells, start, start + count, Role.Cell, bold: false));
            Boxes(heightMm);
            _flow.Down(heightMm);
            from += count;
            if (from >= most)
            {
                return;
            }

            TurnPage(headMm);
        }
    }

    private void TurnPage(double headMm)
    {
        _flow.TurnPage();
        _flow.In(Role.Artifact, () => PlaceHead(null, headMm));
    }

    private void PlaceHead(Role? role, double heightMm)
    {
        double rightMm = _flow.LeftMm + _widthsMm.Sum();
        IReadOnlyList<string>[] titles = [.. _table.Columns.Select((column, index) => LinesOf(column.Title, index, bold: true))];
        PlaceCells(titles, 0, titles.Max(lines => lines.Count), role, bold: true);
        _flow.Down(heightMm);
        if (role is null)
        {
            _flow.Add(new ShapeMark(new Line(new(_flow.LeftMm, _flow.YMm), new(rightMm, _flow.YMm), new Pen(RuleMm))));
        }
        else
        {
            _flow.Rule(_flow.LeftMm, rightMm, _flow.YMm, RuleMm);
        }
    }

    private void PlaceCells(IReadOnlyList<string>[] cells, int from, int to, Role? role, bool bold)
    {
        double xMm = _flow.LeftMm;
        for (int column = 0; column < cells.Length; column++)
        {
            double leftMm = xMm + PadXMm, rightMm = xMm + _widthsMm[column] - PadXMm;
            bool isText = _table.Columns[column].IsText || IsForm;
            IReadOnlyList<string> lines = cells[column];
            void Draw()
            {
                for (int line = from; line < Math.Min(to, lines.Count); line++)
                {
                    double topMm = _flow.YMm + PadYMm + ((line - from) * PageFlow.LineMm(_sizePt));
                    _flow.Text(isText ? leftMm : rightMm, topMm, isText ? PageFlow.Broken(lines, line) : lines[line], _sizePt, bold, isText ? Anchor.Start : Anchor.End);
                }
            }

            if (role is { } tagged)
            {
                _flow.In(tagged, Draw);
            }
            else
            {
                Draw();
            }

            xMm += _widthsMm[column];
        }
    }

    private void Boxes(double heightMm)
    {
        if (!IsForm)
        {
            return;
        }

        _flow.In(Role.Artifact, () =>
        {
            double xMm = _flow.LeftMm;
            foreach (double widthMm in _widthsMm.Prepend(0.0))
            {
                xMm += widthMm;
                _flow.Add(new ShapeMark(new Line(new(xMm, _flow.YMm), new(xMm, _flow.YMm + heightMm), new Pen(HairMm))));
            }
        });
    }

    // A row as low as a table that is not broken is not broken either.
    private double KeptMm(IReadOnlyList<string> row) => Math.Min(RowHeightMm(row), UnbrokenMm);

    private double RowHeightMm(IReadOnlyList<string> row) => Math.Max(_table.RowMm, HeightMm(row, bold: false));

    private double HeightMm(IEnumerable<string> cells, bool bold) =>
        (cells.Select((cell, column) => LinesOf(cell, column, bold).Count).Max() * PageFlow.LineMm(_sizePt)) + (2.0 * PadYMm);

    private IReadOnlyList<string> LinesOf(string cell, int column, bool bold) =>
        _flow.Wrapping.Lines(cell, _sizePt, bold, _widthsMm[column] - (2.0 * PadXMm) + 1e-6);

    private double[] Widths()
    {
        double[] least = [.. _table.Columns.Select((_, column) => LeastColumnMm(column, _sizePt))];
        double[] wanted = [.. _table.Columns.Select((_, column) => WantedMm(column))];
        double roomMm = _flow.WidthMm, leastSum = least.Sum(), wantedSum = wanted.Sum();
        if (leastSum >= roomMm)
        {
            return [.. least.Select(width => width * roomMm / leastSum)];
        }

        if (wantedSum > roomMm)
        {
            double part = (roomMm - leastSum) / (wantedSum - leastSum);
            return [.. least.Zip(wanted, (a, b) => a + (part * (b - a)))];
        }

        // What is left goes between the columns of figures, within reason; a table for handwriting keeps its widths.
        const double MostMm = 9.0;
        double extraMm = IsForm ? 0.0 : Math.Min(MostMm, (roomMm - wantedSum) / wanted.Length);
        return [.. wanted.Select(width => width + extraMm)];
    }

    private double LeastColumnMm(int column, double sizePt)
    {
        Column of = _table.Columns[column];
        double headMm = _flow.Wrapping.WidestMm(of.Title, sizePt, bold: true, byWords: true);
        double cellsMm = _table.Rows.Select(row => _flow.Wrapping.WidestMm(row[column], sizePt, bold: false, byWords: of.IsText)).Append(0.0).Max();
        cellsMm = of.IsText ? Math.Min(cellsMm, MostOfWord * _flow.WidthMm) : cellsMm;
        return Math.Max(of.WidthMm ?? 0.0, Math.Max(headMm, cellsMm) + (2.0 * PadXMm));
    }

    private double WantedMm(int column)
    {
        Column of = _table.Columns[column];
        if (of.WidthMm is not null || !of.IsText)
        {
            return LeastColumnMm(column, _sizePt);
        }

        double headMm = _flow.Wrapping.WidestMm(of.Title, _sizePt, bold: true, byWords: true);
        double cellsMm = _table.Rows.Select(row => _flow.Wrapping.WidestMm(row[column], _sizePt, bold: false, byWords: false)).Append(0.0).Max();
        return Math.Max(headMm, cellsMm) + (2.0 * PadXMm);
    }
}
