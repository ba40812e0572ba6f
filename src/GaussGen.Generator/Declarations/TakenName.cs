using System;

namespace GaussGen.Generator.Declarations;

/// <summary>A name that a type already uses.</summary>
/// <param name="Name">The name.</param>
/// <param name="Signature">
/// For a method, what tells it from its overloads, as <see cref="MethodSignature"/> writes it; <c>null</c> for anything else.
/// </param>
internal readonly record struct TakenName(string Name, string? Signature) : IComparable<TakenName>
{
    /// <summary>Whether a type that uses this name cannot have a member beside it.</summary>
    /// <param name="name">The member's name.</param>
    /// <param name="signature">The member's signature, if it is a method.</param>
    public bool Excludes(string name, string? signature) =>
        Name == name && (Signature is null || signature is null || Signature == signature);

    public int CompareTo(TakenName other)
    {
        int byName = string.CompareOrdinal(Name, other.Name);
        return byName != 0 ? byName : string.CompareOrdinal(Signature, other.Signature);
    }
}
