using System;
using System.IO;
using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;
using System.Runtime.InteropServices;
using System.Security.Cryptography;
using System.Threading;

namespace GaussGen.Tool.Reading;

/// <summary>
/// An assembly as bytes in memory with its headers and metadata opened. Nothing of it is ever loaded into the runtime or run.
/// The whole file is held, because a mapped file that shrinks under its reader ends the process.
/// </summary>
internal sealed class AssemblyImage : IDisposable
{
    /// <summary>The largest file that is read: several times the largest assemblies in use, and a bound on the memory needed.</summary>
    public const long MaximumLength = 128L << 20;

    private readonly byte[] _bytes;

    private AssemblyImage(byte[] bytes, PEReader executable, MetadataReader metadata)
    {
        _bytes = bytes;
        Executable = executable;
        Metadata = metadata;
    }

    /// <summary>Sections and method bodies.</summary>
    public PEReader Executable { get; }

    /// <summary>The metadata tables.</summary>
    public MetadataReader Metadata { get; }

    /// <summary>Opens a file.</summary>
    /// <exception cref="UnreadableException">The file is not a managed assembly that can be read.</exception>
    public static AssemblyImage Open(string path, CancellationToken cancellation) => FromBytes(ReadFile(path, cancellation));

    /// <summary>Opens an image that is already in memory; the array must not be changed afterwards.</summary>
    /// <exception cref="UnreadableException">The bytes are not a managed assembly that can be read.</exception>
    public static AssemblyImage FromBytes(byte[] bytes)
    {
        if (bytes.Length < 2 || bytes[0] != 'M' || bytes[1] != 'Z')
        {
            throw new UnreadableException(UnreadableReason.NotAnImage, "is no executable image; name a .NET assembly (.dll or .exe)");
        }

        PEReader executable = new(ImmutableCollectionsMarshal.AsImmutableArray(bytes));
        try
        {
            return Damage.Guard(() =>
            {
                if (!executable.HasMetadata)
                {
                    throw new UnreadableException(
                        UnreadableReason.NativeImage,
                        "holds machine code and no metadata; verify the managed assembly it was made from (the one in the obj folder)");
                }

                return new AssemblyImage(bytes, executable, executable.GetMetadataReader());
            });
        }
        catch (UnreadableException)
        {
            executable.Dispose();
            throw;
        }
    }

    /// <summary>The SHA-256 digest of the whole file, in lower-case hexadecimal digits.</summary>
    public string Digest() => Hexadecimal.Lower(SHA256.HashData(_bytes));

    /// <inheritdoc/>
    public void Dispose() => Executable.Dispose();

    private static byte[] ReadFile(string path, CancellationToken cancellation)
    {
        try
        {
            // Pipes and devices have no length either, and to open one may wait for ever.
            if (new FileInfo(path).Length == 0)
            {
                throw new UnreadableException(UnreadableReason.NotAnImage, "is empty, or no regular file; name a .NET assembly (.dll or .exe)");
            }

            using FileStream stream = new(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete, bufferSize: 1);
            long length = stream.Length;
            if (length > MaximumLength)
            {
                throw new UnreadableException(
                    UnreadableReason.TooLarge,
                    $"is {length >> 20} MiB long and files above {MaximumLength >> 20} MiB are not read; verify the assembly before it is bundled");
            }

            byte[] bytes = new byte[length];
            for (int read = 0; read < bytes.Length;)
            {
                cancellation.ThrowIfCancellationRequested();
                int count = stream.Read(bytes, read, Math.Min(bytes.Length - read, 1 << 20));
                if (count == 0)
                {
                    throw new UnreadableException(UnreadableReason.Unopenable, "became shorter while it was read; run again when the build is done");
                }

                read += count;
            }

            return bytes;
        }
        catch (UnauthorizedAccessException error)
        {
            throw new UnreadableException(UnreadableReason.NoPermission, "may not be read; grant this user read permission", error);
        }
        catch (Exception error) when (error is FileNotFoundException or DirectoryNotFoundException)
        {
            throw new UnreadableException(UnreadableReason.NotFound, "does not exist; check the path, or build first", error);
        }
        catch (Exception error) when (error is IOException or NotSupportedException or ArgumentException)
        {
            throw new UnreadableException(UnreadableReason.Unopenable, "cannot be opened: " + error.Message, error);
        }
    }
}
