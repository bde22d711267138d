using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>What cuts take off, with their doubt: one input a head skim, a deck cut, a line bore, a cylinder's bore.</summary>
public sealed class CutAmounts(Job job, EngineParts parts, SourceBook book)
{
    /// <summary>The amounts of one kind of cut that touch a cylinder at a stage.</summary>
    public IEnumerable<Figure> Of(CutKind kind, int cylinder, Stage stage) =>
        parts.Cuts(kind, cylinder, stage)
            .Where(cut => cut.Cut.Value is not null)
            .Select(cut => new Figure(
                CutWords.WhatOf(kind), Of(cut.Index, cut.Cut, cylinder), FigureKind.Given, stage, CutWords.Of(kind), null, [])
            {
                Written = cut.Cut.Value!.Text,
            });

    /// <summary>The amount of one cut, or the finished size of a bore.</summary>
    /// <param name="index">Its place in the job, which tells it from others.</param>
    /// <param name="cut">The cut, with a value.</param>
    /// <param name="cylinder">The cylinder's index.</param>
    public Estimate Of(int index, Cut cut, int cylinder)
    {
        object owner = cut.Kind switch
        {
            CutKind.HeadSkim => parts.Head(cylinder).Label,
            CutKind.DeckCut => parts.Bank(cylinder),
            CutKind.LineBore => "engine",
            _ => parts.Label(cylinder),
        };
        What what = CutWords.WhatOf(cut.Kind);
        return cut.Value is { Limits: null } bare
            ? Setting(bare.Value, cut.Kind, what, ("cut", index, owner))
            : StatedFigures.EstimateOf(cut.Value!, what, ("cut", index, owner), book);
    }

    /// <summary>A setting with the process tolerance as its doubt; a cut of zero has none.</summary>
    public Estimate Setting(double value, CutKind kind, What what, object identity)
    {
        if (value == 0.0)
        {
            return Estimate.Zero;
        }

        double? toleranceMm = job.Processes.LastOrDefault(process => process.Kind == kind && process.Tolerance is not null)?.Tolerance!.Midpoint;
        Source source = toleranceMm switch
        {
            null => Source.Unstated,
            > 0.0 and double halfWidth => Source.Rectangular(halfWidth),
            _ => Source.WorstOnly(0.0, 0.0),
        };
        return new Estimate(value, [new Term(book.Shared((what, identity), source), 1.0, what)]);
    }
}
