using System;
using System.Buffers.Binary;
using System.Security.Cryptography;
using GaussGen.Functions.Measuring;
using Xunit;

namespace GaussGen.Tests.Functions;

/// <summary>
/// The bits of every function at fixed points, pinned: a host that evaluates binary64 strictly gives these. A change of a
/// coefficient or of an operation's order changes the hash, and is to be decided and not to happen.
/// </summary>
public sealed class FunctionBitsTests
{
    private const string Pinned = "4f02263e18e07fcc31d59bb5fa2a416b02c808970da8ddbeacca063e2d7633b8";

    [Fact]
    public void The_bits_are_the_pinned_ones()
    {
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        Span<byte> bytes = stackalloc byte[12];
        foreach (MeasuredFunction function in MeasuredFunction.All)
        {
            foreach ((double first, double second) in Points.For(function, 8_000))
            {
                BinaryPrimitives.WriteDoubleLittleEndian(bytes, function.Binary64(first, second));
                var single = ((float)first, (float)second);
                bool isInside = function.Domain != Domain.Interval || single.Item1 <= single.Item2;
                BinaryPrimitives.WriteSingleLittleEndian(bytes[8..], isInside ? function.Binary32(single.Item1, single.Item2) : 0.0f);
                hash.AppendData(bytes);
            }
        }

        string found = Convert.ToHexStringLower(hash.GetHashAndReset());
        Assert.True(found == Pinned, found);
    }
}
