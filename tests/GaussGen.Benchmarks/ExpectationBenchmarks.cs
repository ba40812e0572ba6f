using System;
using BenchmarkDotNet.Attributes;

namespace GaussGen.Benchmarks;

/// <summary>
/// What one expectation costs, for 1024 pairs of a mean and a standard deviation that stay in the first cache: the generated
/// member beside loops that a careful programmer writes over the same constants.
/// </summary>
/// <typeparam name="TTable">The rule.</typeparam>
/// <typeparam name="TIntegrand">The function.</typeparam>
[Config(typeof(ShortLoopSettings))]
[GenericTypeArguments(typeof(SevenPoints), typeof(Quintic))]
[GenericTypeArguments(typeof(SevenPoints), typeof(Rational))]
[GenericTypeArguments(typeof(SevenPoints), typeof(Logistic))]
[GenericTypeArguments(typeof(SixteenPoints), typeof(Quintic))]
[GenericTypeArguments(typeof(SixteenPoints), typeof(Rational))]
[GenericTypeArguments(typeof(SixteenPoints), typeof(Logistic))]
[GenericTypeArguments(typeof(ThirtyTwoPoints), typeof(Quintic))]
[GenericTypeArguments(typeof(ThirtyTwoPoints), typeof(Rational))]
[GenericTypeArguments(typeof(ThirtyTwoPoints), typeof(Logistic))]
public class ExpectationBenchmarks<TTable, TIntegrand>
    where TTable : struct, ITable
    where TIntegrand : struct, IIntegrand<double>
{
    private const int Pairs = 1024;

    private readonly double[] _means = new double[Pairs];
    private readonly double[] _deviations = new double[Pairs];
    private readonly Func<double, double> _function = default(TIntegrand).Evaluate;

    [GlobalSetup]
    public void Fill()
    {
        Random random = new(1);
        for (int i = 0; i < Pairs; i++)
        {
            _means[i] = (4.0 * random.NextDouble()) - 2.0;
            _deviations[i] = 0.2 + random.NextDouble();
        }
    }

    [Benchmark(Baseline = true, OperationsPerInvoke = Pairs, Description = "hand-written, same promises")]
    public double HandWrittenWithChecks()
    {
        double sum = 0.0;
        for (int i = 0; i < Pairs; i++)
        {
            sum += HandWritten<TTable>.WithChecks(_means[i], _deviations[i], default(TIntegrand));
        }

        return sum;
    }

    [Benchmark(OperationsPerInvoke = Pairs, Description = "hand-written, unchecked, in pairs")]
    public double HandWrittenInPairs()
    {
        double sum = 0.0;
        for (int i = 0; i < Pairs; i++)
        {
            sum += HandWritten<TTable>.InPairs(_means[i], _deviations[i], default(TIntegrand));
        }

        return sum;
    }

    [Benchmark(OperationsPerInvoke = Pairs, Description = "hand-written, unchecked, plain")]
    public double HandWrittenPlain()
    {
        double sum = 0.0;
        for (int i = 0; i < Pairs; i++)
        {
            sum += HandWritten<TTable>.Plain(_means[i], _deviations[i], default(TIntegrand));
        }

        return sum;
    }

    [Benchmark(OperationsPerInvoke = Pairs, Description = "Expectation, struct")]
    public double GeneratedStruct()
    {
        double sum = 0.0;
        for (int i = 0; i < Pairs; i++)
        {
            sum += TTable.Expectation(_means[i], _deviations[i], default(TIntegrand));
        }

        return sum;
    }

    [Benchmark(OperationsPerInvoke = Pairs, Description = "Expectation, delegate")]
    public double GeneratedDelegate()
    {
        double sum = 0.0;
        for (int i = 0; i < Pairs; i++)
        {
            sum += TTable.Expectation(_means[i], _deviations[i], _function);
        }

        return sum;
    }
}
