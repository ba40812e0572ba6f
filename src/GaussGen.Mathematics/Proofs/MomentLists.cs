using System;
using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>Raw, central and absolute moments of orders from 0, each exactly known, enclosed, or not yet either.</summary>
internal sealed class MomentLists
{
    private readonly BinaryFormat _format;
    private readonly KnownNumber?[] _known;
    private readonly int _count;

    /// <summary>Lists in which order 0 is exactly 1 and the central moment of order 1 exactly 0.</summary>
    public MomentLists(BinaryFormat format, int maximumOrder)
    {
        _format = format;
        _count = maximumOrder + 1;
        _known = new KnownNumber?[3 * _count];
        Raw(0, Rational.One);
        Central(0, Rational.One);
        Absolute(0, Rational.One);
        if (maximumOrder > 0)
        {
            Central(1, Rational.Zero);
        }
    }

    /// <summary>Makes a raw moment known.</summary>
    public void Raw(int order, Rational value) => _known[order] = KnownNumbers.Exact(_format, value);

    /// <summary>Makes a central moment known.</summary>
    public void Central(int order, Rational value) => _known[_count + order] = KnownNumbers.Exact(_format, value);

    /// <summary>Makes an absolute moment known.</summary>
    public void Absolute(int order, Rational value) => _known[(2 * _count) + order] = KnownNumbers.Exact(_format, value);

    /// <summary>Marks a raw moment as beyond every format.</summary>
    public void RawTooLarge(int order) => _known[order] = KnownNumbers.TooLarge(_format);

    /// <summary>Marks the absolute moment, and the central one unless it is known, as beyond every format.</summary>
    public void AboutMeanTooLarge(int order)
    {
        _known[_count + order] ??= KnownNumbers.TooLarge(_format);
        _known[(2 * _count) + order] = KnownNumbers.TooLarge(_format);
    }

    /// <summary>Whether the raw moment is known already.</summary>
    public bool IsRawKnown(int order) => _known[order] is not null;

    /// <summary>Whether the central moment is known already.</summary>
    public bool IsCentralKnown(int order) => _known[_count + order] is not null;

    /// <summary>Whether the absolute moment is known already.</summary>
    public bool IsAbsoluteKnown(int order) => _known[(2 * _count) + order] is not null;

    /// <summary>Encloses what is not known, and puts the data beside it.</summary>
    /// <param name="claim">The claim that is proven.</param>
    /// <param name="data">The data that was found.</param>
    /// <param name="enclose">From a precision in bits to enclosures of all moments; those of known ones are not looked at.</param>
    /// <param name="progress">Told 1 at the end.</param>
    /// <param name="cancellation">Looked at before each round.</param>
    public TableProof Prove(
        TableClaim claim, TableData data, Func<int, MomentBalls> enclose, IProgress<double>? progress, CancellationToken cancellation)
    {
        KnownNumber[] numbers = KnownNumbers.Decide(_format, _known, precision => enclose(precision).Joined(), cancellation);
        var report = new ProofReport(claim, data);
        Judge(report, "Raw", numbers, 0);
        Judge(report, "Central", numbers, _count);
        Judge(report, "Absolute", numbers, 2 * _count);
        progress?.Report(1);
        return report.Finish([]);
    }

    private void Judge(ProofReport report, string member, KnownNumber[] numbers, int from)
    {
        KnownNumber[] known = [.. numbers.Skip(from).Take(_count)];
        report.Entries(member, report.Span(member), known);
        for (int order = 0; order < _count; order++)
        {
            report.Constant(member + order.ToString(CultureInfo.InvariantCulture), known[order], isRequired: true);
        }
    }
}

/// <summary>Enclosures of moments of orders from 0; the lists are of equal length.</summary>
/// <param name="Raw">About zero.</param>
/// <param name="Central">About the mean.</param>
/// <param name="Absolute">About the mean, of the magnitude.</param>
internal sealed record MomentBalls(IReadOnlyList<Ball> Raw, IReadOnlyList<Ball> Central, IReadOnlyList<Ball> Absolute)
{
    /// <summary>All of them in one list.</summary>
    public IReadOnlyList<Ball> Joined() => [.. Raw, .. Central, .. Absolute];

    /// <summary>
    /// The central and absolute moments from the integrals of yᵏ times the density's multiple on both sides of the mean, y the distance
    /// from it, divided by the whole integral; scaled.
    /// </summary>
    public static (Ball[] Central, Ball[] Absolute) FromSides(Ball[] left, Ball[] right, Dyadic scale, int precision)
    {
        var central = new Ball[left.Length];
        var absolute = new Ball[left.Length];
        Ball factor = Ball.Divide(Ball.FromInteger(1), Ball.Add(left[0], right[0], precision), precision);
        for (int k = 0; k < left.Length; k++)
        {
            Ball minor = Ball.Multiply(left[k], factor, precision);
            Ball major = Ball.Multiply(right[k], factor, precision);
            absolute[k] = Ball.Add(major, minor, precision);
            central[k] = (k & 1) == 0 ? absolute[k] : Ball.Subtract(major, minor, precision);
            factor = Ball.Multiply(factor, Ball.FromDyadic(scale), precision);
        }

        return (central, absolute);
    }
}
