using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Core.Jobs;

/// <summary>What to mind with these results, most serious first; one that holds for every cylinder is said once.</summary>
public static class Cautions
{
    // A bound looser than this part of its width would change a printed digit.
    private const double VisibleSlack = 1e-3;

    // More trials than this without clearance, and the ratio's interval says little.
    private const double MostWithoutClearance = 1e-3;

    /// <summary>The cautions of a stage.</summary>
    public static IReadOnlyList<Caution> Of(StageModel model, StageFigures figures, TrialReport? trials = null)
    {
        List<Caution> cautions = [];
        cautions.AddRange(Impossible(model, figures));
        if (trials is { WithoutClearance: > MostWithoutClearance })
        {
            cautions.Add(new Caution(
                "clearance-in-doubt", "In some trials no clearance was left at top dead centre, so that the ratio has no end: take another reading of what is most in doubt."));
        }

        cautions.AddRange(Ended(model));
        cautions.AddRange(EarlierStage(model));
        cautions.AddRange(TopLand(model));
        cautions.AddRange(Places(model));
        cautions.AddRange(WithoutLimits(model));
        cautions.AddRange(Gauges(model));
        cautions.AddRange(Repeats(model));
        cautions.AddRange(Engine(model, figures));
        cautions.AddRange(Work(model));
        return SaidOnce(cautions, model.Job.Engine.Cylinders);
    }

    private static IEnumerable<Caution> Impossible(StageModel model, StageFigures figures)
    {
        for (int cylinder = 0; cylinder < model.Model.Cylinders.Count; cylinder++)
        {
            if (figures.Of(Output.ClearanceVolume, cylinder) is { Value: <= 0.0 })
            {
                yield return new Caution(
                    "no-clearance-volume", "The volumes leave no clearance at top dead centre, so there is no ratio: look for a wrong sign or unit.",
                    Label(model, cylinder), "clearance volume");
            }

            if (figures.Of(Output.PistonToHead, cylinder) is { Value: <= 0.0 })
            {
                yield return new Caution(
                    "piston-touches-head", "By these figures the piston meets the head. Do not turn the engine over.", Label(model, cylinder), "piston to head");
            }

            if (figures.Of(Output.TrappedRatio, cylinder) is null && model.Model.Cylinders[cylinder].Known[(int)Output.TrappedRatio])
            {
                yield return new Caution(
                    "crank-cannot-turn", "Rod, stroke and pin offset do not make a crank that turns: the rod must be longer than the throw and the offset.",
                    Label(model, cylinder), "rod length");
            }

            foreach (Output output in new[] { Output.CompressionRatio, Output.TrappedRatio, Output.CrankingPressure, Output.PistonToHead })
            {
                if (figures.Of(output, cylinder) is { Worst: var worst } && worst.Slack > VisibleSlack * (worst.High - worst.Low))
                {
                    yield return new Caution(
                        "worst-case-bounded", "The worst case of some figures is a certain bound, wider than what can be reached.", Label(model, cylinder));
                    break;
                }
            }
        }
    }

    private static IEnumerable<Caution> Ended(StageModel model) =>
        model.Search.EndedWithoutSuccessor
            .Where(ended => ended.What is not (What.Rock or What.TopLandHeight or What.TopLandDiameter) && ended.Stage == model.Stage
                && model.Search.Find(ended.What, ended.Cylinder) is null)
            .Select(ended => new Caution(
                "reading-ended", $"The earlier {WhatWords.Of(ended.What)} ended with the work done since, and what is needed to carry it through is missing. Measure again.",
                Label(model, ended.Cylinder), WhatWords.Of(ended.What)));

    private static IEnumerable<Caution> EarlierStage(StageModel model) =>
        model.Used
            .Where(used => used.Figure.Stage is { } stage && stage != model.Stage
                && !model.Used.Any(other => other.Cylinder == used.Cylinder && other.Figure.RestsOn.Contains(used.Figure)))
            .Select(used => new Caution(
                "earlier-stage",
                $"The {WhatWords.Of(used.Figure.What)} is from the stage {StageWords.Of(used.Figure.Stage!.Value)}.",
                Label(model, used.Cylinder), WhatWords.Of(used.Figure.What)));

