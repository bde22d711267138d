using System.CommandLine;
using System.CommandLine.Parsing;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Cli;

/// <summary>The options by which every command says which job and which stage it is about.</summary>
internal static class JobOptions
{
    /// <summary>The stage.</summary>
    /// <param name="description">What it says where it is left out.</param>
    public static Option<Stage?> Stage(string description = "before, \"as received\", planned or \"as machined\"; else the last stage with entries.")
    {
        Option<Stage?> stage = new("--stage")
        {
            Description = description,
            HelpName = "stage",
            CustomParser = ParseStage,
        };
        Offer(stage, StageWords.All); // the names of the enumeration are not words of the trade
        return stage;
    }

    /// <summary>An option whose value is one of a few words.</summary>
    /// <param name="name">Its name.</param>
    /// <param name="description">What it says.</param>
    /// <param name="helpName">What stands for the value in the help.</param>
    /// <param name="words">The words.</param>
    /// <param name="find">The value of a word, or null.</param>
    public static Option<T?> Word<T>(string name, string description, string helpName, IReadOnlyList<string> words, Func<string, T?> find)
    {
        Option<T?> option = new(name)
        {
            Description = description,
            HelpName = helpName,
            CustomParser = argument =>
            {
                string typed = Typed(argument);
                if (find(typed) is { } value)
                {
                    return value;
                }

                argument.AddError($"{name} {typed}: that is not known here; write {string.Join(" or ", words)}.");
                return default;
            },
        };
        Offer(option, words);
        return option;
    }

    /// <summary>Refuses a job of which nothing can be computed, with what is missing.</summary>
    public static bool IsEmpty(string path, Results results, Terminal terminal)
    {
        if (!results.IsEmpty)
        {
            return false;
        }

        terminal.Error.WriteLine($"{path}: no cylinder can be computed at the stage {StageWords.Of(results.Stage)}. Missing:");
        SayMissing(results, terminal);
        return true;
    }

    /// <summary>Says what is missing, a line a figure.</summary>
    public static void SayMissing(Results results, Terminal terminal)
    {
        foreach (string missing in new ResultsText(results, UnitSystem.Metric).Missing())
        {
            terminal.Error.WriteLine($"  {missing}");
        }
    }

    /// <summary>1 where some verdict is outside, else 0.</summary>
    public static int ExitCodeOf(Results results) =>
        results.Verdicts.Any(verdict => verdict.State == VerdictState.Outside) ? ExitCode.Outside : ExitCode.Done;

    private static void Offer<T>(Option<T> option, IReadOnlyList<string> words)
    {
        option.CompletionSources.Clear();
        option.CompletionSources.Add(_ => words.Select(word => new System.CommandLine.Completions.CompletionItem(word)));
    }

    private static string Typed(ArgumentResult argument) => string.Join(' ', argument.Tokens.Select(token => token.Value));

    private static Stage? ParseStage(ArgumentResult argument)
    {
        string typed = Typed(argument);
        if (StageWords.Find(typed) is { } stage)
        {
            return stage;
        }

        string? near = NearestWord.Of(typed, StageWords.All);
        argument.AddError(
            $"--stage {typed}: there is no such stage{(near is null ? "" : $"; did you mean \"{near}\"?")} The stages are "
            + string.Join(", ", StageWords.All.Select(word => $"\"{word}\"")) + ".");
        return null;
    }
}
