using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Claims;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Verification;

/// <summary>A declared table with what it promises and what it holds, before anything is proven; or why one of them is not known.</summary>
/// <param name="Declared">The type and its declaration.</param>
/// <param name="Family">The family; null if this version of the tool does not know it.</param>
/// <param name="Claim">The promise; null if it could not be read.</param>
/// <param name="Data">The data; null exactly if there is a reason.</param>
/// <param name="Reason">Why the table could not be read, as one line; null if it was.</param>
internal sealed record ReadTable(DeclaredTable Declared, ClaimFamily? Family, TableClaim? Claim, TableData? Data, string? Reason)
{
    /// <summary>Reads a declared table.</summary>
    public static ReadTable Of(DeclaredTable declared)
    {
        if (declared.Declaration is null)
        {
            return Unread(declared, declared.Type.UnreadDeclarations[declared.Attribute]);
        }

        if (ClaimTable.Find(declared.Attribute) is not { } family)
        {
            return Unread(declared, $"[{declared.Attribute}] is unknown to this version of the tool; install a newer one");
        }

        family = family.As(declared.Declaration);
        TableClaim? claim = null;
        try
        {
            claim = ClaimTable.Read(family, declared.Declaration);
            FoundType type = declared.Type;
            foreach (string span in family.Spans)
            {
                if (type.UnreadSpans.TryGetValue(span, out string? why))
                {
                    return Unread(declared, $"{span} cannot be read: {why}", family, claim);
                }
            }

            return new ReadTable(declared, family, claim, FoundData.Of(type, family), null);
        }
        catch (ClaimException error)
        {
            return Unread(declared, error.Message, family, claim);
        }
    }

    private static ReadTable Unread(DeclaredTable declared, string reason, ClaimFamily? family = null, TableClaim? claim = null) =>
        new(declared, family, claim, null, reason);
}