    private static IEnumerable<Caution> TopLand(StageModel model) =>
        Each(model, cylinder => model.Model.Cylinders[cylinder].Known[(int)Output.ClearanceVolume]
                && !model.Model.Cylinders[cylinder].Form.WholeChamber && !model.Model.Cylinders[cylinder].Form.TopLand)
            .Select(cylinder => new Caution(
                "top-land-left-out", "The top-land crevice is left out: the true ratio is lower. Do not compare with a result that has it.",
                Label(model, cylinder), "top land height"));

    private static IEnumerable<Caution> Places(StageModel model)
    {
        foreach ((int cylinder, Figure figure) in model.Used.Where(used => used.Figure.Kind == FigureKind.Measured))
        {
            if (figure.What == What.Bore && figure.Places.Count == 1)
            {
                yield return new Caution(
                    "one-bore-place", "The bore was read at one place: taper and out-of-round are unknown.", Label(model, cylinder), "bore");
            }

            if (figure.What == What.Deck && figure.Places.Any(place => place.Place.At is null))
            {
                yield return new Caution(
                    "deck-without-end", "The deck was read without saying at which end of the pin: the nearer end is unknown.", Label(model, cylinder), "deck");
            }
        }
    }

    private static IEnumerable<Caution> WithoutLimits(StageModel model) =>
        model.Used
            .Where(used => used.Figure.RestsOn.Count == 0
                && used.Figure.Estimate.Terms.Any(term => model.Model.Sources[term.Source].Shape == SourceShape.Unstated))
            .Select(used => new Caution(
                "no-limits", $"The {WhatWords.Of(used.Figure.What)} is written without limits: taken as exact, and never enough for proof.",
                Label(model, used.Cylinder), WhatWords.Of(used.Figure.What)));

    private static IEnumerable<Caution> Gauges(StageModel model)
    {
        Dictionary<string, Gauge> gauges = model.Job.Gauges.ToDictionary(gauge => gauge.Id);
        foreach ((int cylinder, Figure figure) in model.Used.Where(used => used.Figure is { Kind: FigureKind.Measured, RestsOn.Count: 0 }))
        {
            string word = WhatWords.Of(figure.What);
            if (figure.Gauge is null)
            {
                yield return new Caution(
                    "no-gauge", $"No gauge is named for the {word}: its resolution is taken from the digits written, its limit of error is unknown.",
                    Label(model, cylinder), word);
            }
            else if (GaugesOf(figure).Any(id => gauges.TryGetValue(id!, out Gauge? gauge) && gauge.LimitOfError is null))
            {
                yield return new Caution(
                    "no-limit-of-error", $"The gauge of the {word} has no limit of error: how far it may be off is unknown.", Label(model, cylinder), word);
            }
        }
    }

    private static IEnumerable<Caution> Repeats(StageModel model)
    {
        foreach ((int cylinder, Figure figure) in model.Used.Where(used => used.Figure is { Kind: FigureKind.Measured, RestsOn.Count: 0 }))
        {
            string word = WhatWords.Of(figure.What);
            double freedom = figure.Estimate.Terms
                .Select(term => model.Model.Sources[term.Source])
                .Where(source => source.Shape == SourceShape.Pooled)
                .Select(source => source.DegreesOfFreedom)
                .DefaultIfEmpty(double.PositiveInfinity)
                .Min();
            if (freedom <= 2.0)
            {
                yield return new Caution(
                    "few-repeats", $"The {word} was repeated too seldom to know its scatter: the limits are very wide. Repeat more, or give the gauge its repeatability.",
                    Label(model, cylinder), word);
            }
            else if (GaugesOf(figure).Any(gauge => !model.Search.HasPool(figure.What, gauge)))
            {
                yield return new Caution(
                    "no-repeats", $"The {word} was not repeated and its gauge brings no repeatability: scatter is not in the result, nor in the worst case.",
                    Label(model, cylinder), word);
            }
        }
    }

