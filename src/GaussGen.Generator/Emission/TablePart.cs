using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Generator.Declarations;

namespace GaussGen.Generator.Emission;

/// <summary>A member to be generated.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Signature">For a method, what tells it from its overloads; <c>null</c> for anything else.</param>
/// <param name="Write">Writes it, with its documentation.</param>
internal sealed record GeneratedMember(string Name, string? Signature, Action<SourceWriter> Write)
{
    public bool IsExcludedBy(IEnumerable<TakenName> names) => names.Any(name => name.Excludes(Name, Signature));
}

/// <summary>What is generated for one declaration, before it is set into its type.</summary>
/// <param name="Summary">The documentation of the type, as markup.</param>
/// <param name="Remarks">The paragraphs below it.</param>
/// <param name="Members">The members in the order in which they are written.</param>
internal sealed record TablePart(string Summary, IReadOnlyList<string> Remarks, IReadOnlyList<GeneratedMember> Members);

/// <summary>The generated text of one declaration.</summary>
internal sealed record GeneratedFile(string HintName, string Text);
