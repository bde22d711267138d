using System.Globalization;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Figures;

/// <summary>How the trials of each cylinder's ratio fell: one small picture a cylinder, all over one range and to one height.</summary>
public static class RatioTrials
{
    private const double WidthMm = 174.0, CellHeightMm = 20.0, BarsMm = 12.0, LabelMm = 3.5, MarginMm = 3.0, TextPt = 7.0;
    private const int MostAcross = 4;

    /// <summary>The figure, or null where no trials were run.</summary>
    public static Picture? Draw(Results results, UnitSystem system, SheetWording words)
    {
        if (results.RatioPicture is not { } picture)
        {
            return null;
        }

        int[] known = [.. Enumerable.Range(0, picture.Shares.Count).Where(cylinder => picture.Shares[cylinder] is not null)];
        int across = Math.Min(MostAcross, known.Length);
        double most = known.Max(cylinder => picture.Shares[cylinder]!.Max()), cellMm = WidthMm / MostAcross;
        List<Shape> shapes = [];
        for (int place = 0; place < known.Length; place++)
        {
            double leftMm = (place % across) * cellMm, topMm = place / across * CellHeightMm;
            shapes.AddRange(Cell(results.Cylinders[known[place]].Cylinder, picture, picture.Shares[known[place]]!, most, leftMm, topMm, cellMm - MarginMm));
        }

        double heightMm = CellHeightMm * ((known.Length + across - 1) / across);
        return new Picture(WidthMm, heightMm, words.Of(Phrase.TrialsHead), Alternative(results, known, new ResultsText(results, system), words), shapes);
    }

    private static IEnumerable<Shape> Cell(string label, RatioPicture picture, IReadOnlyList<double> shares, double most, double leftMm, double topMm, double widthMm)
    {
        double baseMm = topMm + LabelMm + BarsMm, partMm = widthMm / shares.Count;
        yield return new Label(new(leftMm, topMm + LabelMm), VolumeBars.Short(label), TextPt, Bold: true);
        for (int part = 0; part < shares.Count; part++)
        {
            if (shares[part] > 0.0)
            {
                double heightMm = BarsMm * shares[part] / most;
                yield return Polygon.Rectangle(leftMm + (part * partMm), baseMm - heightMm, leftMm + ((part + 1) * partMm), baseMm, null, 0.45);
            }
        }

        yield return new Line(new(leftMm, baseMm), new(leftMm + widthMm, baseMm), Pen.Fine);
        yield return new Label(new(leftMm, baseMm + LabelMm), Number(picture.From), TextPt);
        yield return new Label(new(leftMm + widthMm, baseMm + LabelMm), Number(picture.To), TextPt, Anchor.End);
    }

    private static string Number(double ratio) => ratio.ToString("F2", CultureInfo.InvariantCulture);

    private static string Alternative(Results results, int[] known, ResultsText text, SheetWording words) =>
        string.Join(" ", known.Select(cylinder => results.Cylinders[cylinder]).Select(cylinder => words.Of(
            Phrase.TrialsOfCylinder, ("cylinder", cylinder.Cylinder), ("low", text.End(cylinder.CompressionRatio, q => q.Low)),
            ("high", text.End(cylinder.CompressionRatio, q => q.High)))));
}
