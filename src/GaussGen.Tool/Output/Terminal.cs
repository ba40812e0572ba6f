using System;
using System.IO;
using Spectre.Console;

namespace GaussGen.Tool.Output;

/// <summary>The two streams of a run: results on the one, progress and errors on the other.</summary>
/// <remarks>
/// On a stream that is no terminal there are no colours and no cursor movements, and a table is as wide as its content, so that
/// a search through a log finds whole lines. NO_COLOR turns colours off on a terminal too.
/// </remarks>
internal sealed class Terminal
{
    private const int WidthOfFiles = 10_000;

    private Terminal(IAnsiConsole results, IAnsiConsole messages)
    {
        Results = results;
        Messages = messages;
    }

    /// <summary>Results: the standard output.</summary>
    public IAnsiConsole Results { get; }

    /// <summary>Progress and errors: the standard error.</summary>
    public IAnsiConsole Messages { get; }

    /// <summary>The terminal, or the files in its place, that this process was started with.</summary>
    public static Terminal OfProcess() => new(
        Create(Console.Out, Console.IsOutputRedirected), Create(Console.Error, Console.IsErrorRedirected));

    /// <summary>Two writers in the place of files.</summary>
    public static Terminal Of(TextWriter results, TextWriter messages) => new(Create(results, true), Create(messages, true));

    /// <summary>Writes one line as it is, whatever its length: a terminal may wrap it, a file keeps it whole.</summary>
    public static void WriteLine(IAnsiConsole console, string line, Style? style = null)
    {
        // The console's own writer would break a long line at the terminal's width.
        console.Profile.Out.Writer.Flush();
        string text = PlainText.OneLine(line);
        bool isPlain = style is null || console.Profile.Capabilities.ColorSystem == ColorSystem.NoColors || !console.Profile.Capabilities.Ansi;
        if (isPlain)
        {
            console.Profile.Out.Writer.WriteLine(text);
            return;
        }

        int width = console.Profile.Width;
        console.Profile.Width = WidthOfFiles;
        console.Write(new Text(text, style));
        console.WriteLine();
        console.Profile.Width = width;
    }

    /// <summary>Writes a whole file to the results, as it is.</summary>
    public void WriteFile(string text)
    {
        Results.Profile.Out.Writer.Write(text);
        Results.Profile.Out.Writer.Flush();
    }

    /// <summary>Writes one line on what went wrong.</summary>
    public void WriteError(string message) => WriteLine(Messages, "gaussgen: error: " + message, new Style(Color.Red));

    private static IAnsiConsole Create(TextWriter writer, bool isFile)
    {
        IAnsiConsole console = AnsiConsole.Create(new AnsiConsoleSettings
        {
            Out = new AnsiConsoleOutput(writer),
            Ansi = isFile ? AnsiSupport.No : AnsiSupport.Detect,
            ColorSystem = isFile || HasNoColour() ? ColorSystemSupport.NoColors : ColorSystemSupport.Detect,
            Interactive = isFile ? InteractionSupport.No : InteractionSupport.Detect,
        });
        if (isFile)
        {
            console.Profile.Width = WidthOfFiles;
            console.Profile.Capabilities.Unicode = true;
        }

        return console;
    }

    private static bool HasNoColour() => !string.IsNullOrEmpty(Environment.GetEnvironmentVariable("NO_COLOR"));
}
