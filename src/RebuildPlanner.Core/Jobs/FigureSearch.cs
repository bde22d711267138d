using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Which figure counts: the asked stage first, then earlier ones; within a stage measured, computed, given, assumed; last what holds throughout.</summary>
public sealed class FigureSearch
{
    private readonly MeasuredFigures _measured;
    private readonly StatedFigures _stated;
    private readonly Successors _successors;
    private readonly Dictionary<(What What, int Cylinder, Stage Stage), Figure?> _found = [];

    /// <summary>Prepares the search.</summary>
    /// <param name="job">The job.</param>
    /// <param name="parts">Its parts, looked at from the asked stage.</param>
    /// <param name="book">Where the doubts are kept.</param>
    public FigureSearch(Job job, EngineParts parts, SourceBook book)
    {
        Parts = parts;
        _measured = new MeasuredFigures(job, parts, book);
        _stated = new StatedFigures(job, parts, book);
        _successors = new Successors(job, parts, book, Find);
    }

    /// <summary>The parts it looks through.</summary>
    public EngineParts Parts { get; }

    /// <summary>Figures that ended at some stage without a computed successor: thing, cylinder, stage.</summary>
    public HashSet<(What What, int Cylinder, Stage Stage)> EndedWithoutSuccessor { get; } = [];

    /// <summary>Whether repeats of a thing with a gauge have a spread.</summary>
    public bool HasPool(What what, string? gauge) => _measured.HasPool(what, gauge);

    /// <summary>The figure that counts at the asked stage, or null where it is nowhere to be found.</summary>
    public Figure? Find(What what, int cylinder) => Find(what, cylinder, Parts.Stages[^1]);

    /// <summary>The figure that counts at a stage.</summary>
    public Figure? Find(What what, int cylinder, Stage at)
    {
        if (!_found.TryGetValue((what, cylinder, at), out Figure? figure))
        {
            // The deck stack is for an engine with no deck figure at all, so it is made of what counts at the asked stage and never carried on.
            bool stackMayServe = what == What.Deck && at == Parts.Stages[^1];
            figure = AtStage(what, cylinder, at) ?? (stackMayServe ? _successors.DeckStack(cylinder, at) : null);
            _found[(what, cylinder, at)] = figure;
        }

        return figure;
    }

    private Figure? AtStage(What what, int cylinder, Stage at)
    {
        if (_measured.At(what, cylinder, at, () => Find(What.Bore, cylinder, at)) is { } measured)
        {
            return measured;
        }

        Stage? before = Parts.Before(at);
        Figure? earlier = before is { } previous ? Find(what, cylinder, previous) : Throughout(what, cylinder);

        // Cuts of earlier rebuilds lie behind every figure of this job: they end none.
        bool ended = before is not null
            && (earlier is null ? what == What.Bore && _successors.IsBored(cylinder, at) : _successors.Ends(earlier, cylinder, at));
        Figure? computed = ended ? _successors.Carry(what, earlier, cylinder, at) : null;
        Figure? figure = computed ?? _stated.Given(what, cylinder, at) ?? _stated.Assumed(what, cylinder, at);
        if (figure is null && ended)
        {
            EndedWithoutSuccessor.Add((what, cylinder, at));
            return null;
        }

        return figure ?? earlier;
    }

    private Figure? Throughout(What what, int cylinder) =>
        _measured.At(what, cylinder, null, () => Find(What.Bore, cylinder)) ?? _stated.Throughout(what, cylinder);
}
