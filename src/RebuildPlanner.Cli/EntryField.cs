using System.CommandLine;
using System.Globalization;
using System.Text.Json;

namespace RebuildPlanner.Cli;

/// <summary>One field of an element of the job file, as an option of a command.</summary>
/// <param name="Json">Its name in the job file.</param>
/// <param name="Symbol">The option or argument that gives it.</param>
/// <param name="Write">Writes it where it was given.</param>
internal sealed record EntryField(string Json, Symbol Symbol, Action<ParseResult, Utf8JsonWriter> Write)
{
    /// <summary>Text, a quantity too: it is kept as typed and judged by the job file's reader.</summary>
    public static EntryField Text(string json, string option, string description, string helpName)
    {
        Option<string> text = new(option) { Description = description, HelpName = helpName };
        return new EntryField(json, text, (parsed, body) =>
        {
            if (parsed.GetValue(text) is { } value)
            {
                body.WriteString(json, value);
            }
        });
    }

    /// <summary>Text that must be there and needs no option before it.</summary>
    public static EntryField Word(string json, string name, string description)
    {
        Argument<string> word = new(name) { Description = description };
        return new EntryField(json, word, (parsed, body) => body.WriteString(json, parsed.GetValue(word)!));
    }

    /// <summary>A bare number: a level, a price, hours on the clock.</summary>
    public static EntryField Number(string json, string option, string description, string helpName)
    {
        Option<decimal?> number = new(option)
        {
            Description = description,
            HelpName = helpName,
            CustomParser = argument =>
            {
                string typed = argument.Tokens[0].Value;
                if (decimal.TryParse(typed, NumberStyles.AllowDecimalPoint | NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out decimal value))
                {
                    return value;
                }

                argument.AddError($"{option} {typed}: a number is wanted, such as 0.95.");
                return null;
            },
        };
        return new EntryField(json, number, (parsed, body) =>
        {
            if (parsed.GetValue(number) is { } value)
            {
                body.WriteNumber(json, value);
            }
        });
    }

    /// <summary>A thing that is so where the option stands.</summary>
    public static EntryField Flag(string json, string option, string description, bool value = true)
    {
        Option<bool> flag = new(option) { Description = description };
        return new EntryField(json, flag, (parsed, body) =>
        {
            if (parsed.GetValue(flag))
            {
                body.WriteBoolean(json, value);
            }
        });
    }

    /// <summary>Several texts, the option before each.</summary>
    public static EntryField Texts(string json, string option, string description, string helpName)
    {
        Option<string[]> texts = new(option) { Description = description, HelpName = helpName };
        return new EntryField(json, texts, (parsed, body) =>
        {
            if (parsed.GetValue(texts) is { Length: > 0 } values)
            {
                body.WriteStartArray(json);
                Array.ForEach(values, body.WriteStringValue);
                body.WriteEndArray();
            }
        });
    }

    /// <summary>The fields that say which part and which place on it.</summary>
    public static EntryField[] Place() =>
    [
        Text("cylinder", "--cylinder", "Which cylinder; none named is all.", "label"), Text("piece", "--piece", "Which piece of a piston set.", "label"),
        Text("head", "--head", "Which head.", "label"), Text("bank", "--bank", "Which bank.", "label"),
        Text("at", "--at", "top, middle or bottom of a bore; front or rear of a pin.", "place"), Text("axis", "--axis", "thrust or \"along crank\".", "axis"),
        Text("valve", "--valve", "inlet or exhaust.", "valve"), Number("clock", "--clock", "Hours looking down on the deck, 12 at the cam-drive end.", "hours"),
    ];

    /// <summary>The stage.</summary>
    public static EntryField Stage() => Text("stage", "--stage", "before, \"as received\", planned or \"as machined\".", "stage");

    /// <summary>Adds fields to a command, as arguments or options.</summary>
    public static void AddTo(Command command, IEnumerable<EntryField> fields)
    {
        foreach (EntryField field in fields)
        {
            if (field.Symbol is Argument argument)
            {
                command.Arguments.Add(argument);
            }
            else
            {
                command.Options.Add((Option)field.Symbol);
            }
        }
    }

    /// <summary>The element the fields make.</summary>
    public static string Body(IEnumerable<EntryField> fields, ParseResult parsed) => JsonText.Write(body =>
    {
        body.WriteStartObject();
        foreach (EntryField field in fields)
        {
            field.Write(parsed, body);
        }

        body.WriteEndObject();
    });
}
