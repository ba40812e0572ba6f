using System.Collections.Generic;
using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Sequences;

/// <summary>The words that documentation needs about named lists; each is a phrase without markup.</summary>
/// <param name="Title">What the lists are together: "The gamma function at the half-integers ½ to 20½".</param>
/// <param name="Method">How the entries were obtained, for the remarks on the proof.</param>
/// <param name="Sources">Where the formulas come from: author, year or publication, number.</param>
public sealed record SequenceDescription(string Title, string Method, string Sources);

/// <summary>One list of numbers.</summary>
/// <param name="Name">Its name as a member: "Gamma".</param>
/// <param name="Values">The entries.</param>
/// <param name="Summary">What it is, and what the index means, as a sentence without markup.</param>
public sealed record NamedSequence(string Name, IReadOnlyList<RealNumber> Values, string Summary);

/// <summary>Named lists of numbers before a number format is chosen.</summary>
/// <param name="Description">The words for the documentation.</param>
/// <param name="Sequences">The lists, in the order in which they are emitted.</param>
public sealed record SequenceTable(SequenceDescription Description, IReadOnlyList<NamedSequence> Sequences);
