using System.Globalization;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Stacks;

/// <summary>Rows of numbers from tests/Reference, their count pinned by the caller so that an empty file cannot pass.</summary>
internal static class ReferenceColumns
{
    public static double[][] Read(string file, int rows, int firstColumn = 0)
    {
        string[] lines = [.. RepositoryFiles.Text("tests", "Reference", file).Split('\n').Where(line => line.Length > 0 && line[0] != '#').Skip(1)];
        Assert.Equal(rows, lines.Length);
        return [.. lines.Select(line => line.Split(',').Skip(firstColumn).Select(Number).ToArray())];
    }

    private static double Number(string text) =>
        text == "inf" ? double.PositiveInfinity : double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);
}
