using System;
using System.Collections;
using System.Collections.Generic;
using System.Linq;

namespace GaussGen.Mathematics.Proofs;

/// <summary>A list of binary64 numbers in a claim, equal to another with the same numbers. Its zeros are +0.</summary>
public sealed class ClaimValues : IReadOnlyList<double>, IEquatable<ClaimValues>
{
    private readonly double[] _values;

    /// <summary>A copy of the given numbers.</summary>
    /// <exception cref="ArgumentNullException">The numbers are <c>null</c>.</exception>
    public ClaimValues(IEnumerable<double> values)
    {
        if (values is null)
        {
            throw new ArgumentNullException(nameof(values), "Give the numbers of the claim.");
        }

        _values = [.. values.Select(value => value == 0 ? 0.0 : value)];
    }

    /// <inheritdoc/>
    public int Count => _values.Length;

    /// <inheritdoc/>
    public double this[int index] => _values[index];

    /// <inheritdoc/>
    public bool Equals(ClaimValues? other) => other is not null && Enumerable.SequenceEqual(_values, other._values);

    /// <inheritdoc/>
    public override bool Equals(object? obj) => Equals(obj as ClaimValues);

    /// <inheritdoc/>
    public override int GetHashCode()
    {
        int hash = _values.Length;
        foreach (double value in _values)
        {
            hash = unchecked((hash * 31) + value.GetHashCode());
        }

        return hash;
    }

    /// <inheritdoc/>
    public IEnumerator<double> GetEnumerator() => ((IEnumerable<double>)_values).GetEnumerator();

    IEnumerator IEnumerable.GetEnumerator() => _values.GetEnumerator();
}
