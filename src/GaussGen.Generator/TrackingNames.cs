namespace GaussGen.Generator;

/// <summary>The names of the pipeline's steps, under which tests ask whether a step had anything to do.</summary>
internal static class TrackingNames
{
    /// <summary>What each declaration asks for; symbols stop here.</summary>
    public const string Declarations = "Declarations";

    /// <summary>What the consumer's compiler and framework can do.</summary>
    public const string Target = "Target";

    /// <summary>The names of declarations that differ in nothing but case.</summary>
    public const string CaseTwins = "CaseTwins";

    /// <summary>The texts.</summary>
    public const string Files = "Files";
}
