using System;
using System.IO;
using System.Reflection;
using System.Runtime.Loader;

namespace GaussGen.Generator.Tests.Support;

/// <summary>A compiled consumer, loaded so that its code can run.</summary>
internal sealed class LoadedAssembly : IDisposable
{
    private readonly AssemblyLoadContext _context = new("consumer", isCollectible: true);

    public LoadedAssembly(byte[] image)
    {
        using MemoryStream stream = new(image);
        Assembly = _context.LoadFromStream(stream);
    }

    public Assembly Assembly { get; }

    public Type Type(string name) => Assembly.GetType(name, throwOnError: true)!;

    /// <summary>Calls a static method.</summary>
    public T Call<T>(string type, string method, params object[] arguments)
    {
        try
        {
            return (T)Type(type).GetMethod(method)!.Invoke(null, arguments)!;
        }
        catch (TargetInvocationException exception) when (exception.InnerException is not null)
        {
            throw exception.InnerException;
        }
    }

    public void Dispose() => _context.Unload();
}
