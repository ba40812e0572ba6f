using System.Collections.Generic;

namespace GaussGen.Tests;

internal readonly struct Identity : IIntegrand<double>, IIntegrand<float>
{
    public double Evaluate(double x) => x;

    public float Evaluate(float x) => x;
}

internal readonly struct Constant(double value) : IIntegrand<double>, IIntegrand<float>
{
    public double Evaluate(double x) => value;

    public float Evaluate(float x) => (float)value;
}

/// <summary>A polynomial by Horner's scheme, coefficients from the highest power down.</summary>
internal readonly struct Polynomial(params double[] coefficients) : IIntegrand<double>, IIntegrand<float>
{
    public double Evaluate(double x)
    {
        double sum = 0.0;
        foreach (double coefficient in coefficients)
        {
            sum = (sum * x) + coefficient;
        }

        return sum;
    }

    public float Evaluate(float x)
    {
        float sum = 0.0f;
        foreach (double coefficient in coefficients)
        {
            sum = (sum * x) + (float)coefficient;
        }

        return sum;
    }
}

/// <summary>Notes where it was evaluated, in order.</summary>
internal readonly struct Recorder(List<double> points) : IIntegrand<double>, IIntegrand<float>
{
    public double Evaluate(double x)
    {
        points.Add(x);
        return x;
    }

    public float Evaluate(float x)
    {
        points.Add(x);
        return x;
    }
}

/// <summary>A range through an attenuating echo: what a survey boat would integrate.</summary>
internal readonly struct Echo(double gain, double attenuation) : IIntegrand<double>, IIntegrand<float>
{
    public double Evaluate(double x) => gain / (1.0 + (attenuation * x * x));

    public float Evaluate(float x) => (float)gain / (1.0f + ((float)attenuation * x * x));
}
