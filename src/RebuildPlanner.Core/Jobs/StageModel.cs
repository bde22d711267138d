using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>A job read at one stage: the figures that count, the model made of them, and what is missing.</summary>
public sealed class StageModel
{
    // Common practice: compression while cranking loses heat and leaks, so the exponent stays well under 1.4.
    private const double CrankingExponent = 1.25, CrankingExponentLimit = 0.05;

    /// <summary>The figures a whole stack is made of, in the order in which a missing one is named.</summary>
    private static readonly What[] _stackFigures =
        [What.Bore, What.Stroke, What.Chamber, What.GasketThickness, What.GasketOpening, What.Deck, What.Crown];

    private static readonly (Input Input, What What)[] _inputs =
    [
        (Input.Bore, What.Bore), (Input.Stroke, What.Stroke), (Input.PinOffset, What.PinOffset), (Input.RodLength, What.RodLength),
        (Input.Travel, What.Travel), (Input.Chamber, What.Chamber), (Input.GasketOpening, What.GasketOpening),
        (Input.GasketThickness, What.GasketThickness), (Input.Deck, What.Deck), (Input.Rock, What.Rock),
        (Input.HeadRecess, What.HeadRecess), (Input.Crown, What.Crown), (Input.TopLandHeight, What.TopLandHeight),
        (Input.TopLandDiameter, What.TopLandDiameter), (Input.Pocket, What.Pocket), (Input.WholeChamber, What.WholeChamber),
        (Input.PlugHole, What.PlugHole),
    ];

    private readonly List<MissingFigure> _missing = [];
    private readonly List<(int Cylinder, Figure Figure)> _used = [];
    private readonly HashSet<(int Cylinder, Figure Figure)> _usedOnce = [];
    private readonly Dictionary<string, Estimate> _shared = [];
    private readonly Dictionary<Estimate, int> _estimateIndexes = new(ReferenceEqualityComparer.Instance);
    private readonly List<Estimate> _estimates = [Estimate.Zero];

    /// <summary>Reads a job at a stage.</summary>
    public StageModel(Job job, Stage stage)
    {
        Job = job;
        Stage = stage;
        Search = new FigureSearch(job, new EngineParts(job, stage), Book);
        FindWhatLimitsName();
        CylinderModel[] cylinders = [.. Enumerable.Range(0, job.Engine.Cylinders).Select(CylinderModel)];
        Model = new EngineModel(Book.Sources, _estimates, cylinders);
    }

    /// <summary>The job.</summary>
    public Job Job { get; }

    /// <summary>The stage.</summary>
    public Stage Stage { get; }

    /// <summary>The doubts met.</summary>
    public SourceBook Book { get; } = new();

    /// <summary>Where figures are found.</summary>
    public FigureSearch Search { get; }

    /// <summary>The model.</summary>
    public EngineModel Model { get; }

    /// <summary>Every figure used, by cylinder.</summary>
    public IReadOnlyList<(int Cylinder, Figure Figure)> Used => _used;

    /// <summary>Every figure missing.</summary>
    public IReadOnlyList<MissingFigure> Missing => _missing;

    /// <summary>Finds a figure that only a verdict needs, and notes it as used or missing.</summary>
    public Figure? FindForVerdict(What what, int cylinder)
    {
        Figure? figure = Search.Find(what, cylinder);
        if (figure is null)
        {
            Miss(what, cylinder);
        }
        else
        {
            Use(cylinder, figure);
        }

        return figure;
    }

    /// <summary>The model's sources are closed once it is made, so the figures that only limits need are looked up before.</summary>
    private void FindWhatLimitsName()
    {
        foreach (Limit limit in Job.Limits)
        {
            What? what = limit.Subject.Derived == Derived.BoreClearance ? What.Skirt : limit.Subject.What;
            for (int cylinder = 0; what is { } named && cylinder < Job.Engine.Cylinders; cylinder++)
            {
                Search.Find(named, cylinder);
            }
        }
    }

