using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Sheets.Tests.Build;

/// <summary>What a sheet says, as approved. When a sheet is meant to say something else, the new text is read and put in Approved.</summary>
public class SheetSnapshotTests
{
    [Theory]
    [InlineData("van-four.json", UnitSystem.Metric)]
    [InlineData("hill-climb-vee-eight.json", UnitSystem.Inch)]
    [InlineData("fen-boat-three.json", UnitSystem.Metric)]
    public void A_build_sheet_says_what_was_approved(string sample, UnitSystem units) =>
        AssertApproved($"sheet-{Path.GetFileNameWithoutExtension(sample)}", SheetFiles.BuildSheetOf(SheetFiles.Sample(sample), units));

    [Theory]
    [InlineData("two-stroke-twin.json")]
    public void A_measuring_form_says_what_was_approved(string template)
    {
        Job job = SheetFiles.Read(RepositoryFiles.Text("templates", template));

        AssertApproved($"form-{Path.GetFileNameWithoutExtension(template)}", MeasuringForm.Of(SheetFiles.Input(job), Stage.AsReceived, Round.Of(job.Engine)));
    }

    private static void AssertApproved(string name, Sheet sheet)
    {
        string said = SheetText.Of(sheet);
        string path = RepositoryFiles.At("tests", "RebuildPlanner.Sheets.Tests", "Approved", $"{name}.txt");
        string received = Path.Combine(AppContext.BaseDirectory, $"{name}.received.txt");
        File.WriteAllText(received, said);

        Assert.True(File.Exists(path), $"Nothing is approved yet; {received} is what the sheet says.");
        Assert.Equal(File.ReadAllText(path), said);
    }
}
