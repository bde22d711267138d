using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Tests.Stacks;

/// <summary>Draws a model's sources the plain way: the oracle for everything that avoids drawing.</summary>
internal sealed class Simulation(Source[] sources, int seed)
{
    private readonly Random _random = new(seed);
    private readonly Dictionary<int, double> _scales = [];

    public void Next(double[] draw)
    {
        _scales.Clear();
        for (int s = 0; s < sources.Length; s++)
        {
            Source source = sources[s];
            draw[s] = source.StandardUncertainty * source.Shape switch
            {
                SourceShape.Rectangular => Math.Sqrt(3.0) * ((2.0 * _random.NextDouble()) - 1.0),
                SourceShape.Normal => Normal(),
                SourceShape.Pooled => Normal() * Scale(source.Pool, (int)source.DegreesOfFreedom),
                _ => 0.0,
            };
        }
    }

    private double Scale(int pool, int degreesOfFreedom)
    {
        if (!_scales.TryGetValue(pool, out double scale))
        {
            double chiSquare = 0.0;
            for (int i = 0; i < degreesOfFreedom; i++)
            {
                double z = Normal();
                chiSquare += z * z;
            }

            _scales[pool] = scale = Math.Sqrt(degreesOfFreedom / chiSquare);
        }

        return scale;
    }

    private double Normal() => Math.Sqrt(-2.0 * Math.Log(1.0 - _random.NextDouble())) * Math.Cos(2.0 * Math.PI * _random.NextDouble());
}
