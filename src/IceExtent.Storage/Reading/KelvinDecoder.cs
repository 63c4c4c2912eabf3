using System.Buffers;
using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;

namespace IceExtent.Storage.Reading;

/// <summary>Turns stored numbers into kelvins, row by row from the top.</summary>
internal static class KelvinDecoder
{
    /// <summary>Writes one channel's plane.</summary>
    /// <param name="stored">The stored numbers as bytes, little-endian.</param>
    /// <param name="order">Where each cell stands among them.</param>
    /// <param name="rule">What the numbers mean, with a table for the short ones.</param>
    /// <param name="kelvins">Receives one value a cell, row-major, row 0 at the top, in K; NaN is missing.</param>
    /// <exception cref="ArgumentException">The plane has another number of cells than the order.</exception>
    public static void Decode(ReadOnlySpan<byte> stored, CellOrder order, KelvinRule rule, Span<float> kelvins)
    {
        if (kelvins.Length != order.Rows * order.Columns)
        {
            throw new ArgumentException(
                $"The plane has {kelvins.Length} cells; the order has {order.Rows} x {order.Columns}.", nameof(kelvins));
        }

        switch (rule.Encoding.Number)
        {
            case StoredNumber.SignedOneByte or StoredNumber.UnsignedOneByte:
                DecodeRows(stored, order, new TableLine<byte>(rule.Table), kelvins);
                break;
            case StoredNumber.SignedTwoBytes or StoredNumber.UnsignedTwoBytes:
                DecodeRows(MemoryMarshal.Cast<byte, ushort>(stored), order, new TableLine<ushort>(rule.Table), kelvins);
                break;
            case StoredNumber.SignedFourBytes:
                Compute<int>(stored, order, rule.Encoding, kelvins);
                break;
            case StoredNumber.UnsignedFourBytes:
                Compute<uint>(stored, order, rule.Encoding, kelvins);
                break;
            case StoredNumber.SignedEightBytes:
                Compute<long>(stored, order, rule.Encoding, kelvins);
                break;
            case StoredNumber.UnsignedEightBytes:
                Compute<ulong>(stored, order, rule.Encoding, kelvins);
                break;
            case StoredNumber.RealFourBytes when RealLine.Suits(rule.Encoding):
                DecodeRows(MemoryMarshal.Cast<byte, float>(stored), order, new PlainLine(rule.Encoding), kelvins);
                break;
            case StoredNumber.RealFourBytes:
                Compute<float>(stored, order, rule.Encoding, kelvins);
                break;
            default:
                Compute<double>(stored, order, rule.Encoding, kelvins);
                break;
        }
    }

    private static void Compute<T>(ReadOnlySpan<byte> stored, CellOrder order, KelvinEncoding encoding, Span<float> kelvins)
        where T : unmanaged, INumber<T> =>
        DecodeRows(MemoryMarshal.Cast<byte, T>(stored), order, new ComputedLine<T>(encoding), kelvins);

    // Rows whose numbers do not stand side by side are gathered first, so that the inner loops see one shape only.
    private static void DecodeRows<T, TLine>(ReadOnlySpan<T> stored, CellOrder order, TLine line, Span<float> kelvins)
        where T : unmanaged
        where TLine : struct, ILine<T>
    {
        if (order.ColumnStride == 1 && order.RowStride == order.Columns)
        {
            line.Decode(stored.Slice(order.First, kelvins.Length), kelvins);
            return;
        }

        T[] gathered = ArrayPool<T>.Shared.Rent(order.Columns);
        for (int row = 0; row < order.Rows; row++)
        {
            int first = order.First + (row * order.RowStride);
            ReadOnlySpan<T> numbers = order.ColumnStride == 1
                ? stored.Slice(first, order.Columns)
                : Gather(stored, first, order.ColumnStride, gathered.AsSpan(0, order.Columns));
            line.Decode(numbers, kelvins.Slice(row * order.Columns, order.Columns));
        }

        ArrayPool<T>.Shared.Return(gathered);
    }

    private static ReadOnlySpan<T> Gather<T>(ReadOnlySpan<T> stored, int first, int stride, Span<T> into)
    {
        for (int column = 0; column < into.Length; column++)
        {
            into[column] = stored[first + (column * stride)];
        }

        return into;
    }

    private interface ILine<T>
    {
        void Decode(ReadOnlySpan<T> stored, Span<float> kelvins);
    }

    // A table gives for each bit pattern what KelvinEncoding.ToKelvins gives for its number.
    private readonly struct TableLine<T>(float[] table) : ILine<T>
        where T : unmanaged, IBinaryInteger<T>
    {
        // Compiled in full at once: a run of one year is over before the runtime would get round to it.
        [MethodImpl(MethodImplOptions.AggressiveOptimization)]
        public void Decode(ReadOnlySpan<T> stored, Span<float> kelvins)
        {
            ReadOnlySpan<float> entries = table;
            for (int cell = 0; cell < stored.Length; cell++)
            {
                kelvins[cell] = entries[int.CreateTruncating(stored[cell])];
            }
        }
    }

    private readonly struct PlainLine(KelvinEncoding encoding) : ILine<float>
    {
        public void Decode(ReadOnlySpan<float> stored, Span<float> kelvins) => RealLine.Decode(stored, encoding, kelvins);
    }

    private readonly struct ComputedLine<T>(KelvinEncoding encoding) : ILine<T>
        where T : unmanaged, INumber<T>
    {
        public void Decode(ReadOnlySpan<T> stored, Span<float> kelvins)
        {
            for (int cell = 0; cell < stored.Length; cell++)
            {
                kelvins[cell] = encoding.ToKelvins(double.CreateTruncating(stored[cell]));
            }
        }
    }
}
