using System.Collections.Generic;
using System.ComponentModel;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>The options that describe a table which no assembly declares; the verbs that can make one share them.</summary>
/// <remarks>A list is numbers with commas between them, a decimal point in each, whatever the culture: 0.25,-1.5e-3,2.</remarks>
internal abstract class TableSettings : CommandSettings
{
    [CommandOption("--rule <NAME>")]
    [Description("Make a rule without an assembly: gauss-hermite, gauss-half-range-hermite, gauss-truncated-normal, gauss-generalized-hermite, "
        + "gauss-log-normal, gauss-normal-mixture, gauss-even-exponential or nested-hermite.")]
    public string? Rule { get; init; }

    [CommandOption("--moments <NAME>")]
    [Description("Make moments without an assembly: normal, truncated-normal, half-normal, log-normal or even-exponential.")]
    public string? Moments { get; init; }

    [CommandOption("--sequence <NAME>")]
    [Description("Make lists without an assembly: half-integer-gamma or oscillator-matrix-elements.")]
    public string? Sequence { get; init; }

    [CommandOption("--points <COUNT>")]
    [Description("The number of nodes of a Gauss rule.")]
    public string? Points { get; init; }

    [CommandOption("--level <LEVEL>")]
    [Description("The level of the nested rule, from 0.")]
    public string? Level { get; init; }

    [CommandOption("--convention <NAME>")]
    [Description("Of gauss-hermite: probabilist (weight: standard normal density) or physicist (exp(-x^2)).")]
    public string? Convention { get; init; }

    [CommandOption("--mean <NUMBER>")]
    [Description("The mean of the normal distribution, before any truncation.")]
    public string? Mean { get; init; }

    [CommandOption("--standard-deviation <NUMBER>")]
    [Description("Its standard deviation.")]
    public string? StandardDeviation { get; init; }

    [CommandOption("--lower <NUMBER>")]
    [Description("The lower end of a truncated distribution; without it there is none.")]
    public string? Lower { get; init; }

    [CommandOption("--upper <NUMBER>")]
    [Description("The upper end; without it there is none.")]
    public string? Upper { get; init; }

    [CommandOption("--scale <NUMBER>")]
    [Description("The scale of the half-normal distribution: that of |X| for normal X with mean 0 and this standard deviation.")]
    public string? Scale { get; init; }

    [CommandOption("--log-mean <NUMBER>")]
    [Description("The mean of the logarithm of a log-normal variable.")]
    public string? LogMean { get; init; }

    [CommandOption("--log-standard-deviation <NUMBER>")]
    [Description("The standard deviation of that logarithm.")]
    public string? LogStandardDeviation { get; init; }

    [CommandOption("--exponent <NUMBER>")]
    [Description("The exponent m of the weight |x|^(2m) exp(-x^2) of gauss-generalized-hermite.")]
    public string? Exponent { get; init; }

    [CommandOption("--weights <LIST>")]
    [Description("The weights of the normal distributions in a mixture: numbers with commas between them, 0.25,0.75.")]
    public string? Weights { get; init; }

    [CommandOption("--means <LIST>")]
    [Description("Their means, as many.")]
    public string? Means { get; init; }

    [CommandOption("--standard-deviations <LIST>")]
    [Description("Their standard deviations, as many.")]
    public string? StandardDeviations { get; init; }

    [CommandOption("--coefficients <LIST>")]
    [Description("c1,c2,... of an even exponential, exp(-(c1 x^2 + c2 x^4 + ...)).")]
    public string? Coefficients { get; init; }

    [CommandOption("--maximum-order <ORDER>")]
    [Description("The highest order of moments, 4 if it is not given; of half-integer-gamma the largest k of Gamma(k + 1/2).")]
    public string? MaximumOrder { get; init; }

    [CommandOption("--size <COUNT>")]
    [Description("The number of states of the oscillator.")]
    public string? Size { get; init; }

    [CommandOption("--power <POWER>")]
    [Description("The power of x between them.")]
    public string? Power { get; init; }

    [CommandOption("--drop-zero-weights")]
    [Description("Leave out nodes whose weight rounds to zero.")]
    public bool DropZeroWeights { get; init; }

    [CommandOption("--error-estimate")]
    [Description("Add the companion rule by which the error of a rule is estimated.")]
    public bool ErrorEstimate { get; init; }

    [CommandOption("--format <NAME>")]
    [Description("The number format of a table made here: binary64 or binary32; binary64 if it is not given.")]
    public string? Format { get; init; }

    /// <summary>The options beside the name of a table, with what was given for each; an empty text stands for a flag, null for nothing.</summary>
    public IReadOnlyList<(string Option, string? Value)> Options =>
    [
        ("--points", Points),
        ("--level", Level),
        ("--convention", Convention),
        ("--mean", Mean),
        ("--standard-deviation", StandardDeviation),
        ("--lower", Lower),
        ("--upper", Upper),
        ("--scale", Scale),
        ("--log-mean", LogMean),
        ("--log-standard-deviation", LogStandardDeviation),
        ("--exponent", Exponent),
        ("--weights", Weights),
        ("--means", Means),
        ("--standard-deviations", StandardDeviations),
        ("--coefficients", Coefficients),
        ("--maximum-order", MaximumOrder),
        ("--size", Size),
        ("--power", Power),
        ("--drop-zero-weights", DropZeroWeights ? "" : null),
        ("--error-estimate", ErrorEstimate ? "" : null),
        ("--format", Format),
    ];
}
