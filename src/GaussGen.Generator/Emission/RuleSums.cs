using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using static GaussGen.Generator.Emission.TableText;

namespace GaussGen.Generator.Emission;

/// <summary>
/// The sums over a rule: the expectation of a function, with an estimate of its error where there is a companion, and the integral
/// where the weights do not sum to one.
/// </summary>
internal static class RuleSums
{
    private const string Expectation = "Expectation";

    public static IEnumerable<GeneratedMember> Of(RoundedRule rule, NumberType type)
    {
        Carrier carrier = Carrier.Of(rule);
        IntegrandForm[] forms = IntegrandForm.Both(type).ToArray();
        foreach (IntegrandForm form in forms)
        {
            yield return ExpectationOf(carrier, form, rule, type);
        }

        if (rule.Companion is { } companion)
        {
            foreach (IntegrandForm form in forms)
            {
                yield return ErrorSum.Of(carrier, form, rule, companion, type);
            }
        }

        if (rule.Table.LocationScale is { } family && !IsOne(family.TotalWeight))
        {
            foreach (IntegrandForm form in forms)
            {
                yield return Integral(form, rule, type);
            }
        }
    }

    /// <summary>What the expectation of a function is, for the documentation.</summary>
    public static string Exactness(RoundedRule rule) =>
        $"exact, apart from rounding, for polynomials up to degree {Text(rule.Table.DegreeOfExactness)}";

    public static bool IsOne(RealNumber number) => number.ExactValue is { } value && value == Rational.One;

    public static void DocumentFunction(SourceWriter writer, IntegrandForm form, Carrier carrier, string calls)
    {
        if (form.IsGeneric)
        {
            writer.TypeParameter("TIntegrand", "The type of the function; a struct is compiled into the loop over the nodes.");
        }

        carrier.DocumentParameters(writer);
        writer.Parameter("integrand", $"The function; it is called once for each node{calls}, and what it throws reaches the caller.");
    }

    public static void DocumentNull(SourceWriter writer, IntegrandForm form)
    {
        if (!form.IsGeneric)
        {
            writer.Throws("global::System.ArgumentNullException", "The function is <c>null</c>.");
        }
    }

    private static GeneratedMember ExpectationOf(Carrier carrier, IntegrandForm form, RoundedRule rule, NumberType type)
    {
        SumHead head = new(Expectation, carrier.Parameters);
        return new GeneratedMember(head.Name, form.SignatureOf(head, type), writer =>
        {
            writer.Summary(Documentation.Escape(carrier.IsFixed
                ? $"The expectation of a function of {rule.Table.Description.Variable}."
                : $"The expectation of a function of {rule.Table.Description.Variable}, by the sum over the nodes."));
            DocumentFunction(writer, form, carrier, string.Empty);
            writer.Returns(carrier.IsFixed
                ? $"The sum Σ wᵢ f(xᵢ) over the nodes; {Exactness(rule)}."
                : $"The expectation; {Exactness(rule)}. {carrier.AtZero}");
            carrier.DocumentRefusal(writer);
            DocumentNull(writer, form);
            form.WriteHeader(writer, head, type);
            using (writer.Block())
            {
                carrier.WriteCheck(writer);
                carrier.WriteSum(writer, type, "return ", rule.Table.IsSymmetric, string.Empty);
            }
        });
    }

    /// <summary>The sum over the nodes as they stand.</summary>
    private static GeneratedMember Integral(IntegrandForm form, RoundedRule rule, NumberType type)
    {
        SumHead head = new("Integral", Array.Empty<string>());
        Carrier asTheyStand = Carrier.Fixed;
        return new GeneratedMember(head.Name, form.SignatureOf(head, type), writer =>
        {
            writer.Summary(Documentation.Escape(
                $"The integral over the real line of a function times the weight function, which is {rule.Table.Description.Weight}."));
            DocumentFunction(writer, form, asTheyStand, string.Empty);
            writer.Returns($"The sum Σ wᵢ f(xᵢ) over the nodes; {Exactness(rule)}.");
            DocumentNull(writer, form);
            form.WriteHeader(writer, head, type);
            using (writer.Block())
            {
                asTheyStand.WriteSum(writer, type, "return ", rule.Table.IsSymmetric, string.Empty);
            }
        });
    }
}
