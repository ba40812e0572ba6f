using System.Collections.Generic;
using System.Globalization;
using System.Linq;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Claims;

/// <summary>A number in the code of a sum: the name under which claims know it, and what the code does without it.</summary>
internal sealed record SumConstant(string Name, double Without);

/// <summary>
/// The numbers that the code of a rule's expectation holds besides its table. A sum over the nodes is
/// ReciprocalTotalWeight · Σ wᵢ f(mean + NodeScale · standardDeviation · xᵢ); what a rule has not is a number in its code instead.
/// </summary>
/// <param name="Constants">The numbers, in the order in which the code has them.</param>
/// <param name="IsOptional">Whether the code may do without all of them.</param>
internal sealed record SumForm(IReadOnlyList<SumConstant> Constants, bool IsOptional)
{
    /// <summary>The name of the factor of an estimate of the error.</summary>
    public const string ErrorFactor = "ErrorFactor";

    private static readonly SumConstant ExpectationLocation = new("ExpectationLocation", 0);
    private static readonly SumConstant ExpectationScale = new("ExpectationScale", 1);
    private static readonly SumConstant Factor = new(ErrorFactor, 1);

    private static readonly SumForm Integral = new([new("IntegralLocation", 0), new("IntegralScale", 1)], IsOptional: true);

    /// <summary>A rule that is carried to a mean and a standard deviation. An expectation that multiplies by nothing multiplies by one.</summary>
    public static SumForm Located { get; } = new([new("NodeScale", 1), new("ReciprocalTotalWeight", 1)], IsOptional: true);

    /// <summary>A rule that is carried to a scale, about zero.</summary>
    public static SumForm ScaleOnly { get; } = new([ExpectationLocation], IsOptional: false);

    /// <summary>A rule that is taken as it stands.</summary>
    public static SumForm Fixed { get; } = new([ExpectationLocation, ExpectationScale], IsOptional: false);

    private static IEnumerable<SumForm> All => [Located, ScaleOnly, Fixed, Integral];

    /// <summary>Whether a name is one of a number in code, so that a constant of a type that bears it is of no table.</summary>
    public static bool IsInCode(string name) => name == ErrorFactor || All.Any(form => form.Constants.Any(constant => constant.Name == name));

    /// <summary>Whether a number in code only says that a sum is taken as it stands.</summary>
    public static bool IsTrivial(string name) => name != ErrorFactor && IsInCode(name) && Located.Constants.All(constant => constant.Name != name);

    /// <summary>The numbers in a generated method, with their names; a literal is null where the code does without.</summary>
    /// <exception cref="ClaimException">The code holds another count of numbers than the sum has.</exception>
    public IEnumerable<(SumConstant Constant, FoundConstant? Literal)> Read(FoundMethod method) => method.Name switch
    {
        "Expectation" => Read(method, mayHaveFactor: false),
        "ExpectationWithError" => Read(method, mayHaveFactor: true),
        "Integral" when this == Located => Integral.Read(method, mayHaveFactor: false),
        _ => [],
    };

    private IEnumerable<(SumConstant Constant, FoundConstant? Literal)> Read(FoundMethod method, bool mayHaveFactor)
    {
        int[] counts = IsOptional ? [0, Constants.Count] : [Constants.Count];
        int count = method.Literals.Count;
        bool hasFactor = mayHaveFactor && counts.Contains(count - 1);
        if (!hasFactor && !counts.Contains(count))
        {
            int[] possible = [.. mayHaveFactor ? counts.SelectMany(plain => new[] { plain, plain + 1 }) : counts];
            string expected = string.Join(" or ", possible.Select(each => each == 0 ? "none" : each.ToString(CultureInfo.InvariantCulture)));
            throw new ClaimException(
                $"the code of {method.Name} holds {count} constants where {expected} are expected; use the tool's version of the package");
        }

        int plain = count - (hasFactor ? 1 : 0);
        IEnumerable<(SumConstant, FoundConstant?)> found = Constants.Select((constant, index) => (constant, index < plain ? method.Literals[index] : null));
        return mayHaveFactor ? found.Append((Factor, hasFactor ? method.Literals[^1] : null)) : found;
    }
}
