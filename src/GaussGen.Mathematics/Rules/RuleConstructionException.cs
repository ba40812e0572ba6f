using System;

namespace GaussGen.Mathematics.Rules;

/// <summary>Why a rule, or a table of moments, cannot be constructed though each of its parameters is in its range.</summary>
public enum RuleFailure
{
    /// <summary>The probability of the interval is below 2^−1022.</summary>
    MassTooSmall,

    /// <summary>A weight, normally an outermost one, is below 2^−1022: ask for fewer points.</summary>
    WeightNotRepresentable,

    /// <summary>A node is too large for the number format: ask for fewer points or a smaller scale.</summary>
    NodeNotRepresentable,

    /// <summary>The weight function, or a moment, cannot be resolved within the limits on precision and on the points of a quadrature.</summary>
    RecurrenceNotDetermined,

    /// <summary>A node of the error estimate's companion rule is outside the interval of the weight function.</summary>
    CompanionOutsideInterval,

    /// <summary>The rule has no companion that could estimate its error.</summary>
    NoCompanion,

    /// <summary>A number is as good as half-way between two representable ones.</summary>
    RoundingNotDecided,

    /// <summary>A moment is so large that no number format could hold it: ask for a lower order or for smaller parameters.</summary>
    MomentNotRepresentable,
}

/// <summary>A rule, or a table of moments, that cannot be constructed though each of its parameters is in its range.</summary>
/// <param name="failure">Why.</param>
/// <param name="message">What to change, as a sentence.</param>
public sealed class RuleConstructionException(RuleFailure failure, string message) : Exception(message)
{
    /// <summary>Why it cannot be constructed.</summary>
    public RuleFailure Failure { get; } = failure;
}
