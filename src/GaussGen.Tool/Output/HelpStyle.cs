using Spectre.Console;
using Spectre.Console.Cli.Help;

namespace GaussGen.Tool.Output;

/// <summary>How the help looks: weight instead of colour, so that it reads on a light terminal as on a dark one.</summary>
internal static class HelpStyle
{
    // The help writer cannot do without a style anywhere, so what is neither a heading nor a name of the user's is italic.
    private static readonly Style Strong = new(decoration: Decoration.Bold);
    private static readonly Style Placeholder = new(decoration: Decoration.Italic);

    /// <summary>Bold headings and names, italic placeholders.</summary>
    public static HelpProviderStyle Create() => new()
    {
        Description = new DescriptionStyle { Header = Strong },
        Usage = new UsageStyle
        {
            Header = Strong,
            CurrentCommand = Strong,
            Command = Strong,
            Options = Placeholder,
            RequiredArgument = Placeholder,
            OptionalArgument = Placeholder,
        },
        Examples = new ExampleStyle { Header = Strong, Arguments = Placeholder },
        Arguments = new ArgumentStyle { Header = Strong, RequiredArgument = Placeholder, OptionalArgument = Placeholder },
        Commands = new CommandStyle { Header = Strong, ChildCommand = Strong, RequiredArgument = Placeholder },
        Options = new OptionStyle
        {
            Header = Strong,
            DefaultValueHeader = Strong,
            DefaultValue = Placeholder,
            RequiredOption = Placeholder,
            RequiredOptionValue = Placeholder,
            OptionalOptionValue = Placeholder,
        },
    };
}
