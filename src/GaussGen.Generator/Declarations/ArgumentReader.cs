using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Globalization;
using System.Linq;
using GaussGen.Generator.Diagnostics;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Microsoft.CodeAnalysis;

namespace GaussGen.Generator.Declarations;

/// <summary>
/// Reads the arguments of one attribute, checks their ranges and notes what is wrong. Every method returns a value that a
/// request accepts, whatever the source says.
/// </summary>
internal sealed class ArgumentReader
{
    /// <summary>The name of the argument that says how many points a rule has.</summary>
    public const string PointsArgument = "points";

    /// <summary>The name of the argument that says up to which order there are moments.</summary>
    public const string MaximumOrderArgument = "MaximumOrder";

    /// <summary>The name of the argument that says which rule of a chain is asked for.</summary>
    public const string LevelArgument = "level";

    /// <summary>The name of the argument that asks for an estimate of the error.</summary>
    public const string ErrorEstimateArgument = "ErrorEstimate";

    private const string Lower = "lower";
    private const string Upper = "upper";
    private const string Coefficient = "coefficients";
    private const string Weights = "weights";
    private const string Means = "means";
    private const string StandardDeviations = "standardDeviations";

    private const int OrderIfNotSet = 4;

    private static readonly ValueList One = new(Enumerable.Repeat(1.0, 1));

    private readonly Dictionary<string, TypedConstant> _values = new(StringComparer.Ordinal);
    private readonly List<Mistake> _mistakes = new();

    public ArgumentReader(AttributeData attribute)
    {
        ImmutableArray<TypedConstant> positional = attribute.ConstructorArguments;
        ImmutableArray<IParameterSymbol> parameters = attribute.AttributeConstructor?.Parameters ?? ImmutableArray<IParameterSymbol>.Empty;
        for (int i = 0; i < Math.Min(positional.Length, parameters.Length); i++)
        {
            _values[parameters[i].Name] = positional[i];
        }

        foreach (KeyValuePair<string, TypedConstant> named in attribute.NamedArguments)
        {
            _values[named.Key] = named.Value;
        }

        IsRefusedByCompiler = attribute.AttributeConstructor is null || _values.Values.Any(IsError);
    }

    /// <summary>Whether the attribute is one that the compiler itself reports, so that no one else need say more.</summary>
    public bool IsRefusedByCompiler { get; }

    /// <summary>What is wrong, in the order in which the arguments were read.</summary>
    public IReadOnlyList<Mistake> Mistakes => _mistakes;

    /// <summary>The order that the source asks for, in range or not.</summary>
    public int OrderAsWritten { get; private set; } = OrderIfNotSet;

    /// <summary>The end of an interval that is nearer to the centre of the distribution; of a far interval, the one to move.</summary>
    public string NearEnd { get; private set; } = Lower;

    public int Points(int most) => InRange(DiagnosticDescriptors.PointsOutOfRange, PointsArgument, 1, 1, most);

    public int MaximumOrder(int highest)
    {
        OrderAsWritten = Value(MaximumOrderArgument, OrderIfNotSet);
        return InRange(DiagnosticDescriptors.OrderOutOfRange, MaximumOrderArgument, OrderIfNotSet, 0, highest);
    }

    public double Finite(string argument)
    {
        double value = Value(argument, 0.0);
        return Require(IsFinite(value), value, 0.0, DiagnosticDescriptors.NotFinite, argument);
    }

    public double Positive(string argument)
    {
        double value = Value(argument, 1.0);
        return Require(value > 0.0 && IsFinite(value), value, 1.0, DiagnosticDescriptors.NotPositive, argument);
    }

    public int Level(int highest) => InRange(DiagnosticDescriptors.LevelOutOfRange, LevelArgument, 0, 0, highest);

    /// <summary>A number that says how large a table is and that is not the order of moments.</summary>
    public int Size(string argument, int lowest, int highest) =>
        InRange(DiagnosticDescriptors.SizeOutOfRange, argument, lowest, lowest, highest);

