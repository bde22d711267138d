using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Numerics;

public class SlopesTests
{
    private static readonly double[] _figures =
        [101.6, 88.4, 0.8, 144.8, 0, 63400, 103.5, 0, 1.0, 0.22, 0.21, 0.05, 0.1, 5000, 6, 101, 12, 0, 0, 1.1, 200, 1.25];

    // Bit for bit: the operations are the same in the same order.
    [Theory]
    [InlineData(0)]
    [InlineData(8)]
    [InlineData(14)]
    public void A_pass_for_eight_inputs_agrees_with_a_dual_pass_for_each(int first)
    {
        CylinderForm form = new(TravelMeasured: false, OffsetPin: true, WholeChamber: false, TopLand: true, Closing: true, TwoStroke: false);
        CylinderFigures<Slopes> many = default;
        for (int input = 0; input < _figures.Length; input++)
        {
            bool seeded = input >= first && input < first + Slopes.Count;
            many[input] = seeded ? Slopes.Seed(_figures[input], input - first) : Slopes.From(_figures[input]);
        }

        CylinderStack<Slopes>.Compute(many, form, out CylinderStack<Slopes> all);
        for (int place = 0; place < Slopes.Count; place++)
        {
            CylinderFigures<Dual<Real>> one = default;
            for (int input = 0; input < _figures.Length; input++)
            {
                one[input] = new Dual<Real>(new Real(_figures[input]), new Real(input == first + place ? 1.0 : 0.0));
            }

            CylinderStack<Dual<Real>>.Compute(one, form, out CylinderStack<Dual<Real>> single);
            for (int output = 0; output < CylinderStack<Real>.Count; output++)
            {
                Assert.Equal(single[output].Value.Value, all[output].Value);
                Assert.Equal(single[output].Derivative.Value, all[output].Derivatives[place]);
            }
        }
    }

    // Only u·u against u² is rounded elsewhere.
    [Fact]
    public void Covariances_side_by_side_are_the_covariances_one_by_one()
    {
        Source[] sources = [Source.Normal(0.3), Source.Rectangular(0.7), Source.Normal(1.1)];
        double[] a = [.. Enumerable.Range(0, 48).Select(i => Math.Sin(i + 1))], b = [.. Enumerable.Range(0, 48).Select(i => Math.Cos(3 * i))];
        double[] together = new double[16];
        Propagation.Covariances([.. sources.Select(source => source.StandardUncertainty * source.StandardUncertainty)], a, b, together);

        for (int figure = 0; figure < together.Length; figure++)
        {
            double alone = Propagation.Covariance(
                sources, [a[figure], a[16 + figure], a[32 + figure]], [b[figure], b[16 + figure], b[32 + figure]]);
            Assert.Equal(alone, together[figure], 1e-14);
        }
    }
}
