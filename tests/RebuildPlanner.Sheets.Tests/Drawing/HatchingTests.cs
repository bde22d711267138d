using CsCheck;
using RebuildPlanner.Sheets.Drawing;

namespace RebuildPlanner.Sheets.Tests.Drawing;

public class HatchingTests
{
    private static readonly Gen<double> Angle = Gen.Double[-180.0, 180.0];

    // A cross-section with a notch, as the head over its chamber.
    private static readonly Spot[] Notched = [new(0, 0), new(40, 0), new(40, 20), new(30, 20), new(30, 8), new(10, 8), new(10, 20), new(0, 20)];

    private const double NotchedArea = (40.0 * 20.0) - (20.0 * 12.0);

    // The lines lie a spacing apart, so their length times the spacing is the area but for the ends: one spacing's worth of the outline.
    [Fact]
    public void Lines_cover_the_area_and_no_more() => Angle.Sample(
        angle =>
        {
            const double Spacing = 0.1;
            double length = Hatching.Of(Notched, Spacing, angle).Cast<Line>().Sum(Length);
            Assert.Equal(NotchedArea, Spacing * length, 0.02 * NotchedArea);
        },
        iter: 200);

    [Fact]
    public void No_line_leaves_the_outline() => Angle.Sample(
        angle => Assert.All(
            Hatching.Of(Notched, 1.3, angle).Cast<Line>(),
            line => Assert.False(InNotch(Middle(line)) || InNotch(Near(line.From, line.To)) || InNotch(Near(line.To, line.From)), $"{line} at {angle}")),
        iter: 200);

    [Fact]
    public void Lines_run_at_the_angle_anticlockwise_as_seen_on_paper()
    {
        Line line = (Line)Hatching.Of(Notched, 3.0, 45.0).First();

        double rise = line.From.YMm - line.To.YMm, run = line.To.XMm - line.From.XMm; // y runs down on paper
        Assert.Equal(1.0, rise / run, 1e-9);
    }

    private static double Length(Line line) =>
        Math.Sqrt(Math.Pow(line.To.XMm - line.From.XMm, 2) + Math.Pow(line.To.YMm - line.From.YMm, 2));

    private static Spot Middle(Line line) => new(0.5 * (line.From.XMm + line.To.XMm), 0.5 * (line.From.YMm + line.To.YMm));

    private static Spot Near(Spot from, Spot to) => new((0.99 * from.XMm) + (0.01 * to.XMm), (0.99 * from.YMm) + (0.01 * to.YMm));

    private static bool InNotch(Spot spot) => spot is { XMm: > 10.0001 and < 29.9999, YMm: > 8.0001 } or { XMm: < -1e-9 or > 40.0001 } or { YMm: < -1e-9 or > 20.0001 };
}
