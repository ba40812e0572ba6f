using System;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Rules;
using GaussGen.Mathematics.Sequences;

namespace GaussGen.Mathematics.Requests;

/// <summary>
/// Remembers rounded tables by their requests, so that equal requests are worked on once in a process. All members are
/// thread-safe. Of two threads that want the same table one constructs it and the other waits; a waiting one that is cancelled leaves,
/// and where the constructing one is cancelled the next one takes over. Failures are not remembered.
/// </summary>
/// <remarks>
/// What is remembered is bounded: <see cref="MaximumTables"/> tables with <see cref="MaximumValues"/> numbers in all; the tables
/// that were wanted least recently go first.
/// </remarks>
public static class TableMemo
{
    /// <summary>How many tables are remembered at most.</summary>
    public const int MaximumTables = 256;

    /// <summary>How many numbers the remembered tables hold together at most; a single larger table is not remembered.</summary>
    public const int MaximumValues = 1 << 17;

    private static readonly BoundedMemo<TableRequest> Memo = new(MaximumTables, MaximumValues);

    /// <summary>How many tables this process has constructed; it does not grow where a table is remembered.</summary>
    public static long Constructions => Memo.Constructions;

    /// <summary>The rule that is asked for, in its number format.</summary>
    /// <exception cref="InvalidOperationException">An entry's rounding cannot be decided.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static RoundedRule Get(RuleRequest request, CancellationToken cancellation) => (RoundedRule)Memo.Get(
        request,
        token => RuleRounding.Round(request.Construct(token), request.Format, request.DropZeroWeights, token),
        rule => (((RoundedRule)rule).Table.Nodes.Count + (((RoundedRule)rule).Companion?.Nodes.Count ?? 0)) * 2,
        cancellation);

    /// <summary>The moments that are asked for, in their number format.</summary>
    /// <exception cref="InvalidOperationException">An entry's rounding cannot be decided.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static RoundedMoments Get(MomentRequest request, CancellationToken cancellation) => (RoundedMoments)Memo.Get(
        request,
        token => MomentRounding.Round(request.Construct(token), request.Format, token),
        moments => ((RoundedMoments)moments).Raw.Count * 3,
        cancellation);

    /// <summary>The lists that are asked for, in their number format.</summary>
    /// <exception cref="InvalidOperationException">An entry's rounding cannot be decided.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static RoundedSequences Get(SequenceRequest request, CancellationToken cancellation) => (RoundedSequences)Memo.Get(
        request,
        token => SequenceRounding.Round(request.Construct(token), request.Format, token),
        sequences => ((RoundedSequences)sequences).Values.Sum(values => values.Count),
        cancellation);
}
