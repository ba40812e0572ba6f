using System;
using System.Collections.Generic;
using System.Linq;
using System.Reflection;
using System.Reflection.Metadata;
using System.Threading;

namespace GaussGen.Tool.Reading;

/// <summary>Finds every table of an assembly by its attribute, and the data that the compiled code hands out for it.</summary>
internal sealed class AssemblyReader
{
    private const string UnknownCode = "its code is none of the forms in which compilers keep a table";

    private readonly MetadataReader _metadata;
    private readonly MetadataNames _names;
    private readonly AttributeReader _attributes;
    private readonly SpanForms _spans;
    private readonly MethodLiterals _literals;
    private readonly HashSet<EntityHandle> _generated = [];

    private AssemblyReader(AssemblyImage image)
    {
        _metadata = image.Metadata;
        _names = new MetadataNames(_metadata);
        _attributes = new AttributeReader(_metadata, _names);
        InstructionDecoder decoder = new();
        MappedData data = new(image.Executable, _metadata);
        ArrayForms arrays = new(_names, data);
        StaticArrays statics = new(image.Executable, _metadata, _names, arrays, decoder);
        _literals = new MethodLiterals(image.Executable, _metadata, decoder);
        _spans = new SpanForms(image.Executable, _metadata, _names, data, arrays, statics, decoder);
    }

    /// <summary>Reads all tables of an assembly.</summary>
    /// <exception cref="UnreadableException">The image is a reference assembly, or damaged.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled.</exception>
    public static FoundAssembly Read(AssemblyImage image, CancellationToken cancellation) =>
        Damage.Guard(() => new AssemblyReader(image).Read(image.Digest(), cancellation));

    private FoundAssembly Read(string digest, CancellationToken cancellation)
    {
        if (!_metadata.IsAssembly)
        {
            throw new UnreadableException(UnreadableReason.Damaged, "is a module without an assembly manifest; verify the assembly it belongs to");
        }

        AssemblyDefinition assembly = _metadata.GetAssemblyDefinition();
        Dictionary<EntityHandle, List<CustomAttributeHandle>> declarations = FindDeclarations(cancellation);
        List<FoundType> types = [];
        foreach ((EntityHandle target, List<CustomAttributeHandle> attributes) in declarations)
        {
            cancellation.ThrowIfCancellationRequested();
            types.Add(target.Kind == HandleKind.MethodDefinition
                ? ReadMethod((MethodDefinitionHandle)target, attributes)
                : ReadType((TypeDefinitionHandle)target, attributes));
        }

        return new FoundAssembly(_metadata.GetString(assembly.Name), assembly.Version, digest, types);
    }

    /// <summary>
    /// All GaussGen attributes of the assembly, by the type or method they stand on, in metadata order; and the types with a
    /// generated table that no attribute declares any more, with no attributes.
    /// </summary>
    private Dictionary<EntityHandle, List<CustomAttributeHandle>> FindDeclarations(CancellationToken cancellation)
    {
        Dictionary<EntityHandle, List<CustomAttributeHandle>> found = [];
        foreach (CustomAttributeHandle handle in _metadata.CustomAttributes)
        {
            cancellation.ThrowIfCancellationRequested();
            CustomAttribute attribute = _metadata.GetCustomAttribute(handle);
            EntityHandle target = attribute.Parent;
            if (target.Kind == HandleKind.AssemblyDefinition)
            {
                ThrowIfReferenceAssembly(attribute);
            }
            else if (target.Kind is HandleKind.PropertyDefinition or HandleKind.MethodDefinition && _attributes.IsOwnGeneratedCode(attribute))
            {
                _ = _generated.Add(target);
            }
            else if (target.Kind is HandleKind.TypeDefinition or HandleKind.MethodDefinition && _attributes.OwnAttributeName(attribute) is not null)
            {
                if (!found.TryGetValue(target, out List<CustomAttributeHandle>? list))
                {
                    found.Add(target, list = []);
                }

                list.Add(handle);
            }
        }

        AddUndeclared(found);
        return found;
    }

    private void AddUndeclared(Dictionary<EntityHandle, List<CustomAttributeHandle>> found)
    {
        if (_generated.Count == 0)
        {
            return;
        }

        foreach (TypeDefinitionHandle type in _metadata.TypeDefinitions)
        {
            foreach (PropertyDefinitionHandle property in _metadata.GetTypeDefinition(type).GetProperties())
            {
                if (_generated.Contains(property))
                {
                    _ = found.TryAdd(type, []);
                }
            }
        }
    }

