using System.Linq;
using GaussGen.Tool.Output;
using GaussGen.Tool.Plots;
using Xunit;

namespace GaussGen.Tool.Tests.Plots;

/// <summary>Plots in letters, small enough to be checked by eye.</summary>
public class TerminalStemPlotTests
{
    [Fact]
    public void Stems_are_as_high_as_their_values() => Assert.Equal(
        [
            "        4 ┤    ●",
            "          │    │",
            "        2 ┤    │   ●",
            "          │●   │   │",
            "        0 ┤│   │   │",
            "          └┴───┴───┴",
            "           -1      1",
        ],
        new TerminalStemPlot([(-1, 1), (0, 4), (1, 2)], 20, 5).Draw(isUnicode: true));

    [Fact]
    public void Small_values_are_told_apart_on_a_logarithmic_scale_in_ASCII()
    {
        TerminalStemPlot plot = new([(0, 1), (1, 1e-2), (2, 1e-4)], 20, 5);
        Assert.True(plot.IsLogarithmic);
        Assert.Equal(
            [
                "   1.0E+0 +o",
                "          ||",
                "   1.0E-2 +|   o",
                "          ||   |",
                "   1.0E-4 +|   |   o",
                "          ++---+---+",
                "           0       2",
            ],
            plot.Draw(isUnicode: false));
    }

    [Fact]
    public void The_highest_of_several_in_a_column_is_shown() => Assert.Equal(
        2, new TerminalStemPlot([(0, 1), (0.001, 3), (0.002, 2), (100, 3)], 20, 5).Draw(true).Sum(line => line.Count(letter => letter == '●')));

    [Fact]
    public void What_has_no_height_has_a_foot_and_what_is_no_number_does_no_harm()
    {
        var lines = new TerminalStemPlot([(0, 0), (1, double.NaN), (2, double.PositiveInfinity), (3, -1), (4, 1)], 20, 3).Draw(isUnicode: true);
        Assert.Equal(1, lines.Sum(line => line.Count(letter => letter == '●')));
        Assert.Equal(5, lines[^2].Count(letter => letter == '┴'));
        Assert.Empty(new TerminalStemPlot([(0, 0), (1, double.NaN)], 20, 3).Draw(true));
        Assert.Empty(new TerminalStemPlot([], 20, 3).Draw(true));
    }

    [Fact]
    public void One_stem_stands_in_the_middle() => Assert.Equal(
        ["        1 ┤    ●", "      0.5 ┤    │", "        0 ┤    │", "          └────┴────", "               7"],
        new TerminalStemPlot([(7, 1)], 20, 3).Draw(isUnicode: true));

    [Theory]
    [InlineData(1e-308, 1e308)]
    [InlineData(5e-324, 5e-324)]
    [InlineData(1.7976931348623157E308, 1.7976931348623157E308)]
    public void Extreme_values_stay_inside(double small, double large)
    {
        var lines = new TerminalStemPlot([(-1e308, small), (1e308, large)], 80, 10).Draw(isUnicode: true);
        Assert.Equal(12, lines.Count);
        Assert.All(lines, line => Assert.InRange(line.Length, 1, 80));
        Assert.Equal(2, lines.Sum(line => line.Count(letter => letter == '●')));
    }

    [Theory]
    [InlineData("Σ wᵢ f(xᵢ) ≈ ∫ f(x) w(x) dx", "sum w_i f(x_i) ~ integral f(x) w(x) dx")]
    [InlineData("exp(−x²/2)/√(2π)", "exp(-x^2/2)/sqrt(2 pi)")]
    [InlineData("Heₖ₊₁ = x Heₖ − k Heₖ₋₁", "He_(k+1) = x He_k - k He_(k-1)")]
    [InlineData("2ⁿ⁻¹ n! √π/(n Hₙ₋₁(xᵢ))²", "2^(n-1) n! sqrt(pi)/(n H_(n-1)(x_i))^2")]
    [InlineData("f⁽²ⁿ⁾(ξ), He₁₆, x¹²", "f^(2n)(xi), He_16, x^12")]
    [InlineData("船 Größe", "_ Gr__e")]
    [InlineData("2^(k/2) Γ((k+1)/2)/√π, 0 ≤ 2j ≤ k, 3·4, Szegő", "2^(k/2) Gamma((k+1)/2)/sqrt(pi), 0 <= 2j <= k, 3*4, Szego")]
    public void Formulas_in_ASCII(string text, string expected) => Assert.Equal(expected, AsciiText.Of(text));
}
