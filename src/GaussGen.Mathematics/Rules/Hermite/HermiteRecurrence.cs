namespace GaussGen.Mathematics.Rules.Hermite;

/// <summary>
/// The three-term recurrence of the Hermite polynomials in fixed-size integers, with a bound of its error: section 2 of
/// Derivation.md, whose names the variables bear.
/// </summary>
/// <remarks>
/// At the point x = X/2²⁵ the scaled values Mₖ = Heₖ(x)·2^(S−7k) obey Mₖ₊₁ = (X·Mₖ − k·2¹⁸·Mₖ₋₁)/2³², where dividing by 2³² only
/// drops the lowest of the five 32-bit digits that an M has. A step never lets the larger of two neighbours grow, so that nothing
/// can overflow; when two neighbours fit into four digits, both move up by one, exactly. The only error is the rounding down: less
/// than one unit a step.
/// </remarks>
internal static class HermiteRecurrence
{
    /// <summary>The bits behind the point of x.</summary>
    internal const int PointBits = 25;

    /// <summary>The power of two by which the scale changes from one degree to the next.</summary>
    internal const int StepBits = 7;

    /// <summary>The power of two of the scale at degree 0 before any move.</summary>
    internal const int FirstScale = 158;

    // 2^−127: numbers that do not fit into four digits are at least 2^127.
    private const double UnitBelow = 1.0 / (1L << 62) / (1L << 62) / (1 << 3);

    /// <summary>Heₙ and Heₙ₋₁ at a point.</summary>
    /// <param name="points">n, at least 2 and at most 1024.</param>
    /// <param name="point">X, with 0 &lt; X &lt; 2³¹ and x² &lt; 4(n − 1).</param>
    /// <param name="roots">√k at index k, from 0 to n at least.</param>
    internal static HermiteValues Evaluate(int points, uint point, double[] roots)
    {
        var values = new HermiteValues(point);
        int turn = HermiteErrorBound.Turn(point);
        Advance(ref values, point, roots, 1, turn);
        double current = values.Current.ToDouble() * UnitBelow, previous = values.Previous.ToDouble() * UnitBelow;
        values.Error = HermiteErrorBound.AtTurn(turn, point, current, previous);
        Advance(ref values, point, roots, turn + 1, points - 1);
        return values;
    }

    /// <summary>Whether the error bound covers the recurrence up to degree n at the point.</summary>
    internal static bool IsCovered(int points, uint point) =>
        point > 0 && point < 1U << 31 && HermiteErrorBound.Turn(point) <= points - 2;

    /// <summary>The steps from degree k to k + 1 for the given k.</summary>
    private static void Advance(ref HermiteValues values, uint point, double[] roots, int first, int last)
    {
        HermiteDigits start = values.Current, before = values.Previous;
        long c0 = start.Digit0, c1 = start.Digit1, c2 = start.Digit2, c3 = start.Digit3, c4 = start.Digit4;
        long p0 = before.Digit0, p1 = before.Digit1, p2 = before.Digit2, p3 = before.Digit3, p4 = before.Digit4;
        long x = point;
        double error = values.Error;
        for (int k = first; k <= last; k++)
        {
            // X < 2^31, k·2^18 < 2^29 and digits below 2^32: every sum stays within 64 bits.
            long factor = (long)k << 18;
            long sum = (x * c0) - (factor * p0);
            sum = (sum >> 32) + (x * c1) - (factor * p1);
            long n0 = (uint)sum;
            sum = (sum >> 32) + (x * c2) - (factor * p2);
            long n1 = (uint)sum;
            sum = (sum >> 32) + (x * c3) - (factor * p3);
            long n2 = (uint)sum;
            sum = (sum >> 32) + (x * c4) - (factor * p4);
            long n3 = (uint)sum;
            long n4 = sum >> 32;
            error = HermiteErrorBound.Step(error, roots[k + 1]);
            p0 = c0;
            p1 = c1;
            p2 = c2;
            p3 = c3;
            p4 = c4;
            c0 = n0;
            c1 = n1;
            c2 = n2;
            c3 = n3;
            c4 = n4;

            // The top digit repeats the sign of the one below: both numbers fit into four digits.
            if (((c4 + (c3 >> 31)) | (p4 + (p3 >> 31))) == 0)
            {
                c4 = (int)c3;
                c3 = c2;
                c2 = c1;
                c1 = c0;
                c0 = 0;
                p4 = (int)p3;
                p3 = p2;
                p2 = p1;
                p1 = p0;
                p0 = 0;
                error *= 4294967296.0;
                values.Moves++;
            }
        }

        values.Current = new HermiteDigits(c0, c1, c2, c3, c4);
        values.Previous = new HermiteDigits(p0, p1, p2, p3, p4);
        values.Error = error;
    }
}
