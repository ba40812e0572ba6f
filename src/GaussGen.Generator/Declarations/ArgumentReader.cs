using System;
using System.Collections.Generic;
using System.Collections.Immutable;
using System.Globalization;
using System.Linq;
using GaussGen.Generator.Diagnostics;
using GaussGen.Mathematics.Formats;
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

    private const int OrderIfNotSet = 4;

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

        IsRefusedByCompiler = attribute.AttributeConstructor is null || _values.Values.Any(value => value.Kind == TypedConstantKind.Error);
    }

    /// <summary>Whether the attribute is one that the compiler itself reports, so that no one else need say more.</summary>
    public bool IsRefusedByCompiler { get; }

    /// <summary>What is wrong, in the order in which the arguments were read.</summary>
    public IReadOnlyList<Mistake> Mistakes => _mistakes;

    /// <summary>The order that the source asks for, in range or not.</summary>
    public int OrderAsWritten { get; private set; } = OrderIfNotSet;

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

    private static bool IsFinite(double value) => !double.IsNaN(value) && !double.IsInfinity(value);

    private static string Text(IFormattable value) => value.ToString(null, CultureInfo.InvariantCulture);

    private int InRange(DiagnosticDescriptor rule, string argument, int ifNotSet, int lowest, int highest)
    {
        int value = Value(argument, ifNotSet);
        if (value < lowest || value > highest)
        {
            _mistakes.Add(new Mistake(rule, argument, Text(value), Text(lowest), Text(highest)));
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

    private T Value<T>(string argument, T ifNotSet) =>
        _values.TryGetValue(argument, out TypedConstant constant) && constant.Kind != TypedConstantKind.Error && constant.Value is T value
            ? value
            : ifNotSet;

    /// <summary>The number formats of the attributes, under their names there.</summary>
    private enum NumberFormat
    {
        Binary64 = 0,
        Binary32 = 1,
    }
}
