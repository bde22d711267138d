using System.CommandLine;
using System.Globalization;
using RebuildPlanner.Core.Jobs;
using RebuildPlanner.Core.Stacks;

namespace RebuildPlanner.Cli;

/// <summary>How trials are asked for, watched and broken off.</summary>
internal sealed class TrialRun
{
    // Whoever waits longer is told that something is going on.
    private static readonly TimeSpan _patience = TimeSpan.FromSeconds(1);

    private readonly Option<int?> _trials = Whole("--trials", "So many trials in place of as many as the digits need; 0 for first order alone.", 0, TrialOptions.MostTrials);
    private readonly Option<int?> _seed = Whole("--seed", "What the trials begin with; else 1. The same seed gives the same answer.", 0, int.MaxValue);
    private readonly Option<int?> _digits = Whole("--digits", "Digits of the uncertainty to be sure of, 1 or 2; else 2.", 1, 2);
    private readonly Option<bool> _plain = new("--plain") { Description = "Count trials alone, without the exact linear part: slower, and independent of it." };

    /// <summary>Adds the options to a command.</summary>
    public void AddTo(Command command)
    {
        command.Options.Add(_trials);
        command.Options.Add(_seed);
        command.Options.Add(_digits);
        command.Options.Add(_plain);
    }

    /// <summary>The results, or null after Ctrl-C.</summary>
    public Results? Results(Job job, Stage stage, ParseResult parsed, Terminal terminal)
    {
        TrialOptions usual = new();
        TrialOptions options = usual with
        {
            Seed = (ulong)(parsed.GetValue(_seed) ?? (int)usual.Seed),
            Trials = parsed.GetValue(_trials),
            Digits = parsed.GetValue(_digits) ?? usual.Digits,
            Plain = parsed.GetValue(_plain),
        };
        using CancellationTokenSource broken = new();
        void Break(object? sender, ConsoleCancelEventArgs key)
        {
            key.Cancel = true;
            broken.Cancel();
        }

        // Only a long run is listened for: to hear of the key costs a start of its own.
        bool mayBeLong = options.Plain || options.Trials > 0;
        if (mayBeLong)
        {
            Console.CancelKeyPress += Break;
        }

        Progress progress = new(terminal);
        try
        {
            return StageResults.Of(job, stage, options, progress, broken.Token);
        }
        catch (OperationCanceledException)
        {
            terminal.Error.WriteLine("Broken off; nothing was written.");
            return null;
        }
        finally
        {
            progress.End();
            if (mayBeLong)
            {
                Console.CancelKeyPress -= Break;
            }
        }
    }

    private static Option<int?> Whole(string name, string description, int least, int most) => new(name)
    {
        Description = description,
        HelpName = "number",
        CustomParser = argument =>
        {
            string typed = argument.Tokens[0].Value;
            if (int.TryParse(typed, NumberStyles.None, CultureInfo.InvariantCulture, out int number) && number >= least && number <= most)
            {
                return number;
            }

            argument.AddError(string.Create(CultureInfo.InvariantCulture, $"{name} {typed}: a whole number from {least} to {most} is wanted."));
            return null;
        },
    };

    /// <summary>One line that is written over, on a screen alone.</summary>
    private sealed class Progress(Terminal terminal) : IProgress<long>
    {
        private readonly DateTimeOffset _begun = terminal.Now();
        private bool _said;

        public void Report(long value)
        {
            if (terminal.IsScreen && terminal.Now() - _begun > _patience)
            {
                _said = true;
                terminal.Error.Write(string.Create(CultureInfo.InvariantCulture, $"\r{value} trials"));
            }
        }

        public void End()
        {
            if (_said)
            {
                terminal.Error.Write("\r                              \r");
            }
        }
    }
}
