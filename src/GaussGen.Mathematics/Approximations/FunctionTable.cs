using System.Collections.Generic;

namespace GaussGen.Mathematics.Approximations;

/// <summary>One table of numbers of the runtime's error functions.</summary>
/// <param name="Name">The property's name.</param>
/// <param name="Summary">What the table holds.</param>
/// <param name="Rows">Its rows, as encodings of binary64 numbers.</param>
public sealed record FunctionTable(string Name, string Summary, IReadOnlyList<ulong[]> Rows);
