using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Reading;
using GaussGen.Tool.Tests.Fixtures;
using Microsoft.CodeAnalysis;
using Xunit;

namespace GaussGen.Tool.Tests.Reading;

/// <summary>The numbers in the code of sums, written by hand as the generator writes them, and otherwise.</summary>
public class SumCodeTests
{
    public static TheoryData<string, string, string> Codes => new()
    {
        // Located: without numbers, with both, and each of them with a factor of the error.
        { "Located", "return Sum(mean, standardDeviation, integrand);", "NodeScale=1 ReciprocalTotalWeight=1" },
        { "Located", "double scale = 1.5 * standardDeviation; const double reciprocal = 0.25; return Sum(mean, scale, reciprocal, integrand);", "NodeScale=1.5 ReciprocalTotalWeight=0.25" },
        { "Located", "error = Math.Abs(Sum(mean, standardDeviation, integrand) - mean); return mean;", "NodeScale=1 ReciprocalTotalWeight=1 ErrorFactor=1" },
        { "Located", "error = 0.5 * Math.Abs(Sum(mean, standardDeviation, integrand) - mean); return mean;", "NodeScale=1 ReciprocalTotalWeight=1 ErrorFactor=0.5" },
        { "Located", "double scale = 1.5 * standardDeviation; double other = Sum(mean, scale, 0.25, integrand); error = 0.5 * Math.Abs(other - mean); return mean;", "NodeScale=1.5 ReciprocalTotalWeight=0.25 ErrorFactor=0.5" },
        { "Located", "double scale = 1.5 * standardDeviation; double other = Sum(mean, scale, 0.25, integrand); error = Math.Abs(other - mean); return mean;", "NodeScale=1.5 ReciprocalTotalWeight=0.25 ErrorFactor=1" },
        { "ScaleOnly", "return Sum(0.0, standardDeviation, integrand);", "ExpectationLocation=0" },
        { "ScaleOnly", "double other = Sum(0.0, standardDeviation, integrand); error = Math.Abs(other - mean); return mean;", "ExpectationLocation=0 ErrorFactor=1" },
        { "ScaleOnly", "double other = Sum(0.0, standardDeviation, integrand); error = 0.5 * Math.Abs(other - mean); return mean;", "ExpectationLocation=0 ErrorFactor=0.5" },
        { "Fixed", "return Sum(0.0, 1.0, integrand);", "ExpectationLocation=0 ExpectationScale=1" },
        { "Fixed", "return Sum(0.25, 2.0, integrand);", "ExpectationLocation=0.25 ExpectationScale=2" },
        { "Fixed", "double other = Sum(0.0, 1.0, integrand); error = Math.Abs(other - mean); return mean;", "ExpectationLocation=0 ExpectationScale=1 ErrorFactor=1" },
        { "Fixed", "double other = Sum(0.0, 1.0, integrand); error = 0.5 * Math.Abs(other - mean); return mean;", "ExpectationLocation=0 ExpectationScale=1 ErrorFactor=0.5" },
    };

    public static TheoryData<string, string, string> WrongCodes => new()
    {
        { "Located", "return 2.0 * Sum(mean, standardDeviation, integrand);", "the code of Expectation holds 1 constants where none or 2 are expected" },
        { "Located", "error = 1.5 * Math.Abs(2.5 * Sum(mean, 3.5 * standardDeviation, 4.5, integrand)); return mean;", "the code of ExpectationWithError holds 4 constants where none or 1 or 2 or 3 are expected" },
        { "ScaleOnly", "return Sum(mean, standardDeviation, integrand);", "the code of Expectation holds 0 constants where 1 are expected" },
        { "ScaleOnly", "error = mean; return mean;", "the code of ExpectationWithError holds 0 constants where 1 or 2 are expected" },
        { "Fixed", "return Sum(0.0, standardDeviation, integrand);", "the code of Expectation holds 1 constants where 2 are expected" },
        { "Fixed", "error = 0.5 * mean; return mean;", "the code of ExpectationWithError holds 1 constants where 2 or 3 are expected" },
    };

    [Theory]
    [MemberData(nameof(Codes))]
    public void Numbers_have_their_names_whatever_the_compiler_makes_of_the_code(string form, string code, string expected)
    {
        foreach (Framework framework in Enum.GetValues<Framework>())
        {
            foreach (OptimizationLevel optimization in Enum.GetValues<OptimizationLevel>())
            {
                Assert.Equal(expected.Split(' '), Found(form, code, framework, optimization));
                Assert.Equal(expected.Split(' '), Found(form, InSingle(code), framework, optimization, "float"));
            }
        }
    }

