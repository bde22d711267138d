using System.Globalization;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using Spectre.Console;

namespace RebuildPlanner.Cli;

/// <summary>Lays results out for a screen or a pipe, 80 columns and up; it adds nothing to them.</summary>
internal static class ResultsScreen
{
    /// <summary>Shows the results.</summary>
    public static void Show(Job job, Results results, UnitSystem system, Terminal terminal)
    {
        IAnsiConsole console = terminal.Draw();
        ResultsText text = new(results, system);
        Heading(console, job, results, text);
        Ratios(console, results, text);
        Trials(console, results);
        Bores(console, results, text);
        VolumesOf(console, results, text);
        Spreads(console, results, text);
        VerdictsOf(console, results);
        Missing(console, text);
        Origins(console, results, text);
        CautionsOf(console, text);
    }

    private static void Heading(IAnsiConsole console, Job job, Results results, ResultsText text)
    {
        Line(console, $"[bold]Job {Escape(results.Job)}[/]  {Escape(job.Title ?? "")}");
        string engine = job.Engine.Description ?? $"{job.Engine.Cylinders} cylinders";
        Line(console, Escape(string.Join(", ", new[] { job.CustomerName, engine }.OfType<string>())));
        Line(console, $"Stage: [bold]{StageWords.Of(results.Stage)}[/]");
        console.WriteLine();
        Line(console, "95 %: the true figure lies between these with 95 % belief.");
        Line(console, "worst: between these even with every error at its limit at once.");
        foreach (string method in text.Method())
        {
            Line(console, Escape(method));
        }
    }

    private static void Ratios(IAnsiConsole console, Results results, ResultsText text)
    {
        Table table = NewTable("cyl", "ratio", "95 % from", "to", "worst from", "to", "trapped", $"cranking {text.Unit(QuantityKind.Pressure)}");
        foreach (CylinderResult cylinder in results.Cylinders)
        {
            Row(
                table, cylinder.Cylinder, text.Value(cylinder.CompressionRatio), text.End(cylinder.CompressionRatio, q => q.Low),
                text.End(cylinder.CompressionRatio, q => q.High), text.End(cylinder.CompressionRatio, q => q.WorstLow),
                text.End(cylinder.CompressionRatio, q => q.WorstHigh), text.Value(cylinder.TrappedRatio), text.Value(cylinder.CrankingPressure));
        }

        Write(console, "Compression ratio", table, results.Cylinders.Any(cylinder => cylinder.CompressionRatio is not null));
    }

    // Eighths of a letter's height, the fullest part of any cylinder eight of them.
    private static void Trials(IAnsiConsole console, Results results)
    {
        const string Eighths = " ▁▂▃▄▅▆▇█";
        if (results.RatioPicture is not { } picture)
        {
            return;
        }

        double most = picture.Shares.OfType<IReadOnlyList<double>>().Max(shares => shares.Max());
        Table table = NewTable("cyl", string.Create(CultureInfo.InvariantCulture, $"{picture.From:F2}"), string.Create(CultureInfo.InvariantCulture, $"{picture.To:F2}"));
        table.Columns[1].LeftAligned();
        for (int cylinder = 0; cylinder < picture.Shares.Count; cylinder++)
        {
            if (picture.Shares[cylinder] is { } shares)
            {
                Row(table, results.Cylinders[cylinder].Cylinder, string.Concat(shares.Select(share => Eighths[(int)Math.Ceiling(share / most * (Eighths.Length - 1) - 1e-9)])), "");
            }
        }

        Write(console, "Ratio, as the trials fell", table, known: true);
    }

    private static void Bores(IAnsiConsole console, Results results, ResultsText text)
    {
        string unit = text.Unit(QuantityKind.Length);
        Table gaps = NewTable("cyl", "to head", "95 % from", "to", "worst from", "to");
        Table bores = NewTable("cyl", "bore", "95 % from", "to", "taper", "out-of-round");
        foreach (CylinderResult cylinder in results.Cylinders)
        {
            Row(
                gaps, cylinder.Cylinder, text.Value(cylinder.PistonToHead), text.End(cylinder.PistonToHead, q => q.Low),
                text.End(cylinder.PistonToHead, q => q.High), text.End(cylinder.PistonToHead, q => q.WorstLow),
                text.End(cylinder.PistonToHead, q => q.WorstHigh));
            Row(
                bores, cylinder.Cylinder, text.Value(cylinder.Bore), text.End(cylinder.Bore, q => q.Low),
                text.End(cylinder.Bore, q => q.High), text.Value(cylinder.Taper), text.Value(cylinder.OutOfRound));
        }

        Write(console, $"Piston to head, {unit}", gaps, results.Cylinders.Any(cylinder => cylinder.PistonToHead is not null));
        Write(console, $"Bores, {unit}", bores, results.Cylinders.Any(cylinder => cylinder.Bore is not null));
    }

    private static void VolumesOf(IAnsiConsole console, Results results, ResultsText text)
    {
        string unit = text.Unit(QuantityKind.Volume);
        Table table = NewTable("cyl", "chamber", "gasket", "deck", "crown", "top land", "clearance", "swept");
        foreach (CylinderResult cylinder in results.Cylinders)
        {
            Row(
                table, cylinder.Cylinder, text.Value(cylinder.Chamber), text.Value(cylinder.Gasket), text.Value(cylinder.Deck),
                text.Value(cylinder.Crown), text.Value(cylinder.TopLand), text.Value(cylinder.ClearanceVolume), text.Value(cylinder.SweptVolume));
        }

        Write(console, $"Volumes, {unit}", table, results.Cylinders.Any(cylinder => (cylinder.Chamber ?? cylinder.SweptVolume ?? cylinder.Crown) is not null));
        foreach (CylinderResult cylinder in results.Cylinders.Where(cylinder => cylinder.CrossCheck is not null))
        {
            ResultQuantity check = cylinder.CrossCheck!;
            Line(console, Escape(
                $"Cylinder {cylinder.Cylinder}: whole chamber less the sum of its parts {text.Value(check)} "
                + $"(95 % from {text.End(check, q => q.Low)} to {text.End(check, q => q.High)}) {unit}."));
        }
    }