    public double Exponent()
    {
        double value = Value("exponent", 0.0);
        if (GaussGeneralizedHermiteRequest.IsExponent(value))
        {
            return value;
        }

        _mistakes.Add(new Mistake(
            DiagnosticDescriptors.ExponentOutOfRange,
            "exponent",
            Text(value),
            Text(GaussGeneralizedHermiteRequest.InfimumExponent),
            Text(GaussGeneralizedHermiteRequest.MaximumExponent)));
        return 0.0;
    }

    /// <summary>The ends of an interval, the lower below the upper and one of them finite.</summary>
    /// <param name="mean">The centre of the distribution that is restricted to the interval.</param>
    public (double Lower, double Upper) Interval(double mean = 0.0)
    {
        double lower = Value(Lower, -1.0);
        double upper = Value(Upper, 1.0);
        NearEnd = Math.Abs(upper - mean) < Math.Abs(lower - mean) ? Upper : Lower;
        Mistake? mistake = double.IsNaN(lower) ? new Mistake(DiagnosticDescriptors.NotANumber, Lower, Lower)
            : double.IsNaN(upper) ? new Mistake(DiagnosticDescriptors.NotANumber, Upper, Upper)
            : lower >= upper ? new Mistake(DiagnosticDescriptors.EmptyInterval, Upper, Text(lower), Text(upper))
            : double.IsInfinity(lower) && double.IsInfinity(upper) ? new Mistake(DiagnosticDescriptors.WholeLine, Lower)
            : null;
        if (mistake is null)
        {
            return (lower, upper);
        }

        _mistakes.Add(mistake);
        return (-1.0, 1.0);
    }

    /// <summary>The coefficients of an even exponential, the last one above zero.</summary>
    public ValueList Coefficients()
    {
        double[] values = List(Coefficient);
        double last = values.Length > 0 ? values[values.Length - 1] : 0.0;
        bool isRight = HasCount(Coefficient, values, GaussEvenExponentialRequest.MaximumCoefficients)
            && HasNone(Coefficient, values, value => !IsFinite(value), DiagnosticDescriptors.NotFinite);
        if (isRight && last > 0.0)
        {
            return new ValueList(values);
        }

        if (isRight)
        {
            _mistakes.Add(new Mistake(DiagnosticDescriptors.LeadingCoefficient, Coefficient, Text(last), Text(2 * values.Length))
            {
                Element = values.Length - 1,
            });
        }

        return One;
    }

    /// <summary>The components of a mixture of normal distributions.</summary>
    public (ValueList Weights, ValueList Means, ValueList StandardDeviations) Mixture()
    {
        double[] weights = List(Weights);
        double[] means = List(Means);
        double[] deviations = List(StandardDeviations);
        if (HasCount(Weights, weights, GaussNormalMixtureRequest.MaximumComponents)
            && HasCountOf(Means, means, weights)
            && HasCountOf(StandardDeviations, deviations, weights))
        {
            // Each list has its own mistakes, and all of them are told.
            bool isRight = HasNone(Weights, weights, value => !(value >= 0.0 && IsFinite(value)), DiagnosticDescriptors.NotAWeight)
                && HasSome(Weights, weights);
            isRight &= HasNone(Means, means, value => !IsFinite(value), DiagnosticDescriptors.NotFinite);
            isRight &= HasNone(StandardDeviations, deviations, value => !(value > 0.0 && IsFinite(value)), DiagnosticDescriptors.NotPositive);
            if (isRight)
            {
                return (new ValueList(weights), new ValueList(means), new ValueList(deviations));
            }
        }

        return (One, One, One);
    }

    public bool ErrorEstimate() => Value(ErrorEstimateArgument, false);

    public bool DropZeroWeights() => Value("DropZeroWeights", false);

    public BinaryFormat Format() =>
        Choice("Format", NumberFormat.Binary64) == NumberFormat.Binary32 ? BinaryFormat.Binary32 : BinaryFormat.Binary64;

