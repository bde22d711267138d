using RebuildPlanner.Core.Cylinders;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Numerics;
using RebuildPlanner.Core.Stacks;
using RebuildPlanner.Core.Tests.Jobs;

namespace RebuildPlanner.Core.Tests.Docs;

/// <summary>What the program itself makes of a worked example: by its formula, or where the method is a rule of the road, by a whole small job.</summary>
internal static class WorkedFormulas
{
    private const double Mm3PerCm3 = 1000.0;

    public static Dictionary<string, Func<WorkedExample, Dictionary<string, object>>> All { get; } = new()
    {
        ["swept-volume"] = page => One("swept", Cm3(Volumes.OfCylinder(Mm(page, "bore"), Mm(page, "travel")))),
        ["gasket-volume"] = page => One("gasket", Cm3(Volumes.OfGasket(Mm(page, "opening"), default, Mm(page, "thickness")))),
        ["deck-volume"] = page => One("deck volume", Cm3(Volumes.OfCylinder(Mm(page, "bore"), Mm(page, "deck")))),
        ["crown-by-fill"] = page => One("crown", Cm3(Volumes.OfCrownByFill(Mm3(page, "fill"), Mm(page, "bore"), Mm(page, "drop")))),
        ["top-land"] = page => One("top land", Cm3(Volumes.OfTopLand(Mm(page, "bore"), Mm(page, "land diameter"), Mm(page, "land height")))),
        ["compression-ratio"] = page => One("ratio", Volumes.CompressionRatio(Mm3(page, "swept"), Mm3(page, "clearance")).Value),
        ["slider-crank"] = Crank,
        ["trapped-ratio"] = Trapped,
        ["cranking-pressure"] = Cranking,
        ["deck-stack"] = DeckStack,
        ["piston-to-head"] = PistonToHead,
        ["chamber-after-skim"] = Skim,
        ["burette"] = Fill,
        ["length-temperature"] = Temperature,
        ["places-and-pools"] = Places,
        ["first-order"] = FirstOrderOfGap,
        ["worst-case"] = Worst,
        ["verdicts"] = VerdictsOfGap,
        ["spread"] = Spread,
        ["monte-carlo"] = Trials,
    };

    private static Dictionary<string, object> Crank(WorkedExample page)
    {
        Real stroke = Mm(page, "stroke"), rod = Mm(page, "rod"), offset = Mm(page, "offset");
        double angle = double.DegreesToRadians(page.In("angle", "deg"));
        return new()
        {
            ["reach"] = SliderCrank.Reach(stroke, rod, offset).Value,
            ["travel"] = SliderCrank.Travel(stroke, rod, offset).Value,
            ["below top"] = SliderCrank.BelowTop(stroke, rod, offset, new Real(Math.Sin(angle)), new Real(Math.Cos(angle))).Value,
        };
    }

    private static Dictionary<string, object> Trapped(WorkedExample page)
    {
        Real stroke = Mm(page, "stroke"), closing = new(double.DegreesToRadians(page.In("closing", "deg")));
        Real below = SliderCrank.BelowTopAtClosing(stroke, Mm(page, "rod"), default, closing, twoStroke: false);
        return new()
        {
            ["below top"] = below.Value,
            ["trapped"] = Charge.TrappedRatio(below, stroke, new Real(page.In("ratio", "1"))).Value,
        };
    }

    private static Dictionary<string, object> Cranking(WorkedExample page)
    {
        Real air = Charge.AmbientPressure(new Real(page.In("altitude", "m")));
        return new()
        {
            ["air"] = air.Value,
            ["gauge"] = Charge.CrankingPressure(new Real(page.In("trapped", "1")), air, new Real(page.In("exponent", "1"))).Value,
        };
    }

    private static Dictionary<string, object> DeckStack(WorkedExample page)
    {
        Job job = Workbench.Single(
            $$"""
            "engine": { "cylinders": 1, "stroke": "{{page.Text("stroke", "mm")}}", "rodLength": "{{page.Text("rod", "mm")}}",
              "pinOffset": "{{page.Text("offset", "mm")}}" }
            """,
            Given(("block height", page.Text("block height", "mm")), ("compression height", page.Text("compression height", "mm"))));
        return One("deck", Workbench.Find(job, Stage.AsReceived, What.Deck)!.Estimate.Value);
    }

    private static Dictionary<string, object> PistonToHead(WorkedExample page)
    {
        Job job = Workbench.Single(
            Given(("gasket thickness", page.Text("gasket", "mm")), ("rock", page.Text("rock", "mm"))),
            $$"""
            "readings": [
              { "what": "deck", "cylinder": "1", "at": "front", "value": "{{page.Text("deck front", "mm")}} below", "stage": "as received" },
              { "what": "deck", "cylinder": "1", "at": "rear", "value": "{{page.Text("deck rear", "mm")}} below", "stage": "as received" } ]
            """);
        return One("gap", StageResults.Of(job, Stage.AsReceived).Cylinders[0].PistonToHead!.Value);
    }

