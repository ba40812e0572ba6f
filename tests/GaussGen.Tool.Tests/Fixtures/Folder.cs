using System;
using System.IO;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>A temporary folder with a name that paths must survive.</summary>
internal sealed class Folder : IDisposable
{
    public string Path { get; } =
        Directory.CreateDirectory(System.IO.Path.Combine(System.IO.Path.GetTempPath(), "gaussgen Größe 船 " + Guid.NewGuid().ToString("N"))).FullName;

    public string Add(string name, byte[] content)
    {
        string path = Below(name);
        _ = Directory.CreateDirectory(System.IO.Path.GetDirectoryName(path)!);
        File.WriteAllBytes(path, content);
        return path;
    }

    public string Below(string name) => System.IO.Path.Combine(Path, name);

    public void Dispose() => Directory.Delete(Path, recursive: true);
}
