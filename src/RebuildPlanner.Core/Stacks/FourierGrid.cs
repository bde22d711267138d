using System.Runtime.Intrinsics;
using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>Quadrature nodes over t with the characteristic function already in their weights.</summary>
internal sealed class FourierGrid
{
    // The t law of an even ν has a logarithm at t = 0: the first panel is halved towards it.
    private const int HalvingsAtZero = 3;

    private readonly double[] _t;
    private readonly double[] _weight;

    /// <summary>Lays panels no wider than given from 0 to the last t and forms φ at their nodes.</summary>
    public FourierGrid(double lastT, double panelWidth, FillPhi fill)
    {
        int panels = (int)Math.Ceiling(lastT / panelWidth);
        double width = lastT / panels;
        _t = new double[(panels + HalvingsAtZero) * GaussLegendre.Points];
        _weight = new double[_t.Length];
        double[] phi = new double[_t.Length];
        int next = 0;
        double start = 0.0, end = width / (1 << HalvingsAtZero);
        for (int halving = 0; halving <= HalvingsAtZero; halving++, (start, end) = (end, 2.0 * end))
        {
            Lay(start, end, ref next);
        }

        for (int panel = 1; panel < panels; panel++)
        {
            Lay(panel * width, (panel + 1) * width, ref next);
        }

        fill(_t, phi);
        for (int i = 0; i < _t.Length; i++)
        {
            _weight[i] *= phi[i] / (Math.PI * _t[i]);
        }
    }

    /// <summary>Forms φ at every t.</summary>
    public delegate void FillPhi(ReadOnlySpan<double> t, Span<double> phi);

    /// <summary>W of the given order at an offset the grid reaches.</summary>
    public double Tail(int order, double offset)
    {
        // Always eight at a time, so that the sum is formed in one order on every machine.
        Vector512<double> sum = Vector512<double>.Zero;
        for (int i = 0; i < _t.Length; i += Vector512<double>.Count)
        {
            Vector512<double> t = Vector512.Create(_t, i), weight = Vector512.Create(_weight, i), angle = offset * t;
            if (order == 0)
            {
                sum += weight * LaneSine.Sin(angle);
            }
            else if (order == 1)
            {
                // 1 − cos as a square keeps its digits where the angle is small.
                Vector512<double> half = LaneSine.Sin(0.5 * angle);
                sum += 2.0 * weight * half * half / t;
            }
            else
            {
                sum += weight * (angle - LaneSine.Sin(angle)) / (t * t);
            }
        }

        double inverted = Vector512.Sum(sum);
        return order switch
        {
            0 => 0.5 - inverted,
            1 => (0.5 * offset) - inverted,
            _ => (0.25 * offset * offset) - inverted,
        };
    }

    private void Lay(double start, double end, ref int next)
    {
        double middle = 0.5 * (start + end), half = 0.5 * (end - start);
        for (int i = 0; i < GaussLegendre.Points; i++, next++)
        {
            _t[next] = middle + (half * GaussLegendre.Nodes[i]);
            _weight[next] = half * GaussLegendre.Weights[i];
        }
    }
}
