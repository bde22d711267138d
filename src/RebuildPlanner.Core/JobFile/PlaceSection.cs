using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads the keys that say which part and which place on it, and refuses by name those that the <c>what</c> does not take.</summary>
internal static class PlaceSection
{
    private const double HoursOnTheClock = 12.0;

    public static Place Read(Fields fields, WhatLine line, Known known)
    {
        bool face = line.What == What.Flatness; // A head and a block alike have a face to be flat.
        Allow(fields, line, "cylinder", line.Belongs != Belongs.Bank);
        Allow(fields, line, "piece", line.MayBePiece);
        Allow(fields, line, "head", line.Belongs == Belongs.Head || face);
        Allow(fields, line, "bank", line.Belongs == Belongs.Bank || face);
        Allow(fields, line, "at", (line.Keys & (PlaceKeys.Depth | PlaceKeys.PinEnd)) != 0);
        Allow(fields, line, "axis", line.Keys.HasFlag(PlaceKeys.Axis));
        Allow(fields, line, "valve", line.Keys.HasFlag(PlaceKeys.Valve));
        Allow(fields, line, "clock", line.Keys.HasFlag(PlaceKeys.Clock));
        Place place = new(
            line.Belongs != Belongs.Bank ? known.Cylinders.Read(fields, "cylinder") : null,
            line.MayBePiece ? known.Pieces.Read(fields, "piece") : null,
            line.Belongs == Belongs.Head || face ? known.Heads.Read(fields, "head") : null,
            line.Belongs == Belongs.Bank || face ? known.Banks.Read(fields, "bank") : null,
            ReadAt(fields, line.Keys),
            line.Keys.HasFlag(PlaceKeys.Axis) ? fields.Word("axis", JobWords.Axes) : null,
            line.Keys.HasFlag(PlaceKeys.Valve) ? fields.Word("valve", JobWords.Valves) : null,
            line.Keys.HasFlag(PlaceKeys.Clock) ? ReadClock(fields) : null);
        CheckAgreement(fields, place, known);
        return place;
    }

    /// <summary>A reading says which part it was taken on, where there is more than one.</summary>
    public static void CheckNamed(Fields fields, WhatLine line, Place place, Known known)
    {
        if (line.NeedsCylinder && fields.Take("cylinder") is null && !(line.MayBePiece && fields.Take("piece") is not null))
        {
            fields.Missing("cylinder", $"a reading of {line.Word} names its cylinder{(line.MayBePiece ? " or its piece" : "")}");
        }

        bool named = place is not { Head: null, Bank: null, Cylinder: null };
        if (line.Belongs == Belongs.Head && !named && known.Heads.Names is { Count: > 1 } heads)
        {
            fields.Missing("head", $"there are several heads; say which: {Wording.Listed(heads)}");
        }
        else if (line.Belongs == Belongs.Bank && !named && known.Banks.Names is { Count: > 1 } banks)
        {
            fields.Missing("bank", $"there are several banks; say which: {Wording.Listed(banks)}");
        }
    }

    private static void CheckAgreement(Fields fields, Place place, Known known)
    {
        if (place is { Cylinder: not null, Piece: not null })
        {
            fields.Faults.Add(fields.Take("piece")!, "name the cylinder or the piece, not both; 'fitted' says which piece stands where");
        }

        if (place is { Head: { } head, Cylinder: { } cylinder } && known.HeadOf(cylinder) is { } own && own != head)
        {
            fields.Faults.Add(fields.Take("head")!, $"cylinder {cylinder} is under head '{own}'");
        }

        if (place is { Head: not null, Bank: not null })
        {
            fields.Faults.Add(fields.Take("bank")!, "name the head or the bank, not both");
        }
    }

    private static void Allow(Fields fields, WhatLine line, string key, bool allowed)
    {
        if (!allowed)
        {
            fields.NotToldOf(line.Word, key);
        }
    }

    private static At? ReadAt(Fields fields, PlaceKeys keys) =>
        keys.HasFlag(PlaceKeys.Depth) ? fields.Word("at", JobWords.Depths)
        : keys.HasFlag(PlaceKeys.PinEnd) ? fields.Word("at", JobWords.PinEnds)
        : null;

    private static double? ReadClock(Fields fields)
    {
        if (fields.Take("clock") is not { } clock)
        {
            return null;
        }

        if (Fields.NumberIn(clock) is { } hours and > 0.0 and <= HoursOnTheClock)
        {
            return hours;
        }

        fields.Faults.Add(clock, "the clock is a number of hours above 0 and up to 12, without a unit, 12 at the cam-drive end");
        return null;
    }
}
