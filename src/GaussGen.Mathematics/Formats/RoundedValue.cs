namespace GaussGen.Mathematics.Formats;

/// <summary>An entry of a table in its number format, proven to be the representable value nearest to the true one.</summary>
/// <param name="Bits">The interchange encoding, in the low bits (IEEE 754-2019, 3.4). Zero is always +0.</param>
/// <param name="EnclosureWidthLog2">
/// log₂ of the width of the enclosure that decided the rounding, in units in the last place of the result, rounded up;
/// <see cref="int.MinValue"/> where the value was known exactly.
/// </param>
public readonly record struct RoundedValue(ulong Bits, int EnclosureWidthLog2);
