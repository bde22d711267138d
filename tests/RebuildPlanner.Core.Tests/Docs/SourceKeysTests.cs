namespace RebuildPlanner.Core.Tests.Docs;

public class SourceKeysTests
{
    private const int LeastInCode = 50, LeastInMethods = 19, LeastKeys = 17;

    private static readonly (string File, string Mention)[] InCode = References.Mentions("*.cs", "///", "src");
    private static readonly (string File, string Mention)[] InMethods = References.Mentions("*.md", "", "docs", "methods");

    [Fact]
    public void The_mentions_are_found()
    {
        Assert.InRange(InCode.Length, LeastInCode, int.MaxValue);
        Assert.InRange(InMethods.Length, LeastInMethods, int.MaxValue);
        Assert.InRange(References.Keys.Length, LeastKeys, int.MaxValue);
    }

    [Fact]
    public void Every_source_named_is_in_the_references() => Assert.All(InCode.Concat(InMethods), each =>
    {
        string[] keys = References.KeysOf(each.Mention);
        Assert.True(keys.Length > 0, $"{each.File}: not of the form 'Source: key (clause), key.': {each.Mention[..Math.Min(60, each.Mention.Length)]}");
        Assert.All(keys, key => Assert.True(References.Keys.Contains(key), $"{each.File}: docs/references.yaml has no {key}."));
    });

    [Fact]
    public void Every_reference_is_used_and_stands_once()
    {
        HashSet<string> used = [.. InCode.Concat(InMethods).SelectMany(each => References.KeysOf(each.Mention))];

        Assert.Equal(References.Keys.Length, References.Keys.Distinct().Count());
        Assert.Empty(References.Keys.Except(used));
    }
}
