using RebuildPlanner.Core.Numerics;

namespace RebuildPlanner.Core.Stacks;

/// <summary>What trials are run on: doubts in, figures out.</summary>
public interface ITrialModel
{
    /// <summary>The independent doubts.</summary>
    ReadOnlySpan<Source> Sources { get; }

    /// <summary>What is asked for, in order.</summary>
    IReadOnlyList<TrialFigure> Figures { get; }

    /// <summary>Limits asked of several figures at once.</summary>
    IReadOnlyList<IReadOnlyList<FigureLimit>> Joints => [];

    /// <summary>Room of its own for one who computes.</summary>
    ITrialWorker Worker();
}

/// <summary>One who computes the figures of a tile of trials.</summary>
public interface ITrialWorker
{
    /// <summary>Computes every figure in every trial of a tile.</summary>
    /// <param name="tile">The doubts.</param>
    /// <param name="figures">The figures, coherent unit: one row of <see cref="TrialTile.Trials"/> after another. A figure without meaning is NaN.</param>
    /// <param name="linear">The linear parts, less the values: rows of the same kind; those of figures without one are left as they are.</param>
    void Compute(TrialTile tile, Span<double> figures, Span<double> linear);
}

/// <summary>A figure to be sampled.</summary>
/// <param name="Value">At the estimates, coherent unit.</param>
/// <param name="Row">Change for a unit of each source, or null where the linear part is of no use: a spread, a sum of squares.</param>
/// <param name="Decides">Whether trials go on until its digits are sure; the others are as sure as they are by then.</param>
/// <param name="Pole">
/// Where the figure bends as one over a nearly linear sum: what stands still while the rest is turned over, as the 1 in 1 + V_s/V_c; else null.
/// </param>
public sealed record TrialFigure(double Value, double[]? Row, bool Decides = true, double? Pole = null)
{
    /// <summary>The figure bent as it bends: its linear part carried to where the reciprocal takes it.</summary>
    /// <param name="linear">The linear part, less the value.</param>
    /// <remarks>p + (v − p)/(1 − l/(v − p)), whose slope at l = 0 is 1; without bound from l = v − p on. Without a pole v + l.</remarks>
    public double Bent(double linear)
    {
        if (Pole is not { } pole)
        {
            return Value + linear;
        }

        double turned = Turned(Value, pole, new Real(linear)).Value;
        return turned > pole ? turned : double.PositiveInfinity;
    }

    /// <summary>p + (v − p)/(1 − l/(v − p)): beyond the pole of the reciprocal it comes out at p and below.</summary>
    internal static T Turned<T>(double value, double pole, T linear)
        where T : struct, IScalar<T>
    {
        T above = T.From(value - pole);
        return T.From(pole) + (above / (T.From(1.0) - (linear / above)));
    }

    /// <summary>The linear part that is bent to a figure; −∞ at the pole and below.</summary>
    public double Unbent(double figure) => Pole is not { } pole ? figure - Value
        : figure <= pole ? double.NegativeInfinity
        : (Value - pole) * (1.0 - ((Value - pole) / (figure - pole)));
}

/// <summary>Limits on one figure of a model.</summary>
/// <param name="Figure">Which, by its place.</param>
/// <param name="Low">The least allowed, or −∞.</param>
/// <param name="High">The greatest allowed, or +∞.</param>
public readonly record struct FigureLimit(int Figure, double Low, double High);

/// <summary>How trials are run.</summary>
/// <param name="Seed">What the draws begin with: the same seed gives the same answer.</param>
/// <param name="Trials">How many, or null to stop when the digits wanted are sure.</param>
/// <param name="Digits">Significant digits of u that are wanted sure, 1 or 2.</param>
/// <param name="Plain">Counts trials alone, without the exact linear part.</param>
/// <param name="Threads">How many compute at once, or 0 for as many as the machine has; it changes no answer.</param>
public sealed record TrialOptions(ulong Seed = 1, int? Trials = null, int Digits = 2, bool Plain = false, int Threads = 0)
{
    /// <summary>The most trials that are run to make digits sure.</summary>
    public const int MostTrials = 10_000_000;
}
