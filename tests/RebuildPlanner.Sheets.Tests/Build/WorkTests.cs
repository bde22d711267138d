using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Pages;

namespace RebuildPlanner.Sheets.Tests.Build;

public class WorkTests
{
    private static readonly Job Job = SheetFiles.Read(
        """
        { "format": "rebuild-planner-job", "version": 1, "job": { "number": "W" }, "engine": { "cylinders": 1 }, "given": [ { "what": "bore", "value": "84 mm" } ],
          "parts": { "gaskets": [ { "id": "old" }, { "id": "new" } ] },
          "fitted": [ { "stage": "as received", "gasket": "old" }, { "stage": "as machined", "gasket": "new" } ],
          "cuts": [ { "what": "head skim", "head": "head", "value": "0.10 mm", "stage": "before" }, { "what": "deck cut", "bank": "block", "value": "0.20 mm", "stage": "as machined" } ],
          "checks": [ { "what": "crack test", "result": "none", "stage": "as received" }, { "what": "pressure test", "result": "tight", "stage": "as machined" }, { "what": "weighed" } ] }
        """);

    // A sheet of an engine as received must not tell of work that was only done, or parts that were only fitted, later.
    [Theory]
    [InlineData(Stage.AsReceived, "gasket old", "head skim", "crack test", "weighed")]
    [InlineData(Stage.AsMachined, "gasket old", "gasket new", "head skim", "deck cut", "crack test", "pressure test", "weighed")]
    public void Parts_work_and_checks_are_those_up_to_the_stage(Stage stage, params string[] said)
    {
        Sheet sheet = BuildSheet.Of(SheetFiles.Input(Job), StageResults.Of(Job, stage));

        IEnumerable<Block> part = sheet.Blocks.SkipWhile(block => block is not Heading { Text: "Parts and work" }).Skip(1).TakeWhile(block => block is not Heading);
        Assert.Equal(said, part.OfType<Table>().SelectMany(table => table.Rows).Select(row => row[0]));
    }
}
