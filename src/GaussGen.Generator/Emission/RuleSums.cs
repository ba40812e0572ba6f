using System;
using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;
using static GaussGen.Generator.Emission.TableText;

namespace GaussGen.Generator.Emission;

/// <summary>The sums over a rule: the expectation of a function, and the integral where the weights do not sum to one.</summary>
internal static class RuleSums
{
    public static IEnumerable<GeneratedMember> Of(RoundedRule rule, NumberType type)
    {
        IEnumerable<IntegrandForm> forms = IntegrandForm.Both(type);
        if (rule.Table.LocationScale is not { } locationScale)
        {
            string expectation = $"The expectation of a function of a variable whose density is {rule.Table.Description.Weight}.";
            return forms.Select(form => Sum("Expectation", expectation, form, rule, type));
        }

        IEnumerable<GeneratedMember> expectations = forms.Select(form => Expectation(form, rule, type));
        string integral = $"The integral over the real line of a function times the weight function, which is {rule.Table.Description.Weight}.";
        return IsOne(locationScale.TotalWeight)
            ? expectations
            : expectations.Concat(forms.Select(form => Sum("Integral", integral, form, rule, type)));
    }

    /// <summary>The sum over the nodes as they stand.</summary>
    private static GeneratedMember Sum(string name, string summary, IntegrandForm form, RoundedRule rule, NumberType type) =>
        new(name, form.SignatureAfter(Array.Empty<string>()), writer =>
        {
            writer.Summary(Documentation.Escape(summary));
            DocumentTypeParameter(writer, form);
            DocumentIntegrand(writer);
            writer.Returns($"The sum Σ wᵢ f(xᵢ) over the nodes; {Exactness(rule)}.");
            DocumentNull(writer, form);
            form.WriteHeader(writer, name, string.Empty, type);
            using (writer.Block())
            {
                writer.Line($"return {Evaluation(rule)}(Nodes, Weights, {type.Zero}, {type.One}, integrand);");
            }
        });

    /// <summary>The sum over the nodes, carried to a mean and a standard deviation.</summary>
    private static GeneratedMember Expectation(IntegrandForm form, RoundedRule rule, NumberType type) =>
        new("Expectation", form.SignatureAfter(new[] { type.Keyword, type.Keyword }), writer =>
        {
            writer.Summary("The expectation of a function of a normal variable, by the sum over the nodes.");
            DocumentTypeParameter(writer, form);
            writer.Parameter("mean", "The mean of the variable.");
            writer.Parameter("standardDeviation", "Its standard deviation, in the units of the mean; finite, and 0 or above.");
            DocumentIntegrand(writer);
            writer.Returns($"The expectation; {Exactness(rule)}. At standard deviation 0 it is the value of the function at the mean.");
            writer.Throws("global::System.ArgumentOutOfRangeException", "The standard deviation is negative, NaN or infinite.");
            DocumentNull(writer, form);
            form.WriteHeader(writer, "Expectation", $"{type.Keyword} mean, {type.Keyword} standardDeviation, ", type);
            using (writer.Block())
            {
                writer.Line("global::GaussGen.Require.StandardDeviation(standardDeviation);");
                WriteLocatedSum(writer, rule, type);
            }
        });

    private static void WriteLocatedSum(SourceWriter writer, RoundedRule rule, NumberType type)
    {
        string scale = "standardDeviation";
        if (rule.NodeScale is { } nodeScale && !IsOne(rule.Table.LocationScale!.NodeScale))
        {
            scale = "scale";
            writer.Line($"{type.Keyword} scale = {type.Literal(nodeScale)} * standardDeviation; // {type.Hexadecimal(nodeScale)}");
        }

        string factor = string.Empty;
        if (rule.ReciprocalTotalWeight is { } reciprocal && !IsOne(rule.Table.LocationScale!.TotalWeight))
        {
            factor = "reciprocalTotalWeight, ";
            writer.Line($"const {type.Keyword} reciprocalTotalWeight = {type.Literal(reciprocal)}; // {type.Hexadecimal(reciprocal)}");
        }

        writer.Line($"return {Evaluation(rule)}(Nodes, Weights, mean, {scale}, {factor}integrand);");
    }

    private static void DocumentTypeParameter(SourceWriter writer, IntegrandForm form)
    {
        if (form.IsGeneric)
        {
            writer.TypeParameter("TIntegrand", "The type of the function; a struct is compiled into the loop over the nodes.");
        }
    }

    private static void DocumentIntegrand(SourceWriter writer) =>
        writer.Parameter("integrand", "The function; it is called once for each node, and what it throws reaches the caller.");

    private static void DocumentNull(SourceWriter writer, IntegrandForm form)
    {
        if (!form.IsGeneric)
        {
            writer.Throws("global::System.ArgumentNullException", "The function is <c>null</c>.");
        }
    }

    private static string Exactness(RoundedRule rule) =>
        $"exact, apart from rounding, for polynomials up to degree {Text(rule.Table.DegreeOfExactness)}";

    private static string Evaluation(RoundedRule rule) =>
        "global::GaussGen.RuleEvaluation." + (rule.Table.IsSymmetric ? "Symmetric" : "General");

    private static bool IsOne(RealNumber number) => number.ExactValue is { } value && value == Rational.One;
}
