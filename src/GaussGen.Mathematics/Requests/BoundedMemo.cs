using System;
using System.Collections.Generic;
using System.Threading;

namespace GaussGen.Mathematics.Requests;

/// <summary>A thread-safe memory of results by key, bounded in number and size, that forgets what was wanted least recently.</summary>
/// <param name="maximumCount">How many results are kept at most.</param>
/// <param name="maximumSize">How large the kept results are together at most.</param>
internal sealed class BoundedMemo<TKey>(int maximumCount, long maximumSize)
    where TKey : notnull
{
    private readonly object _lock = new();
    private readonly Dictionary<TKey, LinkedListNode<Entry>> _kept = [];
    private readonly LinkedList<Entry> _recent = new();
    private readonly Dictionary<TKey, Work> _underWay = [];
    private long _size;
    private long _constructions;

    /// <summary>How many results were constructed to the end.</summary>
    internal long Constructions => Interlocked.Read(ref _constructions);

    /// <summary>How many results are kept.</summary>
    internal int Count
    {
        get
        {
            lock (_lock)
            {
                return _kept.Count;
            }
        }
    }

    /// <summary>The result under a key: the one that is kept, or else a newly constructed one.</summary>
    internal object Get(
        TKey key, Func<CancellationToken, object> construct, Func<object, long> sizeOf, CancellationToken cancellation)
    {
        Work work;
        lock (_lock)
        {
            if (Find(key) is { } found)
            {
                return found;
            }

            if (!_underWay.TryGetValue(key, out work!))
            {
                _underWay.Add(key, work = new Work());
            }

            work.Users++;
        }

        try
        {
            return Construct(key, work, construct, sizeOf, cancellation);
        }
        finally
        {
            lock (_lock)
            {
                if (--work.Users == 0)
                {
                    _ = _underWay.Remove(key);
                    work.Turn.Dispose();
                }
            }
        }
    }

    private object Construct(
        TKey key, Work work, Func<CancellationToken, object> construct, Func<object, long> sizeOf, CancellationToken cancellation)
    {
        work.Turn.Wait(cancellation);
        try
        {
            // Whoever had the turn before may have left its result, even one that is too large to be kept.
            if (work.Result is null)
            {
                object result = construct(cancellation);
                _ = Interlocked.Increment(ref _constructions);
                work.Result = result;
                Keep(key, result, sizeOf(result));
            }

            return work.Result;
        }
        finally
        {
            _ = work.Turn.Release();
        }
    }

    private object? Find(TKey key)
    {
        if (!_kept.TryGetValue(key, out LinkedListNode<Entry>? node))
        {
            return null;
        }

        _recent.Remove(node);
        _recent.AddFirst(node);
        return node.Value.Result;
    }

    private void Keep(TKey key, object result, long size)
    {
        lock (_lock)
        {
            if (size > maximumSize || _kept.ContainsKey(key))
            {
                return;
            }

            _kept.Add(key, _recent.AddFirst(new Entry(key, result, size)));
            _size += size;
            while (_kept.Count > maximumCount || _size > maximumSize)
            {
                Entry oldest = _recent.Last!.Value;
                _recent.RemoveLast();
                _ = _kept.Remove(oldest.Key);
                _size -= oldest.Size;
            }
        }
    }

    private sealed record Entry(TKey Key, object Result, long Size);

    /// <summary>A construction that threads take turns at until one succeeds.</summary>
    private sealed class Work
    {
        internal SemaphoreSlim Turn { get; } = new(1, 1);

        internal object? Result { get; set; }

        internal int Users { get; set; }
    }
}
