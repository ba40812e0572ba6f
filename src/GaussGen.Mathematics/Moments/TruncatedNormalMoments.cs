using System;
using System.Collections.Generic;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Rules.Universal;
using GaussGen.Mathematics.Weights;

namespace GaussGen.Mathematics.Moments;

/// <summary>The moments of a truncated normal variable X with the mean M.</summary>
/// <remarks>
/// <para>
/// The moments about a dyadic centre c near M come from integration by parts (<see cref="TruncatedMoments"/>; Tallis 1961 has the same recurrence);
/// the binomial theorem takes them from c to M and to 0. Odd absolute moments need one integral more, over the shorter side of M: with
/// P and N the integrals of |x − M|ᵏ above and below M, E (X − M)ᵏ = P − N, E |X − M|ᵏ = P + N, so that it is E (X − M)ᵏ + 2N or 2P − E (X − M)ᵏ.
/// </para>
/// <para>
/// Stein's identity gives E Xᵏ = Rₖ + Aₖ f(l) − Bₖ f(u), f being s² times the density at the ends l and u, and Rₖ₊₁ = m Rₖ + k s² Rₖ₋₁,
/// Aₖ₊₁ = m Aₖ + k s² Aₖ₋₁ + lᵏ, Bₖ₊₁ = m Bₖ + k s² Bₖ₋₁ + uᵏ, all dyadic. Where the terms with f vanish, the moment is Rₖ exactly, as E X = m for
/// an interval symmetric about m, or E X² = m² + s² for l = −m, u = ∞. That is decided in exact arithmetic.
/// </para>
/// </remarks>
internal sealed class TruncatedNormalMoments
{
    private const int MaximumPrecision = 1 << 16;

    private readonly TruncatedNormalDistribution _distribution;
    private readonly int _maximumOrder;
    private readonly Dyadic _centre;
    private readonly SharedByPrecision<Shifted> _shifted;
    private readonly SharedByPrecision<Ball[]> _absolute;

    /// <summary>The moments to an order; the interval has a probability that is not too small.</summary>
    internal TruncatedNormalMoments(TruncatedNormalDistribution distribution, int maximumOrder, CancellationToken cancellation)
    {
        _distribution = distribution;
        _maximumOrder = maximumOrder;
        _centre = distribution.ChooseCentre(cancellation);
        _shifted = new SharedByPrecision<Shifted>(Shift);
        _absolute = new SharedByPrecision<Ball[]>(OddAbsolute);
    }

    /// <summary>E Xᵏ.</summary>
    internal IReadOnlyList<RealNumber> Raw(CancellationToken cancellation)
    {
        Dyadic?[] exact = ExactRaw(cancellation);
        var moments = new RealNumber[_maximumOrder + 1];
        for (int k = 0; k <= _maximumOrder; k++)
        {
            int order = k;
            moments[k] = exact[k] is { } value
                ? RealNumber.Exact(value.ToRational())
                : RealNumber.FromEnclosures((precision, token) => _shifted.At(precision, token).Raw[order]);
        }

        return moments;
    }

    /// <summary>E (X − M)ᵏ.</summary>
    internal IReadOnlyList<RealNumber> Central()
    {
        RealNumber zero = RealNumber.Exact(Rational.Zero);
        var moments = new RealNumber[_maximumOrder + 1];
        for (int k = 0; k <= _maximumOrder; k++)
        {
            int order = k;
            moments[k] = k == 0 ? RealNumber.Exact(Rational.One)
                : k == 1 || (_distribution.IsSymmetric && (k & 1) != 0) ? zero
                : RealNumber.FromEnclosures((precision, token) => _shifted.At(precision, token).Central[order]);
        }

        return moments;
    }

    /// <summary>E |X − M|ᵏ, the central moment for even k.</summary>
    internal IReadOnlyList<RealNumber> Absolute(IReadOnlyList<RealNumber> central)
    {
        var moments = new RealNumber[_maximumOrder + 1];
        for (int k = 0; k <= _maximumOrder; k++)
        {
            int order = k;
            moments[k] = (k & 1) == 0
                ? central[k]
                : RealNumber.FromEnclosures((precision, token) => _absolute.At(precision, token)[order]);
        }

        return moments;
    }

