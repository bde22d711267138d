using System.Text;
using RebuildPlanner.Core.JobFile;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Measuring;
using RebuildPlanner.Tests.Shared;

namespace RebuildPlanner.Cli.Tests;

public sealed class StoreCommandsTests : IDisposable
{
    private readonly Scratch _scratch = new();

    private static string Van => RepositoryFiles.At("samples", "van-four.json");

    public void Dispose() => _scratch.Dispose();

    [Theory]
    [InlineData("van-four.json", "2026-041")]
    [InlineData("hill-climb-vee-eight.json", "2026-052")]
    [InlineData("fen-boat-three.json", "2026-060")]
    public void A_job_goes_in_and_comes_out_the_same_and_its_results_too(string sample, string number)
    {
        string path = RepositoryFiles.At("samples", sample);

        Assert.Equal(0, Run("import", path).ExitCode);
        string exported = Run("export", number).Output;

        Assert.Equal(JobFileReader.Read(File.ReadAllBytes(path)).Job, JobFileReader.Read(Encoding.UTF8.GetBytes(exported)).Job);
        Assert.Equal(Run("results", "--file", path, "--json").Output, Run("results", number, "--json").Output);
    }

    [Fact]
    public void Imported_twice_a_job_is_there_once()
    {
        Run("import", Van);
        string before = Run("history", "2026-041").Output;

        Screen again = Run("import", Van);

        Assert.Equal(0, again.ExitCode);
        Assert.Contains("0 entries added", again.Output, StringComparison.Ordinal);
        Assert.Equal(before, Run("history", "2026-041").Output);
    }

    [Fact]
    public void Importing_again_adds_readings_of_new_ids_and_refuses_changed_ones()
    {
        const string First = """{ "format": "rebuild-planner-job", "version": 1, "job": { "number": "I-1" }, "engine": { "cylinders": 1 }, "readings": [ { "id": "r1", "what": "stroke", "value": "78.0 mm" } READING ] }""";
        string Job(string reading) => _scratch.Write("job.json", First.Replace("READING", reading, StringComparison.Ordinal));
        Run("import", Job(""));

        Screen added = Run("import", Job(""", { "id": "r2", "what": "stroke", "value": "78.1 mm" }"""));
        Screen changed = Run("import", _scratch.Write("other.json", First.Replace("READING", "", StringComparison.Ordinal).Replace("78.0", "79.0", StringComparison.Ordinal)));
        Screen without = Run("import", Job(""", { "what": "stroke", "value": "78.2 mm" }"""));

        Assert.Contains("1 entries added", added.Output, StringComparison.Ordinal);
        Assert.Equal((2, 2), (changed.ExitCode, without.ExitCode));
        Assert.Contains("reading r1 is in the store already and says something else", changed.Error, StringComparison.Ordinal);
        Assert.Contains("readings without an id", without.Error, StringComparison.Ordinal);
        Assert.Equal(2, Exported("I-1").Readings.Count);
    }

