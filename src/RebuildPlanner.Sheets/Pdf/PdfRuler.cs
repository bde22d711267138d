using PdfSharp.Drawing;
using RebuildPlanner.Sheets.Pages;

namespace RebuildPlanner.Sheets.Pdf;

/// <summary>Measures text as the page's type sets it; the same word is measured once.</summary>
internal sealed class PdfRuler : ITextRuler
{
    private const double MmPerPt = 25.4 / 72.0;

    private readonly XGraphics _graphics = XGraphics.CreateMeasureContext(new XSize(1000.0, 1000.0), XGraphicsUnit.Point, XPageDirection.Downwards);
    private readonly Dictionary<(string, double, bool), double> _widthsMm = [];

    /// <inheritdoc/>
    public double WidthMm(string text, double sizePt, bool bold)
    {
        if (!_widthsMm.TryGetValue((text, sizePt, bold), out double widthMm))
        {
            widthMm = text.Length == 0 ? 0.0 : _graphics.MeasureString(text, SheetFonts.Of(sizePt, bold)).Width * MmPerPt;
            _widthsMm.Add((text, sizePt, bold), widthMm);
        }

        return widthMm;
    }
}
