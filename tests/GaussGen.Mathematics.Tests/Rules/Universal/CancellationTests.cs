using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;
using Xunit;

namespace GaussGen.Mathematics.Tests.Rules.Universal;

/// <summary>
/// Each stage of a construction looks at the token: a weight function cancels it in the midst of a stage, and the stage that follows must
/// not come to its end. No time is measured.
/// </summary>
public class CancellationTests
{
    [Theory]
    [InlineData(Stage.Moments, false)]
    [InlineData(Stage.Recurrence, false)]
    [InlineData(Stage.Residuals, false)]
    [InlineData(Stage.Rounding, false)]
    [InlineData(Stage.Moments, true)]
    [InlineData(Stage.Recurrence, true)]
    [InlineData(Stage.Residuals, true)]
    [InlineData(Stage.Ends, true)]
    [InlineData(Stage.Rounding, true)]
    public void No_stage_ends_after_the_token_is_cancelled(Stage stage, bool hasErrorEstimate)
    {
        using var source = new CancellationTokenSource();
        var weight = new CancellingWeight(new HalfRangeWeight(), stage, source);
        var words = new FamilyWords("Gauss rule", "a weight", "none");

        Assert.Throws<OperationCanceledException>(() => RuleRounding.Round(
            UniversalRule.Construct(weight, 9, words, hasErrorEstimate, source.Token), BinaryFormat.Binary64, false, source.Token));
        // One call may be under way when the token is cancelled, and none is begun after it.
        Assert.Equal(0, weight.CallsAfterwards);
        Assert.True(source.IsCancellationRequested);
    }

    [Fact]
    public void Without_the_cancellation_the_same_construction_ends()
    {
        using var source = new CancellationTokenSource();
        var weight = new CancellingWeight(new HalfRangeWeight(), null, source);
        RuleTable table = UniversalRule.Construct(weight, 9, new FamilyWords("Gauss rule", "a weight", "none"), hasErrorEstimate: true, source.Token);

        Assert.Equal(10, RuleRounding.Round(table, BinaryFormat.Binary64, false, source.Token).Companion!.Nodes.Count);
    }

    /// <summary>Where the token is cancelled.</summary>
    public enum Stage
    {
        /// <summary>Once moments are there: Chebyshev's algorithm follows.</summary>
        Moments,

        /// <summary>Once the recurrence is there: the search for the nodes follows.</summary>
        Recurrence,

        /// <summary>At the first node's way into the variable of the moments: the residuals follow.</summary>
        Residuals,

        /// <summary>Where the ends of the interval are asked for: the companion's residuals follow.</summary>
        Ends,

        /// <summary>At the first node's way to the line: the other entries follow.</summary>
        Rounding,
    }

    private sealed class CancellingWeight(MomentWeight weight, Stage? stage, CancellationTokenSource source) : WeightFunction
    {
        public int CallsAfterwards { get; private set; }

        internal override RealNumber? Lower
        {
            get
            {
                Cancel(Stage.Ends);
                return weight.Lower;
            }
        }

        internal override Recurrence Recurrence(int count, int accuracy, CancellationToken cancellation)
        {
            Count();
            Ball[] moments = Moments(2 * count, accuracy + 200, cancellation);
            Recurrence? recurrence = ChebyshevAlgorithm.TryRun(moments, count, isEven: false, accuracy + 200, cancellation, out _);
            Cancel(Stage.Recurrence);
            return recurrence!;
        }

        internal override Ball[] Moments(int count, int precision, CancellationToken cancellation)
        {
            Count();
            Ball[] moments = weight.Moments(count, precision, cancellation);
            Cancel(Stage.Moments);
            return moments;
        }

        internal override Ball ToMomentCoordinate(Ball coordinate)
        {
            Cancel(Stage.Residuals);
            return coordinate;
        }

        internal override Ball ToLine(Ball coordinate, int precision, CancellationToken cancellation)
        {
            Count();
            Cancel(Stage.Rounding);
            return coordinate;
        }

        private void Count() => CallsAfterwards += source.IsCancellationRequested ? 1 : 0;

        private void Cancel(Stage reached)
        {
            if (reached == stage)
            {
                source.Cancel();
            }
        }
    }
}
