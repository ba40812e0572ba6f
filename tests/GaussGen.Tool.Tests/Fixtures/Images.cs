using System;
using System.IO;
using System.Reflection.PortableExecutable;
using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.Emit;

namespace GaussGen.Tool.Tests.Fixtures;

/// <summary>Images of other kinds than ordinary assemblies.</summary>
internal static class Images
{
    private const int DirectoryEntrySize = 8;
    private const int CliHeaderEntry = 14;

    /// <summary>An image without the entry that points to metadata, which is what makes one native (ECMA-335, II.25.2.3.3).</summary>
    public static byte[] Native()
    {
        byte[] image = FixtureCompiler.Compile("class T { }");
        using PEReader executable = new(new MemoryStream([.. image]));
        PEHeaders headers = executable.PEHeaders;
        int directories = headers.PEHeaderStartOffset + (headers.PEHeader!.Magic == PEMagic.PE32 ? 96 : 112);
        image.AsSpan(directories + (CliHeaderEntry * DirectoryEntrySize), DirectoryEntrySize).Clear();
        return image;
    }

    /// <summary>What a compiler gives to other compilers: declarations without bodies.</summary>
    public static byte[] Reference(string source) => FixtureCompiler.Emit(
        FixtureCompiler.CreateCompilation(
            Framework.Net8, OptimizationLevel.Release, "Boat", [source], [FixtureCompiler.OwnLibrary(Framework.Net8)]),
        new EmitOptions(metadataOnly: true, includePrivateMembers: false));
}
