using System;
using System.Globalization;
using System.Linq;
using System.Text;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Rules;

/// <summary>
/// A request for a Gauss rule for the density proportional to exp(−(c₁x² + c₂x⁴ + c₃x⁶ + …)). Each coefficient is the exact value of a
/// binary64 number; the last one is above zero.
/// </summary>
public sealed record GaussEvenExponentialRequest : UniversalRuleRequest
{
    /// <summary>The largest number of coefficients: up to x¹⁶.</summary>
    public const int MaximumCoefficients = 8;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="points">The number of nodes, from <see cref="UniversalRuleRequest.MinimumPoints"/> to <see cref="UniversalRuleRequest.MaximumPoints"/>.</param>
    /// <param name="coefficients">c₁, c₂, …; finite, the last one above zero.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <param name="dropZeroWeights">Whether nodes whose weight rounds to zero are left out.</param>
    /// <exception cref="ArgumentOutOfRangeException">A parameter is out of range; the message says what to give.</exception>
    public GaussEvenExponentialRequest(int points, ValueList coefficients, BinaryFormat format, bool dropZeroWeights)
        : base(points, format, dropZeroWeights)
    {
        Coefficients = EvenExponentialParameters.Require(coefficients, nameof(coefficients));
    }

    /// <summary>c₁, c₂, ….</summary>
    public ValueList Coefficients { get; }

    /// <summary>Whether numbers can be the coefficients: one to <see cref="MaximumCoefficients"/> finite ones, the last above zero.</summary>
    public static bool AreCoefficients(ValueList values) => values is { Count: > 0 and <= MaximumCoefficients }
        && values.All(Parameters.IsFinite) && values[values.Count - 1] > 0;

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.GaussEvenExponential(Points, Coefficients, DropZeroWeights, ErrorEstimate);

    /// <inheritdoc/>
    /// <exception cref="RuleConstructionException">The rule cannot be constructed; the exception says why.</exception>
    public override RuleTable Construct(CancellationToken cancellation)
    {
        var weight = new EvenExponentialWeight(Array.ConvertAll(Coefficients.ToArray(), Parameters.ValueOf));
        string function = EvenExponentialParameters.Write(Coefficients);
        var words = new FamilyWords(
            "Gauss rule",
            "the density proportional to " + function,
            "Trefethen and Weideman 2014, theorem 5.1; NIST DLMF 18.9.1");
        RealNumber integral = RealNumber.FromEnclosures(weight.NormalizingIntegral);
        return UniversalRule.Construct(weight, Points, words, ErrorEstimate, cancellation) with
        {
            Constants = [new NamedConstant("NormalizingIntegral", integral, "The integral of " + function + " over the real line.")],
        };
    }
}

/// <summary>Checks and text of the coefficients of an even exponential.</summary>
internal static class EvenExponentialParameters
{
    internal static ValueList Require(ValueList coefficients, string name) => GaussEvenExponentialRequest.AreCoefficients(coefficients)
        ? coefficients
        : throw new ArgumentOutOfRangeException(
            name,
            string.Format(
                CultureInfo.InvariantCulture,
                "Give from 1 to {0} finite coefficients, the last one above zero.",
                GaussEvenExponentialRequest.MaximumCoefficients));

    /// <summary>"exp(−(0.5 x^2 − 1.0 x^4 + 2.0 x^6))".</summary>
    internal static string Write(ValueList coefficients)
    {
        var text = new StringBuilder("exp(−(");
        bool isFirst = true;
        for (int k = 0; k < coefficients.Count; k++)
        {
            double coefficient = coefficients[k];
            if (coefficient == 0)
            {
                continue;
            }

            string sign = coefficient < 0 ? "−" : "+";
            _ = text.Append(!isFirst ? " " + sign + " " : coefficient < 0 ? sign : string.Empty)
                .Append(Parameters.Write(Math.Abs(coefficient)))
                .Append(" x^")
                .Append((2 * (k + 1)).ToString(CultureInfo.InvariantCulture));
            isFirst = false;
        }

        return text.Append("))").ToString();
    }
}
