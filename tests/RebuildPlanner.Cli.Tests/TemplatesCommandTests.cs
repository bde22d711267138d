using RebuildPlanner.Tests.Shared;
using UglyToad.PdfPig;

namespace RebuildPlanner.Cli.Tests;

public sealed class TemplatesCommandTests : IDisposable
{
    private readonly Scratch _scratch = new();

    private static string Van => RepositoryFiles.At("samples", "van-four.json");

    public void Dispose() => _scratch.Dispose();

    [Fact]
    public void Templates_are_written_out_and_what_a_shop_has_changed_is_left()
    {
        Screen first = Screen.Of("templates", "--to", _scratch["own"]);
        string shop = Path.Combine(_scratch["own"], "shop.json");
        string changed = File.ReadAllText(shop).Replace("Your shop's name", "Tröger & Søn", StringComparison.Ordinal);
        File.WriteAllText(shop, changed);

        Screen second = Screen.Of("templates", "--to", _scratch["own"]);

        Assert.Equal((0, 0), (first.ExitCode, second.ExitCode));
        Assert.Equal(10, first.Output.Split('\n', StringSplitOptions.RemoveEmptyEntries).Length);
        Assert.Contains($"{shop}: was there already, left as it is", second.Output, StringComparison.Ordinal);
        Assert.Equal(changed, File.ReadAllText(shop));
        Assert.Equal(RepositoryFiles.Text("templates", "single.json"), File.ReadAllText(Path.Combine(_scratch["own"], "single.json")));
    }

    [Fact]
    public void An_edited_shop_is_printed_from_a_named_folder_and_from_the_data_folder()
    {
        Directory.CreateDirectory(_scratch["templates"]);
        _scratch.Write(Path.Combine("templates", "shop.json"), """{ "format": "rebuild-planner-shop", "version": 1, "name": "Tröger & Søn", "paper": "Letter" }""");

        Screen named = Screen.Of("sheet", "--file", Van, "--templates", _scratch["templates"], "--out", _scratch["named.pdf"]);
        Screen data = Screen.At(_scratch["."], "sheet", "--file", Van, "--out", _scratch["data.pdf"]);

        Assert.Equal((0, 0), (named.ExitCode, data.ExitCode));
        Assert.Equal(File.ReadAllBytes(_scratch["named.pdf"]), File.ReadAllBytes(_scratch["data.pdf"]));
        using PdfDocument pdf = PdfDocument.Open(_scratch["named.pdf"]);
        Assert.Equal(("Tröger & Søn", 612.0), (pdf.Information.Author, Math.Round(pdf.GetPage(1).Width, 1)));
    }

    [Fact]
    public void A_broken_template_is_refused_with_file_line_and_what_would_be_right_and_nothing_is_printed()
    {
        Directory.CreateDirectory(_scratch["templates"]);
        _scratch.Write(
            Path.Combine("templates", "sheet-wording.json"), "{ \"format\": \"rebuild-planner-wording\", \"version\": 1,\n  \"phrases\": { \"titel\": \"Report\" } }");

        Screen screen = Screen.Of("sheet", "--file", Van, "--templates", _scratch["templates"], "--out", _scratch["van.pdf"]);

        Assert.Equal(2, screen.ExitCode);
        Assert.Contains("sheet-wording.json, line 2: phrases.titel: \"Report\": unknown field 'titel'; did you mean 'title'?", screen.Error, StringComparison.Ordinal);
        Assert.EndsWith("1 fault; nothing was printed.\n", screen.Error, StringComparison.Ordinal);
        Assert.False(File.Exists(_scratch["van.pdf"]));
    }

    [Fact]
    public void A_file_where_the_folder_should_be_is_refused()
    {
        Screen screen = Screen.Of("templates", "--to", _scratch.Write("file", "text"));

        Assert.Equal(2, screen.ExitCode);
        Assert.Contains("that is a file; a folder is wanted.", screen.Error, StringComparison.Ordinal);
    }
}
