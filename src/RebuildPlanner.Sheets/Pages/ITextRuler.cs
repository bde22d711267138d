namespace RebuildPlanner.Sheets.Pages;

/// <summary>Measures a line of text as the page's type sets it.</summary>
public interface ITextRuler
{
    /// <summary>Its width, mm.</summary>
    /// <param name="text">The text.</param>
    /// <param name="sizePt">Type size, pt.</param>
    /// <param name="bold">Whether bold.</param>
    double WidthMm(string text, double sizePt, bool bold);
}
