using System.CommandLine;
using System.Globalization;
using RebuildPlanner.Store;
using Spectre.Console;

namespace RebuildPlanner.Cli;

/// <summary><c>jobs</c>: lists and finds the jobs of the store.</summary>
public static class JobsCommand
{
    private const int PerPage = 20;

    private const string Example = """
        Example:
          rebuild jobs --open --customer bakery
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Option<string> customer = new("--customer") { Description = "Part of the customer's name.", HelpName = "words" }, engine = new("--engine") { Description = "Part of the engine's words.", HelpName = "words" },
            text = new("--text") { Description = "Part of number, title, customer or engine.", HelpName = "words" };
        Option<bool> open = new("--open") { Description = "Open jobs only." }, closed = new("--closed") { Description = "Closed jobs only." };
        Option<int> page = new("--page") { Description = "Which page, from 1.", HelpName = "n", DefaultValueFactory = _ => 1 };
        StoreOption storeOption = new();
        ExampleCommand command = new("jobs", "Lists jobs, the last changed first.", Example) { customer, engine, text, open, closed, page };
        storeOption.AddTo(command);
        command.SetAction(parsed =>
        {
            bool? isClosed = parsed.GetValue(open) == parsed.GetValue(closed) ? null : parsed.GetValue(closed);
            JobFilter filter = new(parsed.GetValue(customer), parsed.GetValue(engine), isClosed, parsed.GetValue(text));
            int number = Math.Max(1, parsed.GetValue(page));
            using JobStore store = storeOption.Open(parsed, terminal);
            long count = store.Count(filter);
            IReadOnlyList<JobRow> rows = store.List(filter, (number - 1) * PerPage, PerPage);
            if (rows.Count == 0)
            {
                terminal.Output.WriteLine(count == 0 ? "No such job." : $"There are {(count + PerPage - 1) / PerPage} pages.");
                return ExitCode.Done;
            }

            Show(rows, terminal);
            terminal.Output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{count} jobs, page {number} of {(count + PerPage - 1) / PerPage}"));
            return ExitCode.Done;
        });
        return command;
    }

    private static void Show(IReadOnlyList<JobRow> rows, Terminal terminal)
    {
        Table table = new() { Border = TableBorder.Simple };
        foreach (string head in new[] { "job", "customer", "engine", "title", "last entry", "" })
        {
            table.AddColumn(new TableColumn(head).PadLeft(0).PadRight(1));
        }

        foreach (JobRow row in rows)
        {
            table.AddRow([.. new[] { row.Number, row.Customer, row.Engine, row.Title, row.Changed.LocalDateTime.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture), row.Closed ? "closed" : "" }.Select(cell => new Text(cell ?? ""))]);
        }

        terminal.Draw().Write(table);
    }
}
