using System.Globalization;
using RebuildPlanner.Core.JobFile;

namespace RebuildPlanner.Sheets.Templates;

/// <summary>Opens a template with the job file's own reader, so that what is wrong in it is said with its line as in a job.</summary>
internal static class TemplateReader
{
    private const int Version = 1;

    /// <summary>What the file holds, or null and every fault in the order of the file.</summary>
    /// <param name="utf8">The file's bytes.</param>
    /// <param name="format">The word of its format.</param>
    /// <param name="read">Reads what the kind of file has of its own.</param>
    public static (T? Read, IReadOnlyList<Fault> Faults) Read<T>(ReadOnlySpan<byte> utf8, string format, Func<Fields, T> read)
        where T : class
    {
        if (JsonTreeReader.Read(utf8, out Fault? broken) is not { } tree)
        {
            return (null, [broken!]);
        }

        FaultList faults = new();
        T? template = null;
        if (Fields.Open(tree, faults, "a template") is { } file)
        {
            if (file.Text("format", required: true) is { } word && word != format)
            {
                faults.Add(file.Take("format")!, $"this must be \"{format}\"");
            }
            else
            {
                string version = Version.ToString(CultureInfo.InvariantCulture);
                if (file.Number("version", $"the number {version}", required: true) is { } number && number != Version)
                {
                    faults.Add(file.Take("version")!, $"this program knows version {version} only");
                }

                template = read(file);
                file.Close();
            }
        }

        return faults.Count == 0 ? (template, []) : (null, faults.InFileOrder());
    }
}
