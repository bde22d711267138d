using System.Text;
using RebuildPlanner.Core.JobFile;

namespace RebuildPlanner.Sheets.Templates;

/// <summary>The words of the sheets, as the program has them or as a shop has changed them.</summary>
public sealed class SheetWording
{
    private const string Format = "rebuild-planner-wording";

    private static readonly Phrase[] _phrases = Enum.GetValues<Phrase>();

    private readonly string[] _texts;

    private SheetWording(string[] texts) => _texts = texts;

    /// <summary>The words that come with the program.</summary>
    public static SheetWording Original { get; } = new(Texts(TemplateFiles.Read(TemplateFiles.Wording), originals: null).Texts!);

    /// <summary>Reads a file of words.</summary>
    /// <param name="utf8">The file's bytes.</param>
    /// <returns>The words with no faults, a phrase left out keeping its original; or no words and every fault.</returns>
    public static (SheetWording? Wording, IReadOnlyList<Fault> Faults) Read(ReadOnlySpan<byte> utf8)
    {
        (string[]? texts, IReadOnlyList<Fault> faults) = Texts(utf8, Original._texts);
        return (texts is null ? null : new SheetWording(texts), faults);
    }

    /// <summary>A phrase with what its braces name filled in.</summary>
    /// <param name="phrase">The phrase.</param>
    /// <param name="filled">Names and what stands for them.</param>
    public string Of(Phrase phrase, params ReadOnlySpan<(string Name, string Value)> filled)
    {
        StringBuilder text = new();
        ReadOnlySpan<char> rest = _texts[(int)phrase];
        while (rest.IndexOf('{') is >= 0 and int open)
        {
            int close = open + rest[open..].IndexOf('}');
            text.Append(rest[..open]).Append(Value(rest[(open + 1)..close], filled));
            rest = rest[(close + 1)..];
        }

        return text.Append(rest).ToString();
    }

    /// <summary>The key of a phrase in the file.</summary>
    public static string Key(Phrase phrase)
    {
        string name = phrase.ToString();
        return char.ToLowerInvariant(name[0]) + name[1..];
    }

    // What is filled in is put down as it is: a brace in a customer's name is only a brace.
    private static string Value(ReadOnlySpan<char> name, ReadOnlySpan<(string Name, string Value)> filled)
    {
        foreach ((string known, string value) in filled)
        {
            if (name.SequenceEqual(known))
            {
                return value;
            }
        }

        throw new ArgumentException($"A phrase names {{{name}}}, which is not known there.");
    }

    private static (string[]? Texts, IReadOnlyList<Fault> Faults) Texts(ReadOnlySpan<byte> utf8, string[]? originals) =>
        TemplateReader.Read(utf8, Format, file =>
        {
            Fields? phrases = file.Object("phrases", required: true);
            string[] texts = [.. _phrases.Select(phrase => phrases is null ? "" : Text(phrases, phrase, originals?[(int)phrase]))];
            phrases?.Close();
            return texts;
        });

    private static string Text(Fields phrases, Phrase phrase, string? original)
    {
        string key = Key(phrase);
        if (phrases.Text(key, required: original is null) is not { } text)
        {
            return original ?? "";
        }

        if (original is not null && Problem(text, Names(original)!) is { } problem)
        {
            phrases.Faults.Add(phrases.Take(key)!, problem);
        }

        return text;
    }

    private static string? Problem(string text, IReadOnlyList<string> known)
    {
        if (Names(text) is not { } names)
        {
            return "a brace is opened and not closed, or the other way round";
        }

        return names.Except(known).FirstOrDefault() is { } unknown ? Wording.Unknown("name in braces", unknown, known) : null;
    }

    /// <summary>The names in braces, or null where the braces do not pair.</summary>
    private static List<string>? Names(string text)
    {
        List<string> names = [];
        int open = -1;
        for (int at = 0; at < text.Length; at++)
        {
            switch (text[at])
            {
                case '{' when open < 0:
                    open = at;
                    break;
                case '}' when open >= 0:
                    names.Add(text[(open + 1)..at]);
                    open = -1;
                    break;
                case '{' or '}':
                    return null;
            }
        }

        return open < 0 ? names : null;
    }
}
