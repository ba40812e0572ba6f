namespace GaussGen.Functions.Measuring;

/// <summary>
/// Numbers that look random and are the same on every host (Steele, Lea and Flood 2014, "Fast splittable pseudorandom number
/// generators": SplitMix64).
/// </summary>
internal sealed class Sequence(ulong seed)
{
    private ulong _state = seed;

    /// <summary>A number from 0 to below 1.</summary>
    internal double Next() => (NextBits() >> 11) * (1.0 / 9007199254740992.0);

    internal ulong NextBits()
    {
        ulong z = _state += 0x9E3779B97F4A7C15;
        z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9;
        z = (z ^ (z >> 27)) * 0x94D049BB133111EB;
        return z ^ (z >> 31);
    }
}
