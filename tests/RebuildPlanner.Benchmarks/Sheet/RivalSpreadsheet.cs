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
    private const int Cylinders = 8, RowsAPage = 46, PagesWanted = 4;

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
    public double Print() => ByTurns.Milliseconds(
        Program, $"-env:UserInstallation=file://{_folder}/profile", "--headless", "--convert-to", "pdf", "--outdir", _folder, _sheet);

    /// <summary>A flat OpenDocument sheet: a line a cylinder with bore, stroke, volumes and a ratio by formula, as often as fills the pages.</summary>
    private static string Text()
    {
        StringBuilder rows = new();
        for (int row = 1; row <= RowsAPage * PagesWanted; row++)
        {
            int cylinder = ((row - 1) % Cylinders) + 1;
            rows.Append("<table:table-row>");
            Number(rows, cylinder);
            Number(rows, 101.6 + (0.001 * row));
            Number(rows, 88.4);
            Number(rows, 63.4 + (0.1 * cylinder));
            Formula(rows, $"of:=PI()/4*[.B{row}]^2*[.C{row}]/1000");
            Formula(rows, $"of:=[.D{row}]+9.1");
            Formula(rows, $"of:=([.E{row}]+[.F{row}])/[.F{row}]");
            rows.Append("</table:table-row>");
        }

        return $"""
            <?xml version="1.0" encoding="UTF-8"?>
            <office:document xmlns:office="urn:oasis:names:tc:opendocument:xmlns:office:1.0" xmlns:table="urn:oasis:names:tc:opendocument:xmlns:table:1.0"
              xmlns:text="urn:oasis:names:tc:opendocument:xmlns:text:1.0" xmlns:of="urn:oasis:names:tc:opendocument:xmlns:of:1.2" office:version="1.3"
              office:mimetype="application/vnd.oasis.opendocument.spreadsheet">
            <office:body><office:spreadsheet><table:table table:name="engine">{rows}</table:table></office:spreadsheet></office:body></office:document>
            """;
    }

    private static void Number(StringBuilder rows, double value) =>
        rows.Append(CultureInfo.InvariantCulture, $"<table:table-cell office:value-type=\"float\" office:value=\"{value:0.###}\"/>");

    private static void Formula(StringBuilder rows, string formula) =>
        rows.Append(CultureInfo.InvariantCulture, $"<table:table-cell office:value-type=\"float\" table:formula=\"{formula}\"/>");
}
