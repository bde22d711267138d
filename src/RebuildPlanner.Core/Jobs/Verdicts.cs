using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Which limits hold: the belief that the true value is inside, single and joint, and what would settle a doubtful one.</summary>
/// <remarks>Source: jcgm106 (8.3.1). A figure without limits is never enough for proof, though its probability is still printed.</remarks>
public sealed class Verdicts(StageModel model, StageFigures figures)
{
    private readonly Dictionary<int, int> _jointOf = [];

    /// <summary>Asks trials for what only they can tell: limits on a ratio or pressure held by several cylinders at once.</summary>
    public void AskJointly(EngineTrials trials)
    {
        foreach ((Limit limit, int number) in model.Job.Limits.Select((limit, number) => (limit, number)).Where(asked => IsJudged(asked.limit)))
        {
            if (OutputOf(limit.Subject) is { } output && limit.Place.Cylinder is null && trials.AddJoint(output, [.. Covered(limit)], Least(limit), Most(limit)) is { } joint)
            {
                _jointOf.Add(number, joint);
            }
        }
    }

    /// <summary>The verdicts on every limit that is judged at the stage, in the order of the limits.</summary>
    public IReadOnlyList<Verdict> All() => [.. model.Job.Limits.SelectMany((limit, number) => IsJudged(limit) ? Of(limit, number) : [])];

    // A worn engine is not judged as received unless a limit says so.
    private bool IsJudged(Limit limit) =>
        limit.Stage is { } stage ? stage == model.Stage : model.Stage is Stage.Planned or Stage.AsMachined;

    private IEnumerable<Verdict> Of(Limit limit, int number)
    {
        Line[] lines = [.. Lines(limit)];
        foreach (Line line in lines.Where(line => line.Cylinder is not null))
        {
            yield return Judge(limit, number, line.Cylinder, [line]);
        }

        if (limit.Place.Cylinder is null)
        {
            yield return Judge(limit, number, null, lines);
        }
    }

    /// <summary>One figure under one limit, or the word of what it lacks.</summary>
    private readonly record struct Line(string? Cylinder, LinearFigure? Figure, string? Lacks);

    private IEnumerable<Line> Lines(Limit limit)
    {
        Output? spread = limit.Subject.Derived switch
        {
            Derived.ChamberSpread => Output.Chamber,
            Derived.RatioSpread => Output.CompressionRatio,
            _ => null,
        };
        if (spread is { } output)
        {
            return [new Line(null, figures.Spread(output), FirstMissing(limit.Subject, null))];
        }

        IEnumerable<int> cylinders = Covered(limit);
        Belongs belongs = limit.Subject.What is { } what ? WhatTable.Line(what).Belongs : Belongs.Cylinder;
        return belongs switch
        {
            Belongs.Cylinder => cylinders.Select(cylinder => LineOf(limit, cylinder, model.Search.Parts.Label(cylinder))),
            Belongs.Head => cylinders.DistinctBy(cylinder => model.Search.Parts.Head(cylinder).Label).Select(cylinder => LineOf(limit, cylinder, null)),
            Belongs.Bank => cylinders.DistinctBy(model.Search.Parts.Bank).Select(cylinder => LineOf(limit, cylinder, null)),
            _ => cylinders.Take(1).Select(cylinder => LineOf(limit, cylinder, null)),
        };
    }

    /// <summary>The output of a cylinder that a subject is, or null where it is a reading or found from readings.</summary>
    private static Output? OutputOf(Subject subject) => subject.Derived switch
    {
        Derived.CompressionRatio => Output.CompressionRatio,
        Derived.TrappedRatio => Output.TrappedRatio,
        Derived.CrankingPressure => Output.CrankingPressure,
        Derived.PistonToHead => Output.PistonToHead,
        _ => null,
    };

    private Line LineOf(Limit limit, int cylinder, string? label)
    {
        string? lacks = null;
        LinearFigure? figure = limit.Subject switch
        {
            var subject when OutputOf(subject) is { } output => figures.Of(output, cylinder),
            { Derived: Derived.Taper } => figures.Taper(cylinder),
            { Derived: Derived.OutOfRound } => figures.OutOfRound(cylinder),
            { Derived: Derived.BoreClearance } => Difference(What.Bore, What.Skirt, 1.0),
            { Derived: Derived.GasketOverhang } => Difference(What.GasketOpening, What.Bore, 0.5),
            { What: { } what } => OfWhat(what),
            _ => null,
        };
        return new Line(label, figure, figure is null ? lacks ?? FirstMissing(limit.Subject, cylinder) : null);

        LinearFigure? Difference(What minuend, What subtrahend, double factor)
        {
            Figure? up = Find(minuend), down = Find(subtrahend);
            return up is null || down is null || up.IsArea ? null : figures.Linear((factor, up.Estimate), (-factor, down.Estimate));
        }

        // Places that differ because the part differs there, as walls do, are not averaged: the one nearest the limit is judged.
        LinearFigure? OfWhat(What what)
        {
            if (Find(what) is not { } found)
            {
                return null;
            }

            bool separate = (WhatTable.Line(what).Keys & (PlaceKeys.Clock | PlaceKeys.Valve)) != 0;
            IEnumerable<PlacedEstimate> places = found.Places.Where(place => limit.Place.Valve is null || place.Place.Valve == limit.Place.Valve);
            Estimate? estimate = !separate || found.Places.Count == 0 ? found.Estimate
                : limit.Min is not null ? places.MinBy(place => place.Estimate.Value)?.Estimate
                : places.MaxBy(place => place.Estimate.Value)?.Estimate;
            return estimate is null ? null : figures.Linear((1.0, estimate));
        }

        Figure? Find(What what)
        {
            Figure? found = model.FindForVerdict(what, cylinder);
            lacks ??= found is null ? WhatWords.Of(what) : null;
            return found;
        }
    }