    private static Dictionary<string, object> Skim(WorkedExample page)
    {
        Job job = Workbench.Single(
            $$"""
            "given": [
              { "what": "chamber", "value": "{{page.Text("chamber", "cm3")}}" },
              { "what": "chamber opening area", "value": "{{page.Text("opening area", "mm2")}}" },
              { "what": "valve head diameter", "valve": "inlet", "value": "{{page.Text("inlet head", "mm")}}" },
              { "what": "valve head diameter", "valve": "exhaust", "value": "{{page.Text("exhaust head", "mm")}}" } ]
            """,
            $$"""
            "cuts": [
              { "what": "head skim", "head": "head", "value": "{{page.Text("skim", "mm")}}", "stage": "as machined" },
              { "what": "valve seat", "cylinder": "1", "valve": "inlet", "value": "{{page.Text("inlet sink", "mm")}}", "stage": "as machined" },
              { "what": "valve seat", "cylinder": "1", "valve": "exhaust", "value": "{{page.Text("exhaust sink", "mm")}}", "stage": "as machined" } ]
            """);
        return One("chamber after", Workbench.Find(job, Stage.AsMachined, What.Chamber)!.Estimate.Value / Mm3PerCm3);
    }

    private static Dictionary<string, object> Fill(WorkedExample page)
    {
        double celsius = page.In("temperature", "C");
        Assert.Equal(Burette.GlassExpansionPerC(Glass.Borosilicate), page.In("glass", "1/C"));
        Assert.Equal(Expansion.PerC(Metal.Aluminium), page.In("metal", "1/C"));
        double factor = Burette.FactorTo20C(
            Burette.GlassExpansionPerC(Glass.Borosilicate), celsius, Expansion.PerC(Metal.Aluminium), celsius);
        return new() { ["factor"] = factor, ["volume"] = page.In("read", "cm3") * factor };
    }

    private static Dictionary<string, object> Temperature(WorkedExample page)
    {
        double length = page.In("length", "mm");
        Assert.Equal(Expansion.PerC(Expansion.GaugeMetal), page.In("gauge", "1/C"));
        return new() { ["iron at 20"] = At20(Metal.CastIron, "iron"), ["aluminium at 20"] = At20(Metal.Aluminium, "aluminium") };

        double At20(Metal metal, string name)
        {
            double celsius = page.In("temperature", "C");
            Assert.Equal(Expansion.PerC(metal), page.In(name, "1/C"));
            return length + Expansion.CorrectionMm(length, Expansion.PerC(Expansion.GaugeMetal), celsius, Expansion.PerC(metal), celsius);
        }
    }

    private static Dictionary<string, object> Places(WorkedExample page)
    {
        (string Axis, string Name)[] places =
            [("thrust", "thrust 1"), ("thrust", "thrust 2"), ("thrust", "thrust 3"), ("along crank", "along 1"), ("along crank", "along 2")];
        IEnumerable<string> readings = places.Select(place =>
            $$"""
            { "what": "bore", "cylinder": "1", "at": "top", "axis": "{{place.Axis}}", "value": "{{page.Text(place.Name, "mm")}}", "gauge": "g",
              "stage": "as received" }
            """);
        Job job = Workbench.Single(
            Gauge(page, "bore gauge", "mm"), "\"readings\": [" + string.Join(",", readings) + "]");
        StageModel model = new(job, Stage.AsReceived);
        Source scatter = model.Search.Find(What.Bore, 0)!.Places[0].Estimate.Terms
            .Select(term => model.Model.Sources[term.Source]).First(source => source.Shape == SourceShape.Pooled);
        ResultQuantity bore = StageResults.Of(job, Stage.AsReceived).Cylinders[0].Bore!;
        return new()
        {
            ["bore"] = bore.Value,
            ["u of the first place"] = scatter.StandardUncertainty,
            ["degrees of freedom"] = scatter.DegreesOfFreedom,
            ["u"] = bore.StandardUncertainty!,
            ["worst low"] = bore.WorstLow!,
            ["worst high"] = bore.WorstHigh!,
        };
    }

    private static Dictionary<string, object> FirstOrderOfGap(WorkedExample page)
    {
        Job job = Workbench.Single(Given(
            ("gasket thickness", Limited(page, "gasket", "mm")), ("deck", Limited(page, "deck", "mm") + " below")));
        StageModel model = new(job, Stage.AsReceived);
        LinearFigure gap = new StageFigures(model).Of(Output.PistonToHead, 0)!;
        double[] row = [.. gap.Row];
        double u = Propagation.StandardUncertainty(model.Model.Sources, row);
        return new()
        {
            ["gap"] = gap.Value,
            ["u"] = u,
            ["half width 95"] = new LinearSum(model.Model.Sources, row).HalfWidth(),
            ["k times u"] = u * Propagation.CoverageFactor(Propagation.EffectiveDegreesOfFreedom(model.Model.Sources, row)),
        };
    }

