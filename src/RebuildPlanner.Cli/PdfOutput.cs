using System.CommandLine;
using System.Text;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Pdf;

namespace RebuildPlanner.Cli;

/// <summary>Where a printed sheet goes.</summary>
internal static class PdfOutput
{
    /// <summary>The option that says where.</summary>
    public static Option<string> Option() => new("--out") { Description = "The PDF to write.", HelpName = "sheet.pdf", Required = true };

    /// <summary>Writes a sheet and gives its bytes; null after the reason has been written.</summary>
    public static byte[]? Write(Sheet sheet, string path, Terminal terminal)
    {
        byte[] pdf = PdfSheet.Write(sheet, out IReadOnlyList<Rune> unprintable);
        if (!Write(pdf, path, terminal))
        {
            return null;
        }

        if (unprintable.Count > 0)
        {
            string list = string.Join(", ", unprintable.Select(rune => $"{rune} (U+{rune.Value:X4})"));
            terminal.Error.WriteLine($"{path}: the type has no shape for {list}; an empty box stands there. The job file inside has them right.");
        }

        return pdf;
    }

    /// <summary>Writes a PDF as it is; false after the reason has been written.</summary>
    public static bool Write(byte[] pdf, string path, Terminal terminal) => OutputFile.WriteAndSay(path, pdf, "%PDF-"u8, terminal);
}
