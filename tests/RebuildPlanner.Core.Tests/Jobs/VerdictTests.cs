using RebuildPlanner.Core.Jobs;

namespace RebuildPlanner.Core.Tests.Jobs;

public class VerdictTests
{
    // Gap 1.40 mm from 1.2 ± 0.05 and 0.2 ± 0.03, both rectangular: the trapezoid's chance below 1.34 is 0.02²/(8·0.05·0.03) = 1/30, by hand.
    [Theory]
    [InlineData("1.34 mm", 1 - (1.0 / 30), VerdictState.NotProven)]
    [InlineData("1.30 mm", 1.0, VerdictState.Within)]
    [InlineData("1.40 mm", 0.5, VerdictState.NotProven)]
    [InlineData("1.50 mm", 0.0, VerdictState.Outside)]
    public void Probability_inside_a_limit_is_that_of_the_exact_sum(string min, double probability, VerdictState state)
    {
        Verdict verdict = Judge($$""" { "what": "piston to head", "min": "{{min}}", "stage": "as received" } """)[0];

        Assert.Equal(probability, verdict.Probability!.Value, 1e-9);
        Assert.Equal((state, 0.99), (verdict.State, verdict.Level));
    }

    // Without the gasket's ± 0.05 the deck's ± 0.03 stays wholly above 1.34; without the deck's the gasket still reaches 1.35: either would prove
    // it, the gasket has the larger share.
    [Fact]
    public void What_would_settle_a_doubtful_verdict_is_the_largest_share_that_proves_it()
    {
        Verdict verdict = Judge(""" { "what": "piston to head", "min": "1.34 mm", "stage": "as received" } """)[0];

        Assert.Equal("gasket thickness", verdict.Settle);
    }

    [Fact]
    public void Nothing_settles_what_lies_on_the_limit()
    {
        Verdict verdict = Judge(""" { "what": "piston to head", "min": "1.40 mm", "stage": "as received" } """)[0];

        Assert.Null(verdict.Settle);
    }

    [Fact]
    public void A_limit_may_state_its_own_level()
    {
        Verdict verdict = Judge(""" { "what": "piston to head", "min": "1.34 mm", "level": 0.95, "stage": "as received" } """)[0];

        Assert.Equal((VerdictState.Within, 0.95), (verdict.State, verdict.Level));
    }

    [Fact]
    public void Minimum_and_maximum_together_are_one_verdict()
    {
        Verdict[] verdicts = Judge(""" { "what": "piston to head", "min": "1.34 mm", "max": "1.46 mm", "stage": "as received" } """);

        Assert.Equal(2, verdicts.Length);
        Assert.Equal(1 - (2.0 / 30), verdicts[0].Probability!.Value, 1e-9);
        Assert.Equal("min 1.34 mm, max 1.46 mm", verdicts[0].Limit);
    }

    // Two cylinders under one head share the gasket, but each has its own deck. With gasket error g in ± 0.05 and each deck error in ± 0.03,
    // both gaps are above 1.34 with chance ∫ dg/0.1 · q(g)², where q = (0.09 + g)/0.06 for g < −0.03 and 1 above:
    // (0.08 + [0.06/3]·(1 − (2/3)³))/0.1 = 0.9407407, by hand.
    [Fact]
    public void The_joint_probability_knows_what_the_cylinders_share()
    {
        Verdict[] verdicts = [.. StageResults.Of(
            Workbench.Engine(2, """ "limits": [ { "what": "piston to head", "min": "1.34 mm", "stage": "as received" } ] """), Stage.AsReceived).Verdicts];

        Assert.Equal(["1", "2", null], verdicts.Select(verdict => verdict.Cylinder));
        Assert.Equal(0.9407407, verdicts[2].Probability!.Value, 2e-3); // the joint rule's own accuracy
    }

    [Fact]
    public void A_figure_without_limits_is_never_enough_for_proof()
    {
        Verdict verdict = StageResults.Of(
            Workbench.Single(
                """
                "given": [ { "what": "bore", "value": "81 mm ± 0.01 mm" }, { "what": "chamber", "value": "36 cc ± 0.3 cc" }, { "what": "gasket thickness", "value": "1.2 mm" },
                  { "what": "gasket opening", "value": "82.5 mm ± 0.2 mm" }, { "what": "deck", "value": "0.2 mm ± 0.03 mm below" }, { "what": "crown", "value": "0 cc flat" } ]
                """,
                """ "limits": [ { "what": "piston to head", "min": "0.9 mm", "stage": "as received" } ] """),
            Stage.AsReceived).Verdicts[0];

        Assert.Equal((VerdictState.NotProven, "gasket thickness"), (verdict.State, verdict.Settle));
        Assert.Equal(1.0, verdict.Probability!.Value, 1e-12);
    }

    [Fact]
    public void Limits_of_plus_or_minus_nothing_are_believed()
    {
        Verdict verdict = StageResults.Of(
            Workbench.Single(
                """ "given": [ { "what": "gasket thickness", "value": "1.2 mm ± 0 mm" }, { "what": "deck", "value": "0.2 mm ± 0 mm below" } ] """,
                """ "limits": [ { "what": "piston to head", "min": "0.9 mm", "stage": "as received" } ] """),
            Stage.AsReceived).Verdicts[0];

        Assert.Equal((VerdictState.Within, 1.0), (verdict.State, verdict.Probability!.Value));
    }

    [Fact]
    public void A_worn_engine_is_not_judged_as_received_unless_a_limit_says_so()
    {
        Job job = Workbench.Single(""" "limits": [ { "what": "piston to head", "min": "0.9 mm" } ] """);

        Assert.Empty(StageResults.Of(job, Stage.AsReceived).Verdicts);
        Assert.NotEmpty(StageResults.Of(job, Stage.Planned).Verdicts);
        Assert.NotEmpty(StageResults.Of(job, Stage.AsMachined).Verdicts);
    }

    [Fact]
    public void The_thinnest_wall_is_judged_not_the_mean()
    {
        Verdict verdict = StageResults.Of(
            Workbench.Single(
                """ "given": [ { "what": "wall", "clock": 3, "value": "2.8 mm ± 0.1 mm", "stage": "as received" }, { "what": "wall", "clock": 9, "value": "5.0 mm ± 0.1 mm", "stage": "as received" } ] """,
                """ "limits": [ { "what": "wall", "min": "3.0 mm", "stage": "as received" } ] """),
            Stage.AsReceived).Verdicts[0];

        Assert.Equal((VerdictState.Outside, 0.99), (verdict.State, verdict.Level));
    }

    [Fact]
    public void A_head_has_one_height_however_many_cylinders()
    {
        Verdict[] verdicts = [.. StageResults.Of(
            Workbench.Engine(
                4, """ "given": [ { "what": "head height", "value": "119.0 mm ± 0.05 mm", "stage": "as received" } ] """,
                """ "cuts": [ { "what": "head skim", "value": "0.30 mm ± 0.01 mm", "stage": "planned" } ] """,
                """ "limits": [ { "what": "head height", "min": "118.6 mm" } ] """),
            Stage.Planned).Verdicts];

        Assert.Equal((null, VerdictState.Within), (Assert.Single(verdicts).Cylinder, verdicts[0].State));
    }

    private static Verdict[] Judge(string limit) =>
        [.. StageResults.Of(Workbench.Single($$""" "limits": [ {{limit}} ] """), Stage.AsReceived).Verdicts];
}
