using System.Buffers.Binary;
using System.Numerics;
using System.Runtime.CompilerServices;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>The checksum that HDF5 puts on the blocks of its structure: lookup3 of [Jenkins2006], in its form for bytes, as [HDF5] has it.</summary>
internal static class Lookup3
{
    /// <summary>The checksum of some bytes.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // As in KelvinDecoder.
    public static uint Of(ReadOnlySpan<byte> bytes)
    {
        uint a = 0xDEADBEEF + (uint)bytes.Length;
        uint b = a;
        uint c = a;
        while (bytes.Length > 12)
        {
            a += BinaryPrimitives.ReadUInt32LittleEndian(bytes);
            b += BinaryPrimitives.ReadUInt32LittleEndian(bytes[4..]);
            c += BinaryPrimitives.ReadUInt32LittleEndian(bytes[8..]);
            Mix(ref a, ref b, ref c);
            bytes = bytes[12..];
        }

        if (bytes.IsEmpty)
        {
            return c;
        }

        Span<byte> last = stackalloc byte[12];
        last.Clear();
        bytes.CopyTo(last);
        a += BinaryPrimitives.ReadUInt32LittleEndian(last);
        b += BinaryPrimitives.ReadUInt32LittleEndian(last[4..]);
        c += BinaryPrimitives.ReadUInt32LittleEndian(last[8..]);
        Finish(ref a, ref b, ref c);
        return c;
    }

    private static void Mix(ref uint a, ref uint b, ref uint c)
    {
        a = (a - c) ^ BitOperations.RotateLeft(c, 4);
        c += b;
        b = (b - a) ^ BitOperations.RotateLeft(a, 6);
        a += c;
        c = (c - b) ^ BitOperations.RotateLeft(b, 8);
        b += a;
        a = (a - c) ^ BitOperations.RotateLeft(c, 16);
        c += b;
        b = (b - a) ^ BitOperations.RotateLeft(a, 19);
        a += c;
        c = (c - b) ^ BitOperations.RotateLeft(b, 4);
        b += a;
    }

    private static void Finish(ref uint a, ref uint b, ref uint c)
    {
        c = (c ^ b) - BitOperations.RotateLeft(b, 14);
        a = (a ^ c) - BitOperations.RotateLeft(c, 11);
        b = (b ^ a) - BitOperations.RotateLeft(a, 25);
        c = (c ^ b) - BitOperations.RotateLeft(b, 16);
        a = (a ^ c) - BitOperations.RotateLeft(c, 4);
        b = (b ^ a) - BitOperations.RotateLeft(a, 14);
        c = (c ^ b) - BitOperations.RotateLeft(b, 24);
    }
}
