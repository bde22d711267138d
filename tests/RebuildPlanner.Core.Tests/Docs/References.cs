using System.Text.RegularExpressions;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Docs;

/// <summary>The keys of docs/references.yaml, and every mention of one. The file keeps to keys at the margin, so lines suffice to read it.</summary>
internal static partial class References
{
    public static string[] Keys { get; } =
        [.. RepositoryFiles.Text("docs", "references.yaml").Split('\n').Select(line => Key().Match(line)).Where(key => key.Success).Select(key => key.Groups[1].Value)];

    /// <summary>File and text of every mention in a folder; in code only the comments that document it are looked at.</summary>
    public static (string File, string Mention)[] Mentions(string pattern, string comment, params string[] folder)
    {
        List<(string, string)> mentions = [];
        string own = Path.DirectorySeparatorChar.ToString(), built = $"{own}obj{own}";
        foreach (string path in Directory.GetFiles(RepositoryFiles.At(folder), pattern, SearchOption.AllDirectories).Where(path => !path.Contains(built, StringComparison.Ordinal)))
        {
            IEnumerable<string> lines = File.ReadAllLines(path).Select(line => line.Trim())
                .Where(line => line.StartsWith(comment, StringComparison.Ordinal)).Select(line => line[comment.Length..].Trim());
            mentions.AddRange(Start().Split(string.Join(' ', lines)).Skip(1).Select(mention => (Path.GetRelativePath(RepositoryFiles.Root, path), mention)));
        }

        return [.. mentions];
    }

    /// <summary>The keys a mention names, or none where it is not in the one form there is: key, key (clause), and a full stop.</summary>
    public static string[] KeysOf(string mention)
    {
        Match form = Form().Match(mention);
        return form.Success ? [.. form.Groups["key"].Captures.Select(key => key.Value)] : [];
    }

    [GeneratedRegex("^([a-z][a-z0-9-]*):\\s*$")]
    private static partial Regex Key();

    [GeneratedRegex(@"Source:\s")]
    private static partial Regex Start();

    [GeneratedRegex(@"^(?<key>[a-z][a-z0-9-]*)(?: \((?:[^()]|\([^()]*\))+\))?(?:, (?<key>[a-z][a-z0-9-]*)(?: \((?:[^()]|\([^()]*\))+\))?)*\.")]
    private static partial Regex Form();
}
