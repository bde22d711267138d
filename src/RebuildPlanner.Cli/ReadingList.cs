using System.CommandLine;
using System.Globalization;
using System.Text;
using nietras.SeparatedValues;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary>Many readings as a list of comma-separated values, RFC 4180: printed blank for an engine, filled in, and read back.</summary>
internal static class ReadingList
{
    private static readonly string[] _columns =
        ["what", "cylinder", "piece", "head", "bank", "at", "axis", "valve", "clock", "value", "from", "to", "drop", "gauge", "temperature", "torquePlate", "stage", "by", "when", "id"];

    /// <summary>The blank list of what is left to read at a stage.</summary>
    public static string Blank(Job job, Stage stage)
    {
        StringBuilder list = new();
        list.AppendJoin(',', _columns).Append('\n');
        foreach (RoundPlace place in Round.Left(job, stage))
        {
            Dictionary<string, string> cells = PlaceWords.Fields(place.Place).ToDictionary(field => field.Name, field => field.Value);
            cells["what"] = WhatWords.Of(place.What);
            cells["stage"] = StageWords.Of(stage);
            list.AppendJoin(',', _columns.Select(column => Quoted(cells.GetValueOrDefault(column, "")))).Append('\n');
        }

        return list.ToString();
    }

    /// <summary>Writes the readings of a list, all or none; rows without a figure are left out.</summary>
    public static int Import(JobStore store, string number, string path, ParseResult parsed, WriteOptions write, Terminal terminal)
    {
        if (InputFile.Read(path, "a list of readings", terminal.Error) is not { } bytes)
        {
            return ExitCode.Wrong;
        }

        List<(int Line, string[] Cells)> rows = Rows(Encoding.UTF8.GetString(bytes).TrimStart('\uFEFF'));
        if (rows.Count == 0)
        {
            terminal.Error.WriteLine($"{path}: the list is empty; --blank-csv prints one to fill in.");
            return ExitCode.Wrong;
        }

        string[] heads = [.. rows[0].Cells.Select(cell => cell.Trim())];
        if (heads.FirstOrDefault(head => !_columns.Contains(head)) is { } unknown)
        {
            string? near = Core.Quantities.NearestWord.Of(unknown, _columns);
            terminal.Error.WriteLine($"{path}, line 1: {unknown}: there is no such column{(near is null ? "" : $"; did you mean {near}?")} There are {string.Join(", ", _columns)}.");
            return ExitCode.Wrong;
        }

        Entry pattern = write.Entry(EntryKind.Reading, "{}", parsed, terminal);
        List<(int Line, Entry Entry)> readings = [];
        foreach ((int line, string[] cells) in rows.Skip(1))
        {
            if (cells.Length > heads.Length)
            {
                terminal.Error.WriteLine($"{path}, line {line}: {cells.Length} cells under {heads.Length} heads; a cell with a comma in it stands in double quotes. Nothing was written.");
                return ExitCode.Wrong;
            }

            Dictionary<string, string> filled = heads.Zip(cells, (head, cell) => (head, Cell: cell.Trim())).Where(pair => pair.Cell.Length > 0).ToDictionary(pair => pair.head, pair => pair.Cell);
            if (filled.ContainsKey("value") || filled.ContainsKey("from") || filled.ContainsKey("to"))
            {
                readings.Add((line, pattern with { Key = $"{pattern.Key}-{line.ToString(CultureInfo.InvariantCulture)}", Body = Body(filled) }));
            }
        }

        return Write(store, number, readings, path, terminal);
    }

    private static int Write(JobStore store, string number, List<(int Line, Entry Entry)> readings, string path, Terminal terminal)
    {
        if (readings.Count == 0)
        {
            terminal.Output.WriteLine($"{path}: no figure is filled in yet; nothing was written.");
            return ExitCode.Done;
        }

        // Every fault is told with the line it stands in.
        Dictionary<string, int> lines = readings.ToDictionary(reading => reading.Entry.Key, reading => reading.Line);
        string? Where(Entry entry) => lines.TryGetValue(entry.Key, out int line) ? $"{path}, line {line}" : null;
        if (Readings.Write(store, number, [.. readings.Select(reading => reading.Entry)], path, terminal, Where) is not { } written)
        {
            return ExitCode.Wrong;
        }

        terminal.Output.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{readings.Count} readings"));
        return Readings.Say(written, terminal);
    }

    private static string Body(Dictionary<string, string> cells) => JsonText.Write(body =>
    {
        body.WriteStartObject();
        foreach (string column in _columns.Where(cells.ContainsKey))
        {
            string cell = cells[column];
            if (column == "torquePlate" && cell is "yes" or "no" or "true" or "false")
            {
                body.WriteBoolean(column, cell is "yes" or "true");
            }
            else if (column == "clock" && decimal.TryParse(cell, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out decimal hours))
            {
                body.WriteNumber(column, hours);
            }
            else
            {
                body.WriteString(column, cell);
            }
        }

        body.WriteEndObject();
    });

    private static string Quoted(string cell) =>
        cell.AsSpan().IndexOfAny(",\"\n") < 0 ? cell : $"\"{cell.Replace("\"", "\"\"", StringComparison.Ordinal)}\"";

    /// <summary>The rows with the line each begins on; commas, semicolons or tabs part the cells, as the first line has them.</summary>
    private static List<(int Line, string[] Cells)> Rows(string text)
    {
        using SepReader reader = Sep.Reader(options => options with { HasHeader = false, Unescape = true, DisableColCountCheck = true }).FromText(text);
        List<(int Line, string[] Cells)> rows = [];
        foreach (SepReader.Row row in reader)
        {
            string[] cells = new string[row.ColCount];
            for (int column = 0; column < cells.Length; column++)
            {
                cells[column] = row[column].ToString();
            }

            if (Array.Exists(cells, cell => cell.Trim().Length > 0))
            {
                rows.Add((row.LineNumberFrom, cells));
            }
        }

        return rows;
    }
}
