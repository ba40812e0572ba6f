using System;

namespace GaussGen.Generator;

/// <summary>Who generated a member, as its attribute says.</summary>
internal static class GeneratorIdentity
{
    public const string Name = "GaussGen";

    public static string Version { get; } = typeof(GeneratorIdentity).Assembly.GetName().Version is { } version
        ? version.ToString(3)
        : throw new InvalidOperationException("The generator's assembly has no version.");
}
