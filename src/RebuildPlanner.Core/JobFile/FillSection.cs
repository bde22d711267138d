using System.Globalization;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads what a burette delivered: <c>from</c> and <c>to</c> on the reading itself, or several <c>fills</c>.</summary>
/// <remarks>A reading has exactly one of these two and <c>value</c>.</remarks>
internal static class FillSection
{
    private const double Mm3PerCc = 1000.0;

    public static (EquatableList<Fill> Fills, bool FromToWritten) Read(Fields reading, WhatLine line)
    {
        bool value = reading.Take("value") is not null, fills = reading.Take("fills") is not null;
        bool fromTo = reading.Take("from") is not null || reading.Take("to") is not null;
        int ways = (value ? 1 : 0) + (fills ? 1 : 0) + (fromTo ? 1 : 0);
        if (ways == 0)
        {
            reading.Missing("value", "what was read is missing; write 'value', or for a burette 'from' and 'to', or 'fills'");
        }
        else if (ways > 1)
        {
            string extra = fills ? "fills" : reading.Take("from") is not null ? "from" : "to";
            reading.Faults.Add(reading.Take(extra)!, "a reading has one of 'value', 'from' with 'to', or 'fills'; leave the others out");
        }

        if (fills || fromTo)
        {
            CheckTakesFills(reading, line);
        }

        List<Fill> read = fromTo && ReadFill(reading) is { } single ? [single] : [];
        if (fills)
        {
            read.AddRange(ReadFills(reading));
        }

        if (ways == 1 && read.Count > 0)
        {
            CheckSum(reading, line, read);
        }

        return ([.. read], fromTo && read.Count == 1 && !fills);
    }

    private static IEnumerable<Fill> ReadFills(Fields reading)
    {
        JsonTree written = reading.Take("fills")!;
        if (written is { Kind: JsonKind.List, Items.Count: 0 })
        {
            reading.Faults.Add(written, "at least one fill, { \"from\": …, \"to\": … }, stands here");
        }

        foreach (JsonTree item in reading.List("fills"))
        {
            if (Fields.Open(item, reading.Faults, "a fill") is { } fields)
            {
                Fill? fill = ReadFill(fields);
                fields.Close();
                if (fill is not null)
                {
                    yield return fill;
                }
            }
        }
    }

    private static Fill? ReadFill(Fields fields)
    {
        Quantity? from = fields.Quantity("from", EngineRules.BuretteScale, required: true);
        Quantity? to = fields.Quantity("to", EngineRules.BuretteScale, required: true);
        if (from is null || to is null)
        {
            return null;
        }

        if (to.Value < from.Value)
        {
            fields.Faults.Add(
                fields.Take("to")!, $"a fill ends at or above where it began, {from.Text}; 'from' is the mark before it and 'to' the one after");
        }

        return new(from, to);
    }

    private static void CheckTakesFills(Fields reading, WhatLine line)
    {
        string field = reading.Take("fills") is not null ? "fills" : reading.Take("from") is not null ? "from" : "to";
        if (!line.Rule.Kinds.Contains(QuantityKind.Volume))
        {
            reading.Faults.Add(reading.Take(field)!, $"only a volume is read by filling; write the {line.Word} as 'value'");
        }
        else if (line.Rule.Signs != SignWords.None)
        {
            // Two marks of a burette cannot say dish or dome, and the program does not guess it.
            reading.Faults.Add(
                reading.Take(field)!,
                $"{line.Word} needs a word such as dish or dome; write it as 'value', or as 'crown fill' with its drop");
        }
    }

    private static void CheckSum(Fields reading, WhatLine line, List<Fill> fills)
    {
        double sumMm3 = fills.Sum(fill => fill.To.Value - fill.From.Value);
        bool judged = line.Rule.Signs == SignWords.None && line.Rule.Kinds.Contains(QuantityKind.Volume)
            && fills.All(fill => fill.To.Value >= fill.From.Value);
        if (judged && (sumMm3 < line.Rule.SaneLow || sumMm3 > line.Rule.SaneHigh))
        {
            string field = reading.Take("fills") is not null ? "fills" : "to";
            string range = string.Create(
                CultureInfo.InvariantCulture, $"{line.Rule.SaneLow / Mm3PerCc:0.###} to {line.Rule.SaneHigh / Mm3PerCc:0.###} cc");
            reading.Faults.Add(
                reading.Take(field)!,
                string.Create(
                    CultureInfo.InvariantCulture,
                    $"{sumMm3 / Mm3PerCc:0.###} cc in all is not a {line.Word} that can be ({range}); look for a slip"));
        }
    }
}
