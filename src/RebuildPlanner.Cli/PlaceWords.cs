using System.Globalization;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Cli;

/// <summary>A place of the round in words.</summary>
internal static class PlaceWords
{
    /// <summary>Such as "bore, cylinder 1, top, thrust".</summary>
    public static string Of(RoundPlace place) => string.Join(", ", new[] { WhatWords.Of(place.What) }.Concat(Fields(place.Place).Select(field => field.Name is "at" or "axis" or "valve" ? field.Value : $"{field.Name} {field.Value}")));

    /// <summary>The fields that say where, as the job file writes them.</summary>
    public static IEnumerable<(string Name, string Value)> Fields(Place place)
    {
        foreach ((string name, string? value) in new[]
        {
            ("cylinder", place.Cylinder), ("piece", place.Piece), ("head", place.Head), ("bank", place.Bank),
            ("at", place.At is { } at ? JobWords.WordFor(at) : null), ("axis", place.Axis is { } axis ? JobWords.Axes.WordFor(axis) : null),
            ("valve", place.Valve is { } valve ? JobWords.Valves.WordFor(valve) : null), ("clock", place.ClockHours?.ToString(CultureInfo.InvariantCulture)),
        })
        {
            if (value is not null)
            {
                yield return (name, value);
            }
        }
    }
}
