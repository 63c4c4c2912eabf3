using System.IO.Compression;
using PureHDF.Filters;

namespace IceExtent.Storage.Writing;

/// <summary>Deflates into a buffer that the next call on the same thread uses again.</summary>
internal sealed class ThreadDeflate : IH5Filter
{
    private static readonly DeflateFilter Library = new();
    private static readonly ZLibCompressionOptions ByRunLength = new()
    {
        CompressionLevel = PlaneFilters.Level,
        CompressionStrategy = ZLibCompressionStrategy.RunLengthEncoding,
    };

    [ThreadStatic]
    private static MemoryStream? deflated;

    /// <inheritdoc/>
    public ushort FilterId => DeflateFilter.Id;

    /// <inheritdoc/>
    public string Name => Library.Name;

    /// <inheritdoc/>
    public uint[] GetParameters(uint[] chunkDimensions, uint typeSize, Dictionary<string, object>? options) =>
        Library.GetParameters(chunkDimensions, typeSize, options);

    /// <inheritdoc/>
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