    private static Dictionary<string, object> Worst(WorkedExample page)
    {
        Job job = Workbench.Single(
            $$"""
            "engine": { "cylinders": 1, "stroke": "{{Limited(page, "stroke", "mm")}}" }
            """,
            Given(
                ("bore", Limited(page, "bore", "mm")), ("whole chamber", Limited(page, "fill", "cm3")), ("plug hole", Limited(page, "hole", "cm3"))));
        ResultQuantity ratio = StageResults.Of(job, Stage.AsReceived).Cylinders[0].CompressionRatio!;
        return new() { ["ratio"] = ratio.Value, ["worst low"] = ratio.WorstLow!, ["worst high"] = ratio.WorstHigh! };
    }

    private static Dictionary<string, object> VerdictsOfGap(WorkedExample page)
    {
        Job job = Workbench.Engine(
            2,
            Given(("gasket thickness", Limited(page, "gasket", "mm")), ("deck", Limited(page, "deck", "mm") + " below")),
            $$"""
            "limits": [ { "what": "piston to head", "min": "{{page.Text("least", "mm")}}", "stage": "as received" } ]
            """);
        IReadOnlyList<Verdict> verdicts = StageResults.Of(job, Stage.AsReceived).Verdicts;
        Verdict single = verdicts.First(verdict => verdict.Cylinder == "1"), joint = verdicts.Single(verdict => verdict.Cylinder is null);
        Assert.Equal(page.In("level", "1"), single.Level);
        return new()
        {
            ["single"] = single.Probability!,
            ["joint"] = joint.Probability!,
            ["verdict"] = single.State == VerdictState.NotProven ? "not proven" : single.State.ToString(),
            ["settle"] = single.Settle!,
        };
    }

    private static Dictionary<string, object> Spread(WorkedExample page)
    {
        string[] readings =
        [
            .. new[] { ("1", "first"), ("2", "second") }.Select(chamber =>
                $$"""
                { "what": "chamber", "cylinder": "{{chamber.Item1}}", "from": "0.0 cc", "to": "{{page.Text(chamber.Item2, "cm3")}}", "gauge": "g",
                  "stage": "as received" }
                """),
        ];
        Job job = Workbench.Engine(2, Gauge(page, "burette", "cm3"), "\"readings\": [" + string.Join(",", readings) + "]");
        ResultQuantity spread = StageResults.Of(job, Stage.AsReceived, new TrialOptions(Trials: 0)).ChamberSpread!;
        return new()
        {
            ["spread"] = spread.Value / Mm3PerCm3,
            ["u"] = spread.StandardUncertainty!.Value / Mm3PerCm3,
            ["half width 95"] = (spread.High!.Value - spread.Value) / Mm3PerCm3,
            ["worst low"] = spread.WorstLow!.Value / Mm3PerCm3,
            ["worst high"] = spread.WorstHigh!.Value / Mm3PerCm3,
        };
    }

    private static Dictionary<string, object> Trials(WorkedExample page)
    {
        Job job = Workbench.Single(
            $$"""
            "engine": { "cylinders": 1, "stroke": "{{page.Text("stroke", "mm")}} ± 0 mm" }
            """,
            Given(("bore", page.Text("bore", "mm") + " ± 0 mm"), ("whole chamber", Limited(page, "chamber", "cm3")), ("plug hole", "0 cc ± 0 cc")));
        ResultQuantity first = StageResults.Of(job, Stage.AsReceived, new TrialOptions(Trials: 0)).Cylinders[0].CompressionRatio!;
        Results results = StageResults.Of(job, Stage.AsReceived);
        ResultQuantity counted = results.Cylinders[0].CompressionRatio!;
        return new()
        {
            ["first order low"] = first.Low!,
            ["first order high"] = first.High!,
            ["tolerance"] = MonteCarlo.Tolerance(first.StandardUncertainty!.Value, 2),
            ["low"] = counted.Low!,
            ["high"] = counted.High!,
            ["which counts"] = results.Trials!.FirstOrderHolds ? "first order" : "trials",
        };
    }

    private static Dictionary<string, object> One(string name, double value) => new() { [name] = value };

    private static Real Mm(WorkedExample page, string name) => new(page.In(name, "mm"));

    private static Real Mm3(WorkedExample page, string name) => new(page.In(name, "cm3") * Mm3PerCm3);

    private static double Cm3(Real mm3) => mm3.Value / Mm3PerCm3;

    private static string Limited(WorkedExample page, string name, string unit) => $"{page.Text(name, unit)} ± {page.Text(name + " limits", unit)}";

    private static string Given(params (string What, string Value)[] entries) =>
        "\"given\": [" + string.Join(", ", entries.Select(entry => $$"""{ "what": "{{entry.What}}", "value": "{{entry.Value}}" }""")) + "]";

    private static string Gauge(WorkedExample page, string kind, string unit) =>
        $$"""
        "gauges": [ { "id": "g", "kind": "{{kind}}", "resolution": "{{page.Text("resolution", unit)}}",
          "limitOfError": "{{page.Text("limit of error", unit)}}" } ]
        """;
}
