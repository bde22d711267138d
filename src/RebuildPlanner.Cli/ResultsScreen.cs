using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using Spectre.Console;

namespace RebuildPlanner.Cli;

/// <summary>Lays results out for a screen or a pipe, 80 columns and up; it adds nothing to them.</summary>
internal static class ResultsScreen
{
    private const string Dash = "–";

    /// <summary>Shows the results.</summary>
    public static void Show(Job job, Results results, UnitSystem system, Terminal terminal)
    {
        IAnsiConsole console = terminal.Draw();
        Heading(console, job, results);
        Ratios(console, results, system);
        Bores(console, results, system);
        VolumesOf(console, results, system);
        Spreads(console, results, system);
        VerdictsOf(console, results);
        Missing(console, results);
        Origins(console, results);
        CautionsOf(console, results);
    }

    /// <summary>What is missing, a line a figure.</summary>
    public static IEnumerable<string> MissingLines(Results results) =>
        results.Missing.GroupBy(missing => missing.What)
            .Select(same => $"{same.Key}: {CylindersOf(same.Select(missing => missing.Cylinder), results)}");

    private static void Heading(IAnsiConsole console, Job job, Results results)
    {
        Line(console, $"[bold]Job {Escape(results.Job)}[/]  {Escape(job.Title ?? "")}");
        string engine = job.Engine.Description ?? $"{job.Engine.Cylinders} cylinders";
        Line(console, Escape(string.Join(", ", new[] { job.CustomerName, engine }.OfType<string>())));
        Line(console, $"Stage: [bold]{StageWords.Of(results.Stage)}[/]");
        console.WriteLine();
        Line(console, "95 %: the true figure lies between these with 95 % belief.");
        Line(console, "worst: between these even with every error at its limit at once.");
    }

    private static void Ratios(IAnsiConsole console, Results results, UnitSystem system)
    {
        Table table = NewTable("cyl", "ratio", "95 % from", "to", "worst from", "to", "trapped", $"cranking {QuantityPrint.Unit(QuantityKind.Pressure, system)}");
        foreach (CylinderResult cylinder in results.Cylinders)
        {
            Row(
                table, cylinder.Cylinder, Value(cylinder.CompressionRatio, system), End(cylinder.CompressionRatio, q => q.Low, system),
                End(cylinder.CompressionRatio, q => q.High, system), End(cylinder.CompressionRatio, q => q.WorstLow, system),
                End(cylinder.CompressionRatio, q => q.WorstHigh, system), Value(cylinder.TrappedRatio, system), Value(cylinder.CrankingPressure, system));
        }

        Write(console, "Compression ratio", table, results.Cylinders.Any(cylinder => cylinder.CompressionRatio is not null));
    }

    private static void Bores(IAnsiConsole console, Results results, UnitSystem system)
    {
        string unit = QuantityPrint.Unit(QuantityKind.Length, system);
        Table gaps = NewTable("cyl", "to head", "95 % from", "to", "worst from", "to");
        Table bores = NewTable("cyl", "bore", "95 % from", "to", "taper", "out-of-round");
        foreach (CylinderResult cylinder in results.Cylinders)
        {
            Row(
                gaps, cylinder.Cylinder, Value(cylinder.PistonToHead, system), End(cylinder.PistonToHead, q => q.Low, system),
                End(cylinder.PistonToHead, q => q.High, system), End(cylinder.PistonToHead, q => q.WorstLow, system),
                End(cylinder.PistonToHead, q => q.WorstHigh, system));
            Row(
                bores, cylinder.Cylinder, Value(cylinder.Bore, system), End(cylinder.Bore, q => q.Low, system),
                End(cylinder.Bore, q => q.High, system), Value(cylinder.Taper, system), Value(cylinder.OutOfRound, system));
        }

        Write(console, $"Piston to head, {unit}", gaps, results.Cylinders.Any(cylinder => cylinder.PistonToHead is not null));
        Write(console, $"Bores, {unit}", bores, results.Cylinders.Any(cylinder => cylinder.Bore is not null));
    }

    private static void VolumesOf(IAnsiConsole console, Results results, UnitSystem system)
    {
        string unit = QuantityPrint.Unit(QuantityKind.Volume, system);
        Table table = NewTable("cyl", "chamber", "gasket", "deck", "crown", "top land", "clearance", "swept");
        foreach (CylinderResult cylinder in results.Cylinders)
        {
            Row(
                table, cylinder.Cylinder, Value(cylinder.Chamber, system), Value(cylinder.Gasket, system), Value(cylinder.Deck, system),
                Value(cylinder.Crown, system), Value(cylinder.TopLand, system), Value(cylinder.ClearanceVolume, system), Value(cylinder.SweptVolume, system));
        }

        Write(console, $"Volumes, {unit}", table, results.Cylinders.Any(cylinder => (cylinder.Chamber ?? cylinder.SweptVolume ?? cylinder.Crown) is not null));
        foreach (CylinderResult cylinder in results.Cylinders.Where(cylinder => cylinder.CrossCheck is not null))
        {
            Line(console, Escape($"Cylinder {cylinder.Cylinder}: whole chamber less the sum of its parts {WithDoubt(cylinder.CrossCheck!, system)} {unit}."));
        }
    }

