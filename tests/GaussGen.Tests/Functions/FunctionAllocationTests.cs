using System;
using System.Runtime.CompilerServices;
using GaussGen.Functions.Measuring;
using Xunit;

namespace GaussGen.Tests.Functions;

/// <summary>No function allocates, in any of its branches.</summary>
public sealed class FunctionAllocationTests
{
    [ReleaseFact]
    public void Nothing_is_allocated()
    {
        foreach (MeasuredFunction function in MeasuredFunction.All)
        {
            (double First, double Second)[] points = [.. Points.For(function, 4000)];
            _ = Sum(function, points);
            long before = GC.GetAllocatedBytesForCurrentThread();
            _ = Sum(function, points);
            Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
        }
    }

    [MethodImpl(MethodImplOptions.NoInlining)]
    private static double Sum(MeasuredFunction function, (double First, double Second)[] points)
    {
        double sum = 0.0;
        foreach ((double first, double second) in points)
        {
            sum += function.Binary64(first, second);
            sum += function.Domain == Domain.Interval ? 0.0 : function.Binary32((float)first, 0.0f);
        }

        return sum;
    }
}
