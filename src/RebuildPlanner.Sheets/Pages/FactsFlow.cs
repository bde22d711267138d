namespace RebuildPlanner.Sheets.Pages;

/// <summary>Lays names and values in two columns; a value too long for its half takes the whole width.</summary>
internal static class FactsFlow
{
    private const double SizePt = 9.0, BetweenMm = 4.0, PadMm = 0.5;

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
                double heightMm = ((pair ? 1 : lines.Count) * PageFlow.LineMm(SizePt)) + PadMm;
                if (!flow.Fits(heightMm))
                {
                    flow.TurnPage();
                }

                flow.In(Role.Row, () =>
                {
                    Cells(facts.Pairs[index].Name, lines, flow.LeftMm);
                    if (pair)
                    {
                        Cells(facts.Pairs[index + 1].Name, [facts.Pairs[index + 1].Value], flow.LeftMm + halfMm);
                    }
                });
                flow.Down(heightMm);
                index += pair ? 2 : 1;
            }
        });
        flow.Down(2.0);

        bool IsShort(int index) => flow.Wrapping.WidestMm(facts.Pairs[index].Value, SizePt, bold: true, byWords: false) <= halfMm - nameMm - BetweenMm
            && !facts.Pairs[index].Value.Contains('\n', StringComparison.Ordinal);

        void Cells(string name, IReadOnlyList<string> lines, double xMm)
        {
            flow.In(Role.HeadCell, () => flow.Text(xMm, flow.YMm, name, SizePt));
            flow.In(Role.Cell, () =>
            {
                for (int line = 0; line < lines.Count; line++)
                {
                    flow.Text(xMm + nameMm, flow.YMm + (line * PageFlow.LineMm(SizePt)), PageFlow.Broken(lines, line), SizePt, bold: true);
                }
            });
        }
    }
}
