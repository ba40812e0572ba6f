using System.Collections.Generic;
using System.IO;

namespace GaussGen.Tool.Exports;

/// <summary>Writes tables in one file format.</summary>
internal interface ITableWriter
{
    /// <summary>Writes the whole file; the same tables give the same bytes.</summary>
    /// <exception cref="Output.InputException">The format has no words for something in a table.</exception>
    void Write(IReadOnlyList<ExportedTable> tables, Stream stream);
}
