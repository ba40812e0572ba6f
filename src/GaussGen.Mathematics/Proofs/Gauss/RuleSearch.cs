using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs.Gauss;

/// <summary>Finds the nodes and weights of a rule, each as an enclosure and as the proven nearest value.</summary>
/// <remarks>
/// <list type="bullet">
/// <item><description>
/// The zeros are told apart first. A sign change of the polynomial over the rounding interval of a found value proves that an odd number of zeros
/// lies there; N of them on disjoint intervals are all N zeros, one each. Where found values do not give that, the zeros are counted by a
/// Sturm sequence (<see cref="ZeroCount"/>), or by sign changes on a grid.
/// </description></item>
/// <item><description>
/// Each zero is narrowed by sign changes (<see cref="RuleZero"/>) until node and weight lie between the rounding midpoints around one
/// representable value (<see cref="NearestValue"/>). Found values only save work: nothing is believed of them.
/// </description></item>
/// <item><description>
/// What the working precision does not decide is tried again with more. A rational number that may be half-way is recognised exactly
/// (<see cref="ExactRule"/>).
/// </description></item>
/// </list>
/// </remarks>
internal sealed class RuleSearch
{
    /// <summary>Where the search gives up, in bits of working precision.</summary>
    public const int LargestPrecision = 1 << 13;

    /// <summary>How often a zero is narrowed with one precision: enough to tell 0 from the smallest number above it.</summary>
    private const int MostSteps = 512;

    private readonly RuleSource _source;
    private readonly BinaryFormat _format;
    private readonly NodeCoordinate _coordinate;
    private readonly int[] _sides;
    private List<RuleZero>? _zeros;
    private KnownEntry?[] _known = [];
    private KnownNumber? _centerWeight;
    private int _decided;

    public RuleSearch(RuleSource source, BinaryFormat format)
    {
        _source = source;
        _format = format;
        _coordinate = new NodeCoordinate(source.Moments.Center, source.Moments.IsEven);
        _sides = source.Moments.IsEven ? [1, -1] : [1];
    }

    /// <summary>All nodes, ascending, with their weights; <c>null</c> if the zeros could not be told apart.</summary>
    /// <param name="hints">Found values that may be nodes.</param>
    /// <param name="progress">Told the finished fraction.</param>
    /// <param name="cancellation">Looked at in each step.</param>
    public List<KnownEntry>? Find(IReadOnlyList<ulong> hints, Action<double> progress, CancellationToken cancellation)
    {
        List<KnownEntry>? entries = Search(hints, progress, cancellation);
        if (_decided == 0 || _decided != _zeros?.Count)
        {
            progress(1);
        }

        return entries;
    }

    private List<KnownEntry>? Search(IReadOnlyList<ulong> hints, Action<double> progress, CancellationToken cancellation)
    {
        int precision = FirstPrecision();
        while (precision <= LargestPrecision)
        {
            if (_source.At(precision, cancellation, out int wanted) is not { } level)
            {
                precision = wanted;
                continue;
            }

            _zeros ??= ZeroIsolation.Find(level, _source, _coordinate, _format, hints, cancellation);
            if (_zeros is not null && DecideAll(level, progress, cancellation))
            {
                return Assemble();
            }

            precision += Math.Max(precision / 2, 64);
        }

        return _zeros is null ? null : Assemble();
    }

    /// <summary>What has been enough in most cases; of no consequence for the result.</summary>
    private int FirstPrecision() => 96 + (2 * _format.Precision) + (_source.Zeros * (_source.Moments.IsEven ? 9 : 10));

    private bool DecideAll(RuleLevel level, Action<double> progress, CancellationToken cancellation)
    {
        if (_known.Length == 0)
        {
            _known = new KnownEntry?[_sides.Length * _zeros!.Count];
        }

        bool isComplete = true;
        ExactRule? exact = null;
        bool isExactKnown = false;
        for (int index = 0; index < _zeros!.Count; index++)
        {
            if (IsDecided(index))
            {
                continue;
            }

            if (!Decide(index, level, cancellation))
            {
                exact = isExactKnown ? exact : _source.Exact(cancellation);
                isExactKnown = true;
                if (exact is null || !DecideExactly(index, exact))
                {
                    isComplete = false;
                    continue;
                }
            }

            progress(++_decided / (double)_zeros.Count);
        }

        if (_source.HasCenterNode && _centerWeight?.Bits is null)
        {
            _centerWeight = Known(level.CenterWeight);
            if (_centerWeight.Bits is null)
            {
                exact = isExactKnown ? exact : _source.Exact(cancellation);
                _centerWeight = exact is null ? _centerWeight : Known(exact.CenterWeight);
                isComplete &= _centerWeight.Bits is not null;
            }
        }

        return isComplete;
    }

