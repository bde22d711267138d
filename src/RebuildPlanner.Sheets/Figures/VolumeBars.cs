using System.Text;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Drawing;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Figures;

/// <summary>The clearance volume of each cylinder as a bar of its parts, all to one scale; parts are told apart by hatching, not colour.</summary>
public static class VolumeBars
{
    private const double WidthMm = 174.0, LabelMm = 18.0, ValueMm = 17.0, HeadMm = 9.0, AxisMm = 9.0, TextPt = 8.0;

    // A bar for one cylinder may be stout; twenty-four must leave room on the page for a caption.
    private const double MostRowMm = 9.0, MostRowsMm = 190.0;

    // No letter of the figure's type is wider on average; what the dash for a clearance volume not known takes at the right edge.
    private const double LetterMm = 1.5, DashMm = 4.0, BehindMm = 2.0, LeastBarMm = 40.0;

    private sealed record Part(Phrase Name, Func<CylinderResult, ResultQuantity?> Of, double? Grey, double? HatchMm, double HatchDeg);

    private static readonly Part[] _parts =
    [
        new(Phrase.Chamber, cylinder => cylinder.Chamber, 1.0, null, 0.0),
        new(Phrase.Gasket, cylinder => cylinder.Gasket, 0.0, null, 0.0),
        new(Phrase.Deck, cylinder => cylinder.Deck, 1.0, 1.1, 45.0),
        new(Phrase.Crown, cylinder => cylinder.Crown, 1.0, 1.1, -45.0),
        new(Phrase.TopLand, cylinder => cylinder.TopLand, 1.0, 0.6, 90.0),
    ];

    /// <summary>The figure, or null where no part of any cylinder is known.</summary>
    public static Picture? Draw(Results results, UnitSystem system, SheetWording words)
    {
        if (!results.Cylinders.Any(cylinder => _parts.Any(part => part.Of(cylinder) is not null)))
        {
            return null;
        }

        double InUnit(ResultQuantity quantity) => QuantityPrint.InUnit(quantity.Value, QuantityKind.Volume, system);
        double[] ends =
        [
            0.0, .. results.Cylinders.SelectMany(cylinder => new[]
            {
                Right(cylinder, InUnit),
                _parts.Sum(part => part.Of(cylinder) is { } volume ? Math.Min(0.0, InUnit(volume)) : 0.0),
                cylinder.ClearanceVolume is { } clearance ? InUnit(clearance) : 0.0,
            }),
        ];
        (double least, double most) = (ends.Min(), ends.Max());
        if (most <= least)
        {
            return null;
        }

        string unit = QuantityPrint.Unit(QuantityKind.Volume, system);
        double step = Step((most - least) / 8.0);
        (least, most) = (Math.Floor(least / step) * step, Math.Ceiling(most / step) * step);
        double rowMm = Math.Min(MostRowMm, MostRowsMm / results.Cylinders.Count), rowsMm = rowMm * results.Cylinders.Count;

        // The scale leaves room behind each bar for the words of what it lacks.
        double perUnit = results.Cylinders.Where(cylinder => cylinder.ClearanceVolume is null).Select(cylinder => RoomMm(cylinder, words) / (Right(cylinder, InUnit) - least))
            .Append((WidthMm - LabelMm - ValueMm) / (most - least)).Min();
        double X(double volume) => LabelMm + ((volume - least) * perUnit);

        List<Shape> shapes = [.. Legend(words), .. Axis(least, most, step, X, rowsMm, unit)];
        ResultsText text = new(results, system);
        for (int index = 0; index < results.Cylinders.Count; index++)
        {
            shapes.AddRange(Row(results.Cylinders[index], HeadMm + (index * rowMm), rowMm, X, InUnit, text, words));
        }

        return new Picture(
            WidthMm, HeadMm + rowsMm + AxisMm, words.Of(Phrase.VolumesHead), Alternative(results, text, unit, words), shapes);
    }

    private static IEnumerable<Shape> Legend(SheetWording words)
    {
        double xMm = LabelMm;
        foreach (Part part in _parts)
        {
            foreach (Shape shape in Box(part, xMm, 1.0, xMm + 6.0, 4.5))
            {
                yield return shape;
            }

            yield return new Label(new(xMm + 7.5, 4.1), words.Of(part.Name), TextPt);
            xMm += 29.0;
        }
    }

    private static IEnumerable<Shape> Axis(double least, double most, double step, Func<double, double> x, double rowsMm, string unit)
    {
        double yMm = HeadMm + rowsMm;
        yield return new Line(new(x(least), yMm), new(x(most), yMm), Pen.Fine);
        int decimals = Math.Max(0, (int)Math.Ceiling(-Math.Log10(step) - 1e-9));
        for (double tick = least; tick <= most + (0.5 * step); tick += step)
        {
            bool zero = Math.Abs(tick) < 0.5 * step;
            yield return new Line(new(x(tick), zero ? HeadMm - 2.0 : yMm), new(x(tick), yMm + 1.2), zero ? Pen.Outline : Pen.Fine);
            string number = (zero ? 0.0 : tick).ToString("F" + decimals, System.Globalization.CultureInfo.InvariantCulture);
            yield return new Label(new(x(tick), yMm + 4.6), number, TextPt, Anchor.Middle);
        }

        yield return new Label(new(x(most) + 6.0, yMm + 4.6), unit, TextPt);
    }

