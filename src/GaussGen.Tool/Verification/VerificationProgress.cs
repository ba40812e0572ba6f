using System;
using System.Collections.Generic;
using System.Linq;
using System.Threading;

namespace GaussGen.Tool.Verification;

/// <summary>How far a verification is. Written by the cores that work, read by the one that draws.</summary>
internal sealed class VerificationProgress
{
    private double[] _sizes = [];
    private double[] _done = [];
    private double _total;
    private int _count;
    private int _finished;
    private volatile string _phase = "Searching";

    /// <summary>What is being done: "Proving 12 of 200 tables".</summary>
    public string Text => _phase == "Searching" ? _phase : $"{_phase} {Volatile.Read(ref _finished)} of {_count} {(_phase == "Reading" ? "files" : "tables")}";

    /// <summary>The finished part of the phase, from 0 to 1.</summary>
    public double Fraction
    {
        get
        {
            double[] sizes = _sizes;
            double[] done = _done;
            if (_total <= 0 || sizes.Length != done.Length)
            {
                return _count == 0 ? 0 : (double)Volatile.Read(ref _finished) / _count;
            }

            double sum = 0;
            for (int i = 0; i < sizes.Length; i++)
            {
                sum += sizes[i] * Volatile.Read(ref done[i]);
            }

            return Math.Min(1, sum / _total);
        }
    }

    /// <summary>The reading of files begins.</summary>
    public void BeginReading(int files) => Begin("Reading", files);

    /// <summary>A file was read.</summary>
    public void EndFile() => _ = Interlocked.Increment(ref _finished);

    /// <summary>The proofs begin. Their cost grows about with the square of a table's size.</summary>
    public void BeginProving(IReadOnlyList<int> sizes)
    {
        Begin("Proving", sizes.Count);
        _done = new double[sizes.Count];
        _sizes = [.. sizes.Select(size => 1.0 + ((double)size * size))];
        _total = _sizes.Sum();
    }

    /// <summary>What one proof reports to.</summary>
    public IProgress<double> OfTable(int index) => new TableProgress(_done, index);

    /// <summary>A proof has ended.</summary>
    public void EndTable(int index)
    {
        Volatile.Write(ref _done[index], 1);
        _ = Interlocked.Increment(ref _finished);
    }

    private void Begin(string phase, int count)
    {
        _finished = 0;
        _count = count;
        _phase = phase;
    }

    private sealed class TableProgress(double[] done, int index) : IProgress<double>
    {
        public void Report(double value) => Volatile.Write(ref done[index], value);
    }
}
