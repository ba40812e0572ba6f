using System;
using System.ComponentModel;

namespace GaussGen;

/// <summary>
/// The sum behind <c>Expectation</c> and <c>Integral</c>: factor · Σ wᵢ f(mean + scale · xᵢ). It is public for generated code
/// alone.
/// </summary>
/// <remarks>
/// <para>The terms are added from the two ends of the table inwards, so that the smallest weights come first and are not lost
/// against a large partial sum; the middle node comes last. Products and sums are separate operations, each rounded: the
/// result does not depend on whether the processor has a fused multiply-add.</para>
/// <para>At scale 0 the result is f(mean) itself, not f(mean) times a rounded sum of weights, and f is evaluated once.</para>
/// <para>Nothing is checked but the lengths of the spans: generated code checks its arguments with <see cref="Require"/>. A mean
/// that is NaN or infinite reaches the integrand. A node whose weight is zero is evaluated like any other, so that an
/// infinite value there makes the result NaN.</para>
/// <para>Nothing is allocated. The loops are inlined into the generated member: there the length of the table is a constant of
/// the program, and no bounds check is left in them.</para>
/// </remarks>
[EditorBrowsable(EditorBrowsableState.Never)]
public static partial class RuleEvaluation
{
    private static void RequireEqualLengths(int nodes, int weights)
    {
        if (nodes != weights)
        {
            RefuseLengths();
        }
    }

    private static void RefuseLengths() =>
        throw new ArgumentException("A rule must have as many weights as nodes.", "weights");

    private static void RequireIntegrand(object? integrand)
    {
        if (integrand is null)
        {
            RefuseIntegrand();
        }
    }

    private static void RefuseIntegrand() =>
        throw new ArgumentNullException("integrand", "Pass the function whose expectation is wanted.");

    /// <summary>A delegate in the shape of a struct, so that both forms of an overload run through one loop.</summary>
    private readonly struct DelegateIntegrand<T>(Func<T, T> function) : IIntegrand<T>
    {
        public T Evaluate(T x) => function(x);
    }
}
