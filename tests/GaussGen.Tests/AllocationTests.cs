using System;
using System.Runtime.CompilerServices;
using Xunit;

namespace GaussGen.Tests;

/// <summary>Evaluating allocates nothing, in any form.</summary>
public sealed class AllocationTests
{
    private const int Calls = 1000;

    private static readonly double[] Nodes = SmallRules.Get(5).Nodes;
    private static readonly double[] Weights = SmallRules.Get(5).Weights;
    private static readonly float[] SingleNodes = SmallRules.GetSingle(5).Nodes;
    private static readonly float[] SingleWeights = SmallRules.GetSingle(5).Weights;

    [ReleaseFact]
    public void The_measurement_sees_an_allocation() =>
        Assert.True(Measure(static () => new double[1].Length) >= 24 * Calls);

    [ReleaseFact]
    public void A_struct_integrand_allocates_nothing()
    {
        Assert.Equal(0, Measure(static () => RuleEvaluation.Symmetric(Nodes, Weights, 1.0, 0.5, new Echo(2.0, 0.3))));
        Assert.Equal(0, Measure(static () => RuleEvaluation.General(Nodes, Weights, 1.0, 0.5, new Echo(2.0, 0.3))));
        Assert.Equal(0, Measure(static () => RuleEvaluation.Symmetric(SingleNodes, SingleWeights, 1.0f, 0.5f, new Identity())));
        Assert.Equal(0, Measure(static () => RuleEvaluation.General(SingleNodes, SingleWeights, 1.0f, 0.5f, new Identity())));
    }

    [ReleaseFact]
    public void A_delegate_that_exists_already_allocates_nothing()
    {
        Assert.Equal(0, Measure(static () => RuleEvaluation.Symmetric(Nodes, Weights, 1.0, 0.5, static x => 1.0 / (1.0 + x))));
        Assert.Equal(0, Measure(static () => RuleEvaluation.General(SingleNodes, SingleWeights, 1.0f, 0.5f, static x => x * x)));
    }

    [ReleaseFact]
    public void A_generated_expectation_allocates_nothing()
    {
        Assert.Equal(0, Measure(static () => Seven.Expectation(1.0, 0.5, new Echo(2.0, 0.3))));
        Assert.Equal(0, Measure(static () => Seven.Expectation(1.0, 0.5, static x => x * x)));
        Assert.Equal(0, Measure(static () => SixteenPhysicist.Integral(new Echo(2.0, 0.3))));
        Assert.Equal(0, Measure(static () => TwentySingle.Expectation(1.0f, 0.5f, new Echo(2.0, 0.3))));
        Assert.Equal(0, Measure(static () => Seven.Nodes[3] + Seven.Weights[3] + Wind.Raw[2] + Wind.Absolute1));
    }

    [ReleaseFact]
    public void A_generated_expectation_of_another_family_allocates_nothing()
    {
        Assert.Equal(0, Measure(static () => Roll.Expectation(0.5, new Echo(2.0, 0.3))));
        Assert.Equal(0, Measure(static () => RollSingle.Expectation(0.5f, static x => x * x)));
        Assert.Equal(0, Measure(static () => Shallow.Expectation(new Echo(2.0, 0.3)) + Quay.Expectation(static x => x * x)));
        Assert.Equal(0, Measure(static () => Pendulum.Expectation(new Echo(2.0, 0.3)) + Pendulum.NormalizingIntegral));
        Assert.Equal(0, Measure(static () => FourWithError.ExpectationWithError(1.0, 0.5, new Echo(2.0, 0.3), out _)));
        Assert.Equal(0, Measure(static () => RollWithError.ExpectationWithError(0.5, static x => x * x, out double error) + error));
        Assert.Equal(0, Measure(static () => HalfGamma.Gamma[3] + HalfGamma.Reciprocal[3] + QuarticSpring.Elements[3] + FadingMoments.Raw[2]));
    }

    [ReleaseFact]
    public void A_standard_deviation_of_zero_and_the_check_of_it_allocate_nothing()
    {
        Assert.Equal(0, Measure(static () => RuleEvaluation.Symmetric(Nodes, Weights, 1.0, 0.0, new Echo(2.0, 0.3))));
        Assert.Equal(0, Measure(static () =>
        {
            Require.StandardDeviation(0.0);
            Require.StandardDeviation(1.0f);
            Require.Scale(0.0);
            Require.Scale(1.0f);
            return 0;
        }));
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static long Measure<T>(Func<T> action)
    {
        // Once beforehand, for what a first call alone allocates: the compiler's cached delegates, and JIT work.
        _ = action();
        long before = GC.GetAllocatedBytesForCurrentThread();
        for (int i = 0; i < Calls; i++)
        {
            _ = action();
        }

        return GC.GetAllocatedBytesForCurrentThread() - before;
    }
}
