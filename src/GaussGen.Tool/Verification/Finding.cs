namespace GaussGen.Tool.Verification;

/// <summary>What kind of thing is wrong; each kind has a code that build logs and reports carry.</summary>
internal enum FindingKind
{
    /// <summary>An entry is proven to be another value than the claim promises.</summary>
    WrongEntry,

    /// <summary>A member is missing, or of another type or length than the claim promises.</summary>
    WrongShape,

    /// <summary>Nothing is proven about an entry or a whole table.</summary>
    NotProven,

    /// <summary>A file could not be read.</summary>
    NotRead,
}

/// <summary>One thing to report about a table.</summary>
/// <param name="Kind">What kind.</param>
/// <param name="Member">The entry or member, "Nodes[3]"; null if it is the whole table.</param>
/// <param name="Message">One line.</param>
/// <param name="Expected">The right value as text, where it is known.</param>
/// <param name="Found">The found value as text.</param>
internal sealed record Finding(FindingKind Kind, string? Member, string Message, string? Expected = null, string? Found = null);

/// <summary>The codes of findings. The analyzer's own diagnostics have the numbers below 900.</summary>
internal static class FindingCodes
{
    /// <summary>The code of a kind.</summary>
    public static string Code(this FindingKind kind) => kind switch
    {
        FindingKind.WrongEntry => "GAUSS901",
        FindingKind.WrongShape => "GAUSS902",
        FindingKind.NotProven => "GAUSS903",
        _ => "GAUSS904",
    };

    /// <summary>What a kind means, as a sentence.</summary>
    public static string Meaning(this FindingKind kind) => kind switch
    {
        FindingKind.WrongEntry => "An entry is not the representable value nearest to the true one.",
        FindingKind.WrongShape => "A table's members are not those that its declaration promises.",
        FindingKind.NotProven => "A table or an entry could not be proven.",
        _ => "A file could not be read.",
    };
}
