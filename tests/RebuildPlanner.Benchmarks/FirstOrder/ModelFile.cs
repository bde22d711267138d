using System.Text.Json;
using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Benchmarks;

/// <summary>Hands a model to the rival: u of each source, and for each cylinder the estimate behind each input, with its terms.</summary>
internal static class ModelFile
{
    /// <summary>Writes the file.</summary>
    public static void Write(EngineModel model, string path)
    {
        using FileStream stream = File.Create(path);
        using Utf8JsonWriter json = new(stream);
        json.WriteStartObject();
        json.WriteStartArray("u");
        foreach (Source source in model.Sources)
        {
            json.WriteNumberValue(source.StandardUncertainty);
        }

        json.WriteEndArray();
        json.WriteStartArray("cylinders");
        for (int cylinder = 0; cylinder < model.Cylinders.Count; cylinder++)
        {
            Write(json, model, cylinder);
        }

        json.WriteEndArray();
        json.WriteEndObject();
    }

    private static void Write(Utf8JsonWriter json, EngineModel model, int cylinder)
    {
        CylinderForm form = model.Cylinders[cylinder].Form;
        if (form is not { TravelMeasured: false, OffsetPin: false, WholeChamber: false, TopLand: true, Closing: true, TwoStroke: false })
        {
            throw new NotSupportedException("The rival script knows only the formulas this job takes.");
        }

        json.WriteStartObject();
        for (int input = 0; input < CylinderFigures<Real>.Count; input++)
        {
            json.WriteStartObject(((Input)input).ToString());

            // Inputs of one estimate are one object to the rival too: what is shared it need not add up twice.
            json.WriteNumber("estimate", model.Cylinders[cylinder].EstimateOf[input]);
            json.WriteNumber("value", model.EstimateOf(cylinder, (Input)input).Value);
            json.WriteStartArray("terms");
            foreach (Term term in model.TermsOf(cylinder, input))
            {
                json.WriteStartArray();
                json.WriteNumberValue(term.Source);
                json.WriteNumberValue(term.Coefficient);
                json.WriteEndArray();
            }

            json.WriteEndArray();
            json.WriteEndObject();
        }

        json.WriteEndObject();
    }
}
