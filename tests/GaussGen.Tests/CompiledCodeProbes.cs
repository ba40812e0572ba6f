using System;
using System.Runtime.CompilerServices;

namespace GaussGen.Tests;

/// <summary>
/// Methods whose machine code a test reads: each holds one of the library's loops, inlined. The tables are data in the image, as
/// they are in generated code, so that their length is a constant; a table of an even and one of an odd length.
/// </summary>
internal static class CompiledCodeProbes
{
    private static ReadOnlySpan<double> EvenNodes => new double[] { -3.5, -2.5, -1.5, -0.5, 0.5, 1.5, 2.5, 3.5 };

    private static ReadOnlySpan<double> EvenWeights => new double[] { 0.01, 0.04, 0.15, 0.3, 0.3, 0.15, 0.04, 0.01 };

    private static ReadOnlySpan<float> OddNodes => new float[] { -3.0f, -2.0f, -1.0f, 0.0f, 1.0f, 2.0f, 3.0f };

    private static ReadOnlySpan<float> OddWeights => new float[] { 0.005f, 0.06f, 0.235f, 0.4f, 0.235f, 0.06f, 0.005f };

    public static void CallAll()
    {
        _ = EvenSymmetric(1.0, 0.5);
        _ = EvenGeneral(1.0, 0.5);
        _ = OddSymmetric(1.0f, 0.5f);
        _ = OddGeneral(1.0f, 0.5f);
        _ = GeneratedEven(1.0, 0.5);
        _ = GeneratedOdd(1.0, 0.5);
        _ = GeneratedSingle(1.0f, 0.5f);
        _ = Unprotected(EvenNodes, 8);
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static double EvenSymmetric(double mean, double scale) =>
        RuleEvaluation.Symmetric(EvenNodes, EvenWeights, mean, scale, new Echo(2.0, 0.3));

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static double EvenGeneral(double mean, double scale) =>
        RuleEvaluation.General(EvenNodes, EvenWeights, mean, scale, new Echo(2.0, 0.3));

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static float OddSymmetric(float mean, float scale) =>
        RuleEvaluation.Symmetric(OddNodes, OddWeights, mean, scale, new Echo(2.0, 0.3));

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static float OddGeneral(float mean, float scale) =>
        RuleEvaluation.General(OddNodes, OddWeights, mean, scale, new Echo(2.0, 0.3));

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static double GeneratedEven(double mean, double deviation) =>
        SixteenPhysicist.Expectation(mean, deviation, new Echo(2.0, 0.3));

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static double GeneratedOdd(double mean, double deviation) =>
        Seven.Expectation(mean, deviation, new Echo(2.0, 0.3));

    [MethodImpl(MethodImplOptions.NoInlining)]
    public static float GeneratedSingle(float mean, float deviation) =>
        TwentySingle.Expectation(mean, deviation, new Echo(2.0, 0.3));

    /// <summary>A loop that the JIT cannot prove safe, to show that a bounds check would be seen.</summary>
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static double Unprotected(ReadOnlySpan<double> values, int count)
    {
        double sum = 0.0;
        for (int i = 0; i < count; i++)
        {
            sum += values[i];
        }

        return sum;
    }
}
