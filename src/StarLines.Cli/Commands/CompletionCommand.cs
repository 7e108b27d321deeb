using System;
using System.Collections.Generic;
using System.CommandLine;
using System.Linq;

namespace StarLines.Cli.Commands;

/// <summary>Writes the few lines that teach a shell to complete the words of this program.</summary>
internal static class CompletionCommand
{
    // The shells hand the words typed so far to "starlines [suggest:POSITION] LINE", which answers one word a line.
    private static readonly Dictionary<string, string> Scripts = new(StringComparer.Ordinal)
    {
        ["bash"] = """
            # starlines completion for bash; add to ~/.bashrc:  eval "$(starlines completion bash)"
            _starlines() {
                local IFS=$'\n' word="${COMP_WORDS[COMP_CWORD]}"
                COMPREPLY=($(compgen -W "$(starlines "[suggest:${COMP_POINT}]" "${COMP_LINE}" 2>/dev/null)" -- "$word"))
                [ "${#COMPREPLY[@]}" -gt 0 ] || COMPREPLY=($(compgen -f -- "$word"))
            }
            complete -o filenames -F _starlines starlines
            """,
        ["zsh"] = """
            # starlines completion for zsh; add to ~/.zshrc:  eval "$(starlines completion zsh)"
            _starlines() {
                local -a words_found
                words_found=("${(@f)$(starlines "[suggest:${CURSOR}]" "${BUFFER}" 2>/dev/null)}")
                compadd -- "${words_found[@]}"
                _files
            }
            compdef _starlines starlines
            """,
        ["fish"] = """
            # starlines completion for fish; save as ~/.config/fish/completions/starlines.fish
            function __starlines_words
                set -l line (commandline -cp)
                starlines "[suggest:"(string length -- $line)"]" $line 2>/dev/null
            end
            complete -c starlines -a '(__starlines_words)'
            """,
        ["powershell"] = """
            # starlines completion for PowerShell; add to $PROFILE:  starlines completion powershell | Out-String | Invoke-Expression
            Register-ArgumentCompleter -Native -CommandName starlines -ScriptBlock {
                param($word, $line, $position)
                starlines "[suggest:$position]" "$line" | Where-Object { $_ -like "$word*" } | ForEach-Object {
                    [System.Management.Automation.CompletionResult]::new($_, $_, 'ParameterValue', $_)
                }
            }
            """,
    };

    /// <summary>Makes the command.</summary>
    public static Command Create(Terminal terminal)
    {
        var shell = new Argument<string>("SHELL") { Description = "bash, zsh, fish or powershell." };
        shell.CompletionSources.Add(_ => Scripts.Keys.Select(static name => new System.CommandLine.Completions.CompletionItem(name)));
        var command = new VerbCommand(
            "completion", "Writes a script that makes a shell complete commands, options and names.", "starlines completion bash")
        {
            shell,
        };
        command.SetAction(parsed =>
        {
            string name = parsed.GetRequiredValue(shell);
            if (!Scripts.TryGetValue(name, out string? script))
            {
                throw new UsageException($"There is no completion for '{name}'{UsageProblem.Hint(name, Scripts.Keys)}");
            }

            terminal.Out.WriteLine(script.ReplaceLineEndings("\n"));
            return ExitCode.Done;
        });
        return command;
    }
}