    private static void Spreads(IAnsiConsole console, Results results, UnitSystem system)
    {
        Table table = NewTable("", "value", "95 % from", "to", "worst from", "to");
        Add("displacement", results.Displacement);
        Add("spread of ratio", results.RatioSpread);
        Add("spread of chambers", results.ChamberSpread);
        table.Columns[0].LeftAligned();
        Write(console, "Engine", table, table.Rows.Count > 0);
        if (results.RatioSpread is { Low: <= 0.0 })
        {
            Line(console, "Between the ratios of the cylinders no difference is proven.");
        }

        void Add(string name, ResultQuantity? quantity)
        {
            if (quantity is not null)
            {
                string unit = QuantityPrint.Unit(quantity.Kind, system);
                Row(
                    table, unit.Length == 0 ? name : $"{name}, {unit}", Value(quantity, system), End(quantity, q => q.Low, system),
                    End(quantity, q => q.High, system), End(quantity, q => q.WorstLow, system), End(quantity, q => q.WorstHigh, system));
            }
        }
    }

    private static void VerdictsOf(IAnsiConsole console, Results results)
    {
        if (results.Verdicts.Count == 0)
        {
            return;
        }

        foreach (IGrouping<(string, string, double), Verdict> limit in results.Verdicts.GroupBy(verdict => (verdict.What, verdict.Limit, verdict.Level)))
        {
            (string what, string bounds, double level) = limit.Key;
            Table table = NewTable("cyl", "verdict", "belief", "would settle it");
            table.Columns[1].LeftAligned();
            table.Columns[3].LeftAligned();
            foreach (Verdict verdict in limit)
            {
                Row(
                    table, verdict.Cylinder ?? "all", ResultsJson.WordOf(verdict.State),
                    verdict.Probability is { } probability ? Belief(probability) : Dash, verdict.Settle ?? "");
            }

            Write(console, $"Limit: {what} {bounds} (belief wanted {Belief(level)})", table, known: true);
        }
    }

    private static void Missing(IAnsiConsole console, Results results)
    {
        if (results.Missing.Count > 0)
        {
            Section(console, "Missing");
            foreach (string line in MissingLines(results))
            {
                Bullet(console, line);
            }
        }
    }

    private static void Origins(IAnsiConsole console, Results results)
    {
        Section(console, "Where the figures come from");
        foreach (IGrouping<FigureKind, ProvenanceLine> kind in results.Provenance.GroupBy(line => line.Kind).OrderBy(kind => kind.Key))
        {
            IEnumerable<string> items = kind
                .GroupBy(line => (line.What, line.Stage, line.From, line.Gauge))
                .Select(same => Origin(same.Key.What, same.Key.Stage, same.Key.From, same.Key.Gauge, CylindersOf(same.Select(line => line.Cylinder), results), results.Stage));
            Bullet(console, $"{ResultsJson.WordOf(kind.Key)}: {string.Join("; ", items)}");
        }
    }

    private static string Origin(string what, Stage? stage, string? from, string? gauge, string cylinders, Stage asked)
    {
        string[] details =
        [
            .. new[] { from, gauge, stage is { } other && other != asked ? StageWords.Of(other) : null, cylinders == "all" ? null : $"cyl {cylinders}" }
                .OfType<string>(),
        ];
        return details.Length == 0 ? what : $"{what} ({string.Join(", ", details)})";
    }

    private static void CautionsOf(IAnsiConsole console, Results results)
    {
        Section(console, "Cautions");
        foreach (IGrouping<string, Caution> same in results.Cautions.GroupBy(caution => caution.Text))
        {
            string cylinders = CylindersOf(same.Select(caution => caution.Cylinder).OfType<string>(), results);
            Bullet(console, cylinders.Length == 0 || cylinders == "all" ? same.Key : $"Cylinder {cylinders}: {same.Key}");
        }
    }

    private static string CylindersOf(IEnumerable<string> labels, Results results)
    {
        string[] distinct = [.. labels.Distinct()];
        return distinct.Length == results.Cylinders.Count ? "all" : string.Join(", ", distinct);
    }

    private static string Value(ResultQuantity? quantity, UnitSystem system) =>
        quantity is null ? Dash : QuantityPrint.Number(quantity.Value, quantity.Kind, quantity.StandardUncertainty, system);

    private static string WithDoubt(ResultQuantity quantity, UnitSystem system) =>
        $"{Value(quantity, system)} (95 % from {End(quantity, q => q.Low, system)} to {End(quantity, q => q.High, system)})";

    private static string End(ResultQuantity? quantity, Func<ResultQuantity, double?> end, UnitSystem system) =>
        quantity is not null && end(quantity) is { } value ? QuantityPrint.Number(value, quantity.Kind, quantity.StandardUncertainty, system) : Dash;

    // A belief is never printed as certain: what rounds to 100 % is "over 99.9 %".
    private static string Belief(double probability) => probability switch
    {
        > 0.9995 => "> 99.9 %",
        < 0.0005 => "< 0.1 %",
        _ => string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{100.0 * probability:F1} %"),
    };

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
