using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;

namespace RebuildPlanner.Sheets.Build;

/// <summary>How a sheet opens: whose engine it is, and the answer before anything else.</summary>
internal static class OpeningPart
{
    /// <summary>Customer, engine, job, dates.</summary>
    public static Facts Facts(SheetInput input, Results results)
    {
        SheetWording words = input.Words;
        Job job = input.Job;
        List<(string, string)> facts = [];
        Add(Phrase.Customer, job.CustomerName);
        Add(Phrase.Job, job.Number);
        Add(Phrase.Contact, job.CustomerContact);
        Add(Phrase.Opened, job.Opened);
        Add(Phrase.Stage, StageWords.Of(results.Stage));
        Add(Phrase.Issued, input.Issued);
        Add(Phrase.Engine, input.Engine);
        Add(Phrase.JobTitle, job.Title);
        Add(Phrase.Complaint, job.Complaint);
        Add(Phrase.Asked, job.Asked);
        Add(Phrase.FuelRecorded, job.Engine.Fuel);
        return new Facts(facts);

        void Add(Phrase name, string? value)
        {
            if (!string.IsNullOrWhiteSpace(value))
            {
                facts.Add((words.Of(name), value));
            }
        }
    }

    /// <summary>The ratio, the displacement, and how the limits stand.</summary>
    public static IEnumerable<Block> Answer(Results results, ResultsText text, SheetWording words)
    {
        yield return new Paragraph(words.Of(Phrase.AnswerLead, ("stage", StageWords.Of(results.Stage))), Style.Small);
        RatioAnswer? answer = RatioAnswer.Of(results);
        yield return new Paragraph(
            answer is null ? words.Of(Phrase.AnswerNone)
            : answer.Least == answer.Most ? words.Of(Phrase.AnswerSame, ("ratio", answer.Least), ("low", answer.Low), ("high", answer.High))
            : words.Of(Phrase.AnswerRange, ("least", answer.Least), ("most", answer.Most), ("low", answer.Low), ("high", answer.High)),
            Style.Answer);
        if (answer is { Unknown.Count: > 0 })
        {
            yield return new Paragraph(words.Of(Phrase.AnswerWithout, ("cylinders", text.Cylinders(answer.Unknown))), Style.Strong);
        }

        foreach ((VerdictState state, Phrase phrase) in new[]
        {
            (VerdictState.Outside, Phrase.AnswerOutside), (VerdictState.NotProven, Phrase.AnswerOpen), (VerdictState.Within, Phrase.AnswerHeld),
        })
        {
            string[] limits = [.. LimitsPart.Whole(results).Where(verdict => verdict.State == state).Select(verdict => LimitsPart.Name(verdict, words))];
            if (limits.Length > 0)
            {
                yield return new Paragraph(words.Of(phrase, ("limits", string.Join("; ", limits))), Style.Strong);
            }
        }

        if (results.Verdicts.Count == 0)
        {
            yield return new Paragraph(words.Of(Phrase.AnswerNoLimits));
        }

        if (results.Displacement is { } displacement)
        {
            yield return new Paragraph(words.Of(
                Phrase.AnswerDisplacement, ("value", text.Value(displacement)), ("unit", text.Unit(displacement.Kind)),
                ("low", text.End(displacement, q => q.Low)), ("high", text.End(displacement, q => q.High))));
        }

        yield return new Paragraph(words.Of(Phrase.AnswerMeaning), Style.Small);
    }

    /// <summary>What is missing, where something is.</summary>
    public static IEnumerable<Block> Missing(ResultsText text, SheetWording words)
    {
        string[] missing = [.. text.Missing()];
        if (missing.Length > 0)
        {
            yield return new Heading(words.Of(Phrase.MissingHead), 2);
            yield return new Paragraph(words.Of(Phrase.MissingLead, ("nothing", ResultsText.Dash)));
            yield return new Points(missing);
        }
    }
}
