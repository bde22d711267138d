using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Pages;

namespace RebuildPlanner.Sheets.Tests.Build;

public class LimitsTests
{
    // Gap: deck and gasket, 1.3 mm on cylinder 1, 0.9 mm on cylinder 2; heads of 118.9 mm and 118.4 mm; valves of 2.0 mm and 1.2 mm.
    private const string Engine =
        """
        "format": "rebuild-planner-job", "version": 1, "job": { "number": "L" },
        "engine": { "cylinders": 2, "layout": "vee", "labels": ["1", "2"], "banks": [ { "label": "near", "cylinders": ["1"] }, { "label": "far", "cylinders": ["2"] } ],
          "heads": [ { "label": "left", "cylinders": ["1"] }, { "label": "right", "cylinders": ["2"] } ] },
        "given": [ { "what": "gasket thickness", "value": "1.1 mm ± 0.02 mm" }, { "what": "deck", "cylinder": "1", "value": "0.2 mm ± 0.02 mm below" },
          { "what": "deck", "cylinder": "2", "value": "0.2 mm ± 0.02 mm proud" }, { "what": "head height", "head": "left", "value": "118.9 mm ± 0.02 mm" },
          { "what": "head height", "head": "right", "value": "118.4 mm ± 0.02 mm" } ]
        """;

    [Fact]
    public void Limits_that_read_alike_on_two_cylinders_are_two()
    {
        Sheet sheet = SheetOf("""{ "what": "piston to head", "min": "1.1 mm", "cylinder": "2" }, { "what": "piston to head", "min": "1.1 mm", "cylinder": "1" }""");

        Assert.Equal(
            ["NOT held: piston to head min 1.1 mm, cylinder 2.", "Held: piston to head min 1.1 mm, cylinder 1."], Answers(sheet));
        Assert.Equal(
            ["piston to head min 1.1 mm, cylinder 2: NOT held.", "piston to head min 1.1 mm, cylinder 1: held."],
            Sentences(sheet).Select(sentence => sentence[..(sentence.IndexOf("eld.", StringComparison.Ordinal) + 4)]));
    }

    [Fact]
    public void The_same_limit_set_twice_is_said_twice() =>
        Assert.Equal(2, Sentences(SheetOf("""{ "what": "piston to head", "min": "0.5 mm" }, { "what": "piston to head", "min": "0.5 mm" }""")).Count());

    [Fact]
    public void A_limit_on_a_head_or_a_valve_says_which()
    {
        Sheet sheet = SheetOf("""{ "what": "head height", "min": "118.6 mm", "head": "left" }, { "what": "head height", "min": "118.6 mm", "head": "right" }, { "what": "piston to valve", "min": "1.5 mm", "valve": "inlet", "cylinder": "1" }""");

        Assert.Equal(
            [
                "NOT held: head height min 118.6 mm, right.", "Not proven: piston to valve min 1.5 mm, cylinder 1, inlet.", "Held: head height min 118.6 mm, left.",
            ],
            Answers(sheet));
    }

    private static Sheet SheetOf(string limits) => BuildSheet.Of(
        SheetFiles.Input(SheetFiles.Read($$"""{ {{Engine}}, "limits": [ {{limits}} ] }""")),
        StageResults.Of(SheetFiles.Read($$"""{ {{Engine}}, "limits": [ {{limits}} ] }"""), Stage.AsMachined));

    private static IEnumerable<string> Answers(Sheet sheet) =>
        sheet.Blocks.OfType<Framed>().Single().Blocks.OfType<Paragraph>().Where(paragraph => paragraph.Style == Style.Strong).Select(paragraph => paragraph.Text);

    private static IEnumerable<string> Sentences(Sheet sheet) => sheet.Blocks.SkipWhile(block => block is not Heading { Text: "Limits and verdicts" }).OfType<Points>().First().Items;
}
