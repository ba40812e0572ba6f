using System;
using System.Buffers.Binary;
using System.Collections.Generic;
using System.Security.Cryptography;
using System.Text;
using GaussGen.Mathematics.Proofs;
using GaussGen.Tool.Reading;

namespace GaussGen.Tool.Verification;

/// <summary>A digest that two tables share exactly if they hold the same members with the same bits.</summary>
internal static class DataDigest
{
    /// <summary>The SHA-256 digest over every member's name, format and bits, in hexadecimal digits.</summary>
    public static string Of(TableData data)
    {
        using IncrementalHash hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        foreach (DataSpan span in data.Spans)
        {
            Append(hash, span.Name, span.Format?.Name, span.Bits);
        }

        foreach (DataConstant constant in data.Constants)
        {
            Append(hash, constant.Name, constant.Format?.Name, [constant.Bits]);
        }

        return Hexadecimal.Lower(hash.GetHashAndReset());
    }

    private static void Append(IncrementalHash hash, string name, string? format, IReadOnlyList<ulong> bits)
    {
        hash.AppendData(Encoding.UTF8.GetBytes($"{name.Length}:{name} {format ?? "integer"} {bits.Count}\n"));
        byte[] bytes = new byte[bits.Count * 8];
        for (int i = 0; i < bits.Count; i++)
        {
            BinaryPrimitives.WriteUInt64LittleEndian(bytes.AsSpan(i * 8), bits[i]);
        }

        hash.AppendData(bytes);
    }
}
