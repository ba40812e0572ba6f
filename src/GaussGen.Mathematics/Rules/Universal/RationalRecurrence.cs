using GaussGen.Mathematics.Arithmetic;

namespace GaussGen.Mathematics.Rules.Universal;

/// <summary>A three-term recurrence with rational coefficients, exactly; see <see cref="Recurrence"/>.</summary>
/// <param name="diagonal">a₀ … aₙ₋₁.</param>
/// <param name="squares">b₁ … bₙ₋₁ at their indices; the entry at 0 is not used.</param>
/// <param name="isEven">Whether the weight is even.</param>
internal sealed class RationalRecurrence(Rational[] diagonal, Rational[] squares, bool isEven)
{
    /// <summary>The number of coefficients aₖ.</summary>
    internal int Count => diagonal.Length;

    /// <summary>Whether the weight is even.</summary>
    internal bool IsEven => isEven;

    /// <summary>aₖ.</summary>
    internal Rational Diagonal(int k) => diagonal[k];

    /// <summary>bₖ for k at least 1.</summary>
    internal Rational Square(int k) => squares[k];

    /// <summary>The same coefficients with twice the last bₖ; there are at least two aₖ.</summary>
    internal RationalRecurrence DoubleLastSquare()
    {
        var changed = (Rational[])squares.Clone();
        changed[Count - 1] = 2 * changed[Count - 1];
        return new RationalRecurrence(diagonal, changed, isEven);
    }
}
