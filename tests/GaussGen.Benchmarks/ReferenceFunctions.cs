using System;
using MathNet.Numerics;
using MathNet.Numerics.Distributions;

namespace GaussGen.Benchmarks;

/// <summary>MathNet's functions by the names of ours; <c>null</c> where it offers none.</summary>
internal static class ReferenceFunctions
{
    internal static Func<double, double>? Find(string name) => name switch
    {
        "Erf" => x => SpecialFunctions.Erf(x),
        "Erfc" => x => SpecialFunctions.Erfc(x),
        "Inverse" => x => SpecialFunctions.ErfInv(x),
        "Density" => x => Normal.PDF(0.0, 1.0, x),
        "LogDensity" => x => Normal.PDFLn(0.0, 1.0, x),
        "Cumulative" => x => Normal.CDF(0.0, 1.0, x),
        "UpperTail" => x => Normal.CDF(0.0, 1.0, -x),
        "LogCumulative" => x => Math.Log(Normal.CDF(0.0, 1.0, x)),
        "Quantile" => p => Normal.InvCDF(0.0, 1.0, p),
        _ => null,
    };
}
