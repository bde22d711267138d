using PdfSharp.Drawing;
using PdfSharp.Fonts;
using PdfSharp.Pdf;

namespace RebuildPlanner.Sheets.Pdf;

/// <summary>The type of every sheet, carried inside the program so that a sheet looks the same on any machine.</summary>
internal sealed class SheetFonts : IFontResolver
{
    private const string Family = "IBM Plex Sans", Regular = "IBMPlexSans-Regular.ttf", Bold = "IBMPlexSans-Bold.ttf";

    private static readonly XPdfFontOptions _options = new(PdfFontEncoding.Unicode);
    private static readonly Dictionary<(double, bool), XFont> _fonts = [];

    /// <summary>The library keeps its fonts for the whole process, so it is told once.</summary>
    static SheetFonts() => GlobalFontSettings.FontResolver = new SheetFonts();

    /// <summary>The font of a size.</summary>
    public static XFont Of(double sizePt, bool bold)
    {
        if (!_fonts.TryGetValue((sizePt, bold), out XFont? font))
        {
            font = new XFont(Family, sizePt, bold ? XFontStyleEx.Bold : XFontStyleEx.Regular, _options);
            _fonts.Add((sizePt, bold), font);
        }

        return font;
    }

    /// <inheritdoc/>
    public FontResolverInfo ResolveTypeface(string familyName, bool isBold, bool isItalic) => new(isBold ? Bold : Regular);

    /// <inheritdoc/>
    public byte[] GetFont(string faceName)
    {
        using Stream stream = typeof(SheetFonts).Assembly.GetManifestResourceStream(faceName)
            ?? throw new InvalidOperationException($"The font {faceName} is not in the program.");
        byte[] font = new byte[stream.Length];
        stream.ReadExactly(font);
        return font;
    }
}
