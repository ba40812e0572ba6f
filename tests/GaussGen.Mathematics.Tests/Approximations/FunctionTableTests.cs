using System.IO;
using System.Runtime.CompilerServices;
using System.Threading;
using GaussGen.Mathematics.Approximations;
using Xunit;

namespace GaussGen.Mathematics.Tests.Approximations;

public sealed class FunctionTableTests
{
    /// <summary>The runtime's tables are what this project's arithmetic makes, byte for byte.</summary>
    [Fact]
    public void The_committed_tables_are_made_again() =>
        Assert.Equal(File.ReadAllText(CommittedFile()), FunctionTableText.Write(CancellationToken.None), ignoreLineEndingDifferences: false);

    private static string CommittedFile([CallerFilePath] string here = "") =>
        Path.Combine(Path.GetDirectoryName(here)!, "../../../src/GaussGen/Functions/FunctionTables.cs");
}
