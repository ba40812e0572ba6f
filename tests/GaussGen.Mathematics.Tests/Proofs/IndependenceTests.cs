using System;
using System.Collections.Generic;
using System.Linq;
using System.Reflection;
using System.Reflection.Emit;
using System.Runtime.CompilerServices;
using GaussGen.Mathematics.Baselines;
using GaussGen.Mathematics.Proofs;
using Xunit;

namespace GaussGen.Mathematics.Tests.Proofs;

/// <summary>
/// A proof is worth something because it goes another way than the construction. No method that a proof can reach, directly or
/// through any other, belongs to a construction of rules or moments, to a request, or to the fixed-size arithmetic of the fast road.
/// </summary>
public class IndependenceTests
{
    private const BindingFlags Everything =
        BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly;

    private static readonly Assembly Mathematics = typeof(TableClaim).Assembly;

    private static readonly Dictionary<short, OpCode> OpCodesByValue = typeof(OpCodes)
        .GetFields(BindingFlags.Public | BindingFlags.Static)
        .Select(field => (OpCode)field.GetValue(null)!)
        .ToDictionary(code => code.Value);

    [Fact]
    public void Proofs_reach_arithmetic_formats_and_titles_only()
    {
        HashSet<Type> reached = ReachedFrom(TypesIn("Proofs"));
        string[] namespaces = [.. reached.Select(type => type.Namespace ?? string.Empty).Distinct().Order(StringComparer.Ordinal)];
        Assert.All(reached, type => Assert.False(IsForbidden(type), type.FullName + " is on the road of a proof."));

        // The walk is worth nothing if it stops short: it must have found what the proofs stand on.
        Assert.Contains(reached, type => type.Name == "Ball");
        Assert.Contains(reached, type => type.Name == "HalfIntegerGamma");
        Assert.Contains(reached, type => type.Name == "BinaryFormat");
        Assert.Contains("GaussGen.Mathematics.Proofs", namespaces);
        Assert.Contains("GaussGen.Mathematics.Proofs.Gauss", namespaces);
        foreach (string road in new[] { "HankelFactors", "NestedSource", "HermiteAntiGaussSource", "TruncatedNormalMoments", "ExponentialSeries", "RuleZero" })
        {
            Assert.Contains(reached, type => type.Name == road);
        }

    }

    [Fact]
    public void The_walk_sees_what_constructions_stand_on()
    {
        HashSet<Type> reached = ReachedFrom(TypesIn("Requests").Concat(TypesIn("Rules")).Concat(TypesIn("Moments")));
        Assert.Contains(reached, type => IsForbidden(type) && type.Name.StartsWith("Fixed", StringComparison.Ordinal));
        Assert.Contains(reached, type => IsForbidden(type) && type.Namespace == "GaussGen.Mathematics.Rules");
        Assert.Contains(reached, type => IsForbidden(type) && type.Namespace == "GaussGen.Mathematics.Moments");
    }

    [Fact]
    public void Constructions_do_not_use_proofs() => Assert.DoesNotContain(
        ReachedFrom(Mathematics.GetTypes().Where(type => !IsIn("Proofs", type))), type => IsIn("Proofs", type));

    private static bool IsForbidden(Type type) =>
        (type.Namespace is not ("GaussGen.Mathematics.Arithmetic" or "GaussGen.Mathematics.Formats")
            && !IsIn("Proofs", type)
            && type != typeof(ClaimTitle))
        || type.Name.StartsWith("Fixed", StringComparison.Ordinal)
        || type.Name is "WideProduct" or "RealNumber" or "Rounding";

    private static IEnumerable<Type> TypesIn(string room) =>
        Mathematics.GetTypes().Where(type => IsIn(room, type) && !IsCompilerMade(type));

    /// <summary>Whether a type is in a room or one of the rooms inside it.</summary>
    private static bool IsIn(string room, Type type) =>
        (type.Namespace + ".").StartsWith("GaussGen.Mathematics." + room + ".", StringComparison.Ordinal);

    private static bool IsCompilerMade(Type type) => type.DeclaringType is null && type.IsDefined(typeof(CompilerGeneratedAttribute));

    /// <summary>The types of this assembly whose code can run, from any method of the given types.</summary>
    private static HashSet<Type> ReachedFrom(IEnumerable<Type> roots)
    {
        var seen = new HashSet<MethodBase>();
        var waiting = new Queue<MethodBase>();
        foreach (MethodBase method in roots.SelectMany(MethodsOf))
        {
            Visit(method);
        }

        while (waiting.Count > 0)
        {
            foreach (MethodBase called in CalledBy(waiting.Dequeue()))
            {
                Visit(called);
            }
        }

        return [.. seen.Select(method => method.DeclaringType).OfType<Type>().Where(type => !IsCompilerMade(type))];

        void Visit(MethodBase method)
        {
            if (method.DeclaringType?.Assembly != Mathematics || !seen.Add(method))
            {
                return;
            }

            waiting.Enqueue(method);
            if (method.DeclaringType.TypeInitializer is { } initializer)
            {
                Visit(initializer);
            }

            // A call of a virtual method may end in each of its overrides.
            if (method is MethodInfo { IsVirtual: true } slot)
            {
                foreach (MethodInfo candidate in Mathematics.GetTypes()
                    .Where(type => type.IsSubclassOf(method.DeclaringType) && !type.ContainsGenericParameters)
                    .SelectMany(type => type.GetMethods(Everything))
                    .Where(candidate => candidate.IsVirtual && candidate.GetBaseDefinition() == slot.GetBaseDefinition()))
                {
                    Visit(candidate);
                }
            }
        }
    }

    private static IEnumerable<MethodBase> MethodsOf(Type type) =>
        type.GetMethods(Everything).Cast<MethodBase>().Concat(type.GetConstructors(Everything));

    /// <summary>What a method's code names: methods it calls or takes the address of, and initializers of types whose fields it uses.</summary>
    private static IEnumerable<MethodBase> CalledBy(MethodBase method)
    {
        byte[]? code = method.GetMethodBody()?.GetILAsByteArray();
        for (int position = 0; code is not null && position < code.Length;)
        {
            short value = code[position++];
            if (value == 0xfe)
            {
                value = (short)(0xfe00 | code[position++]);
            }

            OpCode instruction = OpCodesByValue[value];
            if (instruction.OperandType is OperandType.InlineMethod or OperandType.InlineField or OperandType.InlineTok)
            {
                MemberInfo? member = Resolve(method, BitConverter.ToInt32(code, position));
                if (member is MethodBase called)
                {
                    yield return called;
                }
                else if (member is FieldInfo { DeclaringType.TypeInitializer: { } initializer })
                {
                    yield return initializer;
                }
            }

            position += OperandSize(instruction.OperandType, code, position);
        }
    }

    private static MemberInfo? Resolve(MethodBase method, int token) => method.Module.ResolveMember(
        token,
        method.DeclaringType is { IsGenericType: true } type ? type.GetGenericArguments() : null,
        method is MethodInfo { IsGenericMethod: true } ? method.GetGenericArguments() : null);

    private static int OperandSize(OperandType type, byte[] code, int position) => type switch
    {
        OperandType.InlineNone => 0,
        OperandType.ShortInlineBrTarget or OperandType.ShortInlineI or OperandType.ShortInlineVar => 1,
        OperandType.InlineVar => 2,
        OperandType.InlineI8 or OperandType.InlineR => 8,
        OperandType.InlineSwitch => 4 + (4 * BitConverter.ToInt32(code, position)),
        _ => 4,
    };
}
