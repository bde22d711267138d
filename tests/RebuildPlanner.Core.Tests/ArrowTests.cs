namespace RebuildPlanner.Core.Tests;

public class ArrowTests
{
    [Fact]
    public void Core_points_at_no_other_room_and_at_no_package()
    {
        string[] outside = [.. typeof(Core.Jobs.Job).Assembly.GetReferencedAssemblies()
            .Select(assembly => assembly.Name!)
            .Where(name => !name.StartsWith("System.", StringComparison.Ordinal))];

        Assert.Empty(outside);
    }
}
