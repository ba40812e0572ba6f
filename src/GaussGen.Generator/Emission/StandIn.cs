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

    private static readonly string[] Location = { "mean", "standardDeviation" };

    public static TablePart For(Declaration declaration)
    {
        NumberType type = NumberType.Of(declaration.Request.Format);
        IEnumerable<GeneratedMember> members = declaration.Request switch
        {
            RuleRequest => RuleMembers(type),
            MomentRequest => MomentMembers(type, Math.Min(Math.Max(declaration.OrderAsWritten, 0), HighestOrder)),
            _ => throw new ArgumentException("A request asks for a rule or for moments.", nameof(declaration)),
        };
        return new TablePart("A stand-in for a table whose declaration has a mistake.", Array.Empty<string>(), members.ToArray());
    }

    private static IEnumerable<GeneratedMember> RuleMembers(NumberType type)
    {
        yield return Constant("PointCount", "int", "1");
        yield return Constant("DegreeOfExactness", "int", "1");
        yield return Span("Nodes", type);
        yield return Span("Weights", type);
        foreach (IntegrandForm form in IntegrandForm.Both(type))
        {
            yield return Sum("Expectation", type, Location, form);
            yield return Sum("Expectation", type, Array.Empty<string>(), form);
            yield return Sum("Integral", type, Array.Empty<string>(), form);
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

    private static GeneratedMember Sum(string name, NumberType type, string[] location, IntegrandForm form) =>
        new(name, form.SignatureAfter(location.Select(_ => type.Keyword)), writer =>
        {
            string parameters = string.Concat(location.Select(parameter => $"{type.Keyword} {parameter}, "));
            form.WriteHeader(writer, name, parameters, type);
            using (writer.Block())
            {
                writer.Line(Throw);
            }
        });
}
