using System.Globalization;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;

namespace GaussGen.Mathematics.Sequences;

/// <summary>
/// A request for the gamma function at the half-integers: Γ(k + ½) and 1/Γ(k + ½) for k = 0 … <see cref="MaximumOrder"/>.
/// </summary>
public sealed record HalfIntegerGammaRequest : SequenceRequest
{
    /// <summary>The smallest value of <see cref="MaximumOrder"/>.</summary>
    public const int SmallestOrder = 0;

    /// <summary>
    /// The largest order that may be asked for. Γ(k + ½) exceeds the largest binary64 number from k = 172 on and the largest binary32 number
    /// from k = 35 on, so that no table of these formats is cut short by this limit.
    /// </summary>
    public const int LargestOrder = 200;

    /// <summary>A request with the given parameters.</summary>
    /// <param name="maximumOrder">The largest k, from <see cref="SmallestOrder"/> to <see cref="LargestOrder"/>.</param>
    /// <param name="format">The number format of every entry.</param>
    /// <exception cref="System.ArgumentOutOfRangeException">The order is out of range; the message says what to give.</exception>
    public HalfIntegerGammaRequest(int maximumOrder, BinaryFormat format)
        : base(format) =>
        MaximumOrder = Parameters.RequireCount(maximumOrder, SmallestOrder, LargestOrder, "The highest order", nameof(maximumOrder));

    /// <summary>The largest k.</summary>
    public int MaximumOrder { get; }

    /// <inheritdoc/>
    public override string Claim => ClaimTitle.HalfIntegerGamma(MaximumOrder);

    /// <summary>Whether a number can be the largest k.</summary>
    public static bool IsMaximumOrder(int value) => value is >= SmallestOrder and <= LargestOrder;

    /// <inheritdoc/>
    /// <remarks>
    /// Γ(k + ½) = √π (2k−1)!!/2ᵏ (NIST DLMF 5.4.6 for k = 0, then 5.5.1): a rational number times √π, which is irrational, so that no entry is
    /// half-way between two representable numbers.
    /// </remarks>
    public override SequenceTable Construct(CancellationToken cancellation)
    {
        var gamma = new RealNumber[MaximumOrder + 1];
        var reciprocal = new RealNumber[MaximumOrder + 1];
        for (int k = 0; k <= MaximumOrder; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            Rational ratio = HalfIntegerGamma.OverSqrtPi(k);
            gamma[k] = RealNumber.FromEnclosures((precision, token) => Ball.Multiply(
                Ball.FromRational(ratio, precision + 2), Constants.SqrtPi(precision + 2, token), precision));
            reciprocal[k] = RealNumber.FromEnclosures((precision, token) => Ball.Divide(
                Ball.FromRational(Rational.One / ratio, precision + 2), Constants.SqrtPi(precision + 2, token), precision));
        }

        string last = MaximumOrder.ToString(CultureInfo.InvariantCulture);
        return new SequenceTable(
            new SequenceDescription(
                "The gamma function at the half-integers k + ½, k from 0 to " + last,
                "an exact rational number times or over an enclosure of the square root of π",
                "NIST DLMF 5.4.6, 5.5.1"),
            [
                new NamedSequence("Gamma", gamma, "Γ(k + ½) at index k, from 0 to " + last + "."),
                new NamedSequence("Reciprocal", reciprocal, "1/Γ(k + ½) at index k, from 0 to " + last + "."),
            ]);
    }
}
