using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.Jobs;

/// <summary>The words of the cuts, and what their doubt counts under.</summary>
public static class CutWords
{
    /// <summary>The cut's word in the job file.</summary>
    public static string Of(CutKind kind) => kind switch
    {
        CutKind.HeadSkim => "head skim",
        CutKind.DeckCut => "deck cut",
        CutKind.LineBore => "line bore",
        CutKind.Bore => "bore",
        CutKind.Hone => "hone",
        CutKind.Sleeve => "sleeve",
        _ => "valve seat",
    };

    /// <summary>What the cut's doubt counts under in shares.</summary>
    public static What WhatOf(CutKind kind) => kind switch
    {
        CutKind.HeadSkim => What.HeadSkim,
        CutKind.DeckCut => What.DeckCut,
        CutKind.LineBore => What.LineBore,
        CutKind.ValveSeat => What.ValveSeat,

        // Whichever tool finished it, what is in doubt is the bore.
        _ => What.Bore,
    };
}
