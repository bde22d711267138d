using System.Globalization;

namespace RebuildPlanner.Core.JobFile;

/// <summary>Dates as the file writes them: checked to be real, kept as typed.</summary>
internal static class Dates
{
    private static readonly string[] MomentFormats =
        ["yyyy-MM-dd", "yyyy-MM-ddTHH:mmK", "yyyy-MM-ddTHH:mm:ssK", "yyyy-MM-ddTHH:mm:ss.FFFFFFFK"];

    public static string? Day(Fields fields, string name) =>
        Checked(
            fields, name, text => DateOnly.TryParseExact(text, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out _),
            "a day of the calendar written year-month-day, such as \"2026-11-03\"");

    public static string? Moment(Fields fields, string name) =>
        Checked(
            fields, name,
            text => DateTimeOffset.TryParseExact(text, MomentFormats, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out _),
            "a moment written as ISO 8601, such as \"2026-11-03T10:20:00Z\", or a day alone");

    private static string? Checked(Fields fields, string name, Func<string, bool> isRight, string right)
    {
        string? text = fields.Text(name);
        if (text is not null && !isRight(text))
        {
            fields.Faults.Add(fields.Take(name)!, $"this must be {right}");
        }

        return text;
    }
}
