using System;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>A weight that is given by its moments. The bad conditioning of the moments is paid for in bits.</summary>
internal abstract class MomentWeight : WeightFunction
{
    /// <summary>The most bits that moments may need; beyond, the weight is refused.</summary>
    internal const int MaximumPrecision = 1 << 14;

    /// <summary>
    /// About how many bits Chebyshev's algorithm loses for n coefficients; measured, and of no consequence for the result.
    /// </summary>
    protected abstract int ExpectedLoss(int count);

    /// <inheritdoc/>
    internal override Recurrence Recurrence(int count, int accuracy, CancellationToken cancellation)
    {
        int precision = checked(accuracy + ExpectedLoss(count));
        while (precision <= MaximumPrecision + accuracy)
        {
            Ball[] moments = Moments(2 * count, precision, cancellation);
            Recurrence? recurrence = ChebyshevAlgorithm.TryRun(moments, count, IsEven, precision, cancellation, out int rows);
            int bits = recurrence?.AccuracyBits() ?? 0;
            if (bits >= accuracy && recurrence is not null)
            {
                return recurrence;
            }

            // A run that broke off at row k lost all its bits there; the loss grows a little faster than k.
            precision += recurrence is not null
                ? accuracy - bits + 16
                : Math.Min(precision, (int)(precision * (1.15 * count / Math.Max(rows, 1) - 1))) + 32;
        }

        throw new RuleConstructionException(
            RuleFailure.RecurrenceNotDetermined,
            "The moments do not determine a rule of so many points within the working precision that is allowed; ask for fewer points, "
            + "or for a weight whose parts differ less in size.");
    }
}