    [Theory]
    [MemberData(nameof(WrongCodes))]
    public void Another_count_of_numbers_is_refused(string form, string code, string message)
    {
        ClaimException error = Assert.Throws<ClaimException>(() => Found(form, code, Framework.Net8, OptimizationLevel.Release));
        Assert.StartsWith(message, error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Forms_that_differ_are_both_judged() => Assert.Equal(
        ["ExpectationLocation=0", "ExpectationScale=1", "ExpectationScale=2"],
        Found("Fixed", "return Sum(0.0, 1.0, integrand);", Framework.Net8, OptimizationLevel.Release, "double", "return Sum(0.0, 2.0, integrand);"));

    [Fact]
    public void Constants_of_the_type_with_such_names_are_of_no_table()
    {
        foreach (string name in new[] { "NodeScale", "ReciprocalTotalWeight", "IntegralLocation", "IntegralScale", "ExpectationLocation", "ExpectationScale", "ErrorFactor" })
        {
            Assert.True(SumForm.IsInCode(name));
        }

        Assert.False(SumForm.IsInCode("NormalizingIntegral"));
        Assert.True(SumForm.IsTrivial("ExpectationScale") && SumForm.IsTrivial("IntegralLocation"));
        Assert.False(SumForm.IsTrivial("ErrorFactor") || SumForm.IsTrivial("NodeScale"));
    }

    private static string InSingle(string code) => System.Text.RegularExpressions.Regex.Replace(code.Replace("double", "float", StringComparison.Ordinal), @"(\d\.\d+)", "$1f");

    private static string[] Found(string form, string code, Framework framework, OptimizationLevel optimization, string type = "double", string? second = null)
    {
        string name = code.Contains("error", StringComparison.Ordinal) ? "ExpectationWithError" : "Expectation";
        string error = name == "Expectation" ? "" : $", out {type} error";
        string Method(string body, string generic) => $$"""
                [System.CodeDom.Compiler.GeneratedCode("GaussGen", "0.1.0")]
                public static {{type}} {{name}}{{(generic.Length == 0 ? "" : "<" + generic + ">")}}({{type}} mean, {{type}} standardDeviation, {{(generic.Length == 0 ? $"Func<{type}, {type}>" : generic)}} integrand{{error}})
                {
                    {{body}}
                }
            """;
        byte[] image = FixtureCompiler.Compile(
            $$"""
            using System; using GaussGen;
            [GaussHermite(1)] static class T
            {
                public const {{type}} NodeScale = 77; public const {{type}} ErrorFactor = 78;
                public static ReadOnlySpan<{{type}}> Nodes => new {{type}}[] { 0 };
                static {{type}} Sum<F>({{type}} mean, {{type}} scale, F integrand) => Sum(mean, scale, 1, integrand);
                static {{type}} Sum<F>({{type}} mean, {{type}} scale, {{type}} factor, F integrand) => factor * mean * scale;
            {{Method(code, "")}}
            {{Method(second ?? code, "TIntegrand")}}
            }
            """,
            framework,
            optimization);
        using AssemblyImage opened = AssemblyImage.FromBytes(image);
        FoundType found = Assert.Single(AssemblyReader.Read(opened, CancellationToken.None).Types);
        ClaimFamily family = ClaimFamily.Rule("T", form switch { "Located" => SumForm.Located, "ScaleOnly" => SumForm.ScaleOnly, _ => SumForm.Fixed }, _ => throw new NotSupportedException());
        IReadOnlyList<DataConstant> constants = FoundData.Of(found, family).Constants;
        Assert.All(constants, constant => Assert.Equal(type == "float" ? "binary32" : "binary64", constant.Format!.Name));
        return [.. constants.Select(constant => $"{constant.Name}={Value(constant)}")];
    }

    private static string Value(DataConstant constant) => (constant.Format!.StorageBits == 32
        ? BitConverter.UInt32BitsToSingle((uint)constant.Bits)
        : BitConverter.UInt64BitsToDouble(constant.Bits)).ToString(System.Globalization.CultureInfo.InvariantCulture);
}