    /// <summary>The first figure missing of those the subject rests on; its own word where none of them is.</summary>
    private string FirstMissing(Subject subject, int? cylinder)
    {
        What[]? restsOn = subject.Derived switch
        {
            Derived.PistonToHead => [What.GasketThickness, What.Deck],
            Derived.ChamberSpread => [What.Chamber],
            Derived.Taper or Derived.OutOfRound => [],
            _ => null,
        };
        IEnumerable<string> missing = model.Missing
            .Where(missing => cylinder is null || missing.Cylinder == model.Search.Parts.Label(cylinder.Value)).Select(missing => missing.What);
        string own = restsOn is [] ? WhatWords.Of(What.Bore) : subject.Word; // a bore read at one place has no taper
        return missing.FirstOrDefault(word => restsOn is null || restsOn.Any(what => WhatWords.Of(what) == word)) ?? own;
    }

    private Verdict Judge(Limit limit, int number, string? cylinder, Line[] lines)
    {
        double level = limit.Level ?? Subjects.DefaultLevel(limit.Subject);
        ResultQuantity? min = Bound(limit.Min), max = Bound(limit.Max);
        string written = string.Join(", ", new[] { Written("min", limit.Min), Written("max", limit.Max) }.OfType<string>());
        if (lines.Length == 0 || Array.Exists(lines, line => line.Figure is null))
        {
            string? lacks = lines.FirstOrDefault(line => line.Figure is null).Lacks;
            return new Verdict(limit.Subject.Word, cylinder, written, min, max, VerdictState.NotProven, null, level, lacks, number, limit.Place);
        }

        LinearFigure[] judged = [.. lines.Select(line => line.Figure!)];
        double probability = Counted(limit, number, judged) ?? Probability(limit, [.. judged.Select(figure => figure.Row.ToArray())], judged);
        string? unstated = Unstated(judged);
        VerdictState state = Decide(probability, level);
        if (state == VerdictState.Within && unstated is not null)
        {
            state = VerdictState.NotProven;
        }

        string? settle = state != VerdictState.NotProven ? null : unstated ?? Settling(limit, judged, level);
        return new Verdict(limit.Subject.Word, cylinder, written, min, max, state, probability, level, settle, number, limit.Place);
    }

    private static VerdictState Decide(double probability, double level) =>
        probability >= level ? VerdictState.Within : probability <= 1.0 - level ? VerdictState.Outside : VerdictState.NotProven;

    /// <summary>The probability by trials, or null where those of first order count or nothing that is judged was drawn.</summary>
    private double? Counted(Limit limit, int number, LinearFigure[] judged) =>
        figures is not { TrialsCount: true, Run: { } run } ? null
        : judged is [{ } only] ? only.Sampled?.Inside(Least(limit), Most(limit))
        : _jointOf.TryGetValue(number, out int joint) ? run.Joint(joint)
        : null;

    private IEnumerable<int> Covered(Limit limit) =>
        Enumerable.Range(0, model.Job.Engine.Cylinders).Where(cylinder => model.Search.Parts.Covers(limit.Place, cylinder));

    private static double Least(Limit limit) => limit.Min?.Midpoint ?? double.NegativeInfinity;

    private static double Most(Limit limit) => limit.Max?.Midpoint ?? double.PositiveInfinity;

    private double Probability(Limit limit, double[][] rows, LinearFigure[] judged)
    {
        LimitedLine[] lines =
        [
            .. judged.Select((figure, index) => new LimitedLine(
                rows[index],
                Least(limit) - figure.Value, Most(limit) - figure.Value)),
        ];
        return JointProbability.Of(model.Model.Sources, lines);
    }

    /// <summary>The first figure without limits that moves what is judged, or null.</summary>
    private string? Unstated(LinearFigure[] judged)
    {
        foreach (LinearFigure figure in judged)
        {
            foreach (Term term in figure.Terms)
            {
                if (model.Model.Sources[term.Source].Shape == SourceShape.Unstated && figure.Row[term.Source] != 0.0)
                {
                    return WhatWords.Of(term.What);
                }
            }
        }

        return null;
    }

    /// <summary>The one input whose doubt set to zero would prove the verdict, largest share first; null where none alone would.</summary>
    private string? Settling(Limit limit, LinearFigure[] judged, double level)
    {
        Dictionary<What, double> shares = [];
        foreach (LinearFigure figure in judged)
        {
            foreach (Term term in figure.Terms)
            {
                double part = term.Coefficient * figure.Row[term.Source] * model.Model.Variances[term.Source];
                shares[term.What] = shares.GetValueOrDefault(term.What) + part;
            }
        }

        foreach ((What what, double share) in shares.OrderByDescending(share => share.Value))
        {
            if (share > 0.0
                && Decide(Probability(limit, [.. judged.Select(figure => figure.RowWithout(what))], judged), level) != VerdictState.NotProven)
            {
                return WhatWords.Of(what);
            }
        }

        return null;
    }

    private static ResultQuantity? Bound(Quantity? written) => written is null ? null : new ResultQuantity(written.Midpoint, written.Kind);

    private static string? Written(string word, Quantity? written) => written is null ? null : $"{word} {written.Text}";
}
