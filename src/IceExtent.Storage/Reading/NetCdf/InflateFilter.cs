using System.IO.Compression;
using PureHDF.Filters;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Inflates a chunk straight into memory of its size; packing is left to the library's own filter.</summary>
/// <remarks>What inflates to more than a chunk can hold is damaged and is refused before it takes memory.</remarks>
internal sealed class InflateFilter : IH5Filter
{
    // Filters that were applied before deflate may have added a checksum or a short header to the chunk.
    private const int RoomBeyondChunk = 64;

    private readonly DeflateFilter library = new();

    /// <inheritdoc/>
    public ushort FilterId => DeflateFilter.Id;

    /// <inheritdoc/>
    public string Name => library.Name;

    /// <inheritdoc/>
    public uint[] GetParameters(uint[] chunkDimensions, uint typeSize, Dictionary<string, object>? options) =>
        library.GetParameters(chunkDimensions, typeSize, options);

    /// <inheritdoc/>
    public Memory<byte> Filter(FilterInfo info)
    {
        if (!info.Flags.HasFlag(H5FilterFlags.Decompress))
        {
            return library.Filter(info);
        }

        int most = checked(info.ChunkSize + RoomBeyondChunk);
        byte[] inflated = ChunkBuffers.ForInflated(most + 1);
        int count = Inflate(info.Buffer, inflated.AsSpan(0, most + 1));
        return count <= most
            ? inflated.AsMemory(0, count)
            : throw new InvalidDataException("A chunk inflates to more bytes than its shape allows.");
    }

    // Asking for one byte too many makes the stream read on to its checksum and verify it.
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
}
