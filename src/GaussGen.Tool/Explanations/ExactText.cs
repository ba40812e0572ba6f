using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Verification;

namespace GaussGen.Tool.Explanations;

/// <summary>An entry as C99 writes it, marked if it is not proven.</summary>
internal static class ExactText
{
    /// <summary>The text.</summary>
    public static string Of(EntryProof entry, BinaryFormat format) =>
        (format.IsFinite(entry.Found) ? HexadecimalFloat.Write(entry.Found, format) : "0x" + EncodingText.Bits(entry.Found, format))
        + (entry.Verdict == Verdict.Proven ? "" : " !");
}