    private CylinderModel CylinderModel(int cylinder)
    {
        int[] estimateOf = new int[CylinderFigures<Numerics.Real>.Count];
        Dictionary<What, Figure> found = [];
        foreach ((Input input, What what) in _inputs)
        {
            if (Search.Find(what, cylinder) is not { } figure)
            {
                continue;
            }

            found.Add(what, figure);
            Use(cylinder, figure);
            Input slot = input == Input.GasketOpening && figure.IsArea ? Input.GasketArea : input;
            estimateOf[(int)slot] = IndexOf(figure.Estimate);
        }

        bool Has(What what) => found.ContainsKey(what);
        if (Has(What.Deck))
        {
            estimateOf[(int)Input.LeastDeck] = IndexOf(found[What.Deck].Least);
        }

        bool offset = found.TryGetValue(What.PinOffset, out Figure? pin) && (pin.Estimate.Value != 0.0 || pin.Estimate.Terms.Count > 0);
        bool twoStroke = Job.Engine.Cycle == EngineCycle.TwoStroke;
        Quantities.Quantity? closing = twoStroke ? Job.Engine.Cam?.ExhaustCloses : Job.Engine.Cam?.InletCloses;
        CylinderForm form = new(
            TravelMeasured: Has(What.Travel), OffsetPin: offset, WholeChamber: Has(What.WholeChamber) && Has(What.PlugHole),
            TopLand: Has(What.TopLandHeight) && Has(What.TopLandDiameter),
            Closing: closing is not null && Has(What.Stroke) && Has(What.RodLength), TwoStroke: twoStroke);
        if (closing is not null)
        {
            estimateOf[(int)Input.Closing] = IndexOf(
                StatedFigures.EstimateOf(closing, twoStroke ? What.ExhaustCloses : What.InletCloses, "engine", Book));
            estimateOf[(int)Input.Altitude] = IndexOf(AltitudeM());
            estimateOf[(int)Input.CrankingExponent] = IndexOf(Shared("cranking exponent", () => new Estimate(
                CrankingExponent,
                [new Term(Book.Shared("cranking exponent", Source.Rectangular(CrankingExponentLimit)), 1.0, What.CrankingExponent)])));
        }

        NoteMissing(cylinder, Has, offset, closing is not null);
        return new CylinderModel(Search.Parts.Label(cylinder), form, estimateOf, KnownOutputs(Has, form));
    }

    private static bool[] KnownOutputs(Func<What, bool> has, CylinderForm form)
    {
        bool[] known = new bool[CylinderStack<Numerics.Real>.Count];
        bool gasket = has(What.GasketThickness) && has(What.GasketOpening), deck = has(What.Bore) && has(What.Deck);
        bool swept = has(What.Bore) && (form.TravelMeasured || (has(What.Stroke) && (!form.OffsetPin || has(What.RodLength))));
        bool parts = has(What.Chamber) && gasket && deck && has(What.Crown);
        bool clearance = form.WholeChamber || parts;
        bool trapped = swept && clearance && form.Closing;

        Set(Output.Bore, has(What.Bore));
        Set(Output.SweptVolume, swept);
        Set(Output.Chamber, has(What.Chamber));
        Set(Output.Gasket, gasket);
        Set(Output.Deck, deck);
        Set(Output.Crown, has(What.Crown));
        Set(Output.TopLand, form.TopLand && has(What.Bore));
        Set(Output.ClearanceVolume, clearance);
        Set(Output.CompressionRatio, swept && clearance);
        Set(Output.TrappedRatio, trapped);
        Set(Output.CrankingPressure, trapped);
        Set(Output.PistonToHead, has(What.GasketThickness) && has(What.Deck));
        Set(Output.CrossCheck, form.WholeChamber && parts);
        return known;

        void Set(Output output, bool value) => known[(int)output] = value;
    }

    private void NoteMissing(int cylinder, Func<What, bool> has, bool offset, bool closing)
    {
        foreach (What what in _stackFigures)
        {
            if (!has(what) && !(what == What.Stroke && has(What.Travel) && !closing))
            {
                Miss(what, cylinder);
            }
        }

        if ((offset || closing) && !has(What.RodLength))
        {
            Miss(What.RodLength, cylinder);
        }

        if (has(What.WholeChamber) && !has(What.PlugHole))
        {
            Miss(What.PlugHole, cylinder);
        }
    }

    private Estimate AltitudeM() => Shared("altitude", () => Job.Engine.Altitude is { } altitude
        ? new Estimate(altitude.Midpoint / 1000.0, altitude.HalfWidth is > 0.0 and double halfWidth
            ? [new Term(Book.Shared("altitude", Source.Rectangular(halfWidth / 1000.0)), 1.0, What.Altitude)]
            : [])
        : Estimate.Zero);

    private Estimate Shared(string name, Func<Estimate> make)
    {
        if (!_shared.TryGetValue(name, out Estimate? estimate))
        {
            _shared.Add(name, estimate = make());
        }

        return estimate;
    }

    private int IndexOf(Estimate estimate)
    {
        if (!_estimateIndexes.TryGetValue(estimate, out int index))
        {
            index = _estimates.Count;
            _estimates.Add(estimate);
            _estimateIndexes.Add(estimate, index);
        }

        return index;
    }

    private void Use(int cylinder, Figure figure)
    {
        if (_usedOnce.Add((cylinder, figure)))
        {
            _used.Add((cylinder, figure));
            foreach (Figure earlier in figure.RestsOn)
            {
                Use(cylinder, earlier);
            }
        }
    }

    private void Miss(What what, int cylinder)
    {
        MissingFigure missing = new(WhatWords.Of(what), Search.Parts.Label(cylinder));
        if (!_missing.Contains(missing))
        {
            _missing.Add(missing);
        }
    }
}
