using System;
using System.Collections;
using System.Collections.Generic;
using System.Linq;
using System.Reflection;

namespace GaussGen.Generator.Tests.Support;

/// <summary>All objects that can be reached from some object through fields and items of arrays.</summary>
internal static class ObjectGraph
{
    public static IReadOnlyCollection<object> ReachableFrom(IEnumerable<object> roots)
    {
        HashSet<object> seen = new(ReferenceEqualityComparer.Instance);
        Stack<object> open = new(roots);
        while (open.TryPop(out object? current))
        {
            if (seen.Add(current))
            {
                foreach (object next in Next(current))
                {
                    open.Push(next);
                }
            }
        }

        return seen;
    }

    private static IEnumerable<object> Next(object current) => current switch
    {
        string or Type or MemberInfo or Pointer => [],
        Array array => array.GetType().GetElementType()!.IsPrimitive ? [] : ((IEnumerable)array).Cast<object?>().OfType<object>(),
        _ => FieldsOf(current.GetType()).Select(field => field.GetValue(current)).OfType<object>(),
    };

    private static IEnumerable<FieldInfo> FieldsOf(Type? type)
    {
        for (; type is not null && !type.IsPrimitive; type = type.BaseType)
        {
            foreach (FieldInfo field in type.GetFields(
                BindingFlags.Instance | BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.DeclaredOnly))
            {
                if (!field.FieldType.IsPrimitive && !field.FieldType.IsPointer)
                {
                    yield return field;
                }
            }
        }
    }
}
