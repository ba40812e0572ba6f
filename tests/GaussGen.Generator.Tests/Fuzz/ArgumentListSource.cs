using System;
using System.Linq;

namespace GaussGen.Generator.Tests.Fuzz;

/// <summary>Random argument lists that a parser accepts, whatever they mean; edges are more likely than the middle.</summary>
internal sealed class ArgumentListSource(Random random)
{
    private static readonly string[] Integers =
    [
        "0", "1", "2", "3", "5", "8", "201", "1001", "-1", "-0", "int.MinValue", "int.MaxValue", "2 + 3", "10 / 3", "1 << 3",
        "unchecked(int.MaxValue + 1)", "int.MaxValue + 1", "1 / 0", "0x10", "0b11", "1_0", "(byte)7", "(short)-7", "5L", "5U", "'\\u0005'",
        "Known.Five", "Known.NoConstant", "99999999999", "sizeof(int)", "Known.Five * -1",
    ];

    // Large tables take their time, and one is much like another.
    private static readonly string[] LargeIntegers = ["40", "199", "200", "999", "1000"];

    private static readonly string[] Reals =
    [
        "0.0", "-0.0", "1.0", "0.1", "-2.5", "1e-300", "1e300", "1e308", "5e-324", "1e400", "double.NaN", "double.PositiveInfinity",
        "double.NegativeInfinity", "double.MaxValue", "double.Epsilon", "1.5f", "float.NaN", "1.5m", "0.0 / 0.0", "-1 / 0.0", "1e200", "Known.Half",
    ];

    private static readonly string[] Lists =
    [
        "null", "new double[0]", "new double[] { }", "new[] { 1.0 }", "new double[] { 1, 2 }", "new[] { 0.5, 0.25, 0.25 }", "new[] { 0.5, double.NaN }",
        "new double[] { 0, 0 }", "new[] { -0.5, 1.5 }", "new[] { 1.0, Known.Half }", "new[] { Known.NoConstant, 1.0 }", "new double[2]", "new[] { 1e300, 1e-300 }",
        "new int[] { 1, 2 }", "new object[] { 1.0 }", "new double[] { null }", "(double[])null", "new[] { 1.0, \"two\" }", "default(double[])",
    ];

    private static readonly string[] Others =
    [
        "null", "true", "false", "\"five\"", "typeof(int)", "default", "default(int)", "nameof(Known)", "new int[] { 1 }", "new object()", "x => x", "Missing",
        "HermiteConvention.Probabilist", "HermiteConvention.Physicist", "HermiteConvention.Missing", "(HermiteConvention)1", "(HermiteConvention)2",
        "(HermiteConvention)(-1)", "(HermiteConvention)int.MaxValue", "NumberFormat.Binary64", "NumberFormat.Binary32", "(NumberFormat)1", "(NumberFormat)9",
        "(NumberFormat)(-5)", "~NumberFormat.Binary64", "default(NumberFormat)", "(int)NumberFormat.Binary32", "(object)5", "!true", "true && false", "checked(5)",
        "(5, 6)", "$\"{5}\"", "stackalloc int[1]", "throw null", "this", "await 5", "(dynamic)5",
    ];

    private static readonly string[] Names =
    [
        "points", "mean", "standardDeviation", "Points", "Mean", "StandardDeviation", "Convention", "Format", "DropZeroWeights", "MaximumOrder", "TypeId", "missing",
    ];

    public string Next()
    {
        if (random.Next(3) == 0)
        {
            (string name, string fitting) = Other();
            return name + (random.Next(3) == 0 ? AnyList() : "(" + fitting + ")");
        }

        bool isRule = random.Next(2) == 0;
        return (isRule ? "GaussHermite" : "NormalMoments") + (random.Next(3) == 0 ? AnyList() : LikelyList(isRule));
    }

    /// <summary>One of the other families, with arguments of fitting kinds.</summary>
    private (string Name, string Fitting) Other()
    {
        string first = Perhaps(Integer());
        string real = Perhaps(Pick(Reals));
        string[] settings =
        [
            Setting("Format", "NumberFormat"), $"DropZeroWeights = {Pick(["true", "false"])}", $"ErrorEstimate = {Pick(["true", "false"])}",
        ];
        string after = string.Concat(settings.Where(_ => random.Next(3) == 0).Select(setting => ", " + setting));
        return random.Next(13) switch
        {
            0 => ("GaussHalfRangeHermite", first + after),
            1 => ("GaussTruncatedNormal", $"{first}, {real}, {Perhaps(Pick(Reals))}{after}"),
            2 => ("GaussGeneralizedHermite", $"{first}, {real}{after}"),
            3 => ("GaussLogNormal", $"{first}, {real}, {Perhaps(Pick(Reals))}{after}"),
            4 => ("GaussNormalMixture", $"{first}, {Perhaps(Pick(Lists))}, {Perhaps(Pick(Lists))}, {Perhaps(Pick(Lists))}{after}"),
            5 => ("GaussEvenExponential", $"{first}, {Perhaps(Pick([.. Lists, "1, 2", "-1.0, Known.Half", "0, 0, 1"]))}{after}"),
            6 => ("LogNormalMoments", $"{real}, {Perhaps(Pick(Reals))}"),
            7 => ("HalfIntegerGamma", first),
            8 => ("NestedHermite", first + after),
            9 => ("TruncatedNormalMoments", $"{real}, {Perhaps(Pick(Reals))}, {Perhaps(Pick(Reals))}, {Perhaps(Pick(Reals))}"),
            10 => ("HalfNormalMoments", real),
            11 => ("EvenExponentialMoments", Perhaps(Pick([.. Lists, "1, 2", "-1.0, Known.Half", "0, 0, 1"]))),
            _ => ("OscillatorMatrixElements", $"{first}, {Perhaps(Integer())}"),
        };
    }

    /// <summary>Positional arguments of a fitting kind, then settings of a fitting kind; now and then one that does not fit.</summary>
    private string LikelyList(bool isRule)
    {
        string[] settings = isRule
            ? [Setting("Convention", "HermiteConvention"), Setting("Format", "NumberFormat"), $"DropZeroWeights = {Pick(["true", "false"])}"]
            : [$"MaximumOrder = {Integer()}", Setting("Format", "NumberFormat")];
        string positional = isRule ? Perhaps(Integer()) : $"{Perhaps(Pick(Reals))}, {Perhaps(Pick(Reals))}";
        return "(" + string.Join(", ", settings.Where(_ => random.Next(2) == 0).OrderBy(_ => random.Next()).Prepend(positional)) + ")";
    }

    private string AnyList()
    {
        int count = random.Next(-1, 5);
        return count < 0
            ? string.Empty
            : "(" + string.Join(", ", Enumerable.Range(0, count).Select(_ => AnyArgument())) + ")";
    }

    private string AnyArgument() => random.Next(4) switch
    {
        0 => $"{Pick(Names)}: {AnyValue()}",
        1 or 2 => $"{Pick(Names)} = {AnyValue()}",
        _ => AnyValue(),
    };

    private string AnyValue() => Pick(random.Next(3) switch { 0 => Integers, 1 => Reals, _ => Others });

    private string Integer() => Pick(random.Next(100) == 0 ? LargeIntegers : Integers);

    private string Setting(string name, string type) => $"{name} = {Perhaps(Pick(Others.Where(other => other.Contains(type, StringComparison.Ordinal)).ToArray()))}";

    private string Perhaps(string fitting) => random.Next(20) == 0 ? AnyValue() : fitting;

    private string Pick(string[] items) => items[random.Next(items.Length)];
}
