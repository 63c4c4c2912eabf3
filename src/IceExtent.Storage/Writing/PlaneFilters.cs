using System.IO.Compression;
using IceExtent.Storage.Hdf;
using PureHDF.Filters;

namespace IceExtent.Storage.Writing;

/// <summary>The HDF5 filters that planes pass when they are written: shuffle, then deflate.</summary>
/// <remarks>
/// They give the format of the library's own and differ in two things. They work in memory that belongs to the
/// thread, so a day leaves nothing for the collector. And they deflate by run lengths: a shuffled plane of measured
/// values holds runs and noise but few longer repeats, so this is a fifth smaller than the fastest general strategy
/// (docs/PERFORMANCE.md), and no hash of the processor's making decides what the bytes are.
/// </remarks>
internal static class PlaneFilters
{
    // The file records it, though no reader needs it.
    private const int Level = 1;

    private static readonly ZLibCompressionOptions ByRunLength = new()
    {
        CompressionLevel = Level,
        CompressionStrategy = ZLibCompressionStrategy.RunLengthEncoding,
    };

    // Shuffling single bytes changes nothing.
    private static readonly List<H5Filter> ForBytes =
        [new(DeflateFilter.Id, new() { [DeflateFilter.COMPRESSION_LEVEL] = Level })];

    private static readonly List<H5Filter> ForWords = [new(ShuffleFilter.Id), .. ForBytes];

    [ThreadStatic]
    private static byte[]? shuffled;

    [ThreadStatic]
    private static MemoryStream? deflated;

    static PlaneFilters()
    {
        TwoWayFilter.Shuffle.PackWith(Shuffle);
        TwoWayFilter.Deflate.PackWith(Deflate);
    }

    /// <summary>The filters of a plane.</summary>
    /// <param name="elementBytes">The size of a stored number: 1 or 2.</param>
    public static List<H5Filter> Of(int elementBytes) => elementBytes == 1 ? ForBytes : ForWords;

    /// <summary>Shuffles 16-bit numbers into a buffer that the next call on the same thread uses again.</summary>
    /// <param name="info">The plane. Numbers of other sizes are not ours: the library shuffles them.</param>
    public static Memory<byte> Shuffle(FilterInfo info)
    {
        if (info.Parameters is not [sizeof(ushort), ..])
        {
            return new ShuffleFilter().Filter(info);
        }

        if (shuffled is null || shuffled.Length < info.Buffer.Length)
        {
            shuffled = GC.AllocateUninitializedArray<byte>(info.Buffer.Length);
        }

        ByteShuffle.Words(info.Buffer.Span, shuffled.AsSpan(0, info.Buffer.Length));
        return shuffled.AsMemory(0, info.Buffer.Length);
    }

    /// <summary>Deflates into a buffer that the next call on the same thread uses again.</summary>
    /// <param name="info">The shuffled plane.</param>
    public static Memory<byte> Deflate(FilterInfo info)
    {
        MemoryStream output = deflated ??= new MemoryStream(info.Buffer.Length / 4);
        output.SetLength(0);
        using (ZLibStream deflater = new(output, ByRunLength, leaveOpen: true))
        {
            deflater.Write(info.Buffer.Span);
        }

        return output.GetBuffer().AsMemory(0, (int)output.Length);
    }
}
