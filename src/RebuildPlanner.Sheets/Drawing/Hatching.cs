namespace RebuildPlanner.Sheets.Drawing;

/// <summary>Parallel lines inside an outline: cut metal, and the parts of a bar told apart without colour.</summary>
public static class Hatching
{
    // Through a corner a line has no length, only a blot.
    private const double ShortestMm = 0.01;

    /// <summary>The lines.</summary>
    /// <param name="corners">The outline, which may be hollow but not cross itself.</param>
    /// <param name="spacingMm">Between the lines, mm.</param>
    /// <param name="angleDeg">From the horizontal, anticlockwise as seen, deg.</param>
    public static IEnumerable<Shape> Of(IReadOnlyList<Spot> corners, double spacingMm, double angleDeg)
    {
        (double sine, double cosine) = Math.SinCos(double.DegreesToRadians(angleDeg));

        // Along the lines and across them; y runs down on paper.
        double Across(Spot spot) => (spot.XMm * sine) + (spot.YMm * cosine);
        double Along(Spot spot) => (spot.XMm * cosine) - (spot.YMm * sine);
        Spot At(double along, double across) => new((along * cosine) + (across * sine), (across * cosine) - (along * sine));

        double first = Math.Ceiling(corners.Min(Across) / spacingMm), last = corners.Max(Across);
        for (double line = first * spacingMm; line < last; line += spacingMm)
        {
            List<double> crossings = [];
            for (int corner = 0; corner < corners.Count; corner++)
            {
                Spot from = corners[corner], to = corners[(corner + 1) % corners.Count];
                double a = Across(from), b = Across(to);
                if (a <= line != b <= line)
                {
                    crossings.Add(Along(from) + ((line - a) / (b - a) * (Along(to) - Along(from))));
                }
            }

            crossings.Sort();
            for (int pair = 0; pair + 1 < crossings.Count; pair += 2)
            {
                if (crossings[pair + 1] - crossings[pair] < ShortestMm)
                {
                    continue;
                }

                yield return new Line(At(crossings[pair], line), At(crossings[pair + 1], line), Pen.Fine);
            }
        }
    }
}
