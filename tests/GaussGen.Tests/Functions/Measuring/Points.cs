using System;
using System.Collections.Generic;

namespace GaussGen.Functions.Measuring;

/// <summary>The points at which a function is measured: always the same ones for the same count.</summary>
internal static class Points
{
    private const int Neighbours = 40;

    internal static List<(double First, double Second)> For(MeasuredFunction function, int count)
    {
        var random = new Sequence(20260101);
        var points = new List<(double, double)>(count);
        foreach (double x in Fixed(function))
        {
            Add(points, function.Domain, x, Second(function.Domain, x, random));
        }

        while (points.Count < count)
        {
            double x = Random(function.Domain, random);
            Add(points, function.Domain, x, Second(function.Domain, x, random));
        }

        return points;
    }

    /// <summary>Neighbours of every branch, and of every place where one row of a table ends and the next begins.</summary>
    private static IEnumerable<double> Fixed(MeasuredFunction function)
    {
        foreach (double branch in function.Branches)
        {
            double below = branch, above = branch;
            yield return branch;
            for (int i = 0; i < Neighbours; i++)
            {
                yield return below = Math.BitDecrement(below);
                yield return above = Math.BitIncrement(above);
            }
        }

        for (int binade = -9; binade < 6; binade++)
        {
            for (int i = 16; i < 32; i++)
            {
                double border = Math.ScaleB(i, binade - 4);
                foreach (double x in new[] { Math.BitDecrement(border), border, Math.BitIncrement(border) })
                {
                    yield return x;
                    yield return -x;
                    yield return 1.0 - x;
                }
            }
        }

        double[] ends = [double.Epsilon, 1E-320, 2.2250738585072009E-308, 1E-300, 1E-17, 1E-9, 1E9, 1E160, double.MaxValue];
        foreach (double x in ends)
        {
            yield return x;
            yield return -x;
        }
    }

    private static double Random(Domain domain, Sequence random)
    {
        double sign = random.Next() < 0.5 ? -1.0 : 1.0;
        int kind = (int)(random.Next() * 4.0);
        return (domain, kind) switch
        {
            (Domain.Unit, 0) => random.Next(),
            (Domain.Unit, 1) => Math.ScaleB(1.0 + random.Next(), -1 - (int)(random.Next() * 1074.0)),
            (Domain.Unit, 2) => Math.ScaleB(1.0 + random.Next(), -1 - (int)(random.Next() * 30.0)),
            (Domain.Unit, _) => 1.0 - Math.ScaleB(1.0 + random.Next(), -1 - (int)(random.Next() * 50.0)),
            (Domain.SignedUnit, 0 or 1) => (2.0 * random.Next()) - 1.0,
            (Domain.SignedUnit, 2) => sign * Math.ScaleB(1.0 + random.Next(), -1 - (int)(random.Next() * 60.0)),
            (Domain.SignedUnit, _) => sign * (1.0 - Math.ScaleB(1.0 + random.Next(), -1 - (int)(random.Next() * 50.0))),
            (Domain.WideLine or Domain.Scaled, 3) => sign * Math.ScaleB(1.0 + random.Next(), (int)(random.Next() * 1020.0) - 20),
            (_, 0) => (12.0 * random.Next()) - 6.0,
            (_, 1) => sign * Math.ScaleB(1.0 + random.Next(), (int)(random.Next() * 70.0) - 64),
            (_, 2) => sign * 39.0 * random.Next(),
            _ => 4.0 * (random.Next() - 0.5),
        };
    }

    /// <summary>The upper end of an interval: near to or far from the lower one, now and then at infinity.</summary>
    private static double Second(Domain domain, double x, Sequence random)
    {
        if (domain != Domain.Interval)
        {
            return 0.0;
        }

        int kind = (int)(random.Next() * 8.0);
        double width = kind switch
        {
            0 => double.PositiveInfinity,
            1 => Math.BitIncrement(Math.Abs(x)) - Math.Abs(x),
            2 => Math.Abs(x) * Math.ScaleB(1.0 + random.Next(), -(int)(random.Next() * 50.0)),
            3 => 0.26 / Math.Max(1.0, Math.Abs(x)) * (0.8 + (0.4 * random.Next())),
            4 => random.Next() / Math.Max(1.0, Math.Abs(x)),
            5 => Math.ScaleB(1.0 + random.Next(), -(int)(random.Next() * 300.0)),
            6 => -2.0 * x * random.Next(),
            _ => 8.0 * random.Next(),
        };
        return x + Math.Abs(width);
    }

    private static void Add(List<(double First, double Second)> points, Domain domain, double x, double second)
    {
        bool isInside = domain switch
        {
            Domain.Unit => x is > 0.0 and < 1.0,
            Domain.SignedUnit => x is > -1.0 and < 1.0,
            Domain.Scaled => x > -27.5,
            Domain.Interval => second <= double.MaxValue && second > x,
            _ => true,
        };
        if (isInside)
        {
            points.Add((x, second));
        }
    }
}
