using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Writes parts and what was fitted.</summary>
internal static class PartsText
{
    public static void Write(FieldWriter file, PistonSet set)
    {
        file.Text("id", set.Id);
        file.Quantity("oversizeBore", set.OversizeBore);
        file.Quantity("crown", set.Crown);
        file.Quantity("compressionHeight", set.CompressionHeight);
        file.Quantity("wantedClearance", set.WantedClearance);
        file.Quantity("skirt", set.Skirt);
        file.Quantity("topLandHeight", set.TopLandHeight);
        file.Quantity("topLandDiameter", set.TopLandDiameter);
        file.Flag("common", set.Common);
        file.Number("price", set.Price);
        file.Flag("onOffer", set.OnOffer);
        file.Texts("pieces", set.Pieces);
    }

    public static void Write(FieldWriter file, GasketChoice gasket)
    {
        file.Text("id", gasket.Id);
        file.Quantity("opening", gasket.Opening);
        file.Quantity("thickness", gasket.Thickness);
        file.Number("price", gasket.Price);
        file.Text("grade", gasket.Grade);
        file.Quantity("protrusion", gasket.Protrusion);
        file.Flag("onOffer", gasket.OnOffer);
    }

    public static void Write(FieldWriter file, Fitted fitted)
    {
        file.Word("stage", JobWords.Stages, (Stage?)fitted.Stage);
        file.Text("piston", fitted.Piston);
        file.Text("gasket", fitted.Gasket);
        file.Text("cylinder", fitted.Cylinder);
        file.Text("head", fitted.Head);
        file.Text("piece", fitted.Piece);
    }
}
