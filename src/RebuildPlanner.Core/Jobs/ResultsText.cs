using System.Globalization;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;

namespace RebuildPlanner.Core.Jobs;

/// <summary>Results in rounded words and figures, made once for every face that shows them.</summary>
/// <param name="results">The results.</param>
/// <param name="system">The units printed in.</param>
public sealed class ResultsText(Results results, UnitSystem system)
{
    /// <summary>What stands where nothing is known.</summary>
    public const string Dash = "–";

    /// <summary>The word for every cylinder.</summary>
    public const string All = "all";

    /// <summary>A value without its unit, to two digits of its uncertainty; a dash for none.</summary>
    public string Value(ResultQuantity? quantity) => End(quantity, known => known.Value);

    /// <summary>One end of a quantity's interval, to the value's decimals; a dash for none.</summary>
    public string End(ResultQuantity? quantity, Func<ResultQuantity, double?> end) =>
        quantity is not null && end(quantity) is { } value ? QuantityPrint.Number(value, quantity.Kind, quantity.StandardUncertainty, system) : Dash;

    /// <summary>The unit a kind is printed in.</summary>
    public string Unit(QuantityKind kind) => QuantityPrint.Unit(kind, system);

    /// <summary>The cylinders as a list, "all" for every one.</summary>
    public string Cylinders(IEnumerable<string> labels)
    {
        string[] distinct = [.. labels.Distinct()];
        return distinct.Length == results.Cylinders.Count ? All : string.Join(", ", distinct);
    }

    /// <summary>Which reading of the model the intervals and beliefs are of, and how sure that is; nothing where no figure is in doubt.</summary>
    public IEnumerable<string> Method() => results.Method().Select(note => Said(note, results.Trials!));

    private string Said(MethodNote note, TrialReport trials)
    {
        string digits = trials.Options.Digits == 1 ? "one digit" : "two digits";
        string run = string.Create(CultureInfo.InvariantCulture, $"{Trials} trials, seed {trials.Options.Seed}{(trials.Options.Plain ? ", counted plainly" : "")}");
        return note switch
        {
            MethodNote.FirstOrder => $"Intervals and beliefs are of first order; trials agree to {digits} of the uncertainty ({run}).",
            MethodNote.Trials => $"Intervals and beliefs are by trials, Monte Carlo ({run}); first order is off by more than {digits} of the uncertainty allow, furthest at the {trials.FailsAt}{(trials.FailsOn is { } cylinder ? $" of cylinder {cylinder}" : "")}.",
            MethodNote.SpreadIsBiased => "A spread by trials is biased upwards: measuring noise spreads even cylinders that are alike.",
            _ => $"The trials ended before {digits} were sure.",
        };
    }

    /// <summary>How many trials were run, thousands set apart.</summary>
    public string Trials => (results.Trials?.Trials ?? 0).ToString("#,0", CultureInfo.InvariantCulture).Replace(',', ' ');

    /// <summary>What is missing, a line a figure.</summary>
    public IEnumerable<string> Missing() =>
        results.Missing.GroupBy(missing => missing.What).Select(same => $"{same.Key}: {Cylinders(same.Select(missing => missing.Cylinder))}");

    /// <summary>The cautions, each said once with the cylinders it is about.</summary>
    public IEnumerable<string> Cautions()
    {
        foreach (IGrouping<string, Caution> same in results.Cautions.GroupBy(caution => caution.Text))
        {
            string cylinders = Cylinders(same.Select(caution => caution.Cylinder).OfType<string>());
            yield return cylinders.Length == 0 || cylinders == All ? same.Key : $"Cylinder {cylinders}: {same.Key}";
        }
    }

    /// <summary>The head, bank or valve a limit is set on; nothing where it is set on none of them.</summary>
    public static IEnumerable<string> PartsOf(Place place) =>
        new[] { place.Head, place.Bank, place.Valve is { } valve ? JobWords.Valves.WordFor(valve) : null }.OfType<string>();

    /// <summary>A probability in per cent. It is never printed as certain: what rounds to 100 % is "> 99.9 %".</summary>
    public static string Belief(double? probability) => probability switch
    {
        null => Dash,
        > 0.9995 => "> 99.9 %",
        < 0.0005 => "< 0.1 %",
        { } known => string.Create(CultureInfo.InvariantCulture, $"{100.0 * known:F1} %"),
    };

    /// <summary>The belief a limit asks for, in per cent, as it was set.</summary>
    public static string Level(double level) => string.Create(CultureInfo.InvariantCulture, $"{100.0 * level:0.###} %");
}
