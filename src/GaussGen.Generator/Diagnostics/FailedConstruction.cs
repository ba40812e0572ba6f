using System;
using GaussGen.Generator.Declarations;
using GaussGen.Mathematics.Rules;
using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Diagnostics;

/// <summary>From the failure of a construction to the argument that can mend it.</summary>
internal static class FailedConstruction
{
    /// <summary>The mistake that a failure amounts to.</summary>
    /// <param name="failure">The failure.</param>
    /// <param name="family">Of which family the table would be.</param>
    /// <param name="arguments">Its arguments.</param>
    public static Mistake MistakeOf(RuleConstructionException failure, Family family, ArgumentReader arguments)
    {
        (DiagnosticDescriptor rule, string argument) = failure.Failure switch
        {
            RuleFailure.MassTooSmall => (DiagnosticDescriptors.MassTooSmall, arguments.NearEnd),
            RuleFailure.WeightNotRepresentable => (DiagnosticDescriptors.WeightNotRepresentable, family.SizeArgument),
            RuleFailure.NodeNotRepresentable => (DiagnosticDescriptors.NodeNotRepresentable, family.SizeArgument),
            RuleFailure.RecurrenceNotDetermined => (DiagnosticDescriptors.NotDetermined, family.SizeArgument),
            RuleFailure.CompanionOutsideInterval => (DiagnosticDescriptors.CompanionOutsideInterval, ArgumentReader.ErrorEstimateArgument),
            RuleFailure.NoCompanion => (DiagnosticDescriptors.NoCompanion, ArgumentReader.ErrorEstimateArgument),
            RuleFailure.MomentNotRepresentable => (DiagnosticDescriptors.MomentNotRepresentable, family.SizeArgument),
            RuleFailure.RoundingNotDecided => (DiagnosticDescriptors.RoundingNotDecided, string.Empty),
            _ => throw new ArgumentOutOfRangeException(nameof(failure), failure.Failure, "Each failure has its diagnostic."),
        };
        return new Mistake(rule, argument, family.Name, WithoutFullStop(failure.Message));
    }

    private static string WithoutFullStop(string sentence) => sentence.TrimEnd('.');
}
