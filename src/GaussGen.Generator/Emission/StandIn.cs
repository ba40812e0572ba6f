using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Generator.Declarations;
using GaussGen.Mathematics.Requests;
using static GaussGen.Generator.Emission.TableText;

namespace GaussGen.Generator.Emission;

/// <summary>
/// What stands in for a table whose declaration has a mistake: the members that it would have, without the numbers, so that
/// the code that uses them adds no errors to the one about the mistake. It is written in C# 5, for projects whose mistake is
/// an old language version.
/// </summary>
internal static class StandIn
{
    private const int HighestOrder = 1000;

    private const string Throw =
        "throw new global::System.NotSupportedException(\"The declaration of this table has a mistake that the compiler reports.\");";

    /// <summary>Every sum that a rule can have, with and without a location and a scale.</summary>
    private static readonly SumHead[] Sums =
    {
        new("Expectation", Carrier.Location),
        new("Expectation", Carrier.Scale),
        new("Expectation", Array.Empty<string>()),
        new("Integral", Array.Empty<string>()),
        new(ErrorSum.Name, Carrier.Location, HasError: true),
        new(ErrorSum.Name, Carrier.Scale, HasError: true),
        new(ErrorSum.Name, Array.Empty<string>(), HasError: true),
    };

    public static TablePart For(Declaration declaration)
    {
        NumberType type = NumberType.Of(declaration.Request.Format);
        IEnumerable<GeneratedMember> members = declaration.Request switch
        {
            RuleRequest => RuleMembers(type, declaration.OwnNames),
            MomentRequest => MomentMembers(type, Math.Min(Math.Max(declaration.OrderAsWritten, 0), HighestOrder)),
            SequenceRequest => declaration.OwnNames.Select(name => Span(name, type)),
            _ => throw new ArgumentException("A request asks for a rule, for moments or for lists.", nameof(declaration)),
        };
        return new TablePart("A stand-in for a table whose declaration has a mistake.", Array.Empty<string>(), members.ToArray());
    }

    private static IEnumerable<GeneratedMember> RuleMembers(NumberType type, IEnumerable<string> constants)
    {
        yield return Constant("PointCount", "int", "1");
        yield return Constant("DegreeOfExactness", "int", "1");
        foreach (string constant in constants)
        {
            yield return Constant(constant, type.Keyword, type.One);
        }

        foreach (string prefix in new[] { string.Empty, ErrorSum.CompanionPrefix })
        {
            yield return Span(prefix + "Nodes", type);
            yield return Span(prefix + "Weights", type);
        }

        foreach (IntegrandForm form in IntegrandForm.Both(type))
        {
            foreach (SumHead head in Sums)
            {
                yield return Sum(head, type, form);
            }
        }
    }

    private static IEnumerable<GeneratedMember> MomentMembers(NumberType type, int highestOrder)
    {
        foreach (string list in new[] { "Raw", "Central", "Absolute" })
        {
            yield return Span(list, type);
            for (int order = 0; order <= highestOrder; order++)
            {
                yield return Constant(MomentPart.ConstantName(list, order), type.Keyword, type.One);
            }
        }
    }

    private static GeneratedMember Constant(string name, string type, string value) => new(name, null, writer =>
    {
        writer.Line(GeneratedCodeAttribute);
        writer.Line($"public const {type} {name} = {value};");
    });

    private static GeneratedMember Span(string name, NumberType type) => new(name, null, writer =>
    {
        writer.Line(GeneratedCodeAttribute);
        writer.Line($"public static {type.Span} {name}");
        using (writer.Block())
        {
            writer.Line("get { " + Throw + " }");
        }
    });

    private static GeneratedMember Sum(SumHead head, NumberType type, IntegrandForm form) =>
        new(head.Name, form.SignatureOf(head, type), writer =>
        {
            form.WriteHeader(writer, head, type);
            using (writer.Block())
            {
                writer.Line(Throw);
            }
        });
}