    [Fact]
    public void A_job_is_started_from_a_blank_one_filled_and_read()
    {
        Screen started = Run("start", "2026-090", "--from", "single", "--customer", "Smith & Sons <x>", "--complaint", "says \"tick\"");
        Run("set", "2026-090", "engine.stroke", "78 mm ± 0.05 mm");
        Run("set", "2026-090", "engine.rodLength", "132 mm ± 0.1 mm");
        Run("given", "2026-090", "crown", "1.0 cc ± 0.2 cc dish", "--from", "maker");
        Run("assumed", "2026-090", "top land height", "5 mm ± 1 mm");
        Run("gasket", "2026-090", "G1", "--opening", "82 mm ± 0.1 mm", "--thickness", "1.2 mm ± 0.03 mm");
        Run("piston", "2026-090", "std", "--compression-height", "30 mm ± 0.03 mm", "--piece", "P1", "--piece", "P2", "--price", "81.50", "--not-on-offer");
        Run("fit", "2026-090", "--gasket", "G1", "--piston", "std", "--stage", "as received");
        Run("cut", "2026-090", "head skim", "--value", "0.20 mm ± 0.02 mm", "--stage", "before");
        Run("process", "2026-090", "sleeve", "--tolerance", "0.008 mm", "--step", "0.01 mm", "--max", "0.6 mm", "--clean-up", "0.06 mm", "--hone-stock", "0.10 mm", "--offset", "0.02 mm");
        Screen twice = Run("process", "2026-090", "sleeve", "--tolerance", "0.01 mm");
        Run("target", "2026-090", "compression ratio", "--min", "9.0", "--max", "9.5");
        Run("limit", "2026-090", "piston to head", "--min", "1.0 mm", "--level", "0.975", "--stage", "as received");
        Run("check", "2026-090", "crack test", "--result", "none found", "--stage", "as received");
        Run("note", "2026-090", "Mind the {seals} & \"studs\".");
        Run("measure", "2026-090", "bore", "81.02 mm", "--cylinder", "1", "--gauge", "bore gauge", "--stage", "as received", "--no-torque-plate");
        Run("measure", "2026-090", "deck", "0.2 mm below", "--cylinder", "1", "--at", "front", "--gauge", "depth dial", "--stage", "as received");
        Run("measure", "2026-090", "chamber", "--cylinder", "1", "--fill", "0 cc..30.0 cc", "--fill", "0 cc..8.4 cc", "--gauge", "burette", "--stage", "as received");

        Job job = Exported("2026-090");

        Assert.Equal(0, started.ExitCode);
        Assert.Equal(("Smith & Sons <x>", "says \"tick\"", "2026-12-01"), (job.CustomerName, job.Complaint, job.Opened));
        Assert.Equal(("std", 81.50m, false), (job.Pistons[0].Id, job.Pistons[0].Price, job.Pistons[0].OnOffer));
        Assert.Equal(["P1", "P2"], job.Pistons[0].Pieces);
        Assert.Equal((0.975, Stage.AsReceived), (job.Limits[^1].Level, job.Limits[^1].Stage));
        Assert.Equal("Mind the {seals} & \"studs\".", Assert.Single(job.Notes));
        Assert.Equal((What.Chamber, 2), (job.Readings[^1].What, job.Readings[^1].Fills.Count));
        Assert.False(job.Readings[0].TorquePlate);
        Assert.Equal((CutKind.HeadSkim, Stage.Before), (job.Cuts[0].Kind, job.Cuts[0].Stage));
        Process sleeve = Assert.Single(job.Processes, process => process.Kind == CutKind.Sleeve);
        Assert.Equal((0.008, 0.06, 0.10), (sleeve.Tolerance!.Value, sleeve.CleanUp!.Value, sleeve.HoneStock!.Value));
        Assert.Equal((0.01, 0.6, 0.02), (sleeve.Step!.Value, sleeve.Max!.Value, sleeve.Offset!.Value));
        Assert.Equal(2, twice.ExitCode);
        Assert.Contains("write it once", twice.Error, StringComparison.Ordinal);
        Assert.Contains("Compression ratio", Run("results", "2026-090").Output, StringComparison.Ordinal);
        Screen show = Run("show", "2026-090");
        Assert.Contains("readings      as received: bore 1, deck 1, chamber 1", show.Output, StringComparison.Ordinal);
        Assert.DoesNotContain("{\"", show.Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("2", "given", "2026-041", "crwon", "1 cc dish")]
    [InlineData("2", "given", "2026-041", "crown", "1 cc")]
    [InlineData("2", "fit", "2026-041", "--piston", "nowhere", "--stage", "planned")]
    [InlineData("2", "limit", "2026-041", "piston to head", "--min", "1 cc")]
    [InlineData("2", "measure", "2026-041", "bore", "84,1 mm", "--cylinder", "1")]
    [InlineData("2", "measure", "2026-041", "bore", "84.1 mm", "--cylinder", "9")]
    [InlineData("2", "measure", "2026-041", "chamber", "--cylinder", "1", "--fill", "30 cc")]
    [InlineData("2", "measure", "2026-041", "--stage", "as recieved")]
    [InlineData("2", "set", "2026-041", "engine.strok", "88 mm")]
    [InlineData("2", "set", "2026-041", "job.number", "X")]
    [InlineData("2", "strike", "2026-041", "nothing", "--reason", "why")]
    [InlineData("2", "start", "2026-041", "--from", "single")]
    [InlineData("2", "start", "2026-042", "--from", "singel")]
    [InlineData("2", "history", "2026-041", "chambre")]
    [InlineData("2", "gauge", "dial", "--kind", "dial gauge", "--resolution", "0.01")]
    public void What_is_wrong_is_refused_and_nothing_is_written(string exitCode, params string[] args)
    {
        Run("import", Van);
        string before = Run("history", "2026-041").Output;

        Screen screen = Run(args);

        Assert.Equal(exitCode, screen.ExitCode.ToString(System.Globalization.CultureInfo.InvariantCulture));
        Assert.NotEmpty(screen.Error);
        Assert.Equal(before, Run("history", "2026-041").Output);
        Assert.Contains("1 jobs", Run("jobs").Output, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("show", "2026-014")]
    [InlineData("results", "2026-014")]
    [InlineData("note", "2026-014", "text")]
    [InlineData("measure", "2026-014")]
    [InlineData("export", "2026-014")]
    public void A_job_that_is_not_there_is_answered_with_the_nearest(params string[] args)
    {
        Run("import", Van);

        Screen screen = Run(args);

        Assert.Equal(2, screen.ExitCode);
        Assert.Contains("There is no job 2026-014 in the store; did you mean 2026-041?", screen.Error, StringComparison.Ordinal);
    }

    [Fact]
    public void The_same_write_under_the_same_key_is_one()
    {
        Run("import", Van);
        string[] note = ["note", "2026-041", "once", "--key", "k1"];

        Assert.Equal((0, 0), (Run(note).ExitCode, Run(note).ExitCode));
        Screen other = Run("note", "2026-041", "another", "--key", "k1");

        Assert.Equal(2, other.ExitCode);
        Assert.Contains("under the key k1", other.Error, StringComparison.Ordinal);
        Assert.Single(Exported("2026-041").Notes, text => text == "once");
    }

    [Fact]
    public void A_struck_reading_counts_no_more_and_stays_in_history()
    {
        Run("start", "S-1", "--from", "single");
        Run("measure", "S-1", "stroke", "78 mm", "--key", "first", "--stage", "as received");

        Screen struck = Run("strike", "S-1", "fir", "--reason", "gauge slipped");

        Assert.Equal(0, struck.ExitCode);
        Assert.Equal("gauge slipped", Exported("S-1").Readings[0].Struck);
        Assert.Contains("78 mm", Run("history", "S-1", "stroke").Output, StringComparison.Ordinal);
        Assert.Contains("STRUCK: gauge slipped", Run("history", "S-1", "stroke").Output, StringComparison.Ordinal);
        Assert.Equal(2, Run("strike", "S-1", "first", "--reason", "again").ExitCode);
    }

    [Fact]
    public void The_shops_gauge_is_copied_when_a_reading_names_it_with_the_one_it_is_set_with()
    {
        Run("gauge", "mic 7", "--kind", "micrometer", "--resolution", "0.001 mm", "--limit", "0.004 mm");
        Run("gauge", "bore 7", "--kind", "bore gauge", "--resolution", "0.001 mm", "--limit", "0.002 mm", "--set-with", "mic 7");
        Run("start", "G-1", "--from", "single");
        Run("measure", "G-1", "bore", "81.0 mm", "--cylinder", "1", "--gauge", "bore 7", "--stage", "as received");
        Run("gauge", "bore 7", "--kind", "bore gauge", "--resolution", "0.01 mm");

        Job job = Exported("G-1");

        Assert.Contains(job.Gauges, gauge => gauge.Id == "mic 7");
        Assert.Equal("0.001 mm", job.Gauges.Single(gauge => gauge.Id == "bore 7").Resolution!.Text); // the copy stays as it was
        Assert.Contains("0.01 mm", Run("gauge").Output, StringComparison.Ordinal);
    }

    [Fact]
    public void After_each_chamber_the_spread_so_far_is_shown()
    {
        Run("start", "C-1", "--from", "two-stroke-twin");

        Screen first = Chamber("1", "22.4 cc"), second = Chamber("2", "22.8 cc");

        Assert.DoesNotContain("spread", first.Output, StringComparison.Ordinal);
        Assert.Contains("chambers: 2 of 2 read, spread 0.40 cm³", second.Output, StringComparison.Ordinal);
        Assert.Contains("places left for ratio and gap; next: bore, cylinder 1, top, thrust", second.Output, StringComparison.Ordinal);

        Screen Chamber(string cylinder, string to) =>
            Run("measure", "C-1", "chamber", "--cylinder", cylinder, "--from", "0 cc", "--to", to, "--gauge", "burette", "--stage", "as received");
    }

    [Fact]
    public void A_blank_list_is_filled_in_and_read_back()
    {
        Run("start", "L-1", "--from", "two-stroke-twin");
        string blank = Run("measure", "L-1", "--stage", "as received", "--blank-csv").Output;
        string[] rows = blank.Split('\n', StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal(1 + Round.Of(Exported("L-1").Engine).Count, rows.Length);
        rows[1] = rows[1].Replace("top,thrust,,,,", "top,thrust,,,54.02 mm,", StringComparison.Ordinal);
        rows[2] = rows[2].Replace("top,along crank,,,,", "top,along crank,,,\"54.01 mm\",", StringComparison.Ordinal);

        Screen read = Run("measure", "L-1", "--csv", _scratch.Write("list.csv", string.Join("\r\n", rows)));

        Assert.Equal((0, ""), (read.ExitCode, read.Error));
        Assert.StartsWith("2 readings\n", read.Output, StringComparison.Ordinal);
        Assert.Equal(["54.02 mm", "54.01 mm"], Exported("L-1").Readings.Select(reading => reading.Value!.Text));
        Assert.Equal(rows.Length - 2, Run("measure", "L-1", "--stage", "as received", "--blank-csv").Output.Split('\n', StringSplitOptions.RemoveEmptyEntries).Length);
    }

    [Fact]
    public void A_list_with_a_fault_is_refused_whole_with_its_line()
    {
        Run("start", "L-2", "--from", "single");
        string list = _scratch.Write("list.csv", "what;cylinder;value;stage\nstroke;;78 mm;as received\nbore;1;81,02 mm;as received\nbore;7;81.02 mm;as received\n");

        Screen screen = Run("measure", "L-2", "--csv", list);

        Assert.Equal(2, screen.ExitCode);
        Assert.Contains("list.csv, line 3: value: ", screen.Error, StringComparison.Ordinal);
        Assert.Contains("list.csv, line 4: cylinder: ", screen.Error, StringComparison.Ordinal);
        Assert.EndsWith("2 faults; nothing was written.\n", screen.Error, StringComparison.Ordinal);
        Assert.Empty(Exported("L-2").Readings);
        Assert.Contains("did you mean value?", Run("measure", "L-2", "--csv", _scratch.Write("head.csv", "what,valeu\n")).Error, StringComparison.Ordinal);
    }

    [Fact]
    public void A_job_is_closed_and_found_so()
    {
        Run("import", Van);
        Run("start", "O-1", "--from", "single", "--customer", "Another");

        Run("close", "2026-041");

        Assert.Contains("2026-041", Run("jobs", "--closed").Output, StringComparison.Ordinal);
        Assert.DoesNotContain("2026-041", Run("jobs", "--open").Output, StringComparison.Ordinal);
        Assert.Contains("O-1", Run("jobs", "--text", "anoth").Output, StringComparison.Ordinal);
        Assert.Equal("No such job.\n", Run("jobs", "--customer", "nobody").Output);
        Assert.Equal(2, Run("close", "2026-041").ExitCode);
        Assert.Equal(0, Run("close", "2026-041", "--again-open").ExitCode);
    }

    [Fact]
    public void An_issued_sheet_is_kept_and_printed_again_as_it_was()
    {
        Run("import", Van);
        Run("sheet", "2026-041", "--out", _scratch["first.pdf"]);
        Run("sheet", "2026-041", "--out", _scratch["same.pdf"]);
        Run("sheet", "2026-041", "--draft", "--units", "inch", "--out", _scratch["draft.pdf"]);
        string[] issued = [.. Run("history", "2026-041").Output.Split('\n').Where(line => line.Contains(" sheet: ", StringComparison.Ordinal))];
        string key = Assert.Single(issued).Split('[')[1].TrimEnd(']');
        Run("measure", "2026-041", "chamber", "--cylinder", "1", "--from", "0 cc", "--to", "44 cc", "--gauge", "burette 100", "--stage", "as machined");

        Screen again = Run("sheet", "--again", key, "--out", _scratch["again.pdf"]);

        Assert.Equal(0, again.ExitCode);
        Assert.Equal(File.ReadAllBytes(_scratch["first.pdf"]), File.ReadAllBytes(_scratch["again.pdf"]));
        Assert.Equal(2, Run("sheet", "--again", "sheet-000", "--out", _scratch["no.pdf"]).ExitCode);
    }

    [Fact]
    public void The_store_is_checked_backed_up_and_restored()
    {
        Run("import", Van);
        Assert.Equal("sound: 1 jobs\n", Run("store", "check").Output);
        Run("store", "backup", _scratch["backup.db"]);
        Run("note", "2026-041", "after the backup");

        Screen restored = Run("store", "restore", _scratch["backup.db"]);

        Assert.Equal(0, restored.ExitCode);
        Assert.Contains("what stood there is ", restored.Output, StringComparison.Ordinal);
        Assert.DoesNotContain("after the backup", Exported("2026-041").Notes);
        Assert.Equal(3, Run("store", "backup", _scratch["backup.db"]).ExitCode);
        Assert.Equal(3, Run("store", "restore", _scratch["no.db"]).ExitCode);
    }

    [Fact]
    public void A_store_that_is_none_ends_with_three()
    {
        string text = _scratch.Write("text.db", string.Concat(Enumerable.Repeat("no database. ", 99)));

        Screen screen = Run("jobs", "--store", text);

        Assert.Equal((3, $"{text}: this is not a store. Name the store's file, or restore a backup.\n"), (screen.ExitCode, screen.Error));
    }

    [Fact]
    public void Every_command_that_opens_the_store_takes_its_file()
    {
        Run("start", "X-1", "--from", "single", "--store", _scratch["other.db"]);

        Assert.Contains("X-1", Run("jobs", "--store", _scratch["other.db"]).Output, StringComparison.Ordinal);
        Assert.Equal("No such job.\n", Run("jobs").Output);
    }

    private Screen Run(params string[] args) => Screen.At(_scratch["data"], args);

    private Job Exported(string number) => JobFileReader.Read(Encoding.UTF8.GetBytes(Run("export", number).Output)).Job!;
}
