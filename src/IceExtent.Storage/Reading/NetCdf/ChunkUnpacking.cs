using System.IO.Compression;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using IceExtent.Storage.Hdf;
using PureHDF.Filters;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Unpacks chunks: inflates them straight into memory of their size and puts the bytes of 16-bit numbers together.</summary>
/// <remarks>
/// The same as the library's own ways, with less copying, in memory that <see cref="ChunkBuffers"/> lends. What
/// inflates to more than a chunk can hold, or does not come to its checksum, is damaged and is refused.
/// </remarks>
internal static class ChunkUnpacking
{
    // Filters that were applied before deflate may have added a checksum or a short header to the chunk.
    private const int RoomBeyondChunk = 64;

    private static readonly ShuffleFilter LibraryShuffle = new();

    /// <summary>Takes the place of the library's ways, once in the process.</summary>
    public static void Use() => RuntimeHelpers.RunClassConstructor(typeof(Registration).TypeHandle);

    /// <summary>Inflates a chunk.</summary>
    /// <exception cref="InvalidDataException">The chunk is damaged.</exception>
    public static Memory<byte> Inflate(FilterInfo info)
    {
        int most = checked(info.ChunkSize + RoomBeyondChunk);
        byte[] inflated = ChunkBuffers.ForInflated(most + 1);

        // Asking for one byte too many makes the stream read on to its checksum and verify it.
        int count = Inflate(info.Buffer, inflated.AsSpan(0, most + 1));
        return count <= most
            ? inflated.AsMemory(0, count)
            : throw new InvalidDataException("A chunk inflates to more bytes than its shape allows.");
    }

    /// <summary>Undoes the shuffling of a chunk: the low bytes of all numbers stand first in it, and then the high bytes.</summary>
    public static Memory<byte> Unshuffle(FilterInfo info)
    {
        int bytes = info.Buffer.Length;
        if (info.Parameters is not [sizeof(ushort), ..] || int.IsOddInteger(bytes))
        {
            return LibraryShuffle.Filter(info);
        }

        Memory<byte> whole = ChunkBuffers.ForUnshuffled(bytes).AsMemory(0, bytes);
        ReadOnlySpan<byte> planes = info.Buffer.Span;
        Join(planes[..(bytes / 2)], planes[(bytes / 2)..], MemoryMarshal.Cast<byte, ushort>(whole.Span));
        return whole;
    }

    private static int Inflate(ReadOnlyMemory<byte> deflated, Span<byte> into)
    {
        using DeflatedBytes source = new(deflated);
        using ZLibStream stream = new(source, CompressionMode.Decompress);
        int count;
        try
        {
            count = stream.ReadAtLeast(into, into.Length, throwOnEndOfStream: false);
        }
        catch (IOException)
        {
            // No file is read here: this is how the stream reports some of the damage it finds.
            throw new InvalidDataException("A chunk cannot be inflated.");
        }

        return source.RanDry ? throw new InvalidDataException("A chunk ends before its deflated data do.") : count;
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)] // As in KelvinDecoder.
    private static void Join(ReadOnlySpan<byte> low, ReadOnlySpan<byte> high, Span<ushort> numbers)
    {
        int at = 0;
        for (; at <= numbers.Length - Vector256<byte>.Count; at += Vector256<byte>.Count)
        {
            (Vector256<ushort> lowFirst, Vector256<ushort> lowLast) = Vector256.Widen(Vector256.Create(low[at..]));
            (Vector256<ushort> highFirst, Vector256<ushort> highLast) = Vector256.Widen(Vector256.Create(high[at..]));
            (lowFirst | (highFirst << 8)).CopyTo(numbers[at..]);
            (lowLast | (highLast << 8)).CopyTo(numbers[(at + Vector256<ushort>.Count)..]);
        }

        for (; at < numbers.Length; at++)
        {
            numbers[at] = (ushort)(low[at] | (high[at] << 8));
        }
    }

    private static class Registration
    {
        static Registration()
        {
            TwoWayFilter.Deflate.UnpackWith(Inflate);
            TwoWayFilter.Shuffle.UnpackWith(Unshuffle);
        }
    }
}
