namespace RebuildPlanner.Core.Measuring;

/// <summary>The word of anything a result can name: the job file's own, and those of engine fields and cuts.</summary>
public static class WhatWords
{
    /// <summary>The word.</summary>
    public static string Of(What what) => what switch
    {
        What.Drop => "drop",
        What.PinOffset => "pin offset",
        What.InletCloses => "inlet closes",
        What.ExhaustCloses => "exhaust closes",
        What.Altitude => "altitude",
        What.CrankingExponent => "cranking exponent",
        What.HeadSkim => "head skim",
        What.DeckCut => "deck cut",
        What.LineBore => "line bore",
        What.ValveSeat => "valve seat",
        _ => WhatTable.Line(what).Word,
    };
}
