using GaussGen.Mathematics.Proofs;

namespace GaussGen.Tool.Verification;

/// <summary>Verdicts as files for programs write them.</summary>
internal static class VerdictText
{
    /// <summary>"proven", "wrong" or "unproven".</summary>
    public static string Of(Verdict verdict) => verdict switch
    {
        Verdict.Proven => "proven",
        Verdict.Wrong => "wrong",
        _ => "unproven",
    };
}
