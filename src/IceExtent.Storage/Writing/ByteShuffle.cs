using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace IceExtent.Storage.Writing;

/// <summary>The HDF5 shuffle: the first bytes of all numbers, then their second bytes, and so on.</summary>
internal static class ByteShuffle
{
    /// <summary>Shuffles 16-bit little-endian numbers.</summary>
    /// <param name="numbers">The bytes of the numbers; an even count.</param>
    /// <param name="shuffled">Receives as many bytes; not the same memory.</param>
    public static void Words(ReadOnlySpan<byte> numbers, Span<byte> shuffled)
    {
        int count = numbers.Length / sizeof(ushort);
        int width = Vector256<byte>.Count;
        ref byte from = ref MemoryMarshal.GetReference(numbers);
        ref byte to = ref MemoryMarshal.GetReference(shuffled);
        Vector256<ushort> lowByte = Vector256.Create((ushort)byte.MaxValue);
        int number = 0;
        for (; number <= count - width; number += width)
        {
            nuint at = (nuint)(number * sizeof(ushort));
            Vector256<ushort> left = Vector256.LoadUnsafe(ref from, at).AsUInt16();
            Vector256<ushort> right = Vector256.LoadUnsafe(ref from, at + (nuint)width).AsUInt16();
            Vector256.Narrow(left & lowByte, right & lowByte).StoreUnsafe(ref to, (nuint)number);
            Vector256.Narrow(left >>> 8, right >>> 8).StoreUnsafe(ref to, (nuint)(count + number));
        }

        for (; number < count; number++)
        {
            shuffled[number] = numbers[number * sizeof(ushort)];
            shuffled[count + number] = numbers[(number * sizeof(ushort)) + 1];
        }
    }
}
