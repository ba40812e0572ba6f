using System;
using System.Collections;
using System.Collections.Generic;
using System.Linq;

namespace GaussGen.Mathematics.Requests;

/// <summary>A list of binary64 numbers that is equal to another with the same numbers, so that it can be part of a request. Its zeros are +0.</summary>
public sealed class ValueList : IReadOnlyList<double>, IEquatable<ValueList>
{
    private readonly double[] _values;

    /// <summary>A copy of the given numbers.</summary>
    /// <exception cref="ArgumentNullException">The numbers are <c>null</c>.</exception>
    public ValueList(IEnumerable<double> values)
    {
        if (values is null)
        {
            throw new ArgumentNullException(nameof(values));
        }

        // −0 and 0 are one number, and a request is a key.
        _values = values.Select(value => value == 0 ? 0.0 : value).ToArray();
    }

    /// <summary>How many numbers there are.</summary>
    public int Count => _values.Length;

    /// <summary>The number at an index from 0.</summary>
    public double this[int index] => _values[index];

    // Not as an extension method: that would bind to spans where the compiler host has them, and drag their assembly in.
    /// <inheritdoc/>
    public bool Equals(ValueList? other) => other is not null && Enumerable.SequenceEqual(_values, other._values);

    /// <inheritdoc/>
    public override bool Equals(object? obj) => Equals(obj as ValueList);

    /// <inheritdoc/>
    public override int GetHashCode()
    {
        int hash = _values.Length;
        foreach (double value in _values)
        {
            hash = unchecked((hash * 397) ^ value.GetHashCode());
        }

        return hash;
    }

    /// <inheritdoc/>
    public IEnumerator<double> GetEnumerator() => ((IEnumerable<double>)_values).GetEnumerator();

    IEnumerator IEnumerable.GetEnumerator() => _values.GetEnumerator();
}
