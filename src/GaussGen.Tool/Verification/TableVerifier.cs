using System;
using System.Collections.Concurrent;
using System.Collections.Generic;
using System.Linq;
using System.Threading;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Output;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Verification;

/// <summary>A table that is to be verified: a declaration, or why there is none to go by.</summary>
/// <param name="Type">The type that carries it.</param>
/// <param name="Attribute">The attribute's name.</param>
/// <param name="Declaration">The declaration; null if its arguments could not be read.</param>
internal sealed record DeclaredTable(FoundType Type, string Attribute, Declaration? Declaration)
{
    /// <summary>The tables of a type.</summary>
    public static IEnumerable<DeclaredTable> Of(FoundType type) => type.Declarations
        .Select(declaration => new DeclaredTable(type, declaration.Name, declaration))
        .Concat(type.UnreadDeclarations.Keys.Select(name => new DeclaredTable(type, name, null)));

    /// <summary>The number of entries in all spans of the type, which is what the work grows with.</summary>
    public int Size => Type.Spans.Values.Sum(span => span.Count);
}

/// <summary>Proves tables one at a time; the same claim on the same data, as copies of an assembly have it, is proven once.</summary>
internal sealed class TableVerifier
{
    private readonly ConcurrentDictionary<(TableClaim Claim, string Digest), Lazy<TableProof>> _proofs = new();

    /// <summary>Proves a table, or says why not.</summary>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public TableResult Verify(DeclaredTable table, IProgress<double>? progress, CancellationToken cancellation)
    {
        ReadTable read = ReadTable.Of(table);
        if (read is not { Claim: { } claim, Data: { } data })
        {
            return Unprovable(table, read.Reason!, read.Claim);
        }

        try
        {
            TableProof proof = Prove(claim, data, progress, cancellation);
            return new TableResult(table.Type, table.Attribute, claim, proof, proof.Entries.Count, ProofFindings.Of(proof))
            {
                Digest = FoundDigest.Of(data, read.Family!),
            };
        }
        catch (Exception error) when (error is InvalidOperationException or ArithmeticException)
        {
            return Unprovable(table, "the proof stopped: " + PlainText.OneLine(error.Message), claim);
        }
    }

    private TableProof Prove(TableClaim claim, TableData data, IProgress<double>? progress, CancellationToken cancellation)
    {
        Lazy<TableProof> proof = _proofs.GetOrAdd(
            (claim, DataDigest.Of(data)), _ => new Lazy<TableProof>(() => claim.Prove(data, progress, cancellation)));
        return proof.Value;
    }

    private static TableResult Unprovable(DeclaredTable table, string reason, TableClaim? claim = null) =>
        new(table.Type, table.Attribute, claim, null, table.Size, [new Finding(FindingKind.NotProven, null, reason)]);
}
