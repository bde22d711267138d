using System.Text.Json;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Cli.Tests;

public class ResultsCommandTests
{
    private const string Gap =
        """
        { "format": "rebuild-planner-job", "version": 1, "job": { "number": "G-1", "title": "A gap" },
          "engine": { "cylinders": 1, "stroke": "78 mm ± 0.04 mm" },
          "given": [ { "what": "gasket thickness", "value": "1.2 mm ± 0.05 mm" }, { "what": "deck", "value": "0.2 mm ± 0.03 mm below" } ],
          "limits": [ { "what": "piston to head", "min": "MIN", "stage": "as received" } ] }
        """;

    public static TheoryData<string> Samples =>
        [.. Directory.GetFiles(RepositoryFiles.At("samples"), "*.json").Select(path => Path.GetFileName(path)!).Order()];

    [Theory]
    [MemberData(nameof(Samples))]
    public void Every_sample_fits_80_columns_without_a_control_character(string sample)
    {
        foreach (string[] options in new string[][] { [], ["--inch"] })
        {
            Screen screen = Screen.Of(["results", "--file", RepositoryFiles.At("samples", sample), .. options]);

            Assert.InRange(screen.ExitCode, 0, 1);
            Assert.Empty(screen.Error);
            Assert.All(screen.Output.Split('\n'), line => Assert.InRange(line.Length, 0, 80));
            Assert.DoesNotContain(screen.Output, character => char.IsControl(character) && character != '\n');
            Assert.DoesNotContain('…', screen.Output); // a cell cut short is a figure lost
        }
    }

    [Fact]
    public void A_table_of_which_nothing_is_known_is_left_out()
    {
        string output = Screen.Of("results", "--file", RepositoryFiles.At("samples", "fen-boat-three.json"), "--stage", "as received").Output;

        Assert.Contains("Volumes, cm³", output, StringComparison.Ordinal);
        Assert.DoesNotContain("Compression ratio", output, StringComparison.Ordinal);
        Assert.Contains(" - deck: all", output, StringComparison.Ordinal);
    }

    [Fact]
    public void There_are_three_samples() => Assert.Equal(3, Samples.Count);

