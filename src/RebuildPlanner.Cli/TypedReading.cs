using System.Text.RegularExpressions;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Cli;

/// <summary>A reading as it is typed at the bench: a bare figure takes the unit of its gauge, a burette's start and end stand side by side.</summary>
internal static partial class TypedReading
{
    /// <summary>The fields that say what was read, or null with what would be right.</summary>
    /// <param name="typed">What was typed.</param>
    /// <param name="burette">Whether a burette is read.</param>
    /// <param name="unit">The unit of a bare figure.</param>
    /// <param name="problem">What would be right.</param>
    public static IReadOnlyList<(string Name, string Value)>? Fields(string typed, bool burette, string unit, out string? problem)
    {
        problem = null;
        if (!burette)
        {
            return [("value", WithUnit(typed, unit))];
        }

        List<(string, string)> fields = [];
        string[] fills = typed.Split('+', StringSplitOptions.TrimEntries);
        foreach (string fill in fills)
        {
            Match marks = TwoMarks().Match(fill);
            if (!marks.Success)
            {
                problem = fills.Length == 1 && BareFigure().IsMatch(fill)
                    ? $"a burette is read twice: write start and end, such as \"0 {fill.Split(' ')[0]}\""
                    : "write start and end, such as \"0 46.2\", a refill after a plus: \"0 50 + 0 12.4\"";
                return null;
            }

            fields.Add(("from", WithUnit(marks.Groups[1].Value, unit)));
            fields.Add(("to", WithUnit(marks.Groups[2].Value, unit)));
        }

        return fields;
    }

    /// <summary>The unit a gauge's steps are written in, else the kind's own.</summary>
    public static string Unit(string? step, WhatLine line) =>
        step is not null && UnitWord().Match(step) is { Success: true } word
            ? word.Groups[1].Value
            : line.Rule.Kinds[0] == QuantityKind.Volume ? "cc" : "mm";

    private static string WithUnit(string typed, string unit) =>
        BareFigure().Match(typed) is { Success: true } bare ? $"{bare.Groups[1].Value} {unit}{(bare.Groups[2].Length > 0 ? " " + bare.Groups[2].Value : "")}" : typed;

    [GeneratedRegex(@"^([+-]?[0-9.,]+)\s*(below|proud|flush|dish|dome|flat)?$")]
    private static partial Regex BareFigure();

    [GeneratedRegex(@"^([0-9.,]+(?:\s*(?:cc|mL|cm3|cm³|L))?)\s*(?:\.\.|\s)\s*([0-9.,]+(?:\s*(?:cc|mL|cm3|cm³|L))?)$")]
    private static partial Regex TwoMarks();

    [GeneratedRegex(@"^[0-9.,]+\s*([^\d\s]\S*)")]
    private static partial Regex UnitWord();
}
