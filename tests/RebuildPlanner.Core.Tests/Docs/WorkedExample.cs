using System.Globalization;
using System.Text.RegularExpressions;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Docs;

/// <summary>One line of a worked example: a number with its unit, or words where a method gives words.</summary>
internal sealed record WorkedLine(string Name, string Written, string Unit)
{
    public double? Number => double.TryParse(Written, NumberStyles.Float, CultureInfo.InvariantCulture, out double number) ? number : null;

    /// <summary>Half a unit of the last digit written.</summary>
    public double LastDigit
    {
        get
        {
            int point = Written.IndexOf('.', StringComparison.Ordinal);
            return 0.5 * Math.Pow(10.0, point < 0 ? 0 : point + 1 - Written.Length);
        }
    }
}

/// <summary>A worked example as a page of docs/methods prints it; it knows which of its inputs were read.</summary>
internal sealed partial class WorkedExample
{
    private readonly Dictionary<string, WorkedLine> _inputs = [];
    private readonly HashSet<string> _read = [];

    private WorkedExample(string formula) => Formula = formula;

    public string Formula { get; }

    public List<WorkedLine> Outputs { get; } = [];

    public IEnumerable<string> Unread => _inputs.Keys.Except(_read);

    /// <summary>The pages, by name.</summary>
    public static string[] Pages { get; } =
        [.. Directory.GetFiles(RepositoryFiles.At("docs", "methods"), "*.md").Select(path => Path.GetFileNameWithoutExtension(path)).Order(StringComparer.Ordinal)];

    public static string TextOf(string page) => RepositoryFiles.Text("docs", "methods", page + ".md").ReplaceLineEndings("\n");

    public static WorkedExample Of(string page)
    {
        Match block = Assert.Single(Block().Matches(TextOf(page)));
        string[] lines = block.Groups["lines"].Value.TrimEnd('\n').Split('\n');
        WorkedExample example = new(Written(lines[0], "formula"));
        int gives = Array.IndexOf(lines, "gives");
        Assert.InRange(gives, 2, lines.Length - 2);
        foreach (WorkedLine line in lines[1..gives].Select(LineOf))
        {
            Assert.True(line.Number is not null, $"{page}: an input is a number, unlike {line.Written}.");
            example._inputs.Add(line.Name, line);
        }

        example.Outputs.AddRange(lines[(gives + 1)..].Select(LineOf));
        return example;
    }

    /// <summary>An input in the unit it must be written in.</summary>
    public double In(string name, string unit)
    {
        Assert.True(_inputs.TryGetValue(name, out WorkedLine? line), $"{Formula}: no input '{name}'.");
        Assert.Equal(unit, line!.Unit);
        _read.Add(name);
        return line.Number!.Value;
    }

    /// <summary>An input as it would stand in a job file.</summary>
    public string Text(string name, string unit)
    {
        In(name, unit);
        return $"{_inputs[name].Written} {unit.Replace("cm3", "cc", StringComparison.Ordinal)}";
    }

    private static string Written(string line, string name)
    {
        Assert.StartsWith(name + " = ", line, StringComparison.Ordinal);
        return line[(name.Length + 3)..];
    }

    private static WorkedLine LineOf(string line)
    {
        string[] sides = line.Split(" = ");
        Assert.Equal(2, sides.Length);
        int space = sides[1].LastIndexOf(' ');
        WorkedLine number = new(sides[0], sides[1][..Math.Max(0, space)], sides[1][(space + 1)..]);
        return number.Number is null ? new WorkedLine(sides[0], sides[1], "") : number;
    }

    [GeneratedRegex("^```worked\n(?<lines>[^`]*)```$", RegexOptions.Multiline)]
    private static partial Regex Block();
}
