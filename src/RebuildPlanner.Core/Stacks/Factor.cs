using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>One draw that a joint probability is conditioned on: a standard variate and what it adds to each line.</summary>
/// <param name="Kind">The pool's place, or <see cref="Rectangle"/> or <see cref="Normal"/>.</param>
/// <param name="Lines">The lines it moves, ascending.</param>
/// <param name="Weights">By how much a unit of it moves each of them: half-widths of a rectangle, standard deviations else.</param>
internal sealed record Factor(int Kind, int[] Lines, double[] Weights)
{
    /// <summary>Uniform between −1 and 1.</summary>
    public const int Rectangle = -2;

    /// <summary>Standard normal, as is a pool's factor once the pool's scale is in its weights.</summary>
    public const int Normal = -1;

    /// <summary>The weight on one line, 0 where it does not move it.</summary>
    public double On(int line)
    {
        int index = Array.BinarySearch(Lines, line);
        return index < 0 ? 0.0 : Weights[index];
    }

    /// <summary>What one unit is multiplied by, given the pools' scales.</summary>
    public double Scale(ReadOnlySpan<double> scales) => Kind >= 0 ? scales[Kind] : 1.0;

    /// <summary>The probability of the variate at or below x.</summary>
    public double Below(double x) => Kind == Rectangle ? Math.Clamp(0.5 * (x + 1.0), 0.0, 1.0) : NormalRamp.At(0, x, 1.0);

    /// <summary>The variate at a probability.</summary>
    public double Quantile(double probability) => Kind == Rectangle
        ? (2.0 * probability) - 1.0
        : Math.Clamp(NormalLaw.QuickQuantile(probability), -NormalRamp.Reach, NormalRamp.Reach);

    /// <summary>Adds a variate, scaled, to the lines' offsets.</summary>
    public void AddTo(Span<double> offsets, double scaled)
    {
        for (int i = 0; i < Lines.Length; i++)
        {
            offsets[Lines[i]] += Weights[i] * scaled;
        }
    }
}
