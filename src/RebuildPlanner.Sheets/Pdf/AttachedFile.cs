using PdfSharp.Pdf;
using PdfSharp.Pdf.IO;
using RebuildPlanner.Sheets.Pages;

namespace RebuildPlanner.Sheets.Pdf;

/// <summary>The file that travels inside a sheet. Source: iso32000 (7.11.4, embedded file streams).</summary>
public static class AttachedFile
{
    /// <summary>Puts a file into a document.</summary>
    internal static void Add(PdfDocument document, Attachment attachment, DateTime date)
    {
        PdfDictionary stream = new(document);
        document.Internals.AddObject(stream);

        // Not packed: the bytes would then depend on who packs, and so the job can be read even with a text editor.
        stream.CreateStream(attachment.Content);
        stream.Elements.SetName("/Type", "/EmbeddedFile");
        stream.Elements.SetName("/Subtype", "/application#2Fjson");
        PdfDictionary facts = new(document);
        facts.Elements.SetInteger("/Size", attachment.Content.Length);
        facts.Elements.SetDateTime("/CreationDate", date);
        facts.Elements.SetDateTime("/ModDate", date);
        stream.Elements["/Params"] = facts;

        PdfDictionary file = new(document);
        document.Internals.AddObject(file);
        file.Elements.SetName("/Type", "/Filespec");
        file.Elements.SetString("/F", attachment.Name);
        file.Elements.SetString("/UF", attachment.Name);
        file.Elements.SetString("/Desc", attachment.Description);
        file.Elements.SetName("/AFRelationship", "/Source");
        PdfDictionary streams = new(document);
        streams.Elements.SetReference("/F", stream);
        file.Elements["/EF"] = streams;

        PdfDictionary files = new(document);
        files.Elements["/Names"] = new PdfArray(document, new PdfString(attachment.Name), file.Reference!);
        PdfDictionary names = new(document);
        names.Elements["/EmbeddedFiles"] = files;
        document.Internals.Catalog.Elements["/Names"] = names;
        document.Internals.Catalog.Elements["/AF"] = new PdfArray(document, file.Reference!);
    }

    /// <summary>The bytes of the file inside a sheet, or null where there is none or the document cannot be read.</summary>
    /// <param name="pdf">The document.</param>
    /// <param name="name">The name the file was put in under.</param>
    public static byte[]? Read(byte[] pdf, string name)
    {
        try
        {
            using MemoryStream stream = new(pdf);
            using PdfDocument document = PdfReader.Open(stream, PdfDocumentOpenMode.Import);
            PdfArray? names = document.Internals.Catalog.Elements.GetDictionary("/Names")?.Elements.GetDictionary("/EmbeddedFiles")?.Elements.GetArray("/Names");
            for (int index = 0; names is not null && index + 1 < names.Elements.Count; index += 2)
            {
                PdfDictionary? file = names.Elements.GetDictionary(index + 1);
                if (names.Elements.GetString(index) == name && file?.Elements.GetDictionary("/EF")?.Elements.GetDictionary("/F")?.Stream is { } packed)
                {
                    return packed.UnfilteredValue;
                }
            }
        }
        catch (Exception problem) when (problem is not OutOfMemoryException) // the library throws plain exceptions at what is no PDF
        {
            return null;
        }

        return null;
    }
}
