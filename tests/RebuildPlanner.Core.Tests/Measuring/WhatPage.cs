using System.Globalization;
using System.Text;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Tests.Measuring;

/// <summary>Writes the table of docs/what.md from the code.</summary>
internal static class WhatPage
{
    public const string Start = "<!-- table: start -->";
    public const string End = "<!-- table: end -->";

    public static string Table()
    {
        StringBuilder table = new();
        table.Append("| what | unit | closing word | range taken | keys | belongs to |\n|---|---|---|---|---|---|\n");
        foreach (WhatLine line in WhatTable.Lines)
        {
            string[] cells = [line.Word, Units(line.Rule), Words(line.Rule.Signs), Range(line.Rule), Keys(line), Owner(line.Belongs)];
            table.Append("| ").AppendJoin(" | ", cells).Append(" |\n");
        }

        return table.ToString();
    }

    private static string Units(QuantityRule rule) => string.Join("; ", rule.Kinds.Select(kind => kind switch
    {
        QuantityKind.Length => "length: mm, in, thou",
        QuantityKind.Area => "area: mm2, cm2, in2",
        QuantityKind.Volume => "volume: cc, mL, cu in",
        _ => throw new InvalidOperationException($"{kind} has no words on this page yet."),
    }));

    private static string Words(SignWords signs) => signs switch
    {
        SignWords.None => "–",
        SignWords.Protrusion => "proud (or none), below, flush",
        _ => string.Join(", ", SignWordTable.Words(signs)),
    };

    private static string Range(QuantityRule rule) => string.Join("; ", rule.Kinds.Select(kind => kind switch
    {
        QuantityKind.Area when rule.Kinds.Count > 1 => Span(rule.AreaLow, rule.AreaHigh, 1.0, "mm2", rule.Signs),
        QuantityKind.Area => Span(rule.SaneLow, rule.SaneHigh, 1.0, "mm2", rule.Signs),
        QuantityKind.Volume => Span(rule.SaneLow, rule.SaneHigh, 1000.0, "cc", rule.Signs),
        _ => Span(rule.SaneLow, rule.SaneHigh, 1.0, "mm", rule.Signs),
    }));

    private static string Span(double low, double high, double scale, string unit, SignWords signs) =>
        $"{Bound(low / scale, signs)} to {Bound(high / scale, signs, unit)}";

    private static string Bound(double value, SignWords signs, string unit = "")
    {
        string number = (signs == SignWords.None ? value : Math.Abs(value)).ToString(CultureInfo.InvariantCulture);
        return string.Join(' ', new[] { number, unit, SignWordTable.Word(signs, value) }.Where(part => part.Length > 0));
    }

    private static string Keys(WhatLine line)
    {
        string cylinder = line.NeedsCylinder ? "**cylinder**" : "cylinder";
        List<string> keys = [line.MayBePiece && line.NeedsCylinder ? "**cylinder** or **piece**" : cylinder];
        Add(line.MayBePiece && !line.NeedsCylinder, "piece");
        Add(line.Belongs == Belongs.Head, "head");
        Add(line.Belongs == Belongs.Bank, "bank");
        Add(line.Keys.HasFlag(PlaceKeys.Depth), "at (top, middle, bottom)");
        Add(line.Keys.HasFlag(PlaceKeys.PinEnd), "at (front, rear)");
        Add(line.Keys.HasFlag(PlaceKeys.Axis), "axis");
        Add(line.Keys.HasFlag(PlaceKeys.Valve), "valve");
        Add(line.Keys.HasFlag(PlaceKeys.Clock), "clock");
        Add(line.Keys.HasFlag(PlaceKeys.Drop), "**drop**");
        return string.Join(", ", keys);

        void Add(bool allowed, string key)
        {
            if (allowed)
            {
                keys.Add(key);
            }
        }
    }

    private static string Owner(Belongs belongs) => belongs switch
    {
        Belongs.Engine => "engine",
        Belongs.Bank => "bank",
        Belongs.Head => "head",
        _ => "cylinder",
    };
}
