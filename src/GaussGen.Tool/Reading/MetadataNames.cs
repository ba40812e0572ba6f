using System;
using System.Reflection;
using System.Reflection.Metadata;
using System.Reflection.Metadata.Ecma335;

namespace GaussGen.Tool.Reading;

/// <summary>Answers, from the metadata alone, the questions that the reader of tables has about tokens.</summary>
internal sealed class MetadataNames(MetadataReader metadata)
{
    private const int DeepestNesting = 64;
    private const byte GenericInstance = 0x15;
    private const byte ValueTypeCode = 0x11;

    /// <summary>A type's full name with dots between nested types.</summary>
    /// <exception cref="BadImageFormatException">Types are nested without end.</exception>
    public string FullName(TypeDefinitionHandle handle)
    {
        TypeDefinition type = metadata.GetTypeDefinition(handle);
        string name = metadata.GetString(type.Name);
        for (int depth = 0; !type.GetDeclaringType().IsNil; depth++)
        {
            if (depth == DeepestNesting)
            {
                throw new BadImageFormatException();
            }

            type = metadata.GetTypeDefinition(type.GetDeclaringType());
            name = metadata.GetString(type.Name) + "." + name;
        }

        string space = metadata.GetString(type.Namespace);
        return space.Length == 0 ? name : space + "." + name;
    }

    /// <summary>Whether a token is a method of a non-generic type of this name, declared elsewhere.</summary>
    public bool IsMethod(long token, string typeNamespace, string typeName, string method)
    {
        if (Handle(token) is not { Kind: HandleKind.MemberReference } handle)
        {
            return false;
        }

        MemberReference member = metadata.GetMemberReference((MemberReferenceHandle)handle);
        return metadata.StringComparer.Equals(member.Name, method) && IsTypeReference(member.Parent, typeNamespace, typeName);
    }

    /// <summary>The type argument, if a token is an instance over one element type of a generic method of this name.</summary>
    public ElementType? GenericMethodArgument(long token, string typeNamespace, string typeName, string method)
    {
        if (Handle(token) is not { Kind: HandleKind.MethodSpecification } handle)
        {
            return null;
        }

        MethodSpecification specification = metadata.GetMethodSpecification((MethodSpecificationHandle)handle);
        if (!IsMethod(MetadataTokens.GetToken(specification.Method), typeNamespace, typeName, method))
        {
            return null;
        }

        BlobReader signature = metadata.GetBlobReader(specification.Signature);
        bool isOne = signature.ReadSignatureHeader().Kind == SignatureKind.MethodSpecification && signature.ReadCompressedInteger() == 1;
        return isOne ? ElementTypes.FromSignature(signature.ReadSignatureTypeCode()) : null;
    }

    /// <summary>The element type, if a token is a method of this name and number of parameters on a read-only span.</summary>
    public ElementType? SpanMethodElement(long token, string method, int parameters)
    {
        if (Handle(token) is not { Kind: HandleKind.MemberReference } handle)
        {
            return null;
        }

        MemberReference member = metadata.GetMemberReference((MemberReferenceHandle)handle);
        if (member.GetKind() != MemberReferenceKind.Method || !metadata.StringComparer.Equals(member.Name, method))
        {
            return null;
        }

        BlobReader signature = metadata.GetBlobReader(member.Signature);
        _ = signature.ReadSignatureHeader();
        return signature.ReadCompressedInteger() == parameters ? SpanElement(MetadataTokens.GetToken(member.Parent)) : null;
    }

    /// <summary>The element type, if a token is the type ReadOnlySpan of it.</summary>
    public ElementType? SpanElement(long token)
    {
        if (Handle(token) is not { Kind: HandleKind.TypeSpecification } handle)
        {
            return null;
        }

        BlobReader signature = metadata.GetBlobReader(metadata.GetTypeSpecification((TypeSpecificationHandle)handle).Signature);
        return SpanElement(ref signature);
    }

    /// <summary>The element type, if a property is static, without parameters, and of type ReadOnlySpan of it.</summary>
    public ElementType? SpanElement(PropertyDefinition property)
    {
        BlobReader signature = metadata.GetBlobReader(property.Signature);
        SignatureHeader header = signature.ReadSignatureHeader();
        bool isPlain = header.Kind == SignatureKind.Property && !header.IsInstance && signature.ReadCompressedInteger() == 0;
        return isPlain ? SpanElement(ref signature) : null;
    }

    /// <summary>The primitive type that a token names, if it does.</summary>
    public ElementType? Primitive(long token)
    {
        if (Handle(token) is not { Kind: HandleKind.TypeReference } handle)
        {
            return null;
        }

        TypeReference type = metadata.GetTypeReference((TypeReferenceHandle)handle);
        return metadata.StringComparer.Equals(type.Namespace, "System") ? ElementTypes.FromSystemName(metadata.GetString(type.Name)) : null;
    }

    /// <summary>The field of this assembly that a token names, if it does.</summary>
    public static FieldDefinitionHandle? Field(long token) =>
        Handle(token) is { Kind: HandleKind.FieldDefinition } handle ? (FieldDefinitionHandle)handle : null;

    /// <summary>The element type, if a field is a one-dimensional array of it.</summary>
    public ElementType? ArrayElement(FieldDefinition field)
    {
        BlobReader signature = metadata.GetBlobReader(field.Signature);
        bool isArray = signature.ReadSignatureHeader().Kind == SignatureKind.Field
            && signature.ReadSignatureTypeCode() == SignatureTypeCode.SZArray;
        return isArray ? ElementTypes.FromSignature(signature.ReadSignatureTypeCode()) : null;
    }

    /// <summary>Whether a field is static, assigned only by the type initializer, and of this assembly.</summary>
    public static bool IsStaticReadOnly(FieldDefinition field) =>
        (field.Attributes & (FieldAttributes.Static | FieldAttributes.InitOnly)) == (FieldAttributes.Static | FieldAttributes.InitOnly);

    /// <summary>Whether a handle is a reference to a type of this name.</summary>
    public bool IsTypeReference(EntityHandle handle, string typeNamespace, string typeName)
    {
        if (handle.Kind != HandleKind.TypeReference)
        {
            return false;
        }

        TypeReference type = metadata.GetTypeReference((TypeReferenceHandle)handle);
        return metadata.StringComparer.Equals(type.Name, typeName) && metadata.StringComparer.Equals(type.Namespace, typeNamespace);
    }

    private static EntityHandle? Handle(long token) =>
        token is > 0 and <= uint.MaxValue or < 0 and >= int.MinValue ? MetadataTokens.EntityHandle((int)token) : null;

    private ElementType? SpanElement(ref BlobReader signature)
    {
        bool isSpan = signature.ReadCompressedInteger() == GenericInstance
            && signature.ReadCompressedInteger() == ValueTypeCode
            && IsTypeReference(signature.ReadTypeHandle(), "System", "ReadOnlySpan`1")
            && signature.ReadCompressedInteger() == 1;
        return isSpan ? ElementTypes.FromSignature(signature.ReadSignatureTypeCode()) : null;
    }
}