    private static void Spreads(IAnsiConsole console, Results results, ResultsText text)
    {
        Table table = NewTable("", "value", "95 % from", "to", "worst from", "to");
        Add("displacement", results.Displacement);
        Add("spread of ratio", results.RatioSpread);
        Add("spread of chambers", results.ChamberSpread);
        table.Columns[0].LeftAligned();
        Write(console, "Engine", table, table.Rows.Count > 0);
        if (results.RatiosDiffer == false)
        {
            Line(console, "Between the ratios of the cylinders no difference is proven.");
        }

        void Add(string name, ResultQuantity? quantity)
        {
            if (quantity is not null)
            {
                string unit = text.Unit(quantity.Kind);
                Row(
                    table, unit.Length == 0 ? name : $"{name}, {unit}", text.Value(quantity), text.End(quantity, q => q.Low),
                    text.End(quantity, q => q.High), text.End(quantity, q => q.WorstLow), text.End(quantity, q => q.WorstHigh));
            }
        }
    }

    private static void VerdictsOf(IAnsiConsole console, Results results)
    {
        if (results.Verdicts.Count == 0)
        {
            return;
        }

        foreach (IGrouping<int, Verdict> limit in results.Verdicts.GroupBy(verdict => verdict.Number))
        {
            Verdict first = limit.First();
            string name = string.Join(", ", ResultsText.PartsOf(first.Place).Prepend($"{first.What} {first.Limit}"));
            Table table = NewTable("cyl", "verdict", "belief", "would settle it");
            table.Columns[1].LeftAligned();
            table.Columns[3].LeftAligned();
            foreach (Verdict verdict in limit)
            {
                Row(
                    table, verdict.Cylinder ?? "all", ResultsJson.WordOf(verdict.State),
                    ResultsText.Belief(verdict.Probability), verdict.Settle ?? "");
            }

            Write(console, $"Limit: {name} (belief wanted {ResultsText.Level(first.Level)})", table, known: true);
        }
    }

    private static void Missing(IAnsiConsole console, ResultsText text)
    {
        string[] lines = [.. text.Missing()];
        if (lines.Length > 0)
        {
            Section(console, "Missing");
            foreach (string line in lines)
            {
                Bullet(console, line);
            }
        }
    }

    private static void Origins(IAnsiConsole console, Results results, ResultsText text)
    {
        Section(console, "Where the figures come from");
        foreach (IGrouping<FigureKind, ProvenanceLine> kind in results.Provenance.GroupBy(line => line.Kind).OrderBy(kind => kind.Key))
        {
            IEnumerable<string> items = kind
                .GroupBy(line => (line.What, line.Stage, line.From, line.Gauge))
                .Select(same => Origin(same.Key.What, same.Key.Stage, same.Key.From, same.Key.Gauge, text.Cylinders(same.Select(line => line.Cylinder)), results.Stage));
            Bullet(console, $"{ResultsJson.WordOf(kind.Key)}: {string.Join("; ", items)}");
        }
    }

    private static string Origin(string what, Stage? stage, string? from, string? gauge, string cylinders, Stage asked)
    {
        string[] details =
        [
            .. new[] { from, gauge, stage is { } other && other != asked ? StageWords.Of(other) : null, cylinders == ResultsText.All ? null : $"cyl {cylinders}" }
                .OfType<string>(),
        ];
        return details.Length == 0 ? what : $"{what} ({string.Join(", ", details)})";
    }

    private static void CautionsOf(IAnsiConsole console, ResultsText text)
    {
        Section(console, "Cautions");
        foreach (string caution in text.Cautions())
        {
            Bullet(console, caution);
        }
    }

    private static Table NewTable(params string[] columns)
    {
        Table table = new() { Border = TableBorder.Simple };
        foreach (string column in columns)
        {
            table.AddColumn(new TableColumn(Escape(column)).RightAligned().PadLeft(0).PadRight(1));
        }

        return table;
    }

    private static void Row(Table table, params string[] cells) => table.AddRow([.. cells.Select(cell => new Text(cell))]);

    /// <summary>Writes a table under its title, unless nothing in it is known.</summary>
    private static void Write(IAnsiConsole console, string title, Table table, bool known)
    {
        if (known)
        {
            Section(console, title);
            console.Write(table);
        }
    }

    private static void Section(IAnsiConsole console, string title)
    {
        console.WriteLine();
        Line(console, $"[bold]{Escape(title)}[/]");
    }

    private static void Bullet(IAnsiConsole console, string text)
    {
        Grid grid = new();
        grid.AddColumn(new GridColumn().NoWrap().PadLeft(1).PadRight(1));
        grid.AddColumn(new GridColumn().PadLeft(0).PadRight(0));
        grid.AddRow(new Text("-"), new Text(text));
        console.Write(grid);
    }

    private static void Line(IAnsiConsole console, string markup) => console.MarkupLine(markup);

    private static string Escape(string text) => Markup.Escape(text);
}
