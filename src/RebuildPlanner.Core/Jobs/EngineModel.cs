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
    private readonly int[] _firstWorstOnly;
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
        _firstTerm = new int[estimates.Count + 1];
        _firstWorstOnly = new int[estimates.Count];
        List<Term> terms = [];
        for (int estimate = 0; estimate < estimates.Count; estimate++)
        {
            ILookup<bool, Term> worstOnly = Together(estimates[estimate].Terms).ToLookup(term => sources[term.Source].Shape == SourceShape.None);
            terms.AddRange(worstOnly[false]);
            _firstWorstOnly[estimate] = terms.Count;
            terms.AddRange(worstOnly[true]);
            _firstTerm[estimate + 1] = terms.Count;
        }

        _terms = [.. terms];

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

    /// <summary>The doubts of one input of one cylinder, those that count in the worst case alone last.</summary>
    public ReadOnlySpan<Term> TermsOf(int cylinder, int input)
    {
        int estimate = EstimateIndex(cylinder, input);
        return _terms.AsSpan(_firstTerm[estimate].._firstTerm[estimate + 1]);
    }

    /// <summary>Of these, the doubts that have a distribution or bar proof: all that first order reads.</summary>
    public ReadOnlySpan<Term> DoubtsOf(int cylinder, int input) => DoubtsOf(EstimateIndex(cylinder, input));

    /// <inheritdoc cref="DoubtsOf(int, int)"/>
    public ReadOnlySpan<Term> DoubtsOf(int estimate) => _terms.AsSpan(_firstTerm[estimate].._firstWorstOnly[estimate]);

    /// <summary>The best values of one cylinder's inputs.</summary>
    public void Values(int cylinder, out CylinderFigures<Real> figures)
    {
        figures = default;
        for (int input = 0; input < CylinderFigures<Real>.Count; input++)
        {
            figures[input] = new Real(_estimates[EstimateIndex(cylinder, input)].Value);
        }
    }

    // Six places of a bore name their gauge's error six times: added up once here, not in every pass.
    private static IEnumerable<Term> Together(IReadOnlyList<Term> terms) =>
        terms
            .GroupBy(term => (term.Source, term.What))
            .Select(same => new Term(same.Key.Source, same.Sum(term => term.Coefficient), same.Key.What))
            .Where(term => term.Coefficient != 0.0);

    /// <summary>How many distinct estimates there are.</summary>
    public int EstimateCount => _estimates.Length;

    /// <summary>Which estimate one input of one cylinder is.</summary>
    public int EstimateIndex(int cylinder, int input) => _estimateOf[(cylinder * CylinderFigures<Real>.Count) + input];
}
