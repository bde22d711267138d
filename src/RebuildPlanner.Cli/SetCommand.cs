using System.CommandLine;
using System.Globalization;
using System.Text.Json;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>set</c>: a field of job, customer or engine.</summary>
public static class SetCommand
{
    private const string Example = """
        Example:
          rebuild set 2026-041 engine.cam.inletCloses "52 deg ABDC"
          rebuild set 2026-041 customer.contact "yard office, mornings"
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Argument<string> path = new("field") { Description = "Such as engine.stroke, customer.name or job.title." };
        Argument<string?> value = new("value") { Description = "What it is now; left out, it is not known.", Arity = ArgumentArity.ZeroOrOne };
        ExampleCommand command = new("set", "Sets a field of job, customer or engine; what it was stays in history.", Example) { path, value };
        WriteOptions write = new();
        write.AddTo(command);
        command.SetAction(parsed =>
        {
            using JobStore store = write.Open(parsed, terminal);
            string field = parsed.GetValue(path)!;
            WrittenJob? written = WriteOptions.Write(
                store, write.Number(parsed),
                before => field == "job.number"
                    ? ([], "a job keeps its number; export it and import it under another")
                    : JobVerbs.Set(before, field, Json(field, parsed.GetValue(value)), out string? problem) is { } set
                        ? ([write.Entry(set.Kind, set.Body, parsed, terminal)], null)
                        : ([], problem),
                field, terminal);
            if (written is null)
            {
                return ExitCode.Wrong;
            }

            terminal.Output.WriteLine($"{field}: {parsed.GetValue(value) ?? "not known"}");
            return ExitCode.Done;
        });
        return command;
    }

    // The two counts stand without quotes in a job file; lists are written as there; all else is text.
    private static string? Json(string field, string? typed) => typed switch
    {
        null => null,
        _ when field is "engine.cylinders" or "engine.valvesPerCylinder" && int.TryParse(typed, NumberStyles.None, CultureInfo.InvariantCulture, out _) => typed,
        _ when typed.StartsWith('[') || typed.StartsWith('{') => IsJson(typed) ? typed : JsonText.Quoted(typed),
        _ => JsonText.Quoted(typed),
    };

    private static bool IsJson(string typed)
    {
        try
        {
            JsonDocument.Parse(typed).Dispose();
            return true;
        }
        catch (JsonException)
        {
            return false;
        }
    }
}
