using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Store.Tests;

public class ArrowTests
{
    // An assembly keeps no reference it does not use, so the project file is what says where the arrows may point.
    [Fact]
    public void Store_points_at_Core_alone()
    {
        string project = RepositoryFiles.Text("src", "RebuildPlanner.Store", "RebuildPlanner.Store.csproj");

        string[] arrows = [.. project.Split('\n').Where(line => line.Contains("<ProjectReference", StringComparison.Ordinal))];

        Assert.Contains("RebuildPlanner.Core.csproj", Assert.Single(arrows), StringComparison.Ordinal);
    }
}
