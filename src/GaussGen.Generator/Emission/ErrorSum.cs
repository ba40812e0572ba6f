using System.Linq;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules;

namespace GaussGen.Generator.Emission;

/// <summary>The expectation of a function together with an estimate of its error, by the sum over a companion rule.</summary>
internal static class ErrorSum
{
    public const string Name = "ExpectationWithError";

    public const string CompanionPrefix = "Companion";

    public static GeneratedMember Of(Carrier carrier, IntegrandForm form, RoundedRule rule, RoundedCompanion companion, NumberType type)
    {
        SumHead head = new(Name, carrier.Parameters, HasError: true);
        return new GeneratedMember(head.Name, form.SignatureOf(head, type), writer =>
        {
            writer.Summary(Documentation.Escape(
                $"The expectation of a function of {rule.Table.Description.Variable}, and an estimate of its error."));
            RuleSums.DocumentFunction(writer, form, carrier, " of the rule and of its companion");
            writer.Parameter("error", Documentation.Escape(Estimate(carrier, companion, type)));
            writer.Returns($"What <c>Expectation</c> returns: {RuleSums.Exactness(rule)}.");
            writer.Remarks(Documentation.Escape(
                "The estimate supposes that what the two rules do not integrate exactly is small and regular, as for a smooth function; it can be "
                + $"too small or too large by any amount, and is not to be taken for a bound. Source: {companion.Table.Sources}."));
            carrier.DocumentRefusal(writer);
            RuleSums.DocumentNull(writer, form);
            form.WriteHeader(writer, head, type);
            using (writer.Block())
            {
                string arguments = string.Concat(carrier.Parameters.Select(parameter => parameter + ", "));
                writer.Line($"{type.Keyword} expectation = Expectation({arguments}integrand);");
                carrier.WriteSum(writer, type, $"{type.Keyword} companion = ", companion.Table.IsSymmetric, CompanionPrefix);
                writer.Line($"error = {Factor(companion, type)}global::System.Math.Abs(companion - expectation);");
                writer.Line("return expectation;");
            }
        });
    }

    private static string Estimate(Carrier carrier, RoundedCompanion companion, NumberType type)
    {
        string factor = companion.Table.Factor == Rational.One ? "the" : $"{type.Literal(companion.Factor)} times the";
        string atZero = carrier.IsFixed ? string.Empty
            : carrier.Parameters.Count == 1 ? ", and 0 at scale 0" : ", and 0 at standard deviation 0";
        return $"An estimate of the error, never negative{atZero}: {factor} distance to the sum over the companion, which is the "
            + $"{companion.Table.Title} with {TableText.Count(companion.Table.Nodes.Count, "node")}. NaN where that distance is no number.";
    }

    private static string Factor(RoundedCompanion companion, NumberType type) =>
        companion.Table.Factor == Rational.One ? string.Empty : type.Literal(companion.Factor) + " * ";
}