    private static IEnumerable<Caution> Engine(StageModel model, StageFigures figures)
    {
        Engine engine = model.Job.Engine;
        bool warm = model.Job.Readings.Any(reading => reading.Temperature is not null && reading.Struck is null);
        if (warm && engine.BlockMetal is null)
        {
            yield return new Caution("metal-assumed", "The block's metal is not recorded: readings at a temperature were corrected for cast iron.");
        }

        if (warm && engine.Heads.Any(head => head.Metal is null))
        {
            yield return new Caution("metal-assumed", "A head's metal is not recorded: readings at a temperature were corrected for aluminium.");
        }

        if (engine.RodMetal is null && model.Job.Readings.Any(reading => reading is { What: What.RodLength, Temperature: not null, Struck: null }))
        {
            yield return new Caution("metal-assumed", "The rods' metal is not recorded: their length was corrected for steel.");
        }

        if (engine.Altitude is null && model.Model.Cylinders.Any(cylinder => cylinder.Known[(int)Output.CrankingPressure]))
        {
            yield return new Caution("altitude-assumed", "No altitude is recorded: the cranking pressure is for sea level.", null, "altitude");
        }

        if (engine.Cam?.At is { } lift && lift != "seat" && model.Model.Cylinders.Any(cylinder => cylinder.Form.Closing))
        {
            yield return new Caution(
                "closing-at-lift", $"The closing is stated at a lift of {lift}, before the valve seats: the trapped ratio comes out high.", null, "inlet closes");
        }

        if (engine.ClaimedDisplacement is { } claimed && figures.Displacement is { } displacement)
        {
            double halfWidth = claimed.HalfWidth ?? (claimed.LastDigit / 2.0);
            double original = engine.OriginalBore is { } bore && engine.Stroke is { } stroke
                ? engine.Cylinders * Volumes.OfCylinder(new Numerics.Real(bore.Midpoint), new Numerics.Real(stroke.Midpoint)).Value
                : double.NaN;
            bool agrees = claimed.Midpoint + halfWidth >= displacement.Worst.Low && claimed.Midpoint - halfWidth <= displacement.Worst.High;
            bool asBuilt = Math.Abs(original - claimed.Midpoint) <= halfWidth + (1e-3 * claimed.Midpoint);
            if (!agrees && !asBuilt)
            {
                yield return new Caution(
                    "claimed-displacement-differs",
                    $"The claimed displacement {claimed.Text} is not what bore and stroke give, by more than their limits allow: check both.", null, "displacement");
            }
        }
    }

    private static IEnumerable<Caution> Work(StageModel model)
    {
        if (model.Used.Any(used => used.Figure is { What: What.Bore, Kind: FigureKind.Measured })
            && model.Job.Readings.Any(reading => reading.What == What.Bore && reading.Struck is null && reading.Stage == model.Stage && reading.TorquePlate is null))
        {
            yield return new Caution(
                "torque-plate-unknown", "It is not recorded whether the bores were read with the torque plate on.", null, "bore");
        }

        if (model.Model.Cylinders.Any(cylinder => cylinder.Known[(int)Output.PistonToHead]))
        {
            yield return new Caution(
                "cold-gap", "Piston to head is cold and at rest; it shrinks running, by rod stretch, rock and heat. Check with clay or gauge.", null, "piston to head");
        }

        if (model.Job.Cuts.Any(cut => cut.Kind is CutKind.HeadSkim or CutKind.DeckCut && cut.Stage <= model.Stage && cut.Stage != Stage.Before))
        {
            yield return new Caution(
                "after-a-cut", "After a cut look to tilt, bolts bottoming, dowels, the front cover flush with the deck, and the cam turning free in a skimmed head.");
        }

        if (model.Model.Cylinders.Any(cylinder => cylinder.Known[(int)Output.CrankingPressure]))
        {
            yield return new Caution("cranking-test", "Cranking test: fuel and ignition disabled.", null, "cranking pressure");
        }

        yield return new Caution(
            "makers-limits-first",
            "Maker's limits, local codes and licensed practice come first. A probability here is belief from the stated figures, not a failure rate.");
    }

    // One place may have been read with several gauges; none named is a pool of its own.
    private static string?[] GaugesOf(Figure figure) => figure.Gauge is null ? new string?[1] : figure.Gauge.Split(", ");

    private static IEnumerable<int> Each(StageModel model, Func<int, bool> when) =>
        Enumerable.Range(0, model.Model.Cylinders.Count).Where(when);

    private static string Label(StageModel model, int cylinder) => model.Search.Parts.Label(cylinder);

    private static List<Caution> SaidOnce(List<Caution> cautions, int cylinders)
    {
        List<Caution> said = [];
        foreach (IGrouping<(string, string, string?), Caution> same in cautions.Distinct().GroupBy(caution => (caution.Code, caution.Text, caution.Figure)))
        {
            bool all = cylinders > 1 && same.Count(caution => caution.Cylinder is not null) == cylinders;
            said.AddRange(all ? [same.First() with { Cylinder = null }] : same);
        }

        return said;
    }
}
