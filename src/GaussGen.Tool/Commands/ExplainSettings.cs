using System.ComponentModel;
using Spectre.Console;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>The command line of <c>gaussgen explain</c>.</summary>
internal sealed class ExplainSettings : CommandSettings
{
    [CommandArgument(0, "<ASSEMBLY>")]
    [Description("The assembly that holds the table.")]
    public string Assembly { get; init; } = "";

    [CommandArgument(1, "[TYPE]")]
    [Description("The type that declares it; not needed if the assembly has one table only.")]
    public string? Type { get; init; }

    [CommandOption("--all")]
    [Description("Show every entry, however many there are.")]
    public bool ShowsAll { get; init; }

    [CommandOption("-q|--quiet")]
    [Description("Show no progress.")]
    public bool IsQuiet { get; init; }

    /// <inheritdoc/>
    public override ValidationResult Validate() =>
        string.IsNullOrWhiteSpace(Assembly) ? ValidationResult.Error("name an assembly")
        : Type is not null && string.IsNullOrWhiteSpace(Type) ? ValidationResult.Error("name a type after the assembly")
        : ValidationResult.Success();
}
