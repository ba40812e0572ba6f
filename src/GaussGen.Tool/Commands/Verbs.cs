using GaussGen.Tool.Output;
using Spectre.Console.Cli;

namespace GaussGen.Tool.Commands;

/// <summary>The verbs of the command line, with what the help says of each and an example.</summary>
internal static class Verbs
{
    /// <summary>The verb that has verbs of its own.</summary>
    public const string Baseline = "baseline";

    /// <summary>Adds all verbs.</summary>
    public static void Add(IConfigurator configuration, Terminal terminal)
    {
        AddVerify(configuration, terminal);
        AddBaseline(configuration, terminal);
        AddExport(configuration, terminal);
        AddExplain(configuration, terminal);

        // Without examples of its own the help would show the first few of the verbs', and most verbs none.
        _ = configuration.AddExample("verify", "bin/Release", "--report", "proofs.html");
        _ = configuration.AddExample(Baseline, "write", "bin/Release");
        _ = configuration.AddExample(Baseline, "check", "bin/Release");
        _ = configuration.AddExample("export", "SurveyBoat.dll", "--output", "tables.h");
        _ = configuration.AddExample("explain", "SurveyBoat.dll", "SurveyBoat.Sixteen");
    }

    private static void AddVerify(IConfigurator configuration, Terminal terminal) => configuration.AddCommand<VerifyCommand>("verify")
        .WithDescription(
            "Prove every table of compiled assemblies, without running them. "
            + "The exit code is 0 if all is proven, 1 if something is wrong or could not be proven, "
            + "2 if something could not be read, no table was found, or the command line is wrong.")
        .WithExample("verify", "bin/Release/net8.0/SurveyBoat.dll")
        .WithExample("verify", "bin/Release", "--sarif", "proofs.sarif", "--junit", "proofs.xml")
        .WithExample("verify", "bin/Release", "--report", "proofs.html")
        .WithData(terminal);

    private static void AddBaseline(IConfigurator configuration, Terminal terminal) => configuration.AddBranch(Baseline, branch =>
    {
        branch.SetDescription("Pin the tables that were reviewed in a small text file, and notice when they drift.");
        branch.AddExample(Baseline, "write", "bin/Release", "--file", "gaussgen.baseline");
        branch.AddExample(Baseline, "check", "bin/Release", "--file", "gaussgen.baseline");
        _ = branch.AddCommand<BaselineWriteCommand>("write")
            .WithDescription(
                "Write down every table: its identity, its claim and the digest of its data. It says what was reviewed, not what is "
                + "right; that is for verify. The exit code is 0, or 2 if something could not be read; then nothing is written.")
            .WithExample(Baseline, "write", "bin/Release/net8.0/SurveyBoat.dll")
            .WithData(terminal);
        _ = branch.AddCommand<BaselineCheckCommand>("check")
            .WithDescription(
                "Say which tables were added, removed or changed since the review. The exit code is 0 if none was, 1 if one was, "
                + "2 if something could not be read.")
            .WithExample(Baseline, "check", "bin/Release/net8.0/SurveyBoat.dll")
            .WithData(terminal);
    });

    private static void AddExport(IConfigurator configuration, Terminal terminal) => configuration.AddCommand<ExportCommand>("export")
        .WithDescription(
            "Write proven tables for other programs: as a C header, CSV or JSON. The exit code is 0, 1 if a table is not proven, "
            + "2 if something could not be read or written.")
        .WithExample("export", "SurveyBoat.dll", "SurveyBoat.Sixteen", "--output", "sixteen.h", "--prefix", "boat_")
        .WithExample("export", "SurveyBoat.dll", "--as", "csv")
        .WithExample("export", "--rule", "gauss-hermite", "--points", "16", "--format", "binary32")
        .WithExample("export", "--moments", "normal", "--mean", "1.5", "--standard-deviation", "0.25")
        .WithData(terminal);

    private static void AddExplain(IConfigurator configuration, Terminal terminal) => configuration.AddCommand<ExplainCommand>("explain")
        .WithDescription(
            "Show a reviewer one table on a page: definition, entries, residuals, plot, proof. The exit code is 0, 1 if it is not "
            + "proven, 2 if it could not be read.")
        .WithExample("explain", "SurveyBoat.dll", "SurveyBoat.Sixteen")
        .WithExample("explain", "SurveyBoat.dll", "SurveyBoat.Sixteen", "--all")
        .WithData(terminal);
}
