using System.Collections.Generic;
using System.Linq;
using GaussGen.Mathematics.Formats;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Verification;
using Spectre.Console;

namespace GaussGen.Tool.Explanations;

/// <summary>The elements of a square matrix that a list holds row by row: a line an element, with its row and column.</summary>
/// <param name="Proof">The proof of the list.</param>
/// <param name="Size">The number of rows.</param>
/// <param name="ShowsAll">
/// Whether every element is shown. Otherwise zeros are left out, and of a symmetric matrix what is below the diagonal; of more than
/// <see cref="ShownRows"/> elements those at both ends are shown.
/// </param>
internal sealed record MatrixTable(TableProof Proof, int Size, bool ShowsAll)
{
    private const int ShownRows = 12;

    private readonly EntryProof[] _entries = [.. Proof.Entries.Where(entry => entry.Index is not null)];

    /// <summary>The lines.</summary>
    public IEnumerable<PageLine> Lines()
    {
        if (_entries.Length == 0)
        {
            yield break;
        }

        yield return new PageLine($"   m   n {_entries[0].Member,-25}exactly", new Style(decoration: Decoration.Bold));
        bool isHalf = !ShowsAll && IsSymmetric();
        EntryProof[] shown = [.. _entries.Where(entry => ShowsAll || entry.Verdict != Verdict.Proven || (entry.Found != 0 && !(isHalf && Row(entry) > Column(entry))))];
        bool isCut = !ShowsAll && shown.Length > ShownRows;
        for (int i = 0; i < shown.Length; i++)
        {
            if (isCut && i == ShownRows / 2)
            {
                i = shown.Length - (ShownRows / 2);
                yield return new PageLine($"         … {shown.Length - ShownRows} more; --all shows them");
            }

            BinaryFormat format = Proof.Claim.Format;
            yield return new PageLine(
                $"{Row(shown[i]),4}{Column(shown[i]),4} {EncodingText.Number(shown[i].Found, format),-25}{ExactText.Of(shown[i], format)}",
                shown[i].Verdict == Verdict.Proven ? default(Style?) : new Style(Color.Red));
        }

        if (!ShowsAll)
        {
            yield return new PageLine("         Elements that are 0 are left out" + (isHalf ? ", and those below the diagonal:" : "."));
        }

        if (isHalf)
        {
            yield return new PageLine("         the matrix is symmetric.");
        }
    }

    private int Row(EntryProof entry) => entry.Index!.Value / Size;

    private int Column(EntryProof entry) => entry.Index!.Value % Size;

    private bool IsSymmetric() => _entries.Length == Size * Size
        && _entries.All(entry => entry.Found == _entries[(Column(entry) * Size) + Row(entry)].Found);
}
