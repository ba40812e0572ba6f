using Xunit;

namespace GaussGen.Generator.Tests.Support;

/// <summary>Tests that count what the process constructs, or what it keeps alive, and so run while no others do.</summary>
[CollectionDefinition(Name, DisableParallelization = true)]
public sealed class Alone
{
    public const string Name = "Alone";
}
