using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Reflection;
using System.Runtime.Loader;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>
/// What a compiled table hands out when it runs: the assembly is loaded and its properties are called, which is what the tool never
/// does.
/// </summary>
internal sealed class RunningTables : IDisposable
{
    private readonly LibraryContext _context = new();
    private readonly Assembly _assembly;

    private delegate ReadOnlySpan<T> Getter<T>();

    public RunningTables(byte[] image) => _assembly = _context.LoadFromStream(new MemoryStream(image));

    /// <summary>The encodings of a span's entries.</summary>
    public IReadOnlyList<ulong> Bits(string type, string member)
    {
        PropertyInfo property = _assembly.GetType(type, throwOnError: true)!.GetProperty(member)!;
        return property.PropertyType == typeof(ReadOnlySpan<float>)
            ? [.. property.GetMethod!.CreateDelegate<Getter<float>>()().ToArray().Select(value => (ulong)BitConverter.SingleToUInt32Bits(value))]
            : [.. property.GetMethod!.CreateDelegate<Getter<double>>()().ToArray().Select(BitConverter.DoubleToUInt64Bits)];
    }

    public void Dispose() => _context.Unload();

    /// <summary>Finds the runtime library, whose name differs from the tool's by its capitals alone.</summary>
    private sealed class LibraryContext() : AssemblyLoadContext("tables", isCollectible: true)
    {
        protected override Assembly? Load(AssemblyName assemblyName) =>
            assemblyName.Name == "GaussGen" ? LoadFromStream(new MemoryStream(FixtureCompiler.OwnLibraryImage())) : null;
    }
}
