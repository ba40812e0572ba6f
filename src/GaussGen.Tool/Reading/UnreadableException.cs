using System;

namespace GaussGen.Tool.Reading;

/// <summary>Why a file could not be read as an assembly.</summary>
internal enum UnreadableReason
{
    /// <summary>There is no such file or folder.</summary>
    NotFound,

    /// <summary>The operating system refused to open it.</summary>
    NoPermission,

    /// <summary>Something other than a regular file, or one that could not be read to its end.</summary>
    Unopenable,

    /// <summary>The file is larger than any assembly that is read.</summary>
    TooLarge,

    /// <summary>The file is no Portable Executable.</summary>
    NotAnImage,

    /// <summary>Machine code alone: no metadata and no intermediate language to read.</summary>
    NativeImage,

    /// <summary>An assembly of signatures for compilers: it holds no data.</summary>
    ReferenceAssembly,

    /// <summary>Cut short, or not as ECMA-335 says.</summary>
    Damaged,
}

/// <summary>The one error that reading a file ends with, whatever the file holds. Its message is one line that says what to do.</summary>
internal sealed class UnreadableException(UnreadableReason reason, string message, Exception? inner = null) : Exception(message, inner)
{
    /// <summary>Why.</summary>
    public UnreadableReason Reason { get; } = reason;

    /// <summary>Whether such a file is nothing unusual in a folder of build outputs, so that a search passes it by and says so.</summary>
    public bool IsUsualInFolders => Reason is UnreadableReason.NativeImage or UnreadableReason.ReferenceAssembly;
}
