using System.Text;
using System.Text.Json;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Pages;
using RebuildPlanner.Sheets.Templates;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Sheets.Tests.Templates;

public class TemplateTests
{
    private static readonly string Original = RepositoryFiles.Text("templates", TemplateFiles.Wording);

    [Fact]
    public void The_files_in_the_program_are_those_in_the_folder()
    {
        string[] inFolder = [.. Directory.GetFiles(RepositoryFiles.At("templates")).Select(path => Path.GetFileName(path)!).Order(StringComparer.Ordinal)];

        Assert.Equal(10, inFolder.Length);
        Assert.Equal(inFolder, TemplateFiles.Names);
        Assert.All(inFolder, name => Assert.Equal(File.ReadAllBytes(RepositoryFiles.At("templates", name)), TemplateFiles.Read(name)));
    }

    [Fact]
    public void The_wording_file_holds_every_phrase_and_no_other_in_order()
    {
        using JsonDocument file = JsonDocument.Parse(Original, new JsonDocumentOptions { CommentHandling = JsonCommentHandling.Skip });

        Assert.Equal(Enum.GetValues<Phrase>().Select(SheetWording.Key), file.RootElement.GetProperty("phrases").EnumerateObject().Select(phrase => phrase.Name));
    }

    // A phrase that no sheet says is no longer needed.
    [Fact]
    public void Every_phrase_is_said_somewhere()
    {
        string code = string.Concat(Directory.GetFiles(RepositoryFiles.At("src", "RebuildPlanner.Sheets"), "*.cs", SearchOption.AllDirectories)
            .Where(path => !path.Contains($"{Path.DirectorySeparatorChar}obj{Path.DirectorySeparatorChar}", StringComparison.Ordinal)).Select(File.ReadAllText));

        Assert.All(Enum.GetValues<Phrase>(), phrase => Assert.Matches($@"Phrase\.{phrase}\b", code));
    }

    [Fact]
    public void An_edited_phrase_is_said_and_one_taken_out_keeps_its_original_words()
    {
        SheetWording words = Read("""{ "format": "rebuild-planner-wording", "version": 1, "phrases": { "title": "Engine report" } }""");

        Assert.Equal("Engine report", words.Of(Phrase.Title));
        Assert.Equal("Customer", words.Of(Phrase.Customer));
    }

    [Fact]
    public void What_is_filled_in_is_never_read_for_braces_again() =>
        Assert.Equal("{low} : 1, between 1 and 2", SheetWording.Original.Of(Phrase.AnswerSame, ("ratio", "{low}"), ("low", "1"), ("high", "2")));

    [Theory]
    [InlineData("\"title\": \"Build sheet\"", "\"titel\": \"Build sheet\"", 7, "phrases.titel", "did you mean 'title'?")]
    [InlineData("between {low} and {high}\",\n    \"answerRange\"", "between {lo} and {high}\",\n    \"answerRange\"", 27, "phrases.answerSame", "did you mean 'low'?")]
    [InlineData("page {page} of {pages}", "page {page of {pages}", 10, "phrases.pageOf", "a brace is opened and not closed")]
    [InlineData("page {page} of {pages}", "page page} of {pages}", 10, "phrases.pageOf", "a brace is opened and not closed")]
    [InlineData("\"version\": 1", "\"version\": 2", 5, "version", "version 1 only")]
    [InlineData("rebuild-planner-wording", "rebuild-planner-shop", 4, "format", "rebuild-planner-wording")]
    [InlineData("\"title\": \"Build sheet\"", "\"title\": 5", 7, "phrases.title", "text in double quotes")]
    public void A_broken_wording_is_refused_with_its_line(string right, string wrong, int line, string path, string message)
    {
        string broken = Original.Replace(right, wrong, StringComparison.Ordinal);
        Assert.NotEqual(Original, broken);

        (SheetWording? words, IReadOnlyList<Fault> faults) = SheetWording.Read(Encoding.UTF8.GetBytes(broken));

        Assert.Null(words);
        Fault fault = Assert.Single(faults);
        Assert.Equal((line, path), (fault.Line, fault.Path));
        Assert.Contains(message, fault.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void What_is_not_JSON_is_refused_with_its_line()
    {
        (SheetWording? words, IReadOnlyList<Fault> faults) = SheetWording.Read(Encoding.UTF8.GetBytes(Original.Replace("\"title\": \"Build sheet\",", "\"title\": \"Build sheet", StringComparison.Ordinal)));

        Assert.Null(words);
        Assert.Equal(7, Assert.Single(faults).Line);
    }

    [Fact]
    public void A_shop_prints_as_it_says()
    {
        Shop shop = Shop.Read("""{ "format": "rebuild-planner-shop", "version": 1, "name": "Tröger & Søn", "address": ["Mill Lane 4"], "paper": "Letter", "units": "inch" }"""u8).Shop!;

        Assert.Equal(("Tröger & Søn", Paper.Letter, UnitSystem.Inch, (string?)null), (shop.Name, shop.Paper, shop.Units, shop.Contact));
        Assert.Equal(["Mill Lane 4"], shop.Address);
    }

    [Theory]
    [InlineData("\"paper\": \"A5\"", "paper", "A4, Letter")]
    [InlineData("\"units\": \"metric\"", "units", "mm, inch")]
    [InlineData("\"adress\": []", "adress", "did you mean 'address'?")]
    [InlineData("\"address\": [1]", "address[0]", "text in double quotes")]
    public void A_broken_shop_is_refused_with_what_would_be_right(string field, string path, string message)
    {
        (Shop? shop, IReadOnlyList<Fault> faults) = Shop.Read(Encoding.UTF8.GetBytes($$"""{ "format": "rebuild-planner-shop", "version": 1, "name": "N", {{field}} }"""));

        Assert.Null(shop);
        Assert.Equal(path, Assert.Single(faults).Path);
        Assert.Contains(message, faults[0].Message, StringComparison.Ordinal);
    }

    private static SheetWording Read(string json)
    {
        (SheetWording? words, IReadOnlyList<Fault> faults) = SheetWording.Read(Encoding.UTF8.GetBytes(json));
        Assert.Empty(faults);
        return words!;
    }
}
