using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using PureHDF.Filters;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Puts the bytes of 16-bit numbers together again; all else is left to the library's own filter.</summary>
/// <remarks>Shuffled, a chunk holds the low bytes of all numbers first and then the high bytes.</remarks>
internal sealed class UnshuffleFilter : IH5Filter
{
    private const int ShortNumber = 2;

    private readonly ShuffleFilter library = new();

    /// <inheritdoc/>
    public ushort FilterId => ShuffleFilter.Id;

    /// <inheritdoc/>
    public string Name => library.Name;

    /// <inheritdoc/>
    public uint[] GetParameters(uint[] chunkDimensions, uint typeSize, Dictionary<string, object>? options) =>
        library.GetParameters(chunkDimensions, typeSize, options);

    /// <inheritdoc/>
    public Memory<byte> Filter(FilterInfo info)
    {
        int bytes = info.Buffer.Length;
        if (!info.Flags.HasFlag(H5FilterFlags.Decompress)
            || info.Parameters is not [ShortNumber, ..]
            || int.IsOddInteger(bytes))
        {
            return library.Filter(info);
        }

        Memory<byte> whole = ChunkBuffers.ForUnshuffled(bytes).AsMemory(0, bytes);
        ReadOnlySpan<byte> planes = info.Buffer.Span;
        Join(planes[..(bytes / 2)], planes[(bytes / 2)..], MemoryMarshal.Cast<byte, ushort>(whole.Span));
        return whole;
    }

    /// <summary>Joins low and high bytes into numbers; the three spans have one length.</summary>
    internal static void Join(ReadOnlySpan<byte> low, ReadOnlySpan<byte> high, Span<ushort> numbers)
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
}
