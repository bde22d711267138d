using System.CommandLine;

namespace RebuildPlanner.Cli;

/// <summary><c>completions</c>: a script that lets the shell finish words of this program.</summary>
public static class CompletionsCommand
{
    // Each word is quoted for the shell, since a stage has a blank in it.
    private const string Bash = """
        _rebuild() {
            local word
            COMPREPLY=()
            while IFS= read -r word; do
                [ -n "$word" ] && COMPREPLY+=("$(printf '%q' "$word")")
            done < <(rebuild "[suggest:$COMP_POINT]" "$COMP_LINE" 2>/dev/null)
        }
        complete -o default -F _rebuild rebuild
        """;

    private const string Zsh = """
        _rebuild() {
            local -a found
            found=("${(@f)$(rebuild "[suggest:$CURSOR]" "$BUFFER" 2>/dev/null)}")
            found=(${found:#})
            (( $#found )) && compadd -- "${found[@]}" || _files
        }
        compdef _rebuild rebuild
        """;

    private const string Fish = """
        complete -c rebuild -a '(set -l line (commandline -cp); rebuild "[suggest:"(string length -- $line)"]" "$line" 2>/dev/null)'
        """;

    private const string Description = "Prints a script that lets the shell finish this program's words.";

    private const string Example = """
        Example:
          rebuild completions bash >> ~/.bashrc
        """;

    /// <summary>Makes the command.</summary>
    public static Command Make(Terminal terminal)
    {
        Argument<string> shell = new("shell") { Description = "bash, zsh or fish." };
        shell.AcceptOnlyFromAmong("bash", "zsh", "fish");
        ExampleCommand command = new("completions", Description, Example) { shell };
        command.SetAction(parsed =>
        {
            terminal.Output.WriteLine(parsed.GetValue(shell) switch { "bash" => Bash, "zsh" => Zsh, _ => Fish });
            return ExitCode.Done;
        });
        return command;
    }
}
