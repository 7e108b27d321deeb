using System;
using System.IO;
using System.Text;
using System.Threading;
using Spectre.Console;

namespace StarLines.Cli;

/// <summary>Where data, words and the user's Ctrl-C come and go: data on <see cref="Out"/>, everything else on <see cref="Error"/>.</summary>
internal sealed class Terminal : IDisposable
{
    private const int PlainWidth = 120;

    private readonly CancellationTokenSource _stop = new();
    private readonly Lock _gate = new();
    private IAnsiConsole? _live;

    /// <summary>Makes a terminal of streams.</summary>
    /// <param name="input">Standard input.</param>
    /// <param name="output">Standard output.</param>
    /// <param name="error">Standard error.</param>
    public Terminal(Stream input, Stream output, TextWriter error)
    {
        In = input;
        OutStream = output;
        Out = new StreamWriter(output, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false), leaveOpen: true) { NewLine = "\n" };
        Error = error;
    }

    /// <summary>Standard input.</summary>
    public Stream In { get; }

    /// <summary>Standard output as text.</summary>
    public TextWriter Out { get; }

    /// <summary>Standard output as bytes; flush <see cref="Out"/> before writing.</summary>
    public Stream OutStream { get; }

    /// <summary>Standard error.</summary>
    public TextWriter Error { get; }

    /// <summary>Whether a person reads standard output.</summary>
    public bool OutIsTerminal { get; init; }

    /// <summary>Whether a person reads standard error.</summary>
    public bool ErrorIsTerminal { get; init; }

    /// <summary>Columns of the terminal.</summary>
    public int Width { get; init; } = PlainWidth;

    /// <summary>Suppresses progress and remarks; errors are always said.</summary>
    public bool Quiet { get; set; }

    /// <summary>Says more.</summary>
    public bool Verbose { get; set; }

    /// <summary>Cancelled by Ctrl-C.</summary>
    public CancellationToken Stop => _stop.Token;

    /// <summary>The terminal of this process; Ctrl-C cancels <see cref="Stop"/>, a second one ends at once.</summary>
    public static Terminal OfThisProcess()
    {
        var terminal = new Terminal(Console.OpenStandardInput(), Console.OpenStandardOutput(), Console.Error)
        {
            OutIsTerminal = !Console.IsOutputRedirected,
            ErrorIsTerminal = !Console.IsErrorRedirected,
            Width = Console.IsOutputRedirected ? PlainWidth : Math.Max(40, Console.WindowWidth),
        };
        Console.CancelKeyPress += (_, pressed) =>
        {
            pressed.Cancel = !terminal._stop.IsCancellationRequested;
            terminal._stop.Cancel();
        };
        return terminal;
    }

    /// <summary>Does work of several steps and shows how far it is, on standard error, where a person reads it.</summary>
    /// <param name="what">What is done, such as <c>measuring</c>.</param>
    /// <param name="steps">Number of steps.</param>
    /// <param name="work">The work; it calls its argument after each step.</param>
    public void WithProgress(string what, int steps, Action<Action> work)
    {
        if (steps < 2)
        {
            work(static () => { });
            return;
        }

        int done = 0;
        WithPercentage(what, advance => work(() => advance((double)++done / steps)));
    }

    /// <summary>Does work that tells what part of it is done, and shows that on standard error, where a person reads it.</summary>
    /// <param name="what">What is done.</param>
    /// <param name="work">The work; it calls its argument with 0 to 1, from any thread.</param>
    public void WithPercentage(string what, Action<Action<double>> work)
    {
        if (!ErrorIsTerminal || Quiet)
        {
            work(static _ => { });
            return;
        }

        IAnsiConsole console = AnsiConsole.Create(new AnsiConsoleSettings { Out = new AnsiConsoleOutput(Error) });
        Progress progress = console.Progress().AutoClear(true).Columns(
            new TaskDescriptionColumn(), new ProgressBarColumn(), new PercentageColumn(), new RemainingTimeColumn());
        _live = console;
        try
        {
            progress.Start(context =>
            {
                ProgressTask task = context.AddTask(what, autoStart: true, maxValue: 1.0);
                work(part => task.Value = part);
            });
        }
        finally
        {
            _live = null;
        }
    }

    /// <summary>Says that something is wrong, in one sentence.</summary>
    public void SayError(string sentence) => Say("error: " + sentence);

    /// <summary>Says what was guessed or is odd, in one sentence.</summary>
    public void SayRemark(string sentence)
    {
        if (!Quiet)
        {
            Say("note: " + sentence);
        }
    }

    /// <summary>Says what was done, where the user asked for more words.</summary>
    public void SayDetail(string sentence)
    {
        if (Verbose && !Quiet)
        {
            Say(sentence);
        }
    }

    /// <inheritdoc/>
    public void Dispose()
    {
        Out.Flush();
        OutStream.Flush();
        _stop.Dispose();
    }

    private void Say(string line)
    {
        lock (_gate)
        {
            // While a bar is shown, its console makes room for the line above it.
            if (_live is { } console)
            {
                console.WriteLine(line);
                return;
            }

            Error.WriteLine(line);
            Error.Flush();
        }
    }
}
