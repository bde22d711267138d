namespace RebuildPlanner.Sheets.Pages;

/// <summary>Lays names and values in two columns; a value too long for its half takes the whole width.</summary>
internal static class FactsFlow
{
    private const double SizePt = 9.0, BetweenMm = 4.0, PadMm = 0.5;

    // No fewer lines are parted from the rest by the end of a page.
    private const int FewestLines = 3;

    public static void Place(PageFlow flow, Facts facts)
    {
        double nameMm = facts.Pairs.Select(pair => flow.Wrapping.WidestMm(pair.Name, SizePt, bold: false, byWords: false)).Append(0.0).Max() + BetweenMm;
        double halfMm = 0.5 * flow.WidthMm;
        flow.In(Role.Table, () =>
        {
            for (int index = 0; index < facts.Pairs.Count;)
            {
                bool pair = IsShort(index) && index + 1 < facts.Pairs.Count && IsShort(index + 1);
                IReadOnlyList<string> lines = flow.Wrapping.Lines(facts.Pairs[index].Value, SizePt, bold: true, flow.WidthMm - nameMm);
                if (pair)
                {
                    Row(lines.Count, () =>
                    {
                        Cells(facts.Pairs[index].Name, lines, flow.LeftMm, 0, 1);
                        Cells(facts.Pairs[index + 1].Name, [facts.Pairs[index + 1].Value], flow.LeftMm + halfMm, 0, 1);
                    });
                }
                else
                {
                    Long(facts.Pairs[index].Name, lines);
                }

                index += pair ? 2 : 1;
            }
        });
        flow.Down(2.0);

        bool IsShort(int index) => flow.Wrapping.WidestMm(facts.Pairs[index].Value, SizePt, bold: true, byWords: false) <= halfMm - nameMm - BetweenMm
            && !facts.Pairs[index].Value.Contains('\n', StringComparison.Ordinal);

        void Row(int lines, Action cells)
        {
            double heightMm = (lines * PageFlow.LineMm(SizePt)) + PadMm;
            if (!flow.Fits(heightMm))
            {
                flow.TurnPage();
            }

            flow.In(Role.Row, cells);
            flow.Down(heightMm);
        }

        // What a customer tells at length goes on over the page, under its name again.
        void Long(string name, IReadOnlyList<string> lines)
        {
            for (int from = 0; from < lines.Count;)
            {
                if (Room() < Math.Min(FewestLines, lines.Count - from))
                {
                    flow.TurnPage();
                }

                int start = from, count = Math.Clamp(Room(), 1, lines.Count - from);
                Row(count, () => Cells(name, lines, flow.LeftMm, start, start + count));
                from += count;
            }

            int Room() => (int)((flow.RoomMm - PadMm) / PageFlow.LineMm(SizePt));
        }

        void Cells(string name, IReadOnlyList<string> lines, double xMm, int from, int to)
        {
            flow.In(Role.HeadCell, () => flow.Text(xMm, flow.YMm, name, SizePt));
            flow.In(Role.Cell, () =>
            {
                for (int line = from; line < to; line++)
                {
                    flow.Text(xMm + nameMm, flow.YMm + ((line - from) * PageFlow.LineMm(SizePt)), PageFlow.Broken(lines, line), SizePt, bold: true);
                }
            });
        }
    }
}