    /// <summary>Rₖ where that is the moment, else <c>null</c>.</summary>
    private Dyadic?[] ExactRaw(CancellationToken cancellation)
    {
        var exact = new Dyadic?[_maximumOrder + 1];
        var normal = new SteinRecurrence(_distribution, new Dyadic(1, 0), end: null);
        var left = new SteinRecurrence(_distribution, Dyadic.Zero, _distribution.Lower);
        var right = new SteinRecurrence(_distribution, Dyadic.Zero, _distribution.Upper);
        for (int k = 0; k <= _maximumOrder; k++)
        {
            cancellation.ThrowIfCancellationRequested();
            // At ends that are equally far from m the density is the same.
            bool isExact = _distribution.IsSymmetric
                ? left.Current == right.Current
                : left.Current.IsZero && right.Current.IsZero;
            exact[k] = isExact ? normal.Current : null;
            normal.Advance(k);
            left.Advance(k);
            right.Advance(k);
        }

        return exact;
    }

    /// <summary>Raw and central moments, those of even order known to the precision.</summary>
    private Shifted Shift(int precision, CancellationToken cancellation)
    {
        for (int working = precision + 32; working <= MaximumPrecision;)
        {
            Ball[] moments = AboutCentre(_maximumOrder + 1, working, cancellation);
            Ball distance = _distribution.IsSymmetric || _maximumOrder == 0 ? default : moments[1];
            var shifted = new Shifted(
                Translate(moments, Ball.FromDyadic(_centre), working, cancellation),
                Translate(moments, distance.Negate(), working, cancellation));
            int missing = Math.Max(MissingBits(shifted.Raw, 0, precision), MissingBits(shifted.Central, 0, precision));
            if (missing <= 0)
            {
                return shifted;
            }

            working += missing + 16;
        }

        throw NotDetermined();
    }

    /// <summary>E (X − c)ᵏ.</summary>
    private Ball[] AboutCentre(int count, int working, CancellationToken cancellation)
    {
        Ball[] moments = TruncatedMoments.About((bits, _) => _distribution.About(_centre, bits), count, working, cancellation);
        return InUnits(moments, moments[0], working);
    }

    /// <summary>Integrals in standard deviations, divided by a mass and in the variable's own unit.</summary>
    private Ball[] InUnits(Ball[] integrals, Ball mass, int working)
    {
        var moments = new Ball[integrals.Length];
        Ball factor = Ball.Divide(Ball.FromInteger(1), mass, working), unit = Ball.FromDyadic(_distribution.Deviation);
        for (int k = 0; k < moments.Length; k++)
        {
            moments[k] = Ball.Multiply(integrals[k], factor, working);
            factor = Ball.Multiply(factor, unit, working);
        }

        return moments;
    }

    /// <summary>From E Wᵏ to E (W + t)ᵏ: in the j-th round one factor W of all that have one left becomes W + t.</summary>
    private static Ball[] Translate(Ball[] moments, Ball distance, int working, CancellationToken cancellation)
    {
        var result = (Ball[])moments.Clone();
        result[0] = Ball.FromInteger(1);
        for (int round = 1; round < result.Length && distance.IsZero != Trilean.True; round++)
        {
            cancellation.ThrowIfCancellationRequested();
            for (int k = result.Length - 1; k >= round; k--)
            {
                result[k] = Ball.Add(result[k], Ball.Multiply(distance, result[k - 1], working), working);
            }
        }

        return result;
    }

