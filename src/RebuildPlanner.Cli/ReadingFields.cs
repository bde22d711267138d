using System.CommandLine;
using System.Text.Json;
using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Cli;

/// <summary>The fields of a reading as options.</summary>
internal sealed class ReadingFields
{
    private readonly Argument<string?> _what = new("what") { Description = "What was read, such as bore.", Arity = ArgumentArity.ZeroOrOne };
    private readonly Argument<string?> _value = new("figure") { Description = "What the gauge showed, with its unit.", Arity = ArgumentArity.ZeroOrOne };
    private readonly Option<string> _from = new("--from") { Description = "A burette before the fill.", HelpName = "figure" };
    private readonly Option<string> _to = new("--to") { Description = "A burette after the fill.", HelpName = "figure" };
    private readonly Option<string[]> _fills = new("--fill") { Description = "A fill among several, start..end; the option before each.", HelpName = "start..end" };
    private readonly Option<Stage?> _stage = JobOptions.Stage("before, \"as received\", planned or \"as machined\".");
    private readonly EntryField[] _rest =
    [
        .. EntryField.Place(), EntryField.Text("drop", "--drop", "How far the crown stands below the deck for a crown fill.", "figure"),
        EntryField.Text("gauge", "--gauge", "The gauge; the shop's is copied into the job.", "name"),
        EntryField.Text("temperature", "--temperature", "Of gauge and part.", "figure"), EntryField.Flag("torquePlate", "--torque-plate", "The torque plate was on."),
        EntryField.Flag("torquePlate", "--no-torque-plate", "The torque plate was not on.", value: false),
    ];

    /// <summary>Adds them to a command.</summary>
    public void AddTo(Command command)
    {
        command.Arguments.Add(_what);
        command.Arguments.Add(_value);
        foreach (Option option in (Option[])[_from, _to, _fills, _stage, .. _rest.Select(field => (Option)field.Symbol)])
        {
            command.Options.Add(option);
        }
    }

    /// <summary>Whether one reading is named.</summary>
    public bool IsOne(ParseResult parsed) => parsed.GetValue(_what) is not null;

    /// <summary>The stage asked for, or null for none.</summary>
    public Stage? Stage(ParseResult parsed) => parsed.GetValue(_stage);

    /// <summary>The reading as the job file writes it, or null after the reason has been written.</summary>
    public string? Body(ParseResult parsed, Terminal terminal)
    {
        string[] fills = parsed.GetValue(_fills) ?? [];
        string[][] parts = [.. fills.Select(fill => fill.Split("..", StringSplitOptions.TrimEntries))];
        if (Array.Find(fills, fill => fill.Split("..").Length != 2) is { } odd)
        {
            terminal.Error.WriteLine($"--fill {odd}: a fill is written start..end, such as \"0 cc..50.0 cc\".");
            return null;
        }

        EntryField what = new("what", _what, (_, body) => body.WriteString("what", parsed.GetValue(_what)!));
        EntryField figure = new("value", _value, (_, body) =>
        {
            Write(body, "value", parsed.GetValue(_value));
            Write(body, "from", parsed.GetValue(_from));
            Write(body, "to", parsed.GetValue(_to));
            if (parts.Length > 0)
            {
                body.WriteStartArray("fills");
                foreach (string[] fill in parts)
                {
                    body.WriteStartObject();
                    body.WriteString("from", fill[0]);
                    body.WriteString("to", fill[1]);
                    body.WriteEndObject();
                }

                body.WriteEndArray();
            }
        });
        EntryField stage = new("stage", _stage, (_, body) => Write(body, "stage", parsed.GetValue(_stage) is { } at ? StageWords.Of(at) : null));
        return EntryField.Body([what, .. _rest[..8], figure, .. _rest[8..], stage], parsed);
    }

    private static void Write(Utf8JsonWriter body, string name, string? value)
    {
        if (value is not null)
        {
            body.WriteString(name, value);
        }
    }
}
