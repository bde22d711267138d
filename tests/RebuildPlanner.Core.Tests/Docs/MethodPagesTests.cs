namespace RebuildPlanner.Core.Tests.Docs;

/// <summary>The pages of docs/methods are read by machinists and by this test: what they work out by hand, the program works out too.</summary>
public class MethodPagesTests
{
    private const int PageCount = 20, LongestPage = 60;

    public static TheoryData<string> Pages => [.. WorkedExample.Pages];

    [Fact]
    public void There_is_a_page_for_every_formula_and_a_formula_for_every_page()
    {
        Assert.Equal(PageCount, WorkedExample.Pages.Length);
        Assert.Equal(WorkedExample.Pages, WorkedFormulas.All.Keys.Order(StringComparer.Ordinal));
    }

    [Theory]
    [MemberData(nameof(Pages))]
    public void The_worked_example_is_what_the_program_gives(string page)
    {
        WorkedExample example = WorkedExample.Of(page);
        Assert.Equal(page, example.Formula);

        Dictionary<string, object> computed = WorkedFormulas.All[example.Formula](example);

        Assert.Empty(example.Unread);
        Assert.Equal(computed.Keys.Order(StringComparer.Ordinal), example.Outputs.Select(output => output.Name).Order(StringComparer.Ordinal));
        Assert.All(example.Outputs, output =>
        {
            if (output.Number is { } expected)
            {
                // To half the last digit written; the hair more is for figures that end exactly on a half.
                Assert.Equal(expected, (double)computed[output.Name], output.LastDigit * (1.0 + 1e-9));
            }
            else
            {
                Assert.Equal(output.Written, computed[output.Name]);
            }
        });
    }

    [Theory]
    [MemberData(nameof(Pages))]
    public void A_page_is_short_and_says_source_range_and_error(string page)
    {
        string text = WorkedExample.TextOf(page);

        Assert.InRange(text.Count(letter => letter == '\n'), 10, LongestPage);
        Assert.Contains("\nSource: ", text, StringComparison.Ordinal);
        Assert.Contains("**Valid for.**", text, StringComparison.Ordinal);
        Assert.Contains("**Error.**", text, StringComparison.Ordinal);
        Assert.Contains("| symbol | what | unit |", text, StringComparison.Ordinal);
    }
}