    /// <summary>E |X − M|ᵏ at the indexes of odd k.</summary>
    private Ball[] OddAbsolute(int precision, CancellationToken cancellation)
    {
        bool isLeft = IsLeftShorter(cancellation);
        for (int working = precision + 32; working <= MaximumPrecision;)
        {
            Ball mass = TruncatedMoments.About((bits, _) => _distribution.About(_centre, bits), 1, working, cancellation)[0];
            Ball[] side = TruncatedMoments.About(
                (bits, token) => Side(isLeft, bits, token), _maximumOrder + 1, working, cancellation);
            Ball[] part = InUnits(side, mass, working);
            Ball[] central = _shifted.At(working, cancellation).Central;
            for (int k = 1; k <= _maximumOrder; k += 2)
            {
                // On the left the odd integrals are negative: −2 times one is 2N.
                Ball twice = part[k].ScaleByPowerOfTwo(1);
                part[k] = isLeft ? Ball.Subtract(OddCentral(central, k), twice, working) : Ball.Subtract(twice, OddCentral(central, k), working);
            }

            int missing = MissingBits(part, 1, precision);
            if (missing <= 0)
            {
                return part;
            }

            working += missing + 16;
        }

        throw NotDetermined();
    }

    private Ball OddCentral(Ball[] central, int order) => order == 1 || _distribution.IsSymmetric ? default : central[order];

    /// <summary>The interval between M and the end on one side of it, with M as the centre of the moments.</summary>
    private TruncatedInterval Side(bool isLeft, int working, CancellationToken cancellation)
    {
        TruncatedInterval whole = _distribution.About(_centre, working);
        Ball distance = DistanceToMean(working, cancellation);
        Ball mean = Ball.Add(whole.Centre, distance, working);
        return isLeft
            ? new TruncatedInterval(whole.Lower, mean, Ball.Subtract(whole.LowerDistance!.Value, distance, working), default(Ball), mean)
            : new TruncatedInterval(mean, whole.Upper, default(Ball), Ball.Subtract(whole.UpperDistance!.Value, distance, working), mean);
    }

    /// <summary>M − c in standard deviations.</summary>
    private Ball DistanceToMean(int working, CancellationToken cancellation)
    {
        if (_distribution.IsSymmetric)
        {
            return default;
        }

        Ball[] moments = TruncatedMoments.About((bits, _) => _distribution.About(_centre, bits), 2, working, cancellation);
        return Ball.Divide(moments[1], moments[0], working);
    }

    private bool IsLeftShorter(CancellationToken cancellation)
    {
        if (_distribution.Lower is null || _distribution.Upper is null)
        {
            return _distribution.Upper is null;
        }

        TruncatedInterval whole = _distribution.About(_centre, 64);
        Ball twice = DistanceToMean(64, cancellation).ScaleByPowerOfTwo(1);
        Ball sum = Ball.Add(whole.LowerDistance!.Value, whole.UpperDistance!.Value, 64);
        return Ball.Subtract(sum, twice, 64).Midpoint.Sign > 0;
    }

    private static int MissingBits(Ball[] moments, int first, int precision)
    {
        int missing = int.MinValue;
        for (int k = first; k < moments.Length; k += 2)
        {
            missing = Math.Max(missing, precision - Math.Max(0, moments[k].RelativeAccuracyBits));
        }

        return missing;
    }

    private static RuleConstructionException NotDetermined() => new(
        RuleFailure.RecurrenceNotDetermined,
        "The moments of the interval need more bits than are allowed; choose a wider interval or a lower order.");

    private sealed record Shifted(Ball[] Raw, Ball[] Central);

    /// <summary>Yₖ₊₁ = m Yₖ + k s² Yₖ₋₁ + eᵏ, without the last term where there is no end e.</summary>
    private sealed class SteinRecurrence(TruncatedNormalDistribution distribution, Dyadic first, Dyadic? end)
    {
        private readonly Dyadic _variance = distribution.Deviation * distribution.Deviation;
        private Dyadic _before;
        private Dyadic _power = new(1, 0);

        internal Dyadic Current { get; private set; } = first;

        internal void Advance(int order)
        {
            Dyadic next = (distribution.Mean * Current) + (_variance * _before * new Dyadic(order, 0));
            if (end is { } x)
            {
                next += _power;
                _power = (_power * x).Reduce();
            }

            _before = Current;
            Current = next.Reduce();
        }
    }
}
