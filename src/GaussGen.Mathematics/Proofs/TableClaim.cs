using System;
using System.Threading;
using GaussGen.Mathematics.Formats;

namespace GaussGen.Mathematics.Proofs;

/// <summary>
/// What a table in a compiled assembly says of itself. A claim knows how to prove, from exact and enclosed arithmetic alone,
/// that data keeps the promise; it shares no code with the constructions that made the data.
/// </summary>
/// <param name="Format">The promised number format of every entry.</param>
public abstract record TableClaim(BinaryFormat Format)
{
    /// <summary>The promise in words, without markup: "Gauss–Hermite rule with 16 points, standard normal density".</summary>
    public abstract string Title { get; }

    /// <summary>
    /// How the promise is proven, in a few sentences without markup or line ends: for a reader who knows the mathematics and not
    /// the code. The same for every claim of a family.
    /// </summary>
    public abstract string Method { get; }

    /// <summary>Proves or refutes every entry.</summary>
    /// <param name="data">The data that was found.</param>
    /// <param name="progress">Told the finished fraction, from 0 to 1, after each step of the proof; may be <c>null</c>.</param>
    /// <param name="cancellation">Looked at before each step.</param>
    /// <returns>A verdict on every entry that was found, and every way in which the data's shape breaks the promise.</returns>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public abstract TableProof Prove(TableData data, IProgress<double>? progress, CancellationToken cancellation);
}
