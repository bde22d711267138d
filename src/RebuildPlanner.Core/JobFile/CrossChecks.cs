using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>What no entry shows alone: figures that contradict one another.</summary>
internal static class CrossChecks
{
    /// <summary>One name for the piston's height at the top is enough: deck and protrusion are the same gap told from its two ends.</summary>
    public static void DeckAgainstProtrusion(
        IEnumerable<Sited<Reading>> readings, IEnumerable<Sited<StatedFigure>> stated, IReadOnlyList<string> cylinders, FaultList faults)
    {
        List<(What What, Place Place, Stage? Stage, JsonTree Node)> entries = [];
        foreach ((Reading reading, JsonTree node) in readings)
        {
            if (reading is { Struck: null, What: What.Deck or What.PistonProtrusion })
            {
                entries.Add((reading.What, reading.Place, reading.Stage, node));
            }
        }

        foreach ((StatedFigure figure, JsonTree node) in stated)
        {
            if (figure.What is What.Deck or What.PistonProtrusion)
            {
                entries.Add((figure.What, figure.Place, figure.Stage, node));
            }
        }

        entries.Sort((one, other) => one.Node.Spot.Offset.CompareTo(other.Node.Spot.Offset));
        Dictionary<(string Cylinder, Stage? Stage), (What What, JsonTree Node)> first = [];
        foreach ((What what, Place place, Stage? stage, JsonTree node) in entries)
        {
            (What What, JsonTree Node)? against = null;
            foreach (string cylinder in place.Cylinder is { } one ? [one] : cylinders)
            {
                if (!first.TryAdd((cylinder, stage), (what, node)) && first[(cylinder, stage)].What != what)
                {
                    against ??= first[(cylinder, stage)];
                }
            }

            if (against is { } other)
            {
                string word = WhatTable.Line(what).Word, otherWord = WhatTable.Line(other.What).Word;
                faults.Add(
                    node.Spot, node.PathOf("what"), word,
                    $"{otherWord} of the same cylinder and stage stands on line {other.Node.Spot.Line}; keep {otherWord} or {word}, not both");
            }
        }
    }

    /// <summary>The drop is one input a cylinder and drop, so its doubt is written the same each time it is repeated.</summary>
    public static void DropsOfRepeats(IEnumerable<Sited<Reading>> readings, FaultList faults)
    {
        Dictionary<(string? Cylinder, Stage? Stage, double DropMm), (Quantity Drop, JsonTree Node)> first = [];
        foreach ((Reading reading, JsonTree node) in readings.Where(read => read.Item is { What: What.CrownFill, Struck: null }))
        {
            if (reading.Drop is not { } drop || first.TryAdd((reading.Place.Cylinder, reading.Stage, drop.Value), (drop, node)))
            {
                continue;
            }

            (Quantity Drop, JsonTree Node) other = first[(reading.Place.Cylinder, reading.Stage, drop.Value)];
            if (other.Drop.Limits != drop.Limits)
            {
                faults.Add(
                    node.Spot, node.PathOf("drop"), drop.Text,
                    $"the same drop is written {other.Drop.Text} on line {other.Node.Spot.Line}; repeats of one drop carry the same limits");
            }
        }
    }
}
