using System.Collections.Generic;
using System.ComponentModel;
using System.Linq;
using GaussGen.Tool.Reports;
using GaussGen.Tool.Reports.Html;
using Spectre.Console;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>The command line of <c>gaussgen verify</c>.</summary>
internal sealed class VerifySettings : CommandSettings
{
    [CommandArgument(0, "<ASSEMBLY OR FOLDER>")]
    [Description("Assemblies (.dll, .exe), and folders that are searched for them.")]
    public string[] Paths { get; init; } = [];

    [CommandOption("--junit <FILE>")]
    [Description("Write the outcome as JUnit XML.")]
    public string? JUnit { get; init; }

    [CommandOption("--sarif <FILE>")]
    [Description("Write the outcome as SARIF 2.1.0.")]
    public string? Sarif { get; init; }

    [CommandOption("--json <FILE>")]
    [Description("Write the outcome as JSON.")]
    public string? Json { get; init; }

    [CommandOption("--report <FILE>")]
    [Description("Write a report with plots as one HTML file.")]
    public string? Report { get; init; }

    [CommandOption("--allow-empty")]
    [Description("Let a run that finds no table end with 0.")]
    public bool AllowEmpty { get; init; }

    [CommandOption("-q|--quiet")]
    [Description("Say nothing but what is wrong.")]
    public bool IsQuiet { get; init; }

    /// <summary>The reports that are asked for, and where each goes.</summary>
    public IEnumerable<(string Path, IReportWriter Writer)> Reports => new (string? Path, IReportWriter Writer)[]
    {
        (JUnit, new JUnitReport()),
        (Sarif, new SarifReport()),
        (Json, new JsonReport()),
        (Report, new HtmlReport()),
    }.Where(report => report.Path is not null).Select(report => (report.Path!, report.Writer));

    /// <inheritdoc/>
    public override ValidationResult Validate()
    {
        if (Paths.Length == 0 || Paths.Any(string.IsNullOrWhiteSpace))
        {
            return ValidationResult.Error("name an assembly or a folder to verify");
        }

        string[] targets = [.. Reports.Select(report => report.Path)];
        return targets.Any(string.IsNullOrWhiteSpace) ? ValidationResult.Error("name a file for each report")
            : targets.Distinct().Count() < targets.Length ? ValidationResult.Error("name a different file for each report")
            : ValidationResult.Success();
    }
}
