using System;
using Xunit;

namespace GaussGen.Tests;

/// <summary>Generated lists of numbers that are neither rules nor moments.</summary>
public sealed class GeneratedListTests
{
    [Fact]
    public void Gamma_at_half_integers()
    {
        Assert.Equal(172, HalfGamma.Gamma.Length);
        Assert.Equal(172, HalfGamma.Reciprocal.Length);
        Assert.Equal(Math.Sqrt(Math.PI), HalfGamma.Gamma[0], 1e-15);
        for (int k = 1; k < HalfGamma.Gamma.Length; k++)
        {
            // Γ(x + 1) = x Γ(x); each entry is within half a unit in its last place.
            Assert.InRange(HalfGamma.Gamma[k] / (HalfGamma.Gamma[k - 1] * (k - 0.5)), 1.0 - 5e-16, 1.0 + 5e-16);
            Assert.InRange(HalfGamma.Gamma[k] * HalfGamma.Reciprocal[k], 1.0 - 4e-16, 1.0 + 4e-16);
        }

        for (int k = 0; k < HalfGammaSingle.Gamma.Length; k++)
        {
            Assert.Equal((float)HalfGamma.Gamma[k], HalfGammaSingle.Gamma[k]);
        }
    }

    [Fact]
    public void Powers_of_the_position_of_an_oscillator()
    {
        const int Size = 4;
        Assert.Equal(Size * Size, QuarticSpring.Elements.Length);
        for (int n = 0; n < Size; n++)
        {
            // ⟨n|x⁴|n⟩ = (6n² + 6n + 3)/4, as the textbooks have it; recalled, and for n = 0 the moment 3/4 of exp(−x²)/√π.
            Assert.Equal(((6 * n * n) + (6 * n) + 3) / 4.0, QuarticSpring.Elements[(n * Size) + n]);
            for (int m = 0; m < Size; m++)
            {
                Assert.Equal(QuarticSpring.Elements[(n * Size) + m], QuarticSpring.Elements[(m * Size) + n]);
            }
        }

        // x² |0⟩ = |2⟩/√2 + |0⟩/2 and so on: ⟨0|x⁴|2⟩ = 3/√2.
        Assert.Equal(3.0 / Math.Sqrt(2.0), QuarticSpring.Elements[2], 1e-15);
        Assert.Equal(0.0, QuarticSpring.Elements[1]);
        Assert.Equal(15.0 / 8.0, SexticSpring.Elements[0]);
    }
}
