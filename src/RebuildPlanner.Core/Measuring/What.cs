namespace RebuildPlanner.Core.Measuring;

/// <summary>Everything that can be measured, given or assumed on an engine: the closed list of the job file.</summary>
#pragma warning disable CS1591 // Each word is its own explanation; units, sign words and keys stand in WhatTable and docs/what.md.
public enum What
{
    Bore, Stroke, Travel, Chamber, ChamberOpeningArea, ValveSink, ValveHeadDiameter, Deck, Rock, Crown, CrownFill, WholeChamber, PlugHole,
    Pocket, HeadRecess, GasketThickness, GasketOpening, BaseGasket, TopLandHeight, TopLandDiameter, Wall, Skirt, CompressionHeight,
    RodLength, PistonPin, MainJournal, MainHousing, RodJournal, RodHousing, Shell, EndFloat, RodSideClearance, RingGap, HeadHeight,
    BlockHeight, BarrelHeight, DeckHeight, Flatness, LinerProtrusion, PistonProtrusion, CrankRise, Guide, Stem, SpringHeight, PistonToValve,

    // Not in the job file's list of what, but doubts that results name: the engine's own fields, parts of a reading, and cuts.
    Drop, PinOffset, InletCloses, ExhaustCloses, Altitude, CrankingExponent,
    HeadSkim, DeckCut, LineBore, ValveSeat,
}
#pragma warning restore CS1591
