using System.IO.Compression;
using PureHDF.Filters;

namespace IceExtent.Storage.Writing;

/// <summary>The HDF5 filters that planes pass when they are written: shuffle, then deflate.</summary>
/// <remarks>
/// They take the places of the library's own filters in its process-wide register, give the same format and leave
/// reading to the library's. They differ in two things. They work in memory that belongs to the thread, so a day
/// leaves nothing for the collector. And they deflate by run lengths: a shuffled plane of measured values holds runs and
/// noise but few longer repeats, so this is a fifth smaller than the fastest general strategy (docs/PERFORMANCE.md), and no
/// hash of the processor's making decides what the bytes are.
/// </remarks>
internal static class PlaneFilters
{
    // As recorded in the file; it tells a reader nothing that it needs.
    private const int Level = 1;

    // Shuffling single bytes changes nothing.
    private static readonly List<H5Filter> ForBytes = [DeflateOf(Level)];
    private static readonly List<H5Filter> ForWords = [new(ShuffleFilter.Id), .. ForBytes];

    static PlaneFilters()
    {
        H5Filter.Register(new ThreadShuffle());
        H5Filter.Register(new ThreadDeflate());
    }

    /// <summary>The filters of a plane.</summary>
    /// <param name="elementBytes">The size of a stored number.</param>
    public static List<H5Filter> Of(int elementBytes) => elementBytes == 1 ? ForBytes : ForWords;

    private static H5Filter DeflateOf(int level) => new(DeflateFilter.Id, new() { [DeflateFilter.COMPRESSION_LEVEL] = level });

    /// <summary>Shuffles 16-bit numbers into a buffer that the next call on the same thread uses again.</summary>
    private sealed class ThreadShuffle : IH5Filter
    {
        private static readonly ShuffleFilter Library = new();

        [ThreadStatic]
        private static byte[]? shuffled;

        public ushort FilterId => ShuffleFilter.Id;

        public string Name => Library.Name;

        public uint[] GetParameters(uint[] chunkDimensions, uint typeSize, Dictionary<string, object>? options) =>
            Library.GetParameters(chunkDimensions, typeSize, options);

        public Memory<byte> Filter(FilterInfo info)
        {
            if (info.Flags.HasFlag(H5FilterFlags.Decompress) || info.Parameters[0] != sizeof(ushort))
            {
                return Library.Filter(info);
            }

            if (shuffled is null || shuffled.Length < info.Buffer.Length)
            {
                shuffled = GC.AllocateUninitializedArray<byte>(info.Buffer.Length);
            }

            ByteShuffle.Words(info.Buffer.Span, shuffled.AsSpan(0, info.Buffer.Length));
            return shuffled.AsMemory(0, info.Buffer.Length);
        }
    }

    /// <summary>Deflates into a buffer that the next call on the same thread uses again.</summary>
    private sealed class ThreadDeflate : IH5Filter
    {
        private static readonly DeflateFilter Library = new();
        private static readonly ZLibCompressionOptions ByRunLength = new()
        {
            CompressionLevel = Level,
            CompressionStrategy = ZLibCompressionStrategy.RunLengthEncoding,
        };

        [ThreadStatic]
        private static MemoryStream? deflated;

        public ushort FilterId => DeflateFilter.Id;

        public string Name => Library.Name;

        public uint[] GetParameters(uint[] chunkDimensions, uint typeSize, Dictionary<string, object>? options) =>
            Library.GetParameters(chunkDimensions, typeSize, options);

        public Memory<byte> Filter(FilterInfo info)
        {
            if (info.Flags.HasFlag(H5FilterFlags.Decompress))
            {
                return Library.Filter(info);
            }

            MemoryStream output = deflated ??= new MemoryStream(info.Buffer.Length / 4);
            output.SetLength(0);
            using (ZLibStream deflater = new(output, ByRunLength, leaveOpen: true))
            {
                deflater.Write(info.Buffer.Span);
            }

            return output.GetBuffer().AsMemory(0, (int)output.Length);
        }
    }
}
