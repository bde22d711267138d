using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Reads <c>checks</c> and <c>notes</c>: what is told in words.</summary>
internal static class CheckSection
{
    public static List<Check> Read(Fields file)
    {
        List<Check> checks = [];
        foreach (JsonTree item in file.List("checks"))
        {
            if (Fields.Open(item, file.Faults, "a check") is { } fields)
            {
                checks.Add(new(
                    fields.Label("what", required: true) ?? "", fields.Text("result"), fields.Word("stage", JobWords.Stages),
                    fields.Text("by"), Dates.Moment(fields, "when")));
                fields.Close();
            }
        }

        return checks;
    }

    public static List<string> ReadNotes(Fields file)
    {
        List<string> notes = [];
        foreach (JsonTree item in file.List("notes"))
        {
            if (item.Kind == JsonKind.Text)
            {
                notes.Add(item.Text);
            }
            else
            {
                file.Faults.Add(item, "a note is text in double quotes");
            }
        }

        return notes;
    }
}
