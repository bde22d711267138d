using System.Text.RegularExpressions;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Core.Tests.Measuring;

public partial class WhatPageTests
{
    private static string Page => RepositoryFiles.Text("docs", "what.md").ReplaceLineEndings("\n");

    [Fact]
    public void The_page_prints_the_table_the_program_goes_by()
    {
        string page = Page;
        int start = page.IndexOf(WhatPage.Start, StringComparison.Ordinal), end = page.IndexOf(WhatPage.End, StringComparison.Ordinal);
        Assert.True(start >= 0 && end > start, "The page has lost its marks.");

        string table = WhatPage.Table();
        string printed = page[(start + WhatPage.Start.Length)..end].Trim('\n') + "\n";
        Assert.True(table == printed, $"docs/what.md is behind the code; between its marks belongs:\n{table}");
    }

    [Fact]
    public void Every_example_on_the_page_reads_as_the_page_says()
    {
        MatchCollection examples = Example().Matches(Page);
        Assert.Equal(16, examples.Count);
        Assert.All(examples, example =>
        {
            string text = example.Groups["text"].Value, word = example.Groups["what"].Value;
            Quantity? quantity = QuantityText.Read(text, WhatTable.Find(word)!.Rule, out string? problem);
            Assert.True(quantity is null == (example.Groups["verdict"].Value == "refused"), $"{text}: {problem ?? "read"}");
        });
    }

    [GeneratedRegex(@"^\| `(?<text>[^`]+)` \| (?<what>[a-z ]+) \| (?<verdict>read|refused)[ :,;]", RegexOptions.Multiline)]
    private static partial Regex Example();
}
