using System;
using System.Collections.Generic;
using System.Threading;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>
/// Something that is worked out once for each precision and shared by all who ask. Thread-safe: of two threads one works and the
/// other waits; one that is cancelled leaves nothing behind.
/// </summary>
internal sealed class SharedByPrecision<T>(Func<int, CancellationToken, T> construct)
    where T : class
{
    private const int MillisecondsBetweenLooks = 5;

    private readonly Dictionary<int, T> _known = [];

    internal T At(int precision, CancellationToken cancellation)
    {
        // Whoever waits looks at its own token meanwhile.
        while (!Monitor.TryEnter(_known, MillisecondsBetweenLooks))
        {
            cancellation.ThrowIfCancellationRequested();
        }

        try
        {
            if (!_known.TryGetValue(precision, out T? value))
            {
                value = construct(precision, cancellation);
                _known.Add(precision, value);
            }

            return value;
        }
        finally
        {
            Monitor.Exit(_known);
        }
    }
}
