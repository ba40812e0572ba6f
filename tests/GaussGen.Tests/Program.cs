using System;

namespace GaussGen.Tests;

/// <summary>
/// The test project is a program too, for the tests that must see a fresh process: <c>GaussGen.Tests probe</c> calls every
/// method of <see cref="CompiledCodeProbes"/> once.
/// </summary>
internal static class Program
{
    private static int Main(string[] arguments)
    {
        if (arguments is not ["probe"])
        {
            Console.Error.WriteLine("This program holds tests: run them with `dotnet test`.");
            return 2;
        }

        CompiledCodeProbes.CallAll();
        return 0;
    }
}
