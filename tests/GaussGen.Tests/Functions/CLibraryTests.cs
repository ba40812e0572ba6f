using System;
using System.Diagnostics;
using System.Globalization;
using System.IO;
using System.Linq;
using Xunit;

namespace GaussGen.Tests.Functions;

/// <summary>erf and erfc of the C library, through a small program that is compiled where there is a compiler.</summary>
public sealed class CLibraryTests
{
    private const string Program = """
        #include <math.h>
        #include <stdio.h>
        int main(void)
        {
            double x;
            while (scanf("%lf", &x) == 1)
                printf("%.17g %.17g\n", erf(x), erfc(x));
            return 0;
        }
        """;

    [GccFact]
    public void The_c_library_gives_the_same_to_its_own_accuracy()
    {
        double[] arguments = [.. Enumerable.Range(-600, 3200).Select(i => i / 100.0)];
        string folder = Directory.CreateTempSubdirectory("error-functions").FullName;
        try
        {
            File.WriteAllText(Path.Combine(folder, "program.c"), Program);
            _ = Run(folder, "gcc", "program.c -O0 -o program -lm", string.Empty);
            string input = string.Join('\n', arguments.Select(x => x.ToString("R", CultureInfo.InvariantCulture)));
            string[] lines = Run(folder, Path.Combine(folder, "program"), string.Empty, input)
                .Split('\n', StringSplitOptions.RemoveEmptyEntries);
            Assert.Equal(arguments.Length, lines.Length);
            for (int i = 0; i < lines.Length; i++)
            {
                string[] values = lines[i].Split(' ');
                AssertNear(arguments[i], double.Parse(values[0], CultureInfo.InvariantCulture), ErrorFunction.Erf(arguments[i]));
                AssertNear(arguments[i], double.Parse(values[1], CultureInfo.InvariantCulture), ErrorFunction.Erfc(arguments[i]));
            }
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    /// <summary>Within 8 numbers of each other: a C library may err by some last places, most of them by one or two.</summary>
    private static void AssertNear(double x, double theirs, double ours) => Assert.True(
        Math.Abs(BitConverter.DoubleToInt64Bits(theirs) - BitConverter.DoubleToInt64Bits(ours)) <= 8, $"{theirs:R} and {ours:R} at {x:R}");

    private static string Run(string folder, string file, string arguments, string input)
    {
        using Process process = Process.Start(new ProcessStartInfo(file, arguments)
        {
            WorkingDirectory = folder,
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
        })!;
        System.Threading.Tasks.Task<string> output = process.StandardOutput.ReadToEndAsync();
        process.StandardInput.Write(input);
        process.StandardInput.Close();
        Assert.True(process.WaitForExit(60_000), file);
        Assert.Equal(0, process.ExitCode);
        return output.Result;
    }

    private sealed class GccFactAttribute : FactAttribute
    {
        public GccFactAttribute()
        {
            string[] folders = (Environment.GetEnvironmentVariable("PATH") ?? string.Empty).Split(Path.PathSeparator);
            if (!folders.Any(folder => File.Exists(Path.Combine(folder, "gcc"))))
            {
                Skip = "Needs gcc, which is not on this machine's path.";
            }
        }
    }
}
