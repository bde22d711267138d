using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Sheets.Tests;

public class ArrowTests
{
    // An assembly keeps no reference it does not use, so the project file is what says where the arrows may point.
    [Fact]
    public void Sheets_points_at_Core_alone()
    {
        string project = RepositoryFiles.Text("src", "RebuildPlanner.Sheets", "RebuildPlanner.Sheets.csproj");

        string[] arrows = [.. project.Split('\n').Where(line => line.Contains("<ProjectReference", StringComparison.Ordinal))];

        Assert.Contains("RebuildPlanner.Core.csproj", Assert.Single(arrows), StringComparison.Ordinal);
    }
}
