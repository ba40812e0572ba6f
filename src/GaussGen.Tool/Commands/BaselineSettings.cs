using System.ComponentModel;
using System.Linq;
using GaussGen.Tool.Baselines;
using Spectre.Console;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>The command line of <c>gaussgen baseline write</c> and <c>gaussgen baseline check</c>.</summary>
internal sealed class BaselineSettings : CommandSettings
{
    [CommandArgument(0, "<ASSEMBLY OR FOLDER>")]
    [Description("Assemblies (.dll, .exe), and folders that are searched for them.")]
    public string[] Paths { get; init; } = [];

    [CommandOption("--file <FILE>")]
    [Description("The baseline; gaussgen.baseline if none is named.")]
    public string File { get; init; } = Baseline.DefaultFile;

    [CommandOption("--allow-empty")]
    [Description("Let a run that finds no table go on.")]
    public bool AllowEmpty { get; init; }

    [CommandOption("-q|--quiet")]
    [Description("Say nothing but what differs and what is wrong.")]
    public bool IsQuiet { get; init; }

    /// <inheritdoc/>
    public override ValidationResult Validate() =>
        Paths.Length == 0 || Paths.Any(string.IsNullOrWhiteSpace) ? ValidationResult.Error("name an assembly or a folder")
        : string.IsNullOrWhiteSpace(File) ? ValidationResult.Error("name a file for the baseline after --file, or leave it out")
        : ValidationResult.Success();
}
