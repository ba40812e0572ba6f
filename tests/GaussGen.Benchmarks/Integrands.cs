using System;

namespace GaussGen.Benchmarks;

/// <summary>A polynomial of degree 5: the cheapest integrand, where every instruction around it shows.</summary>
public readonly struct Quintic : IIntegrand<double>
{
    public double Evaluate(double x) =>
        (((((((((0.03 * x) - 0.11) * x) + 0.21) * x) + 0.37) * x) - 0.5) * x) + 1.25;
}

/// <summary>A quotient, limited by the processor's divider.</summary>
public readonly struct Rational : IIntegrand<double>
{
    public double Evaluate(double x) => x / (1.0 + (x * x));
}

/// <summary>A function with an exponential in it, as most integrands have.</summary>
public readonly struct Logistic : IIntegrand<double>
{
    public double Evaluate(double x) => 1.0 / (1.0 + Math.Exp(-x));
}
