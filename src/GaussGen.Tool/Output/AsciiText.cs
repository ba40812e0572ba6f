using System;
using System.Collections.Frozen;
using System.Collections.Generic;
using System.Linq;
using System.Text;

namespace GaussGen.Tool.Output;

/// <summary>
/// The tool's own words and formulas in ASCII, for terminals and compilers that know no more: "Σ wᵢ f(xᵢ)" becomes
/// "sum w_i f(x_i)". What has no such spelling becomes an underscore.
/// </summary>
internal static class AsciiText
{
    private const string Subscripts = "₀₁₂₃₄₅₆₇₈₉₊₋ᵢⱼₖₘₙ";
    private const string PlainSubscripts = "0123456789+-ijkmn";
    private const string Superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻⁽⁾ʲᵏⁿᵖ";
    private const string PlainSuperscripts = "0123456789+-()jknp";

    private static readonly FrozenDictionary<char, string> Symbols = new Dictionary<char, string>
    {
        ['Σ'] = "sum",
        ['∫'] = "integral",
        ['√'] = "sqrt",
        ['π'] = "pi",
        ['φ'] = "phi",
        ['ξ'] = "xi",
        ['Γ'] = "Gamma",
        ['–'] = "-",
        ['−'] = "-",
        ['·'] = "*",
        ['≈'] = "~",
        ['≤'] = "<=",
        ['≥'] = ">=",
        ['…'] = "...",
        ['⋯'] = "...",
        ['×'] = "x",
        ['ő'] = "o",
        ['∞'] = "infinity",
        ['½'] = "1/2",
        ['μ'] = "mu",
        ['ψ'] = "psi",
        ['ħ'] = "hbar",
        ['⟨'] = "<",
        ['⟩'] = ">",
    }.ToFrozenDictionary();

    /// <summary>The text in printable ASCII.</summary>
    public static string Of(string text)
    {
        StringBuilder ascii = new(text.Length);
        for (int i = 0; i < text.Length; i++)
        {
            if (Subscripts.Contains(text[i]))
            {
                i += AppendRun(ascii, text, i, '_', Subscripts, PlainSubscripts) - 1;
            }
            else if (Superscripts.Contains(text[i]))
            {
                i += AppendRun(ascii, text, i, '^', Superscripts, PlainSuperscripts) - 1;
            }
            else
            {
                AppendSymbol(ascii, text[i]);
                if (text[i] == '√' && i + 1 < text.Length && text[i + 1] != '(')
                {
                    _ = ascii.Append('(');
                    AppendSymbol(ascii, text[++i]);
                    _ = ascii.Append(')');
                }
            }
        }

        return ascii.ToString();
    }

    private static void AppendSymbol(StringBuilder ascii, char letter)
    {
        // A factor before a symbol that is a word now must not become part of the word.
        string symbol = letter is >= ' ' and <= '~' ? letter.ToString() : Symbols.GetValueOrDefault(letter, "_");
        bool isWord = symbol.Length > 1 && char.IsAsciiLetter(symbol[0]);
        _ = isWord && ascii.Length > 0 && char.IsAsciiLetterOrDigit(ascii[^1]) ? ascii.Append(' ').Append(symbol) : ascii.Append(symbol);
    }

    /// <summary>Writes a run of raised or lowered letters; the length of the run.</summary>
    private static int AppendRun(StringBuilder ascii, string text, int start, char mark, string letters, string plain)
    {
        int end = start;
        while (end < text.Length && letters.Contains(text[end]))
        {
            end++;
        }

        string run = string.Concat(text[start..end].Select(letter => plain[letters.IndexOf(letter, StringComparison.Ordinal)]));
        bool isOne = run.Length == 1 || run[0] == '(' || run.All(char.IsAsciiDigit);
        _ = ascii.Append(mark).Append(isOne ? run : $"({run})");
        return end - start;
    }
}
