using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Cli.Tests;

public class ArrowTests
{
    [Fact]
    public void Nothing_points_at_the_command_line()
    {
        string[] projects = Directory.GetFiles(RepositoryFiles.At("src"), "*.csproj", SearchOption.AllDirectories);

        Assert.Equal(4, projects.Length);
        Assert.DoesNotContain(projects, project => File.ReadAllText(project).Contains("RebuildPlanner.Cli.csproj", StringComparison.Ordinal));
    }
}
