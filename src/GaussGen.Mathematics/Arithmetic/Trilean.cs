namespace GaussGen.Mathematics.Arithmetic;

/// <summary>
/// The answer to a question about an enclosure. An undecided comparison is never taken for a decided one: whoever needs a
/// decision raises the precision until the answer is not <see cref="Unknown"/>.
/// </summary>
public enum Trilean
{
    /// <summary>It holds for no number in the enclosure.</summary>
    False,

    /// <summary>It holds for every number in the enclosure.</summary>
    True,

    /// <summary>It holds for some numbers in the enclosure and not for others.</summary>
    Unknown,
}
