namespace GaussGen.Tool.Reports;

/// <summary>What reports say of the program that wrote them.</summary>
internal static class ToolIdentity
{
    /// <summary>The command's name.</summary>
    public const string Name = "gaussgen";

    /// <summary>The version, as the package has it.</summary>
    public static string Version { get; } = typeof(ToolIdentity).Assembly.GetName().Version!.ToString(3);
}
