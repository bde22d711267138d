using System.CommandLine;
using System.Security.Cryptography;
using System.Text.Json.Nodes;
using RebuildPlanner.Core.Entries;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Quantities;
using RebuildPlanner.Sheets.Build;
using RebuildPlanner.Store;

namespace RebuildPlanner.Cli;

/// <summary><c>sheet</c>: a job file in, the build sheet out as PDF.</summary>
public static class SheetCommand
{
    private const string Description = "The build sheet as PDF: what the engine is, how sure, which limits hold; the job file inside.";

    private const string Example = """
        Example:
          rebuild sheet --file samples/van-four.json --stage "as machined" --out van-four.pdf

        Exit codes:
          0  done
          1  done, and some verdict is outside
          2  the request or the file is wrong; what would be right is said
          3  the store could not be read or written; what to do is said
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        JobSource source = new();
        Option<Stage?> stage = JobOptions.Stage();
        Option<string> output = PdfOutput.Option();
        Option<bool> draft = new("--draft") { Description = "Do not keep it in the store as issued." };
        Option<string> again = new("--again") { Description = "Print an issued sheet again as it was; history has its key.", HelpName = "key" };
        SheetOptions options = new();
        ExampleCommand command = new("sheet", Description, Example) { stage, output, draft, again };
        source.AddTo(command);
        options.AddTo(command);
        command.SetAction(parsed =>
        {
            string path = parsed.GetValue(output)!;
            if (parsed.GetValue(again) is { } key)
            {
                using JobStore kept = source.Open(parsed, terminal);
                return PrintAgain(kept, key, path, terminal);
            }

            if (source.Read(parsed, terminal) is not var (job, name) || options.Of(job, parsed, terminal) is not { } input)
            {
                return ExitCode.Wrong;
            }

            Results results = StageResults.Of(job, parsed.GetValue(stage) ?? LastStage.Of(job));
            if (JobOptions.IsEmpty(name, results, terminal) || PdfOutput.Write(BuildSheet.Of(input, results), path, terminal) is not { } pdf)
            {
                return ExitCode.Wrong;
            }

            if (source.Number(parsed) is { } number && !parsed.GetValue(draft))
            {
                using JobStore store = source.Open(parsed, terminal);
                Register(store, number, input, results, pdf, terminal);
            }

            return JobOptions.ExitCodeOf(results);
        });
        return command;
    }

    /// <summary>Keeps an issued sheet; the very same sheet printed twice is one.</summary>
    private static void Register(JobStore store, string number, SheetInput input, Results results, byte[] pdf, Terminal terminal)
    {
        string key = $"sheet-{Convert.ToHexStringLower(SHA256.HashData(pdf))[..12]}";
        JsonObject body = new()
        {
            ["stage"] = StageWords.Of(results.Stage),
            ["date"] = input.Issued,
            ["paper"] = input.Paper.Word,
            ["units"] = input.Units == UnitSystem.Inch ? "inch" : "mm",
            ["figures"] = Convert.ToHexStringLower(SHA256.HashData(ResultsJson.Write(results))),
        };
        WriteOptions.Write(store, number, [new Entry(key, EntryKind.Sheet, body.ToJsonString(), terminal.Now())], "sheet", terminal, (key, pdf));
    }

    private static int PrintAgain(JobStore store, string key, string path, Terminal terminal)
    {
        if (store.Issued(key) is { } pdf)
        {
            return PdfOutput.Write(pdf, path, terminal) ? ExitCode.Done : ExitCode.Wrong;
        }

        terminal.Error.WriteLine($"--again {key}: no such sheet was issued; rebuild history of its job has the key.");
        return ExitCode.Wrong;
    }
}