    private void ThrowIfReferenceAssembly(CustomAttribute attribute)
    {
        if (attribute.Constructor.Kind == HandleKind.MemberReference
            && _names.IsTypeReference(
                _metadata.GetMemberReference((MemberReferenceHandle)attribute.Constructor).Parent,
                "System.Runtime.CompilerServices",
                "ReferenceAssemblyAttribute"))
        {
            throw new UnreadableException(
                UnreadableReason.ReferenceAssembly, "is a reference assembly and holds no data; verify the implementation beside it");
        }
    }

    private FoundType ReadMethod(MethodDefinitionHandle handle, List<CustomAttributeHandle> attributes)
    {
        MethodDefinition method = _metadata.GetMethodDefinition(handle);
        string name = _names.FullName(method.GetDeclaringType()) + "." + _metadata.GetString(method.Name);
        List<Declaration> declarations = ReadDeclarations(attributes, out Dictionary<string, string> unread);
        return new FoundType(
            name, declarations, new Dictionary<string, FoundSpan>(), new Dictionary<string, FoundConstant>(), [], new Dictionary<string, string>(), unread);
    }

    private FoundType ReadType(TypeDefinitionHandle type, List<CustomAttributeHandle> attributes)
    {
        List<Declaration> declarations = ReadDeclarations(attributes, out Dictionary<string, string> unreadDeclarations);
        if (attributes.Count == 0)
        {
            unreadDeclarations.Add("?", "holds a generated table, and the attribute that says which one is gone; keep GaussGen's attributes in the metadata");
        }

        Dictionary<string, FoundSpan> spans = new(StringComparer.Ordinal);
        Dictionary<string, FoundConstant> constants = new(StringComparer.Ordinal);
        Dictionary<string, string> unreadSpans = new(StringComparer.Ordinal);
        ReadSpans(type, spans, unreadSpans);
        ReadConstants(type, constants);
        FoundMethod[] methods =
        [
            .. _metadata.GetTypeDefinition(type).GetMethods().Where(method => _generated.Contains(method)).Select(_literals.Read),
        ];
        return new FoundType(_names.FullName(type), declarations, spans, constants, methods, unreadSpans, unreadDeclarations);
    }

    private List<Declaration> ReadDeclarations(List<CustomAttributeHandle> attributes, out Dictionary<string, string> unread)
    {
        unread = new Dictionary<string, string>(StringComparer.Ordinal);
        List<Declaration> declarations = [];
        foreach (CustomAttributeHandle handle in attributes)
        {
            CustomAttribute attribute = _metadata.GetCustomAttribute(handle);
            string name = _attributes.OwnAttributeName(attribute)!;
            try
            {
                declarations.Add(_attributes.Read(name, attribute));
            }
            catch (Exception error) when (Damage.IsDamage(error))
            {
                unread[name] = "the arguments of the attribute cannot be read; use the tool's version of the package, and build again";
            }
        }

        return declarations;
    }

    private void ReadSpans(TypeDefinitionHandle type, Dictionary<string, FoundSpan> spans, Dictionary<string, string> unread)
    {
        foreach (PropertyDefinitionHandle handle in _metadata.GetTypeDefinition(type).GetProperties())
        {
            PropertyDefinition property = _metadata.GetPropertyDefinition(handle);
            MethodDefinitionHandle getter = property.GetAccessors().Getter;
            if (getter.IsNil || _names.SpanElement(property) is not { } element)
            {
                continue;
            }

            string name = _metadata.GetString(property.Name);
            if (_spans.Read(getter, element) is { } bytes && spans.TryAdd(name, new FoundSpan(name, element, bytes)))
            {
                continue;
            }

            unread[name] = UnknownCode;
        }
    }

    private void ReadConstants(TypeDefinitionHandle type, Dictionary<string, FoundConstant> constants)
    {
        foreach (FieldDefinitionHandle handle in _metadata.GetTypeDefinition(type).GetFields())
        {
            FieldDefinition field = _metadata.GetFieldDefinition(handle);
            if ((field.Attributes & FieldAttributes.Literal) == 0 || field.GetDefaultValue().IsNil)
            {
                continue;
            }

            Constant constant = _metadata.GetConstant(field.GetDefaultValue());
            if (ElementTypes.FromSignature((SignatureTypeCode)constant.TypeCode) is { } element)
            {
                string name = _metadata.GetString(field.Name);
                BlobReader value = _metadata.GetBlobReader(constant.Value);
                constants.Add(name, new FoundConstant(name, element, ReadBits(ref value, element)));
            }
        }
    }

    private static ulong ReadBits(ref BlobReader value, ElementType element) => element.Size() switch
    {
        1 => value.ReadByte(),
        2 => value.ReadUInt16(),
        4 => value.ReadUInt32(),
        _ => value.ReadUInt64(),
    };
}
