using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Pages;

namespace RebuildPlanner.Sheets.Templates;

/// <summary>The shop, and how it likes its sheets.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Address">Its address, line by line.</param>
/// <param name="Contact">How to reach it, or null.</param>
/// <param name="Paper">Its paper.</param>
/// <param name="Units">Its units.</param>
public sealed record Shop(string Name, IReadOnlyList<string> Address, string? Contact, Paper Paper, UnitSystem Units)
{
    private const string Format = "rebuild-planner-shop";

    private static readonly string[] _units = ["mm", "inch"];

    /// <summary>Reads a shop's file.</summary>
    /// <param name="utf8">The file's bytes.</param>
    /// <returns>The shop with no faults, or no shop and every fault.</returns>
    public static (Shop? Shop, IReadOnlyList<Fault> Faults) Read(ReadOnlySpan<byte> utf8) => TemplateReader.Read(utf8, Format, file => new Shop(
        file.Text("name", required: true) ?? "",
        [.. file.List("address").Select(line => line.Kind == JsonKind.Text ? line.Text : NotText(file, line))],
        file.Text("contact"),
        Paper.Find(Word(file, "paper", [.. Paper.All.Select(paper => paper.Word)])) ?? Paper.A4,
        Word(file, "units", _units) == _units[1] ? UnitSystem.Inch : UnitSystem.Metric));

    private static string NotText(Fields file, JsonTree line)
    {
        file.Faults.Add(line, "a line of the address is text in double quotes");
        return "";
    }

    private static string Word(Fields file, string name, string[] words)
    {
        string? typed = file.Text(name);
        if (typed is not null && !words.Contains(typed))
        {
            file.Faults.Add(file.Take(name)!, Wording.Unknown("word", typed, words));
        }

        return typed ?? words[0];
    }
}
