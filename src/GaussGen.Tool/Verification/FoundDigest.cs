using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Claims;

namespace GaussGen.Tool.Verification;

/// <summary>The digest of data that was found, as <see cref="TableDigest"/> defines it.</summary>
internal static class FoundDigest
{
    /// <summary>The digest with the name of its algorithm in front.</summary>
    public static string Of(TableData data, ClaimFamily family)
    {
        HashSet<string> covered = new(
            family.HasEntryConstants
                ? data.Spans.SelectMany(span => span.Bits.Select((_, index) => DigestedMember.ConstantName(span.Name, index)))
                : [],
            StringComparer.Ordinal);
        return TableDigest.Of(
        [
            .. data.Spans.Select(span => DigestedMember.List(span.Name, span.Format, span.Bits)),
            .. data.Constants
                .Where(constant => family.IsDigested(constant.Name) || covered.Contains(constant.Name))
                .Select(constant => DigestedMember.Number(constant.Name, constant.Format, constant.Bits)),
        ]);
    }
}
