using System;
using System.Collections.Generic;
using System.IO;
using System.Linq;
using System.Reflection.Metadata;
using System.Reflection.Metadata.Ecma335;
using System.Reflection.PortableExecutable;
using GaussGen.Tool.Verification;
using Xunit;

namespace GaussGen.Tool.Tests.Verification;

/// <summary>
/// The tool can construct tables, for an export that no assembly declares. Nothing else of it may: no code outside that one type
/// names a construction.
/// </summary>
public class ToolIndependenceTests
{
    private static readonly string[] Constructions = ["GaussGen.Mathematics.Rules", "GaussGen.Mathematics.Moments", "GaussGen.Mathematics.Requests"];

    [Fact]
    public void Only_tables_that_no_assembly_declares_are_constructed()
    {
        HashSet<string> users = [.. Users()];
        Assert.Equal(["AdHocTable"], users);
    }

    /// <summary>The outermost types whose code holds a token of a construction: a method, a field or a type.</summary>
    private static IEnumerable<string> Users()
    {
        using PEReader executable = new(File.OpenRead(typeof(Verifier).Assembly.Location));
        MetadataReader metadata = executable.GetMetadataReader();
        HashSet<int> tokens =
        [
            .. metadata.TypeReferences.Where(type => IsConstruction(metadata, type)).Select(type => MetadataTokens.GetToken(type)),
            .. metadata.MemberReferences.Where(member => metadata.GetMemberReference(member).Parent is { Kind: HandleKind.TypeReference } parent
                && IsConstruction(metadata, (TypeReferenceHandle)parent)).Select(member => MetadataTokens.GetToken(member)),
        ];
        Assert.True(tokens.Count > 10, "The search must find what AdHocTable uses.");
        foreach (TypeDefinitionHandle type in metadata.TypeDefinitions)
        {
            foreach (MethodDefinitionHandle method in metadata.GetTypeDefinition(type).GetMethods())
            {
                int address = metadata.GetMethodDefinition(method).RelativeVirtualAddress;
                if (address != 0 && Holds(executable.GetMethodBody(address).GetILBytes()!, tokens))
                {
                    yield return Outermost(metadata, type);
                }
            }
        }
    }

    /// <summary>Whether any four bytes in a row are one of the tokens; what is none by chance would only fail the test.</summary>
    private static bool Holds(byte[] code, HashSet<int> tokens) =>
        Enumerable.Range(0, Math.Max(0, code.Length - 3)).Any(position => tokens.Contains(BitConverter.ToInt32(code, position)));

    private static bool IsConstruction(MetadataReader metadata, TypeReferenceHandle type) =>
        Constructions.Contains(metadata.GetString(metadata.GetTypeReference(type).Namespace));

    private static string Outermost(MetadataReader metadata, TypeDefinitionHandle handle)
    {
        TypeDefinition type = metadata.GetTypeDefinition(handle);
        while (!type.GetDeclaringType().IsNil)
        {
            type = metadata.GetTypeDefinition(type.GetDeclaringType());
        }

        return metadata.GetString(type.Name);
    }
}
