using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Output;

/// <summary>
/// One line a failure, in the form in which compilers and build engines write theirs (origin, category, code, text), so that a build
/// log shows it as an error with its file and code.
/// </summary>
internal static class FindingLine
{
    /// <summary>A finding about a table.</summary>
    public static string Of(FileResult file, TableResult table, Finding finding) => PlainText.OneLine(
        $"{file.Path} : error {finding.Kind.Code()}: {table.Type.Name}{(finding.Member is null ? ": " : ".")}{finding.Message}");

    /// <summary>A file that could not be read.</summary>
    public static string Of(FileResult file) =>
        PlainText.OneLine($"{file.Path} : error {FindingKind.NotRead.Code()}: {file.Error!.Message}");
}
