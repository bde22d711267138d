using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>Limits and verdicts: each limit in a sentence, then cylinder by cylinder.</summary>
internal static class LimitsPart
{
    private const int MostColumns = 6;

    public static IEnumerable<Block> Of(Results results, ResultsText text, SheetWording words)
    {
        yield return new Heading(words.Of(Phrase.LimitsHead), 2);
        if (results.Verdicts.Count == 0)
        {
            yield return new Paragraph(words.Of(Phrase.LimitsNone));
            yield break;
        }

        yield return new Points([.. Limits(results).Select(limit => Sentence(results, limit, text, words))]);
        Verdict[][] byCylinder = [.. Limits(results).Where(limit => limit.Length > 1)];
        if (byCylinder.Length > 0)
        {
            yield return new Paragraph(words.Of(Phrase.LimitsTable), Style.Small);
        }

        // As few tables as will do, and all about as wide.
        int tables = (byCylinder.Length + MostColumns - 1) / MostColumns;
        foreach (Verdict[][] columns in byCylinder.Chunk(tables == 0 ? 1 : (byCylinder.Length + tables - 1) / tables))
        {
            yield return Table(results, columns, words);
        }
    }

    /// <summary>The verdict on each limit as a whole: on all its cylinders together, or on the one it names.</summary>
    public static IEnumerable<Verdict> Whole(Results results) => Limits(results).Select(Whole);

    /// <summary>A limit by name, and by the place it is set on.</summary>
    public static string Name(Verdict verdict, SheetWording words)
    {
        (string, string) what = ("what", verdict.What), limit = ("limit", verdict.Limit);
        string name = verdict.Place.Cylinder is { } cylinder
            ? words.Of(Phrase.LimitOfCylinder, what, limit, ("cylinder", cylinder))
            : words.Of(Phrase.LimitName, what, limit);
        return ResultsText.PartsOf(verdict.Place).Aggregate(name, (named, part) => words.Of(Phrase.LimitOfPart, ("limit", named), ("part", part)));
    }

    private static Verdict Whole(Verdict[] limit) => limit[^1];

    /// <summary>The verdicts limit by limit: each cylinder's, and last the one on all of them, unless the limit names one cylinder.</summary>
    private static IEnumerable<Verdict[]> Limits(Results results) =>
        results.Verdicts.GroupBy(verdict => verdict.Number).Select(limit => limit.ToArray());

    private static string Sentence(Results results, Verdict[] limit, ResultsText text, SheetWording words)
    {
        Verdict whole = Whole(limit);
        (string, string) name = ("limit", Name(whole, words)), belief = ("belief", ResultsText.Belief(whole.Probability)),
            level = ("level", ResultsText.Level(whole.Level));
        switch (whole.State)
        {
            case VerdictState.Within:
                return words.Of(Phrase.LimitWithin, name, belief, level);
            case VerdictState.Outside:
                return words.Of(Phrase.LimitOutside, name, belief, level);
            case VerdictState.NotProven when whole.Probability is null:
                return words.Of(
                    Phrase.LimitMissing, name, ("what", whole.Settle ?? whole.What), ("cylinders", text.Cylinders(Lacking(results, limit))));
        }

        IEnumerable<string> settling = limit
            .Where(verdict => verdict is { Cylinder: not null, State: VerdictState.NotProven, Settle: not null } && verdict.Settle != whole.Settle)
            .GroupBy(verdict => verdict.Settle!)
            .Select(same => words.Of(
                Phrase.LimitSettleCylinders, ("cylinders", text.Cylinders(same.Select(verdict => verdict.Cylinder!))), ("what", same.Key)));
        string settle = whole.Settle is { } what ? words.Of(Phrase.LimitSettle, ("what", what)) : words.Of(Phrase.LimitNoSettle);
        return string.Join(' ', [words.Of(Phrase.LimitOpen, name, belief, level), settle, .. settling]);
    }

    /// <summary>The cylinders a limit has no figure of; for a spread, all those that lack what it rests on.</summary>
    private static IEnumerable<string> Lacking(Results results, Verdict[] limit) => limit.Length > 1 || limit[0].Cylinder is not null
        ? limit.Where(verdict => verdict is { Cylinder: not null, Probability: null }).Select(verdict => verdict.Cylinder!)
        : results.Missing.Where(missing => missing.What == limit[0].Settle).Select(missing => missing.Cylinder);

    private static Table Table(Results results, Verdict[][] columns, SheetWording words)
    {
        // Of one cylinder, all of them are that one.
        IEnumerable<string?> rows = [.. results.Cylinders.Select(cylinder => cylinder.Cylinder), .. results.Cylinders.Count > 1 ? new string?[1] : []];
        return new Table(
            [new Column(words.Of(Phrase.Cylinder), IsText: true), .. columns.Select(limit => new Column(Name(limit[0], words)))],
            [.. rows.Select(row => (IReadOnlyList<string>)[row ?? words.Of(Phrase.All), .. columns.Select(limit => Cell(limit, row))])]);
    }

    private static string Cell(Verdict[] limit, string? cylinder) =>
        limit.FirstOrDefault(verdict => verdict.Cylinder == cylinder) is { } verdict
            ? $"{ResultsJson.WordOf(verdict.State)} {ResultsText.Belief(verdict.Probability)}"
            : ResultsText.Dash;
}
