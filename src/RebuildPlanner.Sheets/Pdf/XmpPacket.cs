using System.Globalization;
using System.Text;
using System.Xml.Linq;
using RebuildPlanner.Sheets.Pages;

namespace RebuildPlanner.Sheets.Pdf;

/// <summary>What a sheet says of itself to programs that catalogue files.</summary>
/// <remarks>Source: iso16684-1. Written here because the library does not escape what it puts between tags.</remarks>
internal static class XmpPacket
{
    /// <summary>The program's name.</summary>
    public const string Program = "Rebuild Planner";

    private static readonly XNamespace _meta = "adobe:ns:meta/", _rdf = "http://www.w3.org/1999/02/22-rdf-syntax-ns#",
        _dc = "http://purl.org/dc/elements/1.1/", _xmp = "http://ns.adobe.com/xap/1.0/", _pdf = "http://ns.adobe.com/pdf/1.3/";

    /// <summary>The packet's bytes.</summary>
    public static byte[] Of(Sheet sheet, DateTime date)
    {
        string when = date.ToString("yyyy-MM-dd'T'HH:mm:ss'Z'", CultureInfo.InvariantCulture);
        XElement description = new(
            _rdf + "Description", new XAttribute(_rdf + "about", ""), new XAttribute(XNamespace.Xmlns + "dc", _dc),
            new XAttribute(XNamespace.Xmlns + "xmp", _xmp), new XAttribute(XNamespace.Xmlns + "pdf", _pdf),
            new XElement(_dc + "title", Alternatives(sheet.Title)),
            new XElement(_dc + "creator", new XElement(_rdf + "Seq", new XElement(_rdf + "li", PlainText.Of(sheet.Author)))),
            new XElement(_dc + "description", Alternatives(sheet.Subject)),
            new XElement(_xmp + "CreatorTool", Program),
            new XElement(_xmp + "CreateDate", when),
            new XElement(_xmp + "ModifyDate", when));
        XElement packet = new(
            _meta + "xmpmeta", new XAttribute(XNamespace.Xmlns + "x", _meta),
            new XElement(_rdf + "RDF", new XAttribute(XNamespace.Xmlns + "rdf", _rdf), description));
        return Encoding.UTF8.GetBytes(
            $"<?xpacket begin=\"\uFEFF\" id=\"W5M0MpCehiHzreSzNTczkc9d\"?>\n{packet.ToString().ReplaceLineEndings("\n")}\n<?xpacket end=\"r\"?>");
    }

    private static XElement Alternatives(string text) =>
        new(_rdf + "Alt", new XElement(_rdf + "li", new XAttribute(XNamespace.Xml + "lang", "x-default"), PlainText.Of(text)));
}
