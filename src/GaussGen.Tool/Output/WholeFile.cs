using System;
using System.IO;
using System.Threading;

namespace GaussGen.Tool.Output;

/// <summary>A path at which no file can be written. The message is one line that says what to do.</summary>
internal sealed class UnwritableException(string message, Exception? inner = null) : Exception(message, inner);

/// <summary>
/// Writes files that are whole or not there: the content goes to a new file beside the target, which then takes the target's
/// name in one step. An interrupted run leaves the old file, or none.
/// </summary>
internal static class WholeFile
{
    /// <summary>Writes a file.</summary>
    /// <exception cref="UnwritableException">The system refuses.</exception>
    /// <exception cref="OperationCanceledException">The token was cancelled; nothing is left behind.</exception>
    public static void Write(string path, Action<Stream> write, CancellationToken cancellation)
    {
        string temporary = "";
        try
        {
            string target = Path.GetFullPath(path);
            if (IsDevice(target))
            {
                // A device cannot be half written, and must not be replaced by a file.
                using FileStream device = new(target, FileMode.Open, FileAccess.Write, FileShare.ReadWrite);
                write(device);
                return;
            }

            temporary = Path.Combine(Path.GetDirectoryName(target)!, $".{Path.GetFileName(target)}.{Guid.NewGuid():N}.part");
            using (FileStream stream = new(temporary, FileMode.CreateNew, FileAccess.Write, FileShare.None))
            {
                write(stream);
            }

            cancellation.ThrowIfCancellationRequested();
            File.Move(temporary, target, overwrite: true);
        }
        catch (Exception error) when (error is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            throw new UnwritableException($"{path} cannot be written: {PlainText.OneLine(error.Message)}; name a file in a folder you may write to", error);
        }
        finally
        {
            Remove(temporary);
        }
    }

    /// <summary>Whether a full path is that of a device, such as /dev/null or /dev/stdout.</summary>
    public static bool IsDevice(string target) =>
        !OperatingSystem.IsWindows() && (Path.GetDirectoryName(target) is "/dev" or "/dev/fd") && File.Exists(target);

    private static void Remove(string temporary)
    {
        try
        {
            if (temporary.Length > 0)
            {
                File.Delete(temporary);
            }
        }
        catch (Exception error) when (error is IOException or UnauthorizedAccessException)
        {
            // The folder is gone or was closed meanwhile; the target is not touched either way.
        }
    }
}
