using System.Globalization;
using System.Text;

namespace RebuildPlanner.Benchmarks;

/// <summary>
/// The rival of the sheet: a spreadsheet as a shop might keep one, with its figures in and its formulas ready, printed without a window by
/// <c>soffice --headless --convert-to pdf</c>. Its own start is what it is; its first start, which makes a profile, does not count.
/// </summary>
internal sealed class RivalSpreadsheet
{
    private const string Program = "soffice";

    // As many lines as one page holds at the height the program gives a row by itself: a heading and the rest.
    private const int Cylinders = 8, LinesAPage = 46;

    private readonly string _folder;
    private readonly string _sheet;

    private RivalSpreadsheet(string folder) => (_folder, _sheet) = (folder, Path.Combine(folder, "rival.fods"));

    /// <summary>The PDF it prints.</summary>
    public string Printed => Path.Combine(_folder, "rival.pdf");

    /// <summary>The rival with its sheet written and its profile made, or null where the program is not installed.</summary>
    public static RivalSpreadsheet? Prepare(string folder)
    {
        RivalSpreadsheet rival = new(folder);
        File.WriteAllText(rival._sheet, Text());
        try
        {
            rival.Print();
            return rival;
        }
        catch (System.ComponentModel.Win32Exception)
        {
            return null;
        }
    }

    /// <summary>Prints the sheet; the time of the whole process, ms.</summary>
    /// <exception cref="InvalidOperationException">It printed nothing.</exception>
    public double Print()
    {
        // The program ends with 0 also when it could not print: only a file that was not there before shows that it did.
        File.Delete(Printed);
        double time = ByTurns.Milliseconds(
            Program, $"-env:UserInstallation={new Uri(Path.Combine(_folder, "profile")).AbsoluteUri}", "--headless", "--convert-to", "pdf", "--outdir", _folder, _sheet);
        return File.Exists(Printed) ? time : throw new InvalidOperationException($"{Program} printed nothing.");
    }

    /// <summary>A flat OpenDocument sheet of four tables, a page each, of the kinds a build sheet has; volumes and verdicts by formula.</summary>
    private static string Text()
    {
        string tables =
            Table("cylinders", ["cylinder", "bore", "stroke", "deck", "chamber", "piston", "gasket"], (line, cylinder) =>
                Number(cylinder) + Number(101.6 + (0.001 * line)) + Number(88.4) + Number(0.21 + (0.01 * cylinder)) + Number(63.4 + (0.1 * cylinder)) + Number(5) + Number(1))
            + Table("volumes", ["cylinder", "swept", "gasket", "deck", "clearance", "ratio"], (line, cylinder) =>
                Number(cylinder)
                + Formula($"PI()/4*[cylinders.B{line}]^2*[cylinders.C{line}]/1000")
                + Formula($"PI()/4*103.5^2*[cylinders.G{line}]/1000")
                + Formula($"PI()/4*[cylinders.B{line}]^2*[cylinders.D{line}]/1000")
                + Formula($"[cylinders.E{line}]+[cylinders.F{line}]+[.C{line}]+[.D{line}]")
                + Formula($"([.B{line}]+[.E{line}])/[.E{line}]"))
            + Table("verdicts", ["cylinder", "limit", "least", "most", "is", "verdict"], (line, cylinder) =>
                Number(cylinder) + Words("ratio") + Number(8.6) + Number(10) + Formula($"[volumes.F{line}]")
                + Formula($"IF(AND([.E{line}]&gt;=[.C{line}];[.E{line}]&lt;=[.D{line}]);&quot;holds&quot;;&quot;outside&quot;)"))
            + Table("origins", ["cylinder", "figure", "value", "gauge", "stage", "how"], (line, cylinder) =>
                Number(cylinder) + Words("bore") + Formula($"[cylinders.B{line}]") + Words("bore gauge") + Words("machined") + Words("measured"));

        return $"""
            <?xml version="1.0" encoding="UTF-8"?>
            <office:document xmlns:office="urn:oasis:names:tc:opendocument:xmlns:office:1.0" xmlns:table="urn:oasis:names:tc:opendocument:xmlns:table:1.0"
              xmlns:text="urn:oasis:names:tc:opendocument:xmlns:text:1.0" xmlns:of="urn:oasis:names:tc:opendocument:xmlns:of:1.2" office:version="1.3"
              office:mimetype="application/vnd.oasis.opendocument.spreadsheet">
            <office:body><office:spreadsheet>{tables}</office:spreadsheet></office:body></office:document>
            """;
    }

    private static string Table(string name, string[] heading, Func<int, int, string> cells)
    {
        StringBuilder rows = new();
        rows.Append(CultureInfo.InvariantCulture, $"<table:table table:name=\"{name}\">{Row(string.Concat(heading.Select(Words)))}");
        for (int line = 2; line <= LinesAPage; line++)
        {
            rows.Append(Row(cells(line, ((line - 2) % Cylinders) + 1)));
        }

        return rows.Append("</table:table>").ToString();
    }

    private static string Row(string cells) => $"<table:table-row>{cells}</table:table-row>";

    private static string Words(string words) => $"<table:table-cell office:value-type=\"string\"><text:p>{words}</text:p></table:table-cell>";

    private static string Number(double value) =>
        string.Create(CultureInfo.InvariantCulture, $"<table:table-cell office:value-type=\"float\" office:value=\"{value:0.###}\"/>");

    // Without a value beside it, so that the program has to compute it.
    private static string Formula(string formula) => $"<table:table-cell table:formula=\"of:={formula}\"/>";
}
