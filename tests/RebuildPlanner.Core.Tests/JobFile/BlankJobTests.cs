using System.Text.RegularExpressions;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Tests.Measuring;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.JobFile;

/// <summary>What a blank job shows in its comments, and what it fills in for the shop.</summary>
public partial class BlankJobTests
{
    private const int ExamplesInABlank = 8;

    // Whoever writes a first line copies the example above it, so each must read as it stands.
    [Theory]
    [MemberData(nameof(RoundTests.Blanks), MemberType = typeof(RoundTests))]
    public void The_example_lines_in_the_comments_read_without_fault_once_uncommented(string file)
    {
        int examples = 0;
        string text = ExamplesOverEmptyList().Replace(RepositoryFiles.Text("templates", file), match =>
        {
            string[] lines = [.. match.Groups["example"].Captures.Select(line => line.Value)];
            examples += lines.Length;
            return $"\"{match.Groups["name"].Value}\": [ {string.Join(", ", lines)} ]";
        });

        Job job = JobFiles.Whole(text);

        Assert.Equal(ExamplesInABlank, examples);
        Assert.Equal(
            (2, 1, 1, 1, 1, 1, 1),
            (job.Readings.Count, job.Given.Count, job.Assumed.Count, job.Pistons.Count, job.Gaskets.Count, job.Fitted.Count, job.Cuts.Count));
    }

    [Theory]
    [MemberData(nameof(RoundTests.Blanks), MemberType = typeof(RoundTests))]
    public void What_the_shop_and_the_maker_know_is_left_to_them(string file)
    {
        Job job = JobFiles.Whole(RepositoryFiles.Text("templates", file));

        Assert.Equal(("new", null, null, null, null), (job.Number, job.Title, job.Opened, job.CustomerName, job.CustomerContact));
        Assert.Equal(
            (null, null, null, null, null),
            (job.Engine.Stroke, job.Engine.RodLength, job.Engine.OriginalBore, job.Engine.ClaimedDisplacement, job.Engine.Cam?.InletCloses));
        Assert.All(job.Gauges, gauge => Assert.True(gauge is { Resolution: not null, LimitOfError: not null }, gauge.Id));
        Assert.All(job.Engine.Heads, head => Assert.NotNull(head.Metal));
    }

    // Common practice: 0.90 mm under the head for spark ignition with steel rods, bores true to 0.0125 mm, a gasket clear of the bore by 0.25 mm.
    [Theory]
    [MemberData(nameof(RoundTests.Blanks), MemberType = typeof(RoundTests))]
    public void The_limits_are_those_of_common_practice_and_say_so(string file)
    {
        string text = RepositoryFiles.Text("templates", file);
        Job job = JobFiles.Whole(text);
        string[] everywhere = ["taper max 0.0125 mm", "out-of-round max 0.0125 mm", "gasket overhang min 0.25 mm"];

        Assert.Equal(
            job.Engine.Ignition == Ignition.Spark ? ["piston to head min 0.90 mm", .. everywhere] : everywhere,
            job.Limits.Select(limit => limit.Subject.Word + (limit.Min is { } min ? $" min {min.Text}" : "") + (limit.Max is { } max ? $" max {max.Text}" : "")));
        Assert.NotEmpty(job.Processes);
        Assert.Matches("Common practice[^\\n]*the maker's limit comes first[^\\n]*\\n *\"limits\"", text);
        Assert.Matches("Common practice[^\\n]*\\n *\"process\"", text);
        Assert.Matches("your own gauges[^\\n]*\\n *\"gauges\"", text);
    }

    [GeneratedRegex("""(?:// (?<example>\{[^\n]*\})\s*)+"(?<name>\w+)": \[\]""")]
    private static partial Regex ExamplesOverEmptyList();
}
