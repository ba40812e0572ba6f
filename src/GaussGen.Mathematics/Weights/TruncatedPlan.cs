using System;
using GaussGen.Mathematics.Arithmetic;
using GaussGen.Mathematics.Rules.Universal;

namespace GaussGen.Mathematics.Weights;

/// <summary>
/// Estimates, in binary64, which way to run the recurrence of <see cref="TruncatedMoments"/> and with how many bits. They decide how long
/// it takes and nothing else.
/// </summary>
internal sealed class TruncatedPlan
{
    private const double NaturalLogOfTwo = 0.6931471805599453;
    private const double Unbounded = 1e6;

    private readonly double _centre;
    private readonly double _reach;
    private readonly double _startLog;
    private readonly int _count;

    private TruncatedPlan(double centre, double reach, double startLog, int count, bool isDownward, int workingPrecision)
    {
        _centre = Math.Abs(centre);
        _reach = reach;
        _startLog = startLog;
        _count = count;
        IsDownward = isDownward;
        WorkingPrecision = workingPrecision;
    }

    internal bool IsDownward { get; }

    internal int WorkingPrecision { get; }

    internal static TruncatedPlan For(TruncatedInterval interval, int count, int precision)
    {
        double a = Clip(interval.Lower, -Unbounded), b = Clip(interval.Upper, Unbounded), c = Approximation.ToDouble(interval.Centre);
        double up = precision + 32 + UpwardLoss(a, b, c, count);
        if (interval.LowerDistance is not { } left || interval.UpperDistance is not { } right)
        {
            return new TruncatedPlan(c, 0, 0, count, isDownward: false, (int)Math.Min(up, 1 << 16));
        }

        double reach = Math.Max(Math.Abs(Approximation.ToDouble(left)), Math.Abs(Approximation.ToDouble(right)));
        double mode = Math.Max(a, Math.Min(b, 0)), width = Math.Max(1e-300, Approximation.ToDouble(Ball.Subtract(right, left, 64)));
        // What the first bound exceeds M₀ by, and what errors grow by on the last steps.
        double startLog = Math.Log(width) - (mode * mode / 2) - LogOfMoment(a, b, c, 0) + 2;
        double down = precision + 32 + ((startLog + (Math.Abs(c) * reach) + (reach * reach / 2)) / NaturalLogOfTwo);
        var plan = new TruncatedPlan(c, reach, startLog, count, isDownward: true, (int)Math.Min(Math.Max(down, precision), 1 << 16));
        double costDown = 4.0 * plan.StepsDown(plan.WorkingPrecision) * Price(down);
        double costUp = ((3.0 * count) + (2 * SeriesTerms(Math.Min(Math.Abs(a), 40), up)) + (2 * SeriesTerms(Math.Min(Math.Abs(b), 40), up))) * Price(up);
        return costDown < costUp ? plan : new TruncatedPlan(c, 0, 0, count, isDownward: false, (int)up);
    }

    /// <summary>From where on the recurrence must be run down so that the start's bound has shrunk below 2^−working of the result.</summary>
    internal int StepsDown(int working)
    {
        double log = _startLog, target = -working * NaturalLogOfTwo;
        int k = _count + 1;
        for (; log > target && k < 1 << 20; k++)
        {
            // The larger root t of k t² = |c|ρ t + ρ², by which an error shrinks or grows in a step.
            double product = _centre * _reach;
            log += Math.Log((product + Math.Sqrt((product * product) + (4 * k * _reach * _reach))) / (2 * k));
        }

        return k + 1;
    }

    /// <summary>About ln Mₖ, by the largest value of the integrand and a width.</summary>
    private static double LogOfMoment(double a, double b, double c, int k)
    {
        double best = double.NegativeInfinity;
        double root = Math.Sqrt((c * c) + (4.0 * k));
        foreach (double candidate in new[] { a, b, (c + root) / 2, (c - root) / 2 })
        {
            double x = Math.Max(a, Math.Min(b, candidate));
            double value = (k == 0 ? 0 : k * Math.Log(Math.Abs(x - c) + 1e-300)) - (x * x / 2);
            best = Math.Max(best, value);
        }

        double mode = Math.Max(a, Math.Min(b, 0));
        return best + Math.Log(Math.Min(Math.Max(b - a, 1e-300), 1 / (1 + Math.Abs(mode))));
    }

    private static double UpwardLoss(double a, double b, double c, int count)
    {
        double growth = 0, loss = 0;
        for (int k = 0; k < count; k++)
        {
            growth += k == 0 ? 0 : Math.Log((Math.Abs(c) + Math.Sqrt((c * c) + (4.0 * k))) / 2);
            loss = (k & 1) == 0 ? Math.Max(loss, growth - LogOfMoment(a, b, c, k)) : loss;
        }

        return loss / NaturalLogOfTwo;
    }

    private static double SeriesTerms(double x, double bits)
    {
        double log = 0, target = -(bits * NaturalLogOfTwo) + (x * x / 2);
        int index = 1;
        for (; (log > target || index < x * x) && index < 1 << 16; index++)
        {
            log += Math.Log(((x * x) + 1e-30) / ((2 * index) + 1));
        }

        return index;
    }

    private static double Price(double bits) => bits * Math.Sqrt(bits + 200);

    private static double Clip(Ball? value, double infinite) =>
        value is null ? infinite : Math.Max(-Unbounded, Math.Min(Unbounded, Approximation.ToDouble(value.Value)));
}