    [Theory]
    [InlineData("1.0 mm", 0, "within")]
    [InlineData("1.38 mm", 0, "not proven")]
    [InlineData("1.6 mm", 1, "outside")]
    public void Exit_code_is_one_only_when_a_verdict_is_outside(string min, int exitCode, string word)
    {
        Screen screen = Screen.OfFile(Gap.Replace("MIN", min, StringComparison.Ordinal), "--stage", "as received");

        Assert.Equal(exitCode, screen.ExitCode);
        Assert.Contains(word, screen.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_fault_is_said_at_once_with_file_line_place_and_value()
    {
        Screen screen = Screen.OfFile(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "F" },
              "engine": { "cylinders": 1, "stroke": "78,5 mm" },
              "readings": [ { "what": "bor", "cylinder": "1", "value": "81 mm" } ] }
            """);

        Assert.Equal(2, screen.ExitCode);
        Assert.Empty(screen.Output);
        Assert.Contains("job.json, line 2: engine.stroke: \"78,5 mm\": ", screen.Error, StringComparison.Ordinal);
        Assert.Contains("78.5 mm", screen.Error, StringComparison.Ordinal);
        Assert.Contains("job.json, line 3: readings[0].what: \"bor\": ", screen.Error, StringComparison.Ordinal);
        Assert.Contains("\"bore\"", screen.Error.Replace('\'', '"'), StringComparison.Ordinal);
        Assert.EndsWith("2 faults; nothing was computed.\n", screen.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void An_engine_of_which_nothing_can_be_computed_is_refused_with_what_is_missing()
    {
        Screen screen = Screen.OfFile(""" { "format": "rebuild-planner-job", "version": 1, "job": { "number": "E" }, "engine": { "cylinders": 2 } } """);

        Assert.Equal(2, screen.ExitCode);
        Assert.StartsWith("job.json: no cylinder can be computed at the stage as received. Missing:\n  bore: all\n", screen.Error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("results", "--file", "no-such-file.json", "no-such-file.json: there is no such file.")]
    [InlineData("results", "--file", ".", ".: that is a folder; a job file is wanted.")]
    [InlineData("results", "--file", "x.json", "--stage", "as recieved", "did you mean \"as received\"?")]
    [InlineData("results", "--fill", "x.json", "--fill: there is no such option here; did you mean --file?")]
    [InlineData("result", "Did you mean rebuild results?")]
    [InlineData("sheet", "--fill", "x.json", "See rebuild sheet --help.")]
    public void A_wrong_request_is_answered_with_what_would_be_right(params string[] words)
    {
        Screen screen = Screen.Of(words[..^1]);

        Assert.Equal(2, screen.ExitCode);
        Assert.Empty(screen.Output);
        Assert.Contains(words[^1], screen.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void Results_as_json_parse_and_name_the_job()
    {
        Screen screen = Screen.OfFile(Gap.Replace("MIN", "1.0 mm", StringComparison.Ordinal), "--stage", "as received", "--json");

        JsonElement root = JsonDocument.Parse(screen.Output).RootElement;
        Assert.Equal(("rebuild-planner-results", "G-1"), (root.GetProperty("format").GetString(), root.GetProperty("job").GetString()));
        Assert.Equal(1.4, root.GetProperty("cylinders")[0].GetProperty("pistonToHead").GetProperty("value").GetDouble(), 1e-12);
    }

    [Fact]
    public void Inch_is_asked_for_and_printed()
    {
        string output = Screen.OfFile(Gap.Replace("MIN", "1.0 mm", StringComparison.Ordinal), "--stage", "as received", "--inch").Output;

        Assert.Contains("Piston to head, in", output, StringComparison.Ordinal);
        Assert.Contains("0.0551", output, StringComparison.Ordinal); // 1.4 mm
    }

    [Fact]
    public void Without_a_stage_the_last_one_recorded_is_shown() =>
        Assert.Contains("Stage: as machined", Screen.Of("results", "--file", RepositoryFiles.At("samples", "van-four.json")).Output, StringComparison.Ordinal);

    public static TheoryData<string> Commands =>
        [.. Directory.GetFiles(RepositoryFiles.At("tests", "RebuildPlanner.Cli.Tests", "Approved"), "help-*.txt").Select(path => Path.GetFileNameWithoutExtension(path)["help-".Length..]).Order(StringComparer.Ordinal)];

    [Theory]
    [MemberData(nameof(Commands))]
    public void Help_reads_as_approved(string command)
    {
        Screen screen = Screen.Of([.. command == "root" ? Array.Empty<string>() : [command], "--help"]);

        Assert.Equal(0, screen.ExitCode);
        Assert.Equal(RepositoryFiles.Text("tests", "RebuildPlanner.Cli.Tests", "Approved", $"help-{command}.txt"), TrimEnds(screen.Output));
    }

    // A command's file is named after it, so that the folder says which there are.
    [Fact]
    public void Every_command_has_an_approved_help_with_an_example()
    {
        string[] files = [.. Directory.GetFiles(RepositoryFiles.At("src", "RebuildPlanner.Cli"), "*Command.cs").Select(path => Path.GetFileNameWithoutExtension(path)[..^"Command".Length].ToLowerInvariant())];
        string[] approved = [.. Commands.Select(command => (string)command).Where(command => command != "root")];

        Assert.Equal(approved, files.Except(["entry"]).Order(StringComparer.Ordinal)); // what several commands share is no command
        Assert.All(approved, command => Assert.Contains($"rebuild {command}", Screen.Of(command, "--help").Output.Split("Example")[1], StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("bash", "complete -o default -F _rebuild rebuild")]
    [InlineData("zsh", "compdef _rebuild rebuild")]
    [InlineData("fish", "complete -c rebuild")]
    public void Completions_are_printed_for_each_shell(string shell, string line) =>
        Assert.Contains(line, Screen.Of("completions", shell).Output, StringComparison.Ordinal);

    [Fact]
    public void The_shell_is_offered_the_stages_in_words_of_the_trade() => Assert.Equal(
        ["as machined", "as received", "before", "planned"],
        Screen.Of("[suggest:24]", "rebuild results --stage ").Output.Split('\n', StringSplitOptions.RemoveEmptyEntries).Where(word => !word.StartsWith('-')).Order());

    [Fact]
    public void Limits_that_read_alike_are_told_apart_by_what_they_are_set_on()
    {
        Screen screen = Screen.OfFile(
            """
            { "format": "rebuild-planner-job", "version": 1, "job": { "number": "H" },
              "engine": { "cylinders": 2, "layout": "vee", "banks": [ { "label": "l", "cylinders": ["1"] }, { "label": "r", "cylinders": ["2"] } ] },
              "given": [ { "what": "bore", "value": "84 mm ± 0.01 mm" }, { "what": "head height", "value": "118.6 mm ± 0.1 mm" } ],
              "limits": [ { "what": "head height", "min": "118 mm", "head": "l", "stage": "as received" }, { "what": "head height", "min": "118 mm", "head": "r", "stage": "as received" },
                { "what": "piston to valve", "min": "1 mm", "valve": "inlet", "stage": "as received" } ] }
            """,
            "--stage", "as received");

        Assert.Equal(
            ["head height min 118 mm, l", "head height min 118 mm, r", "piston to valve min 1 mm, inlet"],
            screen.Output.Split('\n').Where(line => line.StartsWith("Limit: ", StringComparison.Ordinal)).Select(line => line[7..line.IndexOf(" (", StringComparison.Ordinal)]));
    }

    // The library names the running program, which here is the test.
    private static string TrimEnds(string text) => string.Join('\n', text.Split('\n').Select(line => line.TrimEnd())).TrimEnd().Replace("RebuildPlanner.Cli.Tests", "rebuild", StringComparison.Ordinal) + "\n";
}
