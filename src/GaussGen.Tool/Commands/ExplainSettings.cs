using System.ComponentModel;
using GaussGen.Tool.Output;
using Spectre.Console;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>The command line of <c>gaussgen explain</c>.</summary>
internal sealed class ExplainSettings : TableSettings
{
    [CommandArgument(0, "[ASSEMBLY]")]
    [Description("The assembly that holds the table.")]
    public string? Assembly { get; init; }

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
    public override ValidationResult Validate()
    {
        try
        {
            bool isAdHoc = AdHocOptions.Read(this) is not null;
            return isAdHoc && Assembly is not null ? ValidationResult.Error("name an assembly, or describe a table with --rule, --moments or --sequence, not both")
                : !isAdHoc && string.IsNullOrWhiteSpace(Assembly) ? ValidationResult.Error("name an assembly, or describe a table with --rule, --moments or --sequence")
                : Type is not null && string.IsNullOrWhiteSpace(Type) ? ValidationResult.Error("name a type after the assembly")
                : ValidationResult.Success();
        }
        catch (InputException error)
        {
            return ValidationResult.Error(error.Message);
        }
    }
}
