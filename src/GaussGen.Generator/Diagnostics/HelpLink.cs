namespace GaussGen.Generator.Diagnostics;

/// <summary>Where a diagnostic is explained: the readme in the package and in the repository, a section for each id.</summary>
internal static class HelpLink
{
    private const string Readme = "README.md";

    public static string Of(string id) => Readme + "#" + id.ToLowerInvariant();
}
