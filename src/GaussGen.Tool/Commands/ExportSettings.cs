using System.ComponentModel;
using System.IO;
using System.Linq;
using GaussGen.Tool.Exports;
using GaussGen.Tool.Output;
using Spectre.Console;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>The command line of <c>gaussgen export</c>.</summary>
internal sealed class ExportSettings : TableSettings
{
    [CommandArgument(0, "[ASSEMBLY]")]
    [Description("The assembly whose tables are exported.")]
    public string? Assembly { get; init; }

    [CommandArgument(1, "[TYPE]")]
    [Description("The types that declare them; all types if none is named.")]
    public string[] Types { get; init; } = [];

    [CommandOption("--as <KIND>")]
    [Description("c (a C99 header), csv or json; else by the ending of the output file, else c.")]
    public string? Kind { get; init; }

    [CommandOption("-o|--output <FILE>")]
    [Description("Write to this file, not to the standard output.")]
    public string? Output { get; init; }

    [CommandOption("--prefix <TEXT>")]
    [Description("Begin C names with this text instead of the namespace: boat_.")]
    public string? Prefix { get; init; }

    [CommandOption("--allow-unproven")]
    [Description("Export a table although entries of it are not proven; the file says so.")]
    public bool AllowUnproven { get; init; }

    [CommandOption("-q|--quiet")]
    [Description("Say nothing but what is wrong.")]
    public bool IsQuiet { get; init; }

    /// <summary>The writer of the wanted kind.</summary>
    /// <exception cref="InputException">There is no such kind.</exception>
    public ITableWriter CreateWriter()
    {
        string kind = Kind ?? (Output is null ? "c" : Path.GetExtension(Output).ToLowerInvariant() switch
        {
            ".h" => "c",
            ".csv" => "csv",
            ".json" => "json",
            _ => throw new InputException($"the ending of {Output} is none of .h, .csv and .json; say what to write with --as"),
        });
        if (Prefix is not null && kind != "c")
        {
            throw new InputException("--prefix is for C names; leave it out, or add --as c");
        }

        return kind switch
        {
            "c" => new CHeaderWriter(Prefix),
            "csv" => new CsvWriter(),
            "json" => new JsonWriter(),
            _ => throw new InputException($"--as {kind} is unknown; choose c, csv or json"),
        };
    }

    /// <inheritdoc/>
    public override ValidationResult Validate()
    {
        try
        {
            if (Output is not null && string.IsNullOrWhiteSpace(Output))
            {
                return ValidationResult.Error("name a file after --output, or leave it out");
            }

            if (Prefix is not null && !CName.IsPrefix(Prefix))
            {
                return ValidationResult.Error("--prefix must be a letter and then letters, digits and underscores");
            }

            _ = CreateWriter();
            bool isAdHoc = AdHocOptions.Read(this) is not null;
            return isAdHoc && Assembly is not null ? ValidationResult.Error("name an assembly, or describe a table with --rule, --moments or --sequence, not both")
                : !isAdHoc && string.IsNullOrWhiteSpace(Assembly) ? ValidationResult.Error("name an assembly, or describe a table with --rule, --moments or --sequence")
                : Types.Any(string.IsNullOrWhiteSpace) ? ValidationResult.Error("name a type after the assembly, or leave it out for all")
                : ValidationResult.Success();
        }
        catch (InputException error)
        {
            return ValidationResult.Error(error.Message);
        }
    }
}