    private static IEnumerable<Shape> Row(
        CylinderResult cylinder, double topMm, double rowMm, Func<double, double> x, Func<ResultQuantity, double> inUnit, ResultsText text,
        SheetWording words)
    {
        double barTopMm = topMm + (0.18 * rowMm), barBottomMm = topMm + (0.82 * rowMm), baseMm = topMm + (0.5 * rowMm) + 1.0;
        yield return new Label(new(LabelMm - 2.0, baseMm), Short(cylinder.Cylinder), TextPt, Anchor.End, Bold: true);
        double right = 0.0, left = 0.0;
        foreach (Part part in _parts)
        {
            if (part.Of(cylinder) is not { } known || inUnit(known) is 0.0)
            {
                continue;
            }

            double volume = inUnit(known), from = volume > 0.0 ? right : left;
            (right, left) = volume > 0.0 ? (right + volume, left) : (right, left + volume);
            foreach (Shape shape in Box(part, x(Math.Min(from, from + volume)), barTopMm, x(Math.Max(from, from + volume)), barBottomMm))
            {
                yield return shape;
            }
        }

        if (cylinder.ClearanceVolume is { } clearance)
        {
            double xMm = x(inUnit(clearance));
            yield return new Line(new(xMm, topMm), new(xMm, topMm + rowMm), new Pen(0.7));
        }
        else
        {
            // Of a bar with a part missing, its length says nothing: that is written behind it.
            yield return new Label(new(x(right) + BehindMm, baseMm), Missing(cylinder, words), TextPt);
        }

        yield return new Label(new(WidthMm, baseMm), text.Value(cylinder.ClearanceVolume), TextPt, Anchor.End);
    }

    /// <summary>Where the bar of a cylinder ends on the right, in the unit printed.</summary>
    private static double Right(CylinderResult cylinder, Func<ResultQuantity, double> inUnit) =>
        _parts.Sum(part => part.Of(cylinder) is { } volume ? Math.Max(0.0, inUnit(volume)) : 0.0);

    /// <summary>What a bar without its clearance volume may take, mm.</summary>
    private static double RoomMm(CylinderResult cylinder, SheetWording words) =>
        Math.Max(LeastBarMm, WidthMm - DashMm - LabelMm - BehindMm - (LetterMm * Missing(cylinder, words).Length));

    private static string Missing(CylinderResult cylinder, SheetWording words) => words.Of(
        Phrase.VolumesMissing,
        ("parts", string.Join(", ", _parts.Where(part => part.Name != Phrase.TopLand && part.Of(cylinder) is null).Select(part => words.Of(part.Name)))));

    private static IEnumerable<Shape> Box(Part part, double leftMm, double topMm, double rightMm, double bottomMm)
    {
        Polygon box = Polygon.Rectangle(leftMm, topMm, rightMm, bottomMm, new Pen(0.25), part.Grey);
        yield return box;
        if (part.HatchMm is { } spacingMm)
        {
            foreach (Shape line in Hatching.Of(box.Corners, spacingMm, part.HatchDeg))
            {
                yield return line;
            }
        }
    }

    private static string Alternative(Results results, ResultsText text, string unit, SheetWording words) =>
        string.Join(" ", results.Cylinders.Select(cylinder =>
            $"{words.Of(Phrase.Cylinder)} {cylinder.Cylinder}: "
            + string.Join(", ", _parts.Select(part => $"{words.Of(part.Name)} {text.Value(part.Of(cylinder))}"))
            + $"; {words.Of(Phrase.VolumesTotal, ("value", text.Value(cylinder.ClearanceVolume)), ("unit", unit))}."));

    /// <summary>A cylinder's label short enough for a figure: there is room for six of the widest letters, and the tables say a longer name whole.</summary>
    internal static string Short(string label)
    {
        const int Most = 6;
        Rune[] letters = [.. PlainText.Of(label).EnumerateRunes()];
        return letters.Length <= Most ? label : string.Concat(letters.Take(Most - 1)) + "…";
    }

    /// <summary>1, 2 or 5 times a power of ten, not below the least step wanted.</summary>
    private static double Step(double least)
    {
        double power = Math.Pow(10.0, Math.Floor(Math.Log10(least)));
        return power * (least <= power ? 1.0 : least <= 2.0 * power ? 2.0 : least <= 5.0 * power ? 5.0 : 10.0);
    }
}
