using CsCheck;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Tests.Cylinders;

public class SliderCrankTests
{
    private const double InchMm = 25.4;

    /// <summary>Rods of 1.4 to 2.4 strokes and offsets to 3 % of the stroke, which covers built engines.</summary>
    private static readonly Gen<(double Stroke, double Rod, double Offset, double Closing)> _cranks = Gen.Select(
        Gen.Double[40, 160], Gen.Double[1.4, 2.4], Gen.Double[-0.03, 0.03], Gen.Double[0.1, 1.4],
        (stroke, rods, offsets, closing) => (stroke, rods * stroke, offsets * stroke, closing));

    // Computed from the octane-rating engine of ASTM D2699 (stroke 4.500 in, rod 10.0 in), independently of this program.
    [Theory]
    [InlineData(30, 9.26911)]
    [InlineData(60, 33.44369)]
    [InlineData(90, 63.66287)]
    [InlineData(120, 90.59369)]
    [InlineData(150, 108.25581)]
    [InlineData(214, 106.54796)]
    public void Piston_of_the_octane_rating_engine_stands_where_it_should(double degrees, double belowTopMm)
    {
        double angle = double.DegreesToRadians(degrees);
        Real below = SliderCrank.BelowTop(new Real(4.5 * InchMm), new Real(10 * InchMm), default, new Real(Math.Sin(angle)), new Real(Math.Cos(angle)));

        Assert.Equal(belowTopMm, below.Value, 5e-6); // printed to five decimals
    }

    // ASTM D2699: inlet closes 34° ABDC; trapped ratios computed independently of this program.
    [Theory]
    [InlineData(7, 6.59307)]
    [InlineData(10, 9.38960)]
    public void Trapped_ratio_of_the_octane_rating_engine(double ratio, double trapped)
    {
        Real stroke = new(4.5 * InchMm);
        Real below = SliderCrank.BelowTopAtClosing(stroke, new Real(10 * InchMm), default, new Real(double.DegreesToRadians(34)), twoStroke: false);

        Assert.Equal(trapped, Charge.TrappedRatio(below, stroke, new Real(ratio)).Value, 5e-6);
    }

    [Fact]
    public void Travel_without_offset_is_the_stroke() =>
        _cranks.Sample(crank => Math.Abs(SliderCrank.Travel(new Real(crank.Stroke), new Real(crank.Rod), default).Value - crank.Stroke) < 1e-9);

    // The oracle is a search over the crank circle for the extremes of the pin's height: no closed form of travel in it.
    [Fact]
    public void Travel_with_offset_is_what_a_search_round_the_crank_finds() => _cranks.Sample(crank =>
    {
        (double _, double top) = Extreme(crank.Stroke, crank.Rod, crank.Offset, 0.0);
        (double _, double bottom) = Extreme(crank.Stroke, crank.Rod, crank.Offset, Math.PI);
        double travel = SliderCrank.Travel(new Real(crank.Stroke), new Real(crank.Rod), new Real(crank.Offset)).Value;
        return Math.Abs(travel - (top - bottom)) < 1e-8;
    });

    [Fact]
    public void Closing_is_counted_from_true_top_dead_centre() => _cranks.Sample(crank =>
    {
        (double topAngle, double top) = Extreme(crank.Stroke, crank.Rod, crank.Offset, 0.0);
        double inlet = top - Height(crank.Stroke, crank.Rod, crank.Offset, topAngle + Math.PI + crank.Closing);
        double exhaust = top - Height(crank.Stroke, crank.Rod, crank.Offset, topAngle - crank.Closing);
        return Math.Abs(BelowTop(crank, twoStroke: false) - inlet) < 1e-5 && Math.Abs(BelowTop(crank, twoStroke: true) - exhaust) < 1e-5;
    });

    [Fact]
    public void Charge_trapped_at_bottom_dead_centre_has_the_static_ratio()
    {
        Real below = SliderCrank.BelowTopAtClosing(new Real(88), new Real(140), default, default, twoStroke: false);

        Assert.Equal(9.5, Charge.TrappedRatio(below, new Real(88), new Real(9.5)).Value, 1e-12);
    }

    private static double BelowTop((double Stroke, double Rod, double Offset, double Closing) crank, bool twoStroke) =>
        SliderCrank.BelowTopAtClosing(
            new Real(crank.Stroke), new Real(crank.Rod), new Real(crank.Offset), new Real(crank.Closing), twoStroke).Value;

    /// <summary>Height of the pin over the crank line from the triangle itself: crankpin, rod, and the pin's line offset sideways.</summary>
    private static double Height(double stroke, double rod, double offset, double angle)
    {
        double sideways = (stroke / 2 * Math.Sin(angle)) - offset;
        return (stroke / 2 * Math.Cos(angle)) + Math.Sqrt((rod * rod) - (sideways * sideways));
    }

    private static (double Angle, double Height) Extreme(double stroke, double rod, double offset, double near)
    {
        double sign = near == 0.0 ? 1.0 : -1.0, low = near - 0.5, high = near + 0.5, golden = (Math.Sqrt(5) - 1) / 2;
        for (int step = 0; step < 60; step++)
        {
            double a = high - (golden * (high - low)), b = low + (golden * (high - low));
            if (sign * Height(stroke, rod, offset, a) > sign * Height(stroke, rod, offset, b))
            {
                high = b;
            }
            else
            {
                low = a;
            }
        }

        return ((low + high) / 2, Height(stroke, rod, offset, (low + high) / 2));
    }
}
