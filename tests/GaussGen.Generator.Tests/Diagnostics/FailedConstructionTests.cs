using System;
using System.Collections.Immutable;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Generator.Declarations;
using GaussGen.Generator.Diagnostics;
using GaussGen.Generator.Emission;
using GaussGen.Generator.Tests.Support;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Microsoft.CodeAnalysis;
using Xunit;

namespace GaussGen.Generator.Tests.Diagnostics;

/// <summary>
/// Tables whose arguments are each in range and that cannot be made: of families that fail in each way there is, some of which are
/// hard to meet with real ones.
/// </summary>
public sealed class FailedConstructionTests
{
    private const string Attributes =
        """
        namespace GaussGen
        {
            [System.AttributeUsage(System.AttributeTargets.Class)]
            internal sealed class BrokenRuleAttribute : System.Attribute
            {
                internal BrokenRuleAttribute(int points, double lower, double upper) { }
                public bool ErrorEstimate { get; set; }
            }

            [System.AttributeUsage(System.AttributeTargets.Class)]
            internal sealed class BrokenMomentsAttribute : System.Attribute
            {
                internal BrokenMomentsAttribute(double lower, double upper) { }
                public int MaximumOrder { get; set; }
            }
        }
        """;

    public static TheoryData<RuleFailure> Failures => [.. Enum.GetValues<RuleFailure>()];

    [Theory]
    [MemberData(nameof(Failures))]
    public async Task A_rule_that_fails_is_one_mistake_at_what_can_mend_it(RuleFailure failure)
    {
        Diagnostic only = await OnlyMistake(failure, "BrokenRule(5, 40, 41, ErrorEstimate = true)", "Expectation(x => x) + Nodes[0]");

        Assert.Equal(IdOf(failure), only.Id);
        Assert.Equal(PlaceIn(failure, "5", "true", "BrokenRule(5, 40, 41, ErrorEstimate = true)"), Source(only));
        Assert.Equal("No table can be made of [BrokenRule]: It is broken; mend it", only.GetMessage(null));
    }

    [Theory]
    [MemberData(nameof(Failures))]
    public async Task Moments_that_fail_are_one_mistake_at_what_can_mend_it(RuleFailure failure)
    {
        const string Declaration = "BrokenMoments(-3, -2, MaximumOrder = 7)";
        Diagnostic only = await OnlyMistake(failure, Declaration, "Raw[0] + Raw7");

        Assert.Equal(IdOf(failure), only.Id);
        Assert.Equal(failure == RuleFailure.MassTooSmall ? "-2" : PlaceIn(failure, "7", Declaration, Declaration), Source(only));
    }

    [Fact]
    public void A_cancelled_construction_is_not_taken_for_a_failed_one()
    {
        CancelledRequest request = new();
        Family family = Family.OfRules("BrokenRule", _ => request);
        TargetCapabilities target = TargetCapabilities.Of(Framework.Net80.Empty, CancellationToken.None);

        Assert.Throws<OperationCanceledException>(() => FilePrinter.Construct(request, target, CancellationToken.None));
        Assert.Throws<OperationCanceledException>(() => RangeCheck.Find(request, family, CancellationToken.None));
    }

    private static async Task<Diagnostic> OnlyMistake(RuleFailure failure, string attribute, string use)
    {
        ImmutableArray<Family> families =
        [
            Family.OfRules("BrokenRule", read =>
            {
                _ = read.Interval();
                return new BrokenRule(failure);
            }),
            Family.OfMoments("BrokenMoments", read =>
            {
                _ = read.Interval();
                _ = read.MaximumOrder(10);
                return new BrokenMoments(failure);
            }),
        ];
        Outcome outcome = new Consumer(
            Attributes,
            $$"""
            using GaussGen;

            [{{attribute}}]
            internal static partial class Echo
            {
                internal static double Of() => {{use}};
            }
            """).Run(new TableGenerator(families));
        Assert.Empty(outcome.CompilerDiagnostics);
        return Assert.Single(await outcome.AnalyzerDiagnostics(new DeclarationAnalyzer(families)));
    }

    private static string IdOf(RuleFailure failure) => failure switch
    {
        RuleFailure.MassTooSmall => "GAUSS029",
        RuleFailure.WeightNotRepresentable => "GAUSS030",
        RuleFailure.NodeNotRepresentable => "GAUSS031",
        RuleFailure.RecurrenceNotDetermined => "GAUSS032",
        RuleFailure.CompanionOutsideInterval => "GAUSS033",
        RuleFailure.NoCompanion => "GAUSS034",
        RuleFailure.RoundingNotDecided => "GAUSS035",
        RuleFailure.MomentNotRepresentable => "GAUSS036",
        _ => throw new ArgumentOutOfRangeException(nameof(failure)),
    };

    private static string PlaceIn(RuleFailure failure, string size, string estimate, string whole) => failure switch
    {
        RuleFailure.MassTooSmall => "40",
        RuleFailure.CompanionOutsideInterval or RuleFailure.NoCompanion => estimate,
        RuleFailure.RoundingNotDecided => whole,
        _ => size,
    };

    private static string Source(Diagnostic diagnostic) => diagnostic.Location.SourceTree!.GetText().ToString(diagnostic.Location.SourceSpan);

    private static RuleConstructionException Exception(RuleFailure failure) => new(failure, "It is broken; mend it.");

    private sealed record BrokenRule(RuleFailure Failure) : RuleRequest(BinaryFormat.Binary64, DropZeroWeights: false)
    {
        public override RuleTable Construct(CancellationToken cancellation) => throw Exception(Failure);
    }

    private sealed record BrokenMoments(RuleFailure Failure) : MomentRequest(BinaryFormat.Binary64)
    {
        public override MomentTable Construct(CancellationToken cancellation) => throw Exception(Failure);
    }

    private sealed record CancelledRequest() : RuleRequest(BinaryFormat.Binary64, DropZeroWeights: false)
    {
        public override RuleTable Construct(CancellationToken cancellation) => throw new OperationCanceledException();
    }
}
