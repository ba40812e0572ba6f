using System;
using System.Linq;
using System.Threading;
using System.Threading.Tasks;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Moments;
using GaussGen.Mathematics.Requests;
using GaussGen.Mathematics.Rules;
using Xunit;

namespace GaussGen.Mathematics.Tests.Requests;

/// <summary>The memory is one for the process, so nothing else may use it meanwhile.</summary>
[CollectionDefinition(nameof(TableMemoTests), DisableParallelization = true)]
[Collection(nameof(TableMemoTests))]
public class TableMemoTests
{
    private static int LastName;

    [Fact]
    public void Equal_requests_are_worked_on_once_and_others_apart()
    {
        var counter = new Counter();
        var request = new RuleOfSize(Name(), 4, counter);
        long before = TableMemo.Constructions;
        RoundedRule first = TableMemo.Get(request, CancellationToken.None);
        Assert.Same(first, TableMemo.Get(request with { }, CancellationToken.None));
        Assert.Equal((1, before + 1), (counter.Count, TableMemo.Constructions));

        // Another size, format or treatment of zeros is another table.
        Assert.NotSame(first, TableMemo.Get(request with { Size = 6 }, CancellationToken.None));
        Assert.NotSame(first, TableMemo.Get(request with { Format = BinaryFormat.Binary32 }, CancellationToken.None));
        Assert.NotSame(first, TableMemo.Get(request with { DropZeroWeights = true }, CancellationToken.None));
        Assert.Equal((4, before + 4), (counter.Count, TableMemo.Constructions));
        Assert.Equal(4, first.Nodes.Count);
    }

    [Fact]
    public void Moments_are_remembered_as_well()
    {
        var counter = new Counter();
        var request = new MomentsOfSize(Name(), 5, counter);
        RoundedMoments first = TableMemo.Get(request, CancellationToken.None);
        Assert.Same(first, TableMemo.Get(request with { }, CancellationToken.None));
        Assert.Equal((1, 5), (counter.Count, first.Raw.Count));
    }

    [Fact]
    public void Threads_that_want_the_same_table_share_one_construction()
    {
        var counter = new Counter { OnConstruct = _ => Thread.Sleep(20) };
        var request = new RuleOfSize(Name(), 4, counter);
        var rules = new RoundedRule[16];
        var threads = rules.Select((_, i) => new Thread(() => rules[i] = TableMemo.Get(request, CancellationToken.None))).ToList();
        threads.ForEach(thread => thread.Start());
        threads.ForEach(thread => thread.Join());
        Assert.Equal(1, counter.Count);
        Assert.All(rules, rule => Assert.Same(rules[0], rule));
    }

    [Fact]
    public void The_tables_wanted_least_recently_are_forgotten_first()
    {
        var counter = new Counter();
        string name = Name();
        RuleOfSize[] requests = [.. Enumerable.Range(0, TableMemo.MaximumTables).Select(i => new RuleOfSize(name, i + 2, counter))];
        foreach (RuleOfSize request in requests)
        {
            _ = TableMemo.Get(request, CancellationToken.None);
        }

        // The oldest is wanted again, so the second one goes when another comes.
        _ = TableMemo.Get(requests[0], CancellationToken.None);
        _ = TableMemo.Get(new RuleOfSize(name, 1, counter), CancellationToken.None);
        Assert.Equal(TableMemo.MaximumTables + 1, counter.Count);
        _ = TableMemo.Get(requests[0], CancellationToken.None);
        _ = TableMemo.Get(requests[2], CancellationToken.None);
        Assert.Equal(TableMemo.MaximumTables + 1, counter.Count);
        _ = TableMemo.Get(requests[1], CancellationToken.None);
        Assert.Equal(TableMemo.MaximumTables + 2, counter.Count);
    }

