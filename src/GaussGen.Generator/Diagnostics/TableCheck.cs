using System.Collections.Generic;
using System.Collections.Immutable;
using System.Linq;
using System.Threading;
using GaussGen.Generator.Declarations;
using GaussGen.Generator.Emission;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Diagnostics;

namespace GaussGen.Generator.Diagnostics;

/// <summary>Whether the tables that a type asks for can be made, and can stand on it beside each other and its own members.</summary>
internal static class TableCheck
{
    public static void Report(
        SymbolAnalysisContext context,
        INamedTypeSymbol type,
        ImmutableArray<Family> families,
        TargetCapabilities target,
        BaselineSet baselines)
    {
        DeclaredFamily[] declared = families.AllOn(type).OrderBy(each => SourceOrder.Of(each.Attribute)).ToArray();
        foreach (DeclaredFamily each in declared)
        {
            bool isAlone = !ReportCollision(context, type, each, declared);
            ArgumentReader arguments = new(each.Attribute);
            TableRequest request = each.Family.ReadRequest(arguments);
            if (arguments.IsRefusedByCompiler)
            {
                continue;
            }

            foreach (Mistake mistake in arguments.Mistakes)
            {
                Report(context, each, mistake);
            }

            if (arguments.Mistakes.Count == 0)
            {
                bool isInRange = ReportRange(context, each, request, arguments);
                ReportTakenNames(context, type, each, request, families, target);
                if (isAlone && isInRange)
                {
                    BaselineCheck.Report(context, type, each, request, baselines);
                }
            }
        }
    }

    /// <summary>Whether another table has the members' names already.</summary>
    private static bool ReportCollision(
        SymbolAnalysisContext context, INamedTypeSymbol type, DeclaredFamily declared, IReadOnlyList<DeclaredFamily> all)
    {
        DeclaredFamily first = all.First(each => each.Family.NameSharedWith(declared.Family) is not null);
        if (first.Family != declared.Family)
        {
            Location place = AttributePlace.Of(declared.Attribute, context.CancellationToken);
            context.ReportDiagnostic(Diagnostic.Create(
                DiagnosticDescriptors.CollidingTables, place, declared.Family.Name, first.Family.Name, DisplayName.Of(type)));
            return true;
        }

        return false;
    }

    /// <summary>Whether the table can be made and the format can hold it; that weights round to zero is no hindrance.</summary>
    private static bool ReportRange(
        SymbolAnalysisContext context, DeclaredFamily declared, TableRequest request, ArgumentReader arguments)
    {
        try
        {
            Mistake? mistake = RangeCheck.Find(request, declared.Family, context.CancellationToken);
            if (mistake is not null)
            {
                Report(context, declared, mistake);
            }

            return mistake is null || mistake.Rule.DefaultSeverity != DiagnosticSeverity.Error;
        }
        catch (RuleConstructionException failure)
        {
            Report(context, declared, FailedConstruction.MistakeOf(failure, declared.Family, arguments));
            return false;
        }
    }

    private static void ReportTakenNames(
        SymbolAnalysisContext context,
        INamedTypeSymbol type,
        DeclaredFamily declared,
        TableRequest request,
        ImmutableArray<Family> families,
        TargetCapabilities target)
    {
        TakenMember[] taken = TakenMember.FindIn(type, declared.Family, families, context.Compilation).ToArray();
        if (taken.Length == 0 || FilePrinter.Construct(request, target, context.CancellationToken) is not { } part)
        {
            return;
        }

        bool isInheritanceTold = false;
        foreach (TakenMember each in taken)
        {
            if (part.Members.FirstOrDefault(member => each.Name.Excludes(member.Name, member.Signature)) is not { } excluded)
            {
                continue;
            }

            // What is inherited may be out of reach: there the attribute is what can be moved, and one report is enough.
            bool isOwn = SymbolEqualityComparer.Default.Equals(each.Holder, type)
                || SymbolEqualityComparer.Default.Equals(each.Holder.ContainingType, type);
            if (isOwn || !isInheritanceTold)
            {
                isInheritanceTold |= !isOwn;
                context.ReportDiagnostic(Diagnostic.Create(
                    DiagnosticDescriptors.NameTaken,
                    PlaceOf(each.Holder, type, declared.Attribute, context.CancellationToken),
                    DisplayName.Of(each.Holder),
                    declared.Family.Name,
                    DisplayName.Of(type),
                    excluded.Name));
            }
        }
    }

    private static Location PlaceOf(ISymbol holder, INamedTypeSymbol type, AttributeData attribute, CancellationToken cancellation)
    {
        if (SymbolEqualityComparer.Default.Equals(holder, type)
            && AttributePlace.PartAround(attribute, 0, cancellation) is { } part)
        {
            return part.Identifier.GetLocation();
        }

        return SymbolEqualityComparer.Default.Equals(holder.ContainingType, type)
            && holder.Locations.Where(place => place.IsInSource).OrderBy(SourceOrder.Of).FirstOrDefault() is { } place
            ? place
            : AttributePlace.Of(attribute, cancellation);
    }

    private static void Report(SymbolAnalysisContext context, DeclaredFamily declared, Mistake mistake) =>
        context.ReportDiagnostic(Diagnostic.Create(
            mistake.Rule, AttributePlace.Of(declared.Attribute, mistake, context.CancellationToken), mistake.Values));
}
