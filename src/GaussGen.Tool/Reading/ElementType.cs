using System.Reflection.Metadata;

namespace GaussGen.Tool.Reading;

/// <summary>The C# type of a table's entry or of a constant.</summary>
internal enum ElementType
{
    /// <summary><c>sbyte</c>.</summary>
    SByte,

    /// <summary><c>byte</c>.</summary>
    Byte,

    /// <summary><c>short</c>.</summary>
    Int16,

    /// <summary><c>ushort</c>.</summary>
    UInt16,

    /// <summary><c>int</c>.</summary>
    Int32,

    /// <summary><c>uint</c>.</summary>
    UInt32,

    /// <summary><c>long</c>.</summary>
    Int64,

    /// <summary><c>ulong</c>.</summary>
    UInt64,

    /// <summary><c>float</c>, binary32.</summary>
    Single,

    /// <summary><c>double</c>, binary64.</summary>
    Double,
}

/// <summary>Sizes and names of element types.</summary>
internal static class ElementTypes
{
    /// <summary>Bytes an element.</summary>
    public static int Size(this ElementType type) => type switch
    {
        ElementType.SByte or ElementType.Byte => 1,
        ElementType.Int16 or ElementType.UInt16 => 2,
        ElementType.Int32 or ElementType.UInt32 or ElementType.Single => 4,
        _ => 8,
    };

    /// <summary>The element type that a signature's code stands for, or null.</summary>
    public static ElementType? FromSignature(SignatureTypeCode code) => code switch
    {
        SignatureTypeCode.SByte => ElementType.SByte,
        SignatureTypeCode.Byte => ElementType.Byte,
        SignatureTypeCode.Int16 => ElementType.Int16,
        SignatureTypeCode.UInt16 => ElementType.UInt16,
        SignatureTypeCode.Int32 => ElementType.Int32,
        SignatureTypeCode.UInt32 => ElementType.UInt32,
        SignatureTypeCode.Int64 => ElementType.Int64,
        SignatureTypeCode.UInt64 => ElementType.UInt64,
        SignatureTypeCode.Single => ElementType.Single,
        SignatureTypeCode.Double => ElementType.Double,
        _ => null,
    };

    /// <summary>The element type named by a type reference to the system's primitive, as <c>newarr</c> writes it, or null.</summary>
    public static ElementType? FromSystemName(string name) => System.Enum.TryParse(name, out ElementType type) ? type : null;
}
