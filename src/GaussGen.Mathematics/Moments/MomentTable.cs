using System.Collections.Generic;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Moments;

/// <summary>The words that documentation needs about a family of moments; each is a phrase without markup.</summary>
/// <param name="Distribution">Whose moments: "the normal distribution with mean 1.5 and standard deviation 0.25".</param>
/// <param name="Method">How the entries were obtained, for the remarks on the proof.</param>
/// <param name="Sources">Where the formulas come from: author, year or publication, number.</param>
public sealed record MomentDescription(string Distribution, string Method, string Sources);

/// <summary>Moments before a number format is chosen, each list indexed by order from 0.</summary>
/// <param name="Description">The words for the documentation.</param>
/// <param name="Raw">E Xᵏ.</param>
/// <param name="Central">E (X − E X)ᵏ.</param>
/// <param name="Absolute">E |X − E X|ᵏ.</param>
public sealed record MomentTable(
    MomentDescription Description,
    IReadOnlyList<RealNumber> Raw,
    IReadOnlyList<RealNumber> Central,
    IReadOnlyList<RealNumber> Absolute);
