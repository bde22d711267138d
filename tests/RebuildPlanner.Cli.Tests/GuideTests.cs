using System.Security.Cryptography;
using System.Text;
using System.Text.RegularExpressions;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Cli.Tests;

/// <summary>The guide's commands run as they stand in it, one after the other, and print what it says they print.</summary>
public sealed partial class GuideTests : IDisposable
{
    private const string AnyLines = "…";

    private readonly Scratch _scratch = new();

    public void Dispose() => _scratch.Dispose();

    [Fact]
    public void The_commands_of_the_guide_print_what_it_says()
    {
        foreach (string file in Directory.GetFiles(RepositoryFiles.At("docs", "guide"), "*.json"))
        {
            File.Copy(file, _scratch[Path.GetFileName(file)]);
        }

        Match[] steps = [.. Step().Matches(RepositoryFiles.Text("docs", "guide.md")).Cast<Match>()];

        Assert.Equal(10, steps.Length);
        foreach (Match step in steps)
        {
            StringBuilder said = new();
            foreach (string line in step.Groups["commands"].Value.Split('\n', StringSplitOptions.RemoveEmptyEntries))
            {
                string[] words = [.. Word().Matches(line).Cast<Match>().Select(word => word.Value.Trim('"'))];
                Assert.Equal("rebuild", words[0]);
                Screen screen = Screen.Of([.. words[1..].Select(InScratch)]);
                said.Append(screen.Error).Append(screen.Output);
                Assert.Equal(step.Groups["exit"].Success ? 2 : 0, screen.ExitCode);
            }

            AssertSays(step.Groups["output"].Value, said.ToString().Replace(_scratch[""] + Path.DirectorySeparatorChar, "", StringComparison.Ordinal));
        }

        // The pictures are of these very pages.
        Dictionary<string, string> pictured = RepositoryFiles.Text("docs", "guide", "pictures.sha256").Split('\n', StringSplitOptions.RemoveEmptyEntries)
            .Select(line => line.Split("  ")).ToDictionary(pair => pair[1], pair => pair[0]);
        foreach ((string picture, string printed) in new[] { ("form.pdf", "form.pdf"), ("sheet.pdf", "2026-071.pdf") })
        {
            string hash = Convert.ToHexStringLower(SHA256.HashData(File.ReadAllBytes(_scratch[printed])));
            Assert.True(pictured[picture] == hash, $"{printed} has changed since docs/pictures.sh made the guide's pictures: look at it and run that again.");
        }
    }

    [Fact]
    public void Every_picture_and_file_the_guide_names_is_there() => Assert.All(
        Link().Matches(RepositoryFiles.Text("docs", "guide.md")).Cast<Match>(),
        link => Assert.True(File.Exists(RepositoryFiles.At("docs", link.Groups[1].Value)), link.Value));

    private string InScratch(string word) => word.Contains('.', StringComparison.Ordinal) || word == "own" ? _scratch[word] : word;

    private static void AssertSays(string written, string said)
    {
        string[] wanted = Lines(written), lines = Lines(said);
        int at = 0;
        for (int line = 0; line < wanted.Length; line++)
        {
            if (wanted[line] != AnyLines)
            {
                Assert.True(at < lines.Length && lines[at] == wanted[line], $"The guide says '{wanted[line]}', the program '{(at < lines.Length ? lines[at] : "nothing more")}'.");
                at++;
                continue;
            }

            // Any lines, up to the one that is written next.
            at = line + 1 < wanted.Length ? Array.IndexOf(lines, wanted[line + 1], at) : lines.Length;
            Assert.True(at >= 0, $"The program does not say '{wanted[Math.Min(line + 1, wanted.Length - 1)]}'.");
        }

        Assert.Equal(lines.Length, at);
    }

    // Blanks at the end of a table's line are not seen in a guide.
    private static string[] Lines(string text) => [.. text.TrimEnd().Split('\n').Select(line => line.TrimEnd())];

    [GeneratedRegex(@"```sh(?<exit> exit=2)?\n(?<commands>[^`]+)```\n```text\n(?<output>[^`]*)```")]
    private static partial Regex Step();

    [GeneratedRegex("\"[^\"]*\"|\\S+")]
    private static partial Regex Word();

    [GeneratedRegex(@"\]\(((?:guide|\.\.)/[^)]*)\)")]
    private static partial Regex Link();
}
