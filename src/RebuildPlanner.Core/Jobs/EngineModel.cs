using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>One cylinder of the model: which estimate each input is, which formulas it takes, which outputs its figures suffice for.</summary>
/// <param name="Label">The cylinder's label.</param>
/// <param name="Form">Which formulas apply.</param>
/// <param name="EstimateOf">For each <see cref="Input"/> the index of its estimate; 0 is the absent figure.</param>
/// <param name="Known">For each <see cref="Output"/> whether its figures are all there.</param>
public sealed record CylinderModel(string Label, CylinderForm Form, IReadOnlyList<int> EstimateOf, IReadOnlyList<bool> Known);

/// <summary>An engine at one stage, ready for the readers of the model: sources, distinct estimates, and per cylinder which is which.</summary>
/// <remarks>Everything is flat arrays: the kernel meets no string, dictionary or list.</remarks>
public sealed class EngineModel
{
    private readonly Source[] _sources;
    private readonly double[] _variances;
    private readonly Estimate[] _estimates;
    private readonly Term[] _terms;
    private readonly int[] _firstTerm;
    private readonly CylinderModel[] _cylinders;
    private readonly int[] _estimateOf;

    /// <summary>Makes the model.</summary>
    /// <param name="sources">The independent doubts.</param>
    /// <param name="estimates">The distinct estimates; the first is the absent figure.</param>
    /// <param name="cylinders">The cylinders in order.</param>
    public EngineModel(IReadOnlyList<Source> sources, IReadOnlyList<Estimate> estimates, IReadOnlyList<CylinderModel> cylinders)
    {
        _sources = [.. sources];
        _variances = [.. sources.Select(source => source.StandardUncertainty * source.StandardUncertainty)];
        _estimates = [.. estimates];
        _terms = [.. estimates.SelectMany(estimate => estimate.Terms)];
        _firstTerm = new int[estimates.Count + 1];
        for (int estimate = 0; estimate < estimates.Count; estimate++)
        {
            _firstTerm[estimate + 1] = _firstTerm[estimate] + estimates[estimate].Terms.Count;
        }

        _cylinders = [.. cylinders];
        _estimateOf = [.. cylinders.SelectMany(cylinder => cylinder.EstimateOf)];
    }

    /// <summary>The independent doubts.</summary>
    public ReadOnlySpan<Source> Sources => _sources;

    /// <summary>u² of each source.</summary>
    public ReadOnlySpan<double> Variances => _variances;

    /// <summary>The cylinders in order.</summary>
    public IReadOnlyList<CylinderModel> Cylinders => _cylinders;

    /// <summary>The estimate behind one input of one cylinder.</summary>
    public Estimate EstimateOf(int cylinder, Input input) => _estimates[EstimateIndex(cylinder, (int)input)];

    /// <summary>The doubts of one input of one cylinder.</summary>
    public ReadOnlySpan<Term> TermsOf(int cylinder, int input)
    {
        int estimate = EstimateIndex(cylinder, input);
        return _terms.AsSpan(_firstTerm[estimate].._firstTerm[estimate + 1]);
    }

    /// <summary>The best values of one cylinder's inputs.</summary>
    public void Values(int cylinder, out CylinderFigures<Real> figures)
    {
        figures = default;
        for (int input = 0; input < CylinderFigures<Real>.Count; input++)
        {
            figures[input] = new Real(_estimates[EstimateIndex(cylinder, input)].Value);
        }
    }

    private int EstimateIndex(int cylinder, int input) => _estimateOf[(cylinder * CylinderFigures<Real>.Count) + input];
}
