using System.Collections.Immutable;
using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Diagnostics;

/// <summary>What can be wrong with a declaration or a baseline. Numbers are never given twice; the readme has a section for each.</summary>
internal static class DiagnosticDescriptors
{
    public static readonly DiagnosticDescriptor NotPartial = Mistake(
        "GAUSS001",
        Category.Declaration,
        "A type with a table must be partial",
        "Make '{0}' partial: [{1}] on '{2}' generates a part of it");

    public static readonly DiagnosticDescriptor Generic = Mistake(
        "GAUSS002",
        Category.Declaration,
        "A type with a table must not be generic",
        "Take the type parameters from '{0}', or move [{1}] to a type outside it: a table on a generic type would exist once for each type argument");

    public static readonly DiagnosticDescriptor FileLocal = Mistake(
        "GAUSS003",
        Category.Declaration,
        "A type with a table must not be local to a file",
        "Take 'file' from '{0}': [{1}] on '{2}' generates a part of it in another file, where it would be a different type");

    public static readonly DiagnosticDescriptor PointsOutOfRange = Mistake(
        "GAUSS004",
        Category.Argument,
        "The number of points is out of range",
        "Ask for {1} to {2} points instead of {0}");

    public static readonly DiagnosticDescriptor CollidingTables = Mistake(
        "GAUSS005",
        Category.Declaration,
        "Two tables on one type have the same members",
        "Move [{0}] to a type of its own: [{1}] already gives '{2}' members of the same names");

    public static readonly DiagnosticDescriptor NameTaken = Mistake(
        "GAUSS006",
        Category.Declaration,
        "The name of a generated member is taken",
        "Rename '{0}', or move [{1}] to another type: the generated part of '{2}' has a member '{3}'");

    public static readonly DiagnosticDescriptor NotFinite = Mistake(
        "GAUSS007",
        Category.Argument,
        "An argument must be finite",
        "Give '{0}' a finite value instead of {1}");

    public static readonly DiagnosticDescriptor NotPositive = Mistake(
        "GAUSS008",
        Category.Argument,
        "An argument must be positive and finite",
        "Give '{0}' a positive, finite value instead of {1}");

    public static readonly DiagnosticDescriptor OrderOutOfRange = Mistake(
        "GAUSS009",
        Category.Argument,
        "The order of moments is out of range",
        "Set MaximumOrder to {1} to {2} instead of {0}");

    public static readonly DiagnosticDescriptor Undefined = Mistake(
        "GAUSS010",
        Category.Argument,
        "The value is not a member of its enumeration",
        "Use {2}: {1} has no member with the value {0}");

    public static readonly DiagnosticDescriptor MomentOverflow = Mistake(
        "GAUSS011",
        Category.Range,
        "A moment is too large for the number format",
        "Set MaximumOrder to {0} at most, use a wider format, or measure in a larger unit: the moment of order {1} is too large for {2}");

    public static readonly DiagnosticDescriptor ZeroWeights = Warning(
        "GAUSS012",
        Category.Range,
        "Weights round to zero",
        "{0} of the {1} weights round to zero in {2}, those of nodes of magnitude {3} and more; set DropZeroWeights = true to leave those nodes out, or ask for fewer points");

    public static readonly DiagnosticDescriptor LanguageVersion = Mistake(
        "GAUSS013",
        Category.Declaration,
        "Tables need C# 9 or later",
        "Set LangVersion to 9.0 or later: this project compiles C# {0}, and [{1}] generates code that needs C# 9.0");

    public static readonly DiagnosticDescriptor NotAsReviewed = Warning(
        "GAUSS014",
        Category.Baseline,
        "A table is not as the baseline has it",
        "Review the table of '{0}' and renew {1} with 'gaussgen baseline write <assembly> --file {1}', or restore the declaration: {2}");

    public static readonly DiagnosticDescriptor NoBaseline = Warning(
        "GAUSS015",
        Category.Baseline,
        "A baseline cannot be read",
        "Tables are not compared with {1}, for line {0} {2}");

    public static readonly DiagnosticDescriptor EmptyInterval = Mistake(
        "GAUSS016",
        Category.Argument,
        "An interval is empty",
        "Make 'upper' larger than 'lower': from {0} to {1} there is no interval");

    public static readonly DiagnosticDescriptor NotANumber = Mistake(
        "GAUSS017",
        Category.Argument,
        "The end of an interval is not a number",
        "Give '{0}' a number or an infinity instead of NaN");

    public static readonly DiagnosticDescriptor WholeLine = Mistake(
        "GAUSS018",
        Category.Argument,
        "An interval is the whole line",
        "Make 'lower' or 'upper' finite, or use [GaussHermite] or [NormalMoments]: on the whole line the distribution is the normal one");

    public static readonly DiagnosticDescriptor ValueCount = Mistake(
        "GAUSS019",
        Category.Argument,
        "A list has too few or too many values",
        "Give '{0}' from 1 to {1} values instead of {2}");

    public static readonly DiagnosticDescriptor UnequalCounts = Mistake(
        "GAUSS020",
        Category.Argument,
        "Lists differ in length",
        "Give '{0}' as many values as '{1}': it has {2} and not {3}");

