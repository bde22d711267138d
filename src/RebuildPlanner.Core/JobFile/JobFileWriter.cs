using System.Buffers;
using System.Text.Encodings.Web;
using System.Text.Json;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Writes a job as a portable job file.</summary>
/// <remarks>
/// One order of fields and one indentation, so that two files of the same job are the same bytes and a difference shows what changed.
/// What is left out of the file stays out, except rows of cylinders: those are written as they were understood.
/// </remarks>
public static class JobFileWriter
{
    private static readonly JsonWriterOptions Options = new()
    {
        Indented = true,
        IndentSize = 2,
        NewLine = "\n",

        // The file is read by people and never pasted into a web page unescaped: ± and µ stay themselves.
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    /// <summary>The job file's text: indented UTF-8 JSON that reads back as the same job.</summary>
    public static byte[] Write(Job job)
    {
        ArrayBufferWriter<byte> buffer = new();
        using (Utf8JsonWriter json = new(buffer, Options))
        {
            WriteJob(new FieldWriter(json), job);
        }

        return [.. buffer.WrittenSpan, (byte)'\n'];
    }

    private static void WriteJob(FieldWriter file, Job job)
    {
        file.Json.WriteStartObject();
        file.Text("format", JobWords.Format);
        file.Number("version", JobWords.Version);
        file.Object("job", () =>
        {
            file.Text("number", job.Number);
            file.Text("opened", job.Opened);
            file.Text("title", job.Title);
            file.Text("complaint", job.Complaint);
            file.Text("asked", job.Asked);
        });
        if (job.CustomerName is not null || job.CustomerContact is not null)
        {
            file.Object("customer", () =>
            {
                file.Text("name", job.CustomerName);
                file.Text("contact", job.CustomerContact);
            });
        }

        file.Object("engine", () => EngineText.Write(file, job.Engine));
        file.Each("gauges", job.Gauges, gauge => MeasuringText.Write(file, gauge));
        file.Each("readings", job.Readings, reading => MeasuringText.Write(file, reading));
        file.Each("given", job.Given, figure => MeasuringText.Write(file, figure));
        file.Each("assumed", job.Assumed, figure => MeasuringText.Write(file, figure));
        if (job.Pistons.Count > 0 || job.Gaskets.Count > 0)
        {
            file.Object("parts", () =>
            {
                file.Each("pistons", job.Pistons, set => PartsText.Write(file, set));
                file.Each("gaskets", job.Gaskets, gasket => PartsText.Write(file, gasket));
            });
        }

        file.Each("fitted", job.Fitted, fitted => PartsText.Write(file, fitted));
        file.Each("cuts", job.Cuts, cut => CuttingText.Write(file, cut));
        file.Each("limits", job.Limits, limit => CuttingText.Write(file, limit));
        file.Each("targets", job.Targets, target => CuttingText.Write(file, target));
        file.Each("process", job.Processes, process => CuttingText.Write(file, process));
        file.Each("checks", job.Checks, check => WriteCheck(file, check));
        file.Texts("notes", job.Notes.Count > 0 ? job.Notes : null);
        file.Json.WriteEndObject();
    }

    private static void WriteCheck(FieldWriter file, Check check)
    {
        file.Text("what", check.What);
        file.Text("result", check.Result);
        file.Word("stage", JobWords.Stages, check.Stage);
        file.Text("by", check.By);
        file.Text("when", check.When);
    }
}
