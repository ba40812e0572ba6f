using System;
using System.Globalization;

namespace GaussGen.Generator.Tests.Fuzz;

/// <summary>Where random tests begin: always at the same place, or where the environment variable GAUSSGEN_SEED says.</summary>
internal static class FuzzSeed
{
    private const int Usual = 1864;

    public static int Value { get; } =
        int.TryParse(Environment.GetEnvironmentVariable("GAUSSGEN_SEED"), NumberStyles.Integer, CultureInfo.InvariantCulture, out int seed) ? seed : Usual;
}
