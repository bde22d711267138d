using System.Globalization;
using System.Text;
using System.Xml;

namespace RebuildPlanner.Sheets.Drawing;

/// <summary>Writes a figure as SVG, in millimetres, to scale. Source: svg11 (shapes, text).</summary>
public static class Svg
{
    private const double MmPerPt = 25.4 / 72.0;

    /// <summary>The SVG text.</summary>
    public static string Write(Picture picture)
    {
        StringBuilder text = new();
        XmlWriterSettings settings = new() { Indent = true, NewLineChars = "\n", OmitXmlDeclaration = true };
        using (XmlWriter xml = XmlWriter.Create(text, settings))
        {
            xml.WriteStartElement("svg", "http://www.w3.org/2000/svg");
            Attribute(xml, "width", $"{Number(picture.WidthMm)}mm");
            Attribute(xml, "height", $"{Number(picture.HeightMm)}mm");
            Attribute(xml, "viewBox", $"0 0 {Number(picture.WidthMm)} {Number(picture.HeightMm)}");
            Attribute(xml, "role", "img");
            Attribute(xml, "font-family", "IBM Plex Sans, sans-serif");
            xml.WriteElementString("title", XmlText(picture.Title));
            xml.WriteElementString("desc", XmlText(picture.Alternative));
            Write(xml, Polygon.Rectangle(0.0, 0.0, picture.WidthMm, picture.HeightMm, null, grey: 1.0));
            foreach (Shape shape in picture.Shapes)
            {
                Write(xml, shape);
            }

            xml.WriteEndElement();
        }

        return text.Append('\n').ToString();
    }

    private static void Write(XmlWriter xml, Shape shape)
    {
        switch (shape)
        {
            case Line line:
                xml.WriteStartElement("line");
                Attribute(xml, "x1", Number(line.From.XMm));
                Attribute(xml, "y1", Number(line.From.YMm));
                Attribute(xml, "x2", Number(line.To.XMm));
                Attribute(xml, "y2", Number(line.To.YMm));
                Drawn(xml, line.Pen, null);
                break;
            case Polygon polygon:
                xml.WriteStartElement("polygon");
                Attribute(xml, "points", string.Join(' ', polygon.Corners.Select(corner => $"{Number(corner.XMm)},{Number(corner.YMm)}")));
                Drawn(xml, polygon.Pen, polygon.Grey);
                break;
            case Circle circle:
                xml.WriteStartElement("circle");
                Attribute(xml, "cx", Number(circle.Centre.XMm));
                Attribute(xml, "cy", Number(circle.Centre.YMm));
                Attribute(xml, "r", Number(circle.RadiusMm));
                Drawn(xml, circle.Pen, circle.Grey);
                break;
            case Label label:
                xml.WriteStartElement("text");
                Attribute(xml, "x", Number(label.At.XMm));
                Attribute(xml, "y", Number(label.At.YMm));
                Attribute(xml, "font-size", Number(label.SizePt * MmPerPt));
                Attribute(xml, "text-anchor", label.Anchor switch { Anchor.Start => "start", Anchor.Middle => "middle", _ => "end" });
                if (label.Bold)
                {
                    Attribute(xml, "font-weight", "bold");
                }

                if (label.Upright)
                {
                    Attribute(xml, "transform", $"rotate(-90 {Number(label.At.XMm)} {Number(label.At.YMm)})");
                }

                xml.WriteString(XmlText(label.Text));
                break;
        }

        xml.WriteEndElement();
    }

    private static void Drawn(XmlWriter xml, Pen? pen, double? grey)
    {
        Attribute(xml, "fill", grey is { } tone ? Tone(tone) : "none");
        if (pen is { } drawn)
        {
            Attribute(xml, "stroke", "black");
            Attribute(xml, "stroke-width", Number(drawn.WidthMm));
            if (drawn.DashMm > 0.0)
            {
                Attribute(xml, "stroke-dasharray", Number(drawn.DashMm));
            }
        }
    }

    private static string Tone(double grey)
    {
        string part = ((int)Math.Round(255.0 * grey)).ToString("x2", CultureInfo.InvariantCulture);
        return $"#{part}{part}{part}";
    }

    private static void Attribute(XmlWriter xml, string name, string value) => xml.WriteAttributeString(name, value);

    private static string Number(double value) => Math.Round(value, 3).ToString("0.###", CultureInfo.InvariantCulture);

    // XML has no word for control characters and broken halves of characters; a job file may hold them.
    private static string XmlText(string text) => Pages.PlainText.Of(text);
}