    [Fact]
    public void The_number_of_remembered_values_is_bounded()
    {
        var counter = new Counter();
        string name = Name();
        int third = (TableMemo.MaximumValues / 6) + 1;

        // Three of these are too much together; one beyond the whole bound is not remembered and drives nothing out.
        RuleOfSize[] requests = [.. Enumerable.Range(0, 3).Select(i => new RuleOfSize(name, third + i, counter))];
        foreach (RuleOfSize request in requests)
        {
            _ = TableMemo.Get(request, CancellationToken.None);
        }

        var large = new RuleOfSize(name, (TableMemo.MaximumValues / 2) + 1, counter);
        _ = TableMemo.Get(large, CancellationToken.None);
        _ = TableMemo.Get(large, CancellationToken.None);
        Assert.Equal(5, counter.Count);
        _ = TableMemo.Get(requests[2], CancellationToken.None);
        _ = TableMemo.Get(requests[1], CancellationToken.None);
        Assert.Equal(5, counter.Count);
        _ = TableMemo.Get(requests[0], CancellationToken.None);
        Assert.Equal(6, counter.Count);
    }

    [Fact]
    public void A_failure_is_not_remembered()
    {
        var counter = new Counter { OnConstruct = _ => throw new InvalidOperationException("Not yet.") };
        var request = new RuleOfSize(Name(), 4, counter);
        Assert.Throws<InvalidOperationException>(() => TableMemo.Get(request, CancellationToken.None));
        counter.OnConstruct = _ => { };
        Assert.Equal(4, TableMemo.Get(request, CancellationToken.None).Nodes.Count);
        Assert.Equal(2, counter.Count);
    }

    [Fact]
    public async Task A_waiting_thread_takes_over_from_a_cancelled_one_and_a_cancelled_waiting_one_leaves()
    {
        using var entered = new ManualResetEventSlim();
        using var constructing = new CancellationTokenSource();
        using var waiting = new CancellationTokenSource();
        var counter = new Counter();
        counter.OnConstruct = token =>
        {
            if (counter.Count == 1)
            {
                entered.Set();
                _ = token.WaitHandle.WaitOne();
                token.ThrowIfCancellationRequested();
            }
        };
        var request = new RuleOfSize(Name(), 4, counter);
        Task<RoundedRule> first = Start(request, constructing.Token);
        entered.Wait();
        Task<RoundedRule> impatient = Start(request, waiting.Token);
        Task<RoundedRule> patient = Start(request, CancellationToken.None);
        await waiting.CancelAsync();
        await Assert.ThrowsAnyAsync<OperationCanceledException>(() => impatient);
        await constructing.CancelAsync();
        await Assert.ThrowsAnyAsync<OperationCanceledException>(() => first);
        Assert.Equal(4, (await patient).Nodes.Count);
        Assert.Equal(2, counter.Count);
    }

    private static Task<RoundedRule> Start(RuleRequest request, CancellationToken cancellation) => Task.Factory.StartNew(
        () => TableMemo.Get(request, cancellation), CancellationToken.None, TaskCreationOptions.LongRunning, TaskScheduler.Default);

    private static string Name() => "test " + Interlocked.Increment(ref LastName);

    /// <summary>Counts constructions; one counter equals another, as it is no part of a request.</summary>
    private sealed class Counter : IEquatable<Counter>
    {
        private int _count;

        public int Count => Volatile.Read(ref _count);

        public Action<CancellationToken> OnConstruct { get; set; } = _ => { };

        public void Constructed(CancellationToken cancellation)
        {
            _ = Interlocked.Increment(ref _count);
            OnConstruct(cancellation);
        }

        public bool Equals(Counter? other) => other is not null;

        public override bool Equals(object? obj) => Equals(obj as Counter);

        public override int GetHashCode() => 0;
    }

    private sealed record RuleOfSize(string Name, int Size, Counter Counter) : RuleRequest(BinaryFormat.Binary64, false)
    {
        public override RuleTable Construct(CancellationToken cancellation)
        {
            Counter.Constructed(cancellation);
            RealNumber[] values = new RealNumber[Size];
            Array.Fill(values, RealNumber.Exact(1));
            return new RuleTable(new(Name, Name, Name, Name, Name), values, values, 1, false, null);
        }
    }

    private sealed record MomentsOfSize(string Name, int Size, Counter Counter) : MomentRequest(BinaryFormat.Binary64)
    {
        public override MomentTable Construct(CancellationToken cancellation)
        {
            Counter.Constructed(cancellation);
            RealNumber[] values = new RealNumber[Size];
            Array.Fill(values, RealNumber.Exact(1));
            return new MomentTable(new(Name, Name, Name), values, values, values);
        }
    }
}
