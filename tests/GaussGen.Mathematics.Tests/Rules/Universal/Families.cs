using System.Collections.Generic;
using System.Globalization;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Mathematics.Tests.Rules.Universal;

/// <summary>The families by the names that the reference data has for them.</summary>
internal static class Families
{
    public static RuleRequest Request(string name, int points, BinaryFormat format)
    {
        string[] words = name.Split(' ');
        return words[0] switch
        {
            "half-range" => new GaussHalfRangeHermiteRequest(points, format, false),
            "quartic" => EvenExponential(points, format, 0, 1),
            "double-well" => EvenExponential(points, format, -2, 0.5),
            "sextic" => EvenExponential(points, format, 1, 0, 0.1),
            "deep-well" => EvenExponential(points, format, -10, 1),
            "mixture" => Mixture(points, format, [0.3, 0.7], [-1, 2], [0.5, 1.5]),
            "symmetric-mixture" => Mixture(points, format, [1, 2, 1], [-2, 1, 4], [0.5, 1, 0.5]),
            "far-mixture" => Mixture(points, format, [0.9, 0.1], [0, 100], [1, 2]),
            "truncated" => new GaussTruncatedNormalRequest(points, End(words[1]), End(words[2]), format, false),
            "generalized-hermite" => new GaussGeneralizedHermiteRequest(points, Number(words[1]), format, false),
            "log-normal" => new GaussLogNormalRequest(points, Number(words[1]), Number(words[2]), format, false),
            _ => throw new KeyNotFoundException("There is no family " + name + "."),
        };
    }

    private static double End(string text) => text switch
    {
        "inf" => double.PositiveInfinity,
        "-inf" => double.NegativeInfinity,
        "8+2^-10" => 8 + (1.0 / 1024),
        _ => Number(text),
    };

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);

    public static GaussEvenExponentialRequest EvenExponential(int points, BinaryFormat format, params double[] coefficients) =>
        new(points, new ValueList(coefficients), format, false);

    public static GaussNormalMixtureRequest Mixture(
        int points, BinaryFormat format, double[] weights, double[] means, double[] standardDeviations) =>
        new(points, new ValueList(weights), new ValueList(means), new ValueList(standardDeviations), format, false);
}
