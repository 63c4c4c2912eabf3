using System.Numerics;
using System.Runtime.InteropServices;

namespace IceExtent.Storage.Reading;

/// <summary>How a file codes one number. Little-endian where it takes more than one byte.</summary>
internal enum StoredNumber
{
    SignedOneByte,
    UnsignedOneByte,
    SignedTwoBytes,
    UnsignedTwoBytes,
    SignedFourBytes,
    UnsignedFourBytes,
    SignedEightBytes,
    UnsignedEightBytes,
    RealFourBytes,
    RealEightBytes,
}

/// <summary>What follows from a number's coding.</summary>
internal static class StoredNumbers
{
    /// <summary>The bytes one number takes.</summary>
    public static int BytesOf(StoredNumber number) => number switch
    {
        StoredNumber.SignedOneByte or StoredNumber.UnsignedOneByte => 1,
        StoredNumber.SignedTwoBytes or StoredNumber.UnsignedTwoBytes => 2,
        StoredNumber.SignedFourBytes or StoredNumber.UnsignedFourBytes or StoredNumber.RealFourBytes => 4,
        _ => 8,
    };

    /// <summary>Whether the number is a whole one.</summary>
    public static bool IsWhole(StoredNumber number) =>
        number is not (StoredNumber.RealFourBytes or StoredNumber.RealEightBytes);

    /// <summary>The same bits read with or without a sign; reals stay as they are.</summary>
    public static StoredNumber WithSign(StoredNumber number, bool signed) => BytesOf(number) switch
    {
        _ when !IsWhole(number) => number,
        1 => signed ? StoredNumber.SignedOneByte : StoredNumber.UnsignedOneByte,
        2 => signed ? StoredNumber.SignedTwoBytes : StoredNumber.UnsignedTwoBytes,
        4 => signed ? StoredNumber.SignedFourBytes : StoredNumber.UnsignedFourBytes,
        _ => signed ? StoredNumber.SignedEightBytes : StoredNumber.UnsignedEightBytes,
    };

    /// <summary>The type as messages name it, such as <c>unsigned 16-bit integer</c>.</summary>
    public static string NameOf(StoredNumber number) => number switch
    {
        StoredNumber.RealFourBytes => "32-bit real",
        StoredNumber.RealEightBytes => "64-bit real",
        StoredNumber.SignedOneByte or StoredNumber.SignedTwoBytes or StoredNumber.SignedFourBytes or StoredNumber.SignedEightBytes =>
            $"signed {BytesOf(number) * 8}-bit integer",
        _ => $"unsigned {BytesOf(number) * 8}-bit integer",
    };

    /// <summary>All numbers of a piece of memory, in double precision.</summary>
    public static double[] ToDoubles(StoredNumber number, ReadOnlySpan<byte> stored) => number switch
    {
        StoredNumber.SignedOneByte => Widen<sbyte>(stored),
        StoredNumber.UnsignedOneByte => Widen<byte>(stored),
        StoredNumber.SignedTwoBytes => Widen<short>(stored),
        StoredNumber.UnsignedTwoBytes => Widen<ushort>(stored),
        StoredNumber.SignedFourBytes => Widen<int>(stored),
        StoredNumber.UnsignedFourBytes => Widen<uint>(stored),
        StoredNumber.SignedEightBytes => Widen<long>(stored),
        StoredNumber.UnsignedEightBytes => Widen<ulong>(stored),
        StoredNumber.RealFourBytes => Widen<float>(stored),
        _ => Widen<double>(stored),
    };

    private static double[] Widen<T>(ReadOnlySpan<byte> stored)
        where T : unmanaged, INumber<T>
    {
        ReadOnlySpan<T> numbers = MemoryMarshal.Cast<byte, T>(stored);
        double[] wide = new double[numbers.Length];
        for (int at = 0; at < wide.Length; at++)
        {
            wide[at] = double.CreateTruncating(numbers[at]);
        }

        return wide;
    }
}