    public static readonly DiagnosticDescriptor NotAWeight = Mistake(
        "GAUSS021",
        Category.Argument,
        "A weight of a mixture is negative or not finite",
        "Give '{0}' values that are finite and not negative instead of {1}");

    public static readonly DiagnosticDescriptor NoWeight = Mistake(
        "GAUSS022",
        Category.Argument,
        "All weights of a mixture are zero",
        "Give at least one of the '{0}' a value above zero");

    public static readonly DiagnosticDescriptor LeadingCoefficient = Mistake(
        "GAUSS023",
        Category.Argument,
        "The leading coefficient is not positive",
        "Make the last coefficient positive instead of {0}: it belongs to the highest power, x^{1}, and the density must fall off");

    public static readonly DiagnosticDescriptor ExponentOutOfRange = Mistake(
        "GAUSS024",
        Category.Argument,
        "The exponent is out of range",
        "Give 'exponent' a value above {1} and at most {2} instead of {0}");

    public static readonly DiagnosticDescriptor LevelOutOfRange = Mistake(
        "GAUSS025",
        Category.Argument,
        "There is no such level",
        "Ask for a level from {1} to {2} instead of {0}");

    public static readonly DiagnosticDescriptor SizeOutOfRange = Mistake(
        "GAUSS026",
        Category.Argument,
        "The size of a table is out of range",
        "Give '{3}' a value from {1} to {2} instead of {0}");

    public static readonly DiagnosticDescriptor ConstantOutOfRange = Mistake(
        "GAUSS027",
        Category.Range,
        "A constant of a rule is out of the number format's range",
        "Use a wider format, or measure in a unit that makes the constant more moderate: {0} is too {1} for {2}");

    public static readonly DiagnosticDescriptor EntryOverflow = Mistake(
        "GAUSS028",
        Category.Range,
        "An entry of a list is too large for the number format",
        "Lower '{0}', or use a wider format: entry {1} of {2} is too large for {3}");

    public static readonly DiagnosticDescriptor MassTooSmall = Failure("GAUSS029", "The probability of an interval is too small");

    public static readonly DiagnosticDescriptor WeightNotRepresentable = Failure("GAUSS030", "A weight is too small");

    public static readonly DiagnosticDescriptor NodeNotRepresentable = Failure("GAUSS031", "A node is out of range");

    public static readonly DiagnosticDescriptor NotDetermined = Failure("GAUSS032", "A distribution cannot be resolved within the limits");

    public static readonly DiagnosticDescriptor CompanionOutsideInterval = Failure("GAUSS033", "An error estimate would leave the interval");

    public static readonly DiagnosticDescriptor NoCompanion = Failure("GAUSS034", "There is no error estimate for the rule");

    public static readonly DiagnosticDescriptor RoundingNotDecided = Failure("GAUSS035", "The rounding of an entry cannot be decided");

    public static readonly DiagnosticDescriptor MomentNotRepresentable = Failure("GAUSS036", "A moment is too large for any number format");

    public static ImmutableArray<DiagnosticDescriptor> All { get; } = ImmutableArray.Create(
        NotPartial, Generic, FileLocal, PointsOutOfRange, CollidingTables, NameTaken, NotFinite, NotPositive, OrderOutOfRange, Undefined,
        MomentOverflow, ZeroWeights, LanguageVersion, NotAsReviewed, NoBaseline, EmptyInterval, NotANumber, WholeLine, ValueCount, UnequalCounts,
        NotAWeight, NoWeight, LeadingCoefficient, ExponentOutOfRange, LevelOutOfRange, SizeOutOfRange, ConstantOutOfRange, EntryOverflow,
        MassTooSmall, WeightNotRepresentable, NodeNotRepresentable, NotDetermined, CompanionOutsideInterval, NoCompanion, RoundingNotDecided,
        MomentNotRepresentable);

    /// <summary>What makes a construction fail though each argument is in its range; the mathematics says what to change.</summary>
    private static DiagnosticDescriptor Failure(string id, string title) =>
        Mistake(id, Category.Range, title, "No table can be made of [{0}]: {1}");

    private static DiagnosticDescriptor Mistake(string id, string category, string title, string message) =>
        new(id, title, message, category, DiagnosticSeverity.Error, isEnabledByDefault: true, helpLinkUri: HelpLink.Of(id));

    private static DiagnosticDescriptor Warning(string id, string category, string title, string message) =>
        new(id, title, message, category, DiagnosticSeverity.Warning, isEnabledByDefault: true, helpLinkUri: HelpLink.Of(id));

    private static class Category
    {
        /// <summary>Where the attribute stands.</summary>
        public const string Declaration = "GaussGen.Declaration";

        /// <summary>What the attribute says.</summary>
        public const string Argument = "GaussGen.Argument";

        /// <summary>What becomes of the numbers.</summary>
        public const string Range = "GaussGen.Range";

        /// <summary>Whether the numbers are those that were reviewed.</summary>
        public const string Baseline = "GaussGen.Baseline";
    }
}