    /// <summary>Narrows a zero until all that it stands for is decided; false if the level's precision does not suffice.</summary>
    private bool Decide(int index, RuleLevel level, CancellationToken cancellation)
    {
        RuleZero zero = _zeros![index];
        for (int step = 0; !IsDecided(index); step++)
        {
            Ball enclosure = zero.Enclosure;
            if (enclosure.RelativeAccuracyBits >= _format.Precision + 8 + _source.Zeros || enclosure.ContainsZero)
            {
                Evaluate(index, enclosure, level);
            }

            // Where coefficients are exact, signs are known however near the zero: the interval would shrink without end around a zero half-way.
            if (!IsDecided(index) && (step == MostSteps || !zero.Narrow(level.Polynomial, cancellation)))
            {
                return false;
            }
        }

        return true;
    }

    private bool IsDecided(int index)
    {
        for (int side = 0; side < _sides.Length; side++)
        {
            if (_known[(index * _sides.Length) + side] is not { Node.Bits: not null, Weight.Bits: not null })
            {
                return false;
            }
        }

        return true;
    }

    private void Evaluate(int index, Ball enclosure, RuleLevel level)
    {
        Ball weight = level.Polynomial.Weight(enclosure);
        if (_source.Moments.IsEven && weight.IsFinite)
        {
            weight = weight.ScaleByPowerOfTwo(-1);
            weight = _source.Parity == 0 ? weight
                : enclosure.ContainsZero ? Ball.WholeLine
                : Ball.Divide(weight, enclosure, level.Precision);
        }

        KnownNumber known = Known(weight);
        for (int side = 0; side < _sides.Length; side++)
        {
            KnownNumber node = Known(_coordinate.ToLine(enclosure, _sides[side], level.Precision));
            Note((index * _sides.Length) + side, new KnownEntry(node, known));
        }
    }

    private bool DecideExactly(int index, ExactRule exact)
    {
        RuleZero zero = _zeros![index];
        if (exact.ZeroIn(zero.Low, zero.High) is not { } root)
        {
            return false;
        }

        KnownNumber weight = Known(exact.Weight(root));
        for (int side = 0; side < _sides.Length; side++)
        {
            KnownNumber node = _coordinate.ToLine(root, _sides[side]) is { } line
                ? Known(line)
                : Known(_coordinate.ToLine(zero.Enclosure, _sides[side], LargestPrecision));
            Note((index * _sides.Length) + side, new KnownEntry(node, weight));
        }

        return IsDecided(index);
    }

    /// <summary>Keeps what was decided earlier.</summary>
    private void Note(int index, KnownEntry entry)
    {
        KnownEntry? old = _known[index];
        _known[index] = new KnownEntry(
            old is { Node.Bits: not null } ? old.Node : entry.Node, old is { Weight.Bits: not null } ? old.Weight : entry.Weight);
    }

    private KnownNumber Known(Ball value) => value.IsFinite
        ? new KnownNumber(value.Lower, value.Upper, NearestValue.Of(_format, value))
        : new KnownNumber(Dyadic.Zero, Dyadic.Zero, null);

    private KnownNumber Known(Rational value)
    {
        Ball enclosure = Ball.FromRational(value, 256);
        return new KnownNumber(enclosure.Lower, enclosure.Upper, _format.Round(value));
    }

    private List<KnownEntry> Assemble()
    {
        var unknown = new KnownNumber(Dyadic.Zero, Dyadic.Zero, null);
        KnownEntry[] known = [.. _known.Select(entry => entry ?? new KnownEntry(unknown, unknown))];
        if (!_source.Moments.IsEven)
        {
            return [.. known];
        }

        var ascending = new List<KnownEntry>(_source.Points);
        for (int index = _zeros!.Count - 1; index >= 0; index--)
        {
            ascending.Add(known[(2 * index) + 1]);
        }

        if (_source.HasCenterNode)
        {
            Ball center = Ball.FromDyadic(_source.Moments.Center);
            ascending.Add(new KnownEntry(Known(center), _centerWeight ?? unknown));
        }

        for (int index = 0; index < _zeros.Count; index++)
        {
            ascending.Add(known[2 * index]);
        }

        return ascending;
    }
}

/// <summary>A node and its weight as a proof knows them.</summary>
/// <param name="Node">The node.</param>
/// <param name="Weight">The weight.</param>
internal sealed record KnownEntry(KnownNumber Node, KnownNumber Weight);