    /// <summary>A member of an enumeration of the attributes, which has the same members here.</summary>
    public T Choice<T>(string argument, T ifNotSet)
        where T : struct, Enum
    {
        int number = Value(argument, Convert.ToInt32(ifNotSet, CultureInfo.InvariantCulture));
        if (Enum.IsDefined(typeof(T), number))
        {
            return (T)Enum.ToObject(typeof(T), number);
        }

        string names = string.Join(" or ", Enum.GetNames(typeof(T)).Select(name => typeof(T).Name + "." + name));
        _mistakes.Add(new Mistake(DiagnosticDescriptors.Undefined, argument, Text(number), typeof(T).Name, names));
        return ifNotSet;
    }

    private static bool IsError(TypedConstant constant) => constant.Kind == TypedConstantKind.Error
        || (constant.Kind == TypedConstantKind.Array && !constant.IsNull && constant.Values.Any(IsError));

    private static bool IsFinite(double value) => !double.IsNaN(value) && !double.IsInfinity(value);

    private static string Text(IFormattable value) => value.ToString(null, CultureInfo.InvariantCulture);

    private int InRange(DiagnosticDescriptor rule, string argument, int ifNotSet, int lowest, int highest)
    {
        int value = Value(argument, ifNotSet);
        if (value < lowest || value > highest)
        {
            _mistakes.Add(new Mistake(rule, argument, Text(value), Text(lowest), Text(highest), argument));
        }

        return Math.Min(Math.Max(value, lowest), highest);
    }

    private double Require(bool isAllowed, double value, double otherwise, DiagnosticDescriptor rule, string argument)
    {
        if (isAllowed)
        {
            return value;
        }

        _mistakes.Add(new Mistake(rule, argument, argument, Text(value)));
        return otherwise;
    }

    private bool HasCount(string argument, double[] values, int most)
    {
        bool isRight = values.Length >= 1 && values.Length <= most;
        if (!isRight)
        {
            _mistakes.Add(new Mistake(DiagnosticDescriptors.ValueCount, argument, argument, Text(most), Text(values.Length)));
        }

        return isRight;
    }

    private bool HasCountOf(string argument, double[] values, double[] weights)
    {
        bool isRight = values.Length == weights.Length;
        if (!isRight)
        {
            _mistakes.Add(new Mistake(
                DiagnosticDescriptors.UnequalCounts, argument, argument, Weights, Text(values.Length), Text(weights.Length)));
        }

        return isRight;
    }

    /// <summary>Whether no value of a list is one that is not allowed; the first that is, is noted.</summary>
    private bool HasNone(string argument, double[] values, Predicate<double> isWrong, DiagnosticDescriptor rule)
    {
        int first = Array.FindIndex(values, isWrong);
        if (first >= 0)
        {
            _mistakes.Add(new Mistake(rule, argument, argument, Text(values[first])) { Element = first });
        }

        return first < 0;
    }

    private bool HasSome(string argument, double[] values)
    {
        bool isRight = Array.Exists(values, value => value > 0.0);
        if (!isRight)
        {
            _mistakes.Add(new Mistake(DiagnosticDescriptors.NoWeight, argument, argument));
        }

        return isRight;
    }

    private T Value<T>(string argument, T ifNotSet) =>
        _values.TryGetValue(argument, out TypedConstant constant)
        && constant.Kind is not (TypedConstantKind.Error or TypedConstantKind.Array)
        && constant.Value is T value
            ? value
            : ifNotSet;

    /// <summary>The values of a list; none where it is <c>null</c> or the compiler refuses it.</summary>
    private double[] List(string argument) =>
        _values.TryGetValue(argument, out TypedConstant constant) && constant.Kind == TypedConstantKind.Array && !constant.IsNull
            ? constant.Values.Select(each => each.Kind == TypedConstantKind.Primitive && each.Value is double value ? value : 1.0).ToArray()
            : Array.Empty<double>();

    /// <summary>The number formats of the attributes, under their names there.</summary>
    private enum NumberFormat
    {
        Binary64 = 0,
        Binary32 = 1,
    }
}
