using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>banks</c> and <c>heads</c>: every cylinder stands in exactly one of each.</summary>
internal static class RowSection
{
    private const string LoneBank = "block";
    private const string LoneHead = "head";

    public static (EquatableList<Bank>? Banks, EquatableList<Head>? Heads) Read(Fields engine, Layout layout, EquatableList<string>? labels)
    {
        EquatableList<Bank>? banks = ReadRows(engine, "banks", labels, (fields, label, cylinders) => new Bank(label, cylinders));
        EquatableList<Head>? heads = ReadRows(
            engine, "heads", labels,
            (fields, label, cylinders) => new Head(
                label, cylinders, fields.Word("metal", JobWords.Metals), fields.Quantity("intakeFaceAngle", EngineRules.IntakeFaceAngle)));

        bool several = layout is Layout.Vee or Layout.Flat && labels is { Count: > 1 };
        bool banksLeftOut = engine.Take("banks") is null;
        if (several && banksLeftOut)
        {
            engine.Missing("banks", $"a {JobWords.Layouts.WordFor(layout)} engine has several banks; say which cylinders stand in which");
        }
        else if (several && banks is { Count: 1 })
        {
            engine.Faults.Add(engine.Take("banks")!, $"a {JobWords.Layouts.WordFor(layout)} engine has several banks, and one is written");
        }

        if (labels is not null && !several)
        {
            banks ??= banksLeftOut ? [new Bank(LoneBank, labels)] : null;
        }

        if (engine.Take("heads") is null && banks is not null)
        {
            heads = [.. banks.Select(bank => new Head(banks.Count == 1 ? LoneHead : bank.Label, bank.Cylinders))];
        }

        return (banks, heads);
    }

    private static EquatableList<TRow>? ReadRows<TRow>(
        Fields engine, string name, EquatableList<string>? labels, Func<Fields, string, EquatableList<string>, TRow> make)
    {
        if (engine.Take(name) is not { } written)
        {
            return null;
        }

        int before = engine.Faults.Count;
        Dictionary<string, string> rowOf = [];
        HashSet<string> rowLabels = [];
        List<TRow> rows = [];
        foreach (JsonTree item in engine.List(name))
        {
            if (Fields.Open(item, engine.Faults, $"each of '{name}'") is not { } fields)
            {
                continue;
            }

            string? label = fields.Label("label", required: true);
            if (label is not null && !rowLabels.Add(label))
            {
                engine.Faults.Add(fields.Take("label")!, $"'{label}' is the label of another one already; each label once");
            }

            EquatableList<string> cylinders = ReadCylinders(fields, label ?? "?", labels, rowOf);
            rows.Add(make(fields, label ?? "", cylinders));
            fields.Close();
        }

        if (labels is not null && written.Kind == JsonKind.List && engine.Faults.Count == before
            && labels.Where(label => !rowOf.ContainsKey(label)).ToList() is { Count: > 0 } left)
        {
            engine.Faults.Add(written, $"cylinder {Wording.Listed(left)} stands in none of '{name}'; every cylinder stands in exactly one");
        }

        return engine.Faults.Count == before ? [.. rows] : null;
    }

    private static EquatableList<string> ReadCylinders(
        Fields fields, string row, EquatableList<string>? labels, Dictionary<string, string> rowOf)
    {
        if (fields.Take("cylinders", required: true) is not { } written || LabelList.Read(fields, "cylinders") is not { } cylinders)
        {
            return [];
        }

        if (cylinders.Count == 0)
        {
            fields.Faults.Add(written, "at least one cylinder stands here");
        }

        foreach (JsonTree item in labels is null ? [] : written.Items)
        {
            if (!labels!.Contains(item.Text))
            {
                fields.Faults.Add(item, Wording.Unknown("cylinder", item.Text, labels!));
            }
            else if (!rowOf.TryAdd(item.Text, row))
            {
                fields.Faults.Add(item, $"cylinder {item.Text} stands in '{rowOf[item.Text]}' already; every cylinder stands in exactly one");
            }
        }

        return cylinders;
    }
}
