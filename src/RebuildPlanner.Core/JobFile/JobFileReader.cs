using System.Globalization;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads a portable job file: a job, or every fault at once.</summary>
public static class JobFileReader
{
    /// <summary>Reads the UTF-8 text of a job file.</summary>
    /// <param name="utf8">The file's bytes.</param>
    /// <returns>The job with no faults, or no job and every fault in the order of the file.</returns>
    public static (Job? Job, IReadOnlyList<Fault> Faults) Read(ReadOnlySpan<byte> utf8)
    {
        if (JsonTreeReader.Read(utf8, out Fault? broken) is not { } tree)
        {
            return (null, [broken!]);
        }

        FaultList faults = new();
        Job? job = Fields.Open(tree, faults, "a job file") is { } file && IsOurs(file) ? ReadJob(file) : null;
        return faults.Count == 0 ? (job, []) : (null, faults.InFileOrder());
    }

    /// <summary>Whether the rest is worth reading: the faults of a file of another kind or a later version would only bury this one.</summary>
    private static bool IsOurs(Fields file)
    {
        string? format = file.Text("format", required: true);
        bool ours = true;
        if (format is not null && format != JobWords.Format)
        {
            ours = Wording.Nearest(format, [JobWords.Format]) is not null;
            file.Faults.Add(file.Take("format")!, $"this must be \"{JobWords.Format}\"");
        }

        if (file.Number("version", $"the number {JobWords.Version}", required: true) is { } version && version != JobWords.Version)
        {
            bool later = version > JobWords.Version;
            string known = JobWords.Version.ToString(CultureInfo.InvariantCulture);
            file.Faults.Add(
                file.Take("version")!,
                later ? $"this program knows version {known} only; a later one is needed for this file" : $"the version is {known}");
            return ours && !later;
        }

        return ours;
    }

    private static Job ReadJob(Fields file)
    {
        Fields? head = file.Object("job", required: true), customer = file.Object("customer");
        Engine? engine = EngineSection.Read(file.Object("engine", required: true));
        List<Gauge> gauges = GaugeSection.Read(file);
        (List<PistonSet> pistons, List<GasketChoice> gaskets) = PartsSection.Read(file.Object("parts"));
        Known known = new(engine, gauges, pistons, gaskets);
        List<Sited<Reading>> readings = ReadingSection.Read(file, known);
        List<Sited<StatedFigure>> given = StatedSection.Read(file, "given", known), assumed = StatedSection.Read(file, "assumed", known);
        CrossChecks.DeckAgainstProtrusion(readings, given.Concat(assumed), known.Cylinders.Names ?? [], file.Faults);
        CrossChecks.DropsOfRepeats(readings, file.Faults);

        Job job = new(
            head?.Label("number", required: true) ?? "", engine ?? new(0, [], [], []),
            head is null ? null : Dates.Day(head, "opened"), head?.Text("title"), head?.Text("complaint"), head?.Text("asked"),
            customer?.Text("name"), customer?.Text("contact"))
        {
            Gauges = [.. gauges],
            Readings = [.. readings.Select(read => read.Item)],
            Given = [.. given.Select(figure => figure.Item)],
            Assumed = [.. assumed.Select(figure => figure.Item)],
            Pistons = [.. pistons],
            Gaskets = [.. gaskets],
            Fitted = [.. FittedSection.Read(file, known)],
            Cuts = [.. CutSection.Read(file, known)],
            Limits = [.. LimitSection.Read(file, "limits", known)],
            Targets = [.. LimitSection.Read(file, "targets", known)],
            Processes = [.. ProcessSection.Read(file)],
            Checks = [.. CheckSection.Read(file)],
            Notes = [.. CheckSection.ReadNotes(file)],
        };
        head?.Close();
        customer?.Close();
        file.Close();
        return job;
    }
}
