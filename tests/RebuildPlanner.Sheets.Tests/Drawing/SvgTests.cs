using System.Globalization;
using System.Xml.Linq;
using RebuildPlanner.Sheets.Drawing;

namespace RebuildPlanner.Sheets.Tests.Drawing;

public class SvgTests
{
    private static readonly XNamespace Svg = "http://www.w3.org/2000/svg";

    private static readonly Picture Picture = new(
        80.0, 40.5, "A & B", "Says <this> \u0007.",
        [
            new Line(new(1.0, 2.0), new(3.5, 4.0), Pen.Dashed), Polygon.Rectangle(5.0, 6.0, 7.0, 8.0, Pen.Outline, 0.5), new Circle(new(9.0, 10.0), 2.0, null, 0.0),
            new Label(new(11.0, 12.0), "Ø 84 & <more>", 7.2, Anchor.End, Bold: true, Upright: true),
        ]);

    [Fact]
    public void Every_shape_is_written_in_millimetres_where_it_is()
    {
        XElement root = XDocument.Parse(Sheets.Drawing.Svg.Write(Picture)).Root!;

        Assert.Equal(("80mm", "40.5mm", "0 0 80 40.5"), (root.Attribute("width")!.Value, root.Attribute("height")!.Value, root.Attribute("viewBox")!.Value));
        XElement line = root.Element(Svg + "line")!;
        Assert.Equal(["1", "2", "3.5", "4"], new[] { "x1", "y1", "x2", "y2" }.Select(name => line.Attribute(name)!.Value));
        Assert.Equal("1.2", line.Attribute("stroke-dasharray")!.Value);
        XElement box = root.Elements(Svg + "polygon").Last();
        Assert.Equal("5,6 7,6 7,8 5,8", box.Attribute("points")!.Value);
        Assert.Equal("#808080", box.Attribute("fill")!.Value);
        XElement circle = root.Element(Svg + "circle")!;
        Assert.Equal(["9", "10", "2", "#000000"], new[] { "cx", "cy", "r", "fill" }.Select(name => circle.Attribute(name)!.Value));
        XElement text = root.Element(Svg + "text")!;
        Assert.Equal(("Ø 84 & <more>", "end", "rotate(-90 11 12)"), (text.Value, text.Attribute("text-anchor")!.Value, text.Attribute("transform")!.Value));
        Assert.Equal(7.2 * 25.4 / 72.0, double.Parse(text.Attribute("font-size")!.Value, CultureInfo.InvariantCulture), 1e-9); // 1 pt is 1/72 in
    }

    [Fact]
    public void What_it_says_is_said_to_who_cannot_see_it_without_what_XML_forbids()
    {
        XElement root = XDocument.Parse(Sheets.Drawing.Svg.Write(Picture)).Root!;

        Assert.Equal(("A & B", "Says <this>  ."), (root.Element(Svg + "title")!.Value, root.Element(Svg + "desc")!.Value));
    }
}
