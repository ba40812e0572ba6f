using System.IO;
using System.Text.Json;

namespace GaussGen.Tool.Reports;

/// <summary>How JSON is laid out: indented, so that a person can read it and a comparison shows lines.</summary>
internal static class JsonOutput
{
    /// <summary>Opens a writer.</summary>
    public static Utf8JsonWriter Open(Stream stream)
    {
        JsonWriterOptions options = new() { Indented = true };
#if NET9_0_OR_GREATER
        options.NewLine = "\n"; // Older frameworks know no other line end than the system's.
#endif
        return new Utf8JsonWriter(stream, options);
    }
}
