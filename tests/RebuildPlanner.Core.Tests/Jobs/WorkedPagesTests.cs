using System.Text.Json;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Jobs;

/// <summary>One cylinder of each sample, worked by hand in docs/worked outside the program.</summary>
public class WorkedPagesTests
{
    public static TheoryData<string> Pages =>
        [.. Directory.GetFiles(RepositoryFiles.At("docs", "worked"), "*.md").Select(path => Path.GetFileName(path)!).Order()];

    [Fact]
    public void There_is_a_page_for_each_sample() => Assert.Equal(
        Directory.GetFiles(RepositoryFiles.At("samples"), "*.json").Select(path => Path.ChangeExtension(Path.GetFileName(path), "md")!).Order(),
        Pages.Select(row => row.Data));

    // The page takes sensitivities by differences, good to about 1e-7; the values are plain algebra.
    [Theory]
    [MemberData(nameof(Pages))]
    public void The_program_agrees_with_the_hand_computation(string page)
    {
        string text = RepositoryFiles.Text("docs", "worked", page);
        JsonElement hand = JsonDocument.Parse(text.Split("```json")[1].Split("```")[0]).RootElement;
        Job job = Workbench.Read(RepositoryFiles.Text("samples", hand.GetProperty("sample").GetString()!));

        Results results = StageResults.Of(job, StageWords.Find(hand.GetProperty("stage").GetString()!)!.Value);
        CylinderResult cylinder = results.Cylinders.Single(each => each.Cylinder == hand.GetProperty("cylinder").GetString());

        Assert.Equal(hand.GetProperty("sweptVolume").GetDouble(), cylinder.SweptVolume!.Value / 1000, 1e-9);
        Assert.Equal(hand.GetProperty("clearanceVolume").GetDouble(), cylinder.ClearanceVolume!.Value / 1000, 1e-9);
        Assert.Equal(hand.GetProperty("compressionRatio").GetDouble(), cylinder.CompressionRatio!.Value, 1e-9);
        Assert.Equal(hand.GetProperty("standardUncertainty").GetDouble(), cylinder.CompressionRatio.StandardUncertainty!.Value, 1e-7);
        Assert.Equal(hand.GetProperty("pistonToHead").GetDouble(), cylinder.PistonToHead!.Value, 1e-9);
        Assert.Equal(hand.GetProperty("largestShare").GetString(), cylinder.Shares[0].Input);
    }
}
