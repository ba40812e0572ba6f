using GaussGen.Mathematics.Requests;

namespace GaussGen.Generator.Declarations;

/// <summary>
/// What one attribute on one type asks for. It is what the pipeline remembers between edits: no symbol, node or location is in
/// it, and two equal ones have the same generated text.
/// </summary>
/// <param name="Type">The type that is to have the table.</param>
/// <param name="Family">The name of the family.</param>
/// <param name="Request">The request; where the attribute has a mistake, one that is near to what it says.</param>
/// <param name="OwnNames">See <see cref="Declarations.Family.OwnNames"/>.</param>
/// <param name="OrderAsWritten">The highest order that the source asks for, in range or not; for a family of moments alone.</param>
/// <param name="IsSound">Whether the attribute is free of mistakes, so that the request is what the user wrote.</param>
/// <param name="TakenNames">The names that generated members might have and that the type already uses.</param>
internal sealed record Declaration(
    TargetType Type,
    string Family,
    TableRequest Request,
    EquatableArray<string> OwnNames,
    int OrderAsWritten,
    bool IsSound,
    EquatableArray<TakenName> TakenNames);
