using PureHDF.Filters;

namespace IceExtent.Storage.Writing;

/// <summary>Shuffles 16-bit numbers into a buffer that the next call on the same thread uses again.</summary>
internal sealed class ThreadShuffle : IH5Filter
{
    private static readonly ShuffleFilter Library = new();

    [ThreadStatic]
    private static byte[]? shuffled;

    /// <inheritdoc/>
    public ushort FilterId => ShuffleFilter.Id;

    /// <inheritdoc/>
    public string Name => Library.Name;

    /// <inheritdoc/>
    public uint[] GetParameters(uint[] chunkDimensions, uint typeSize, Dictionary<string, object>? options) =>
        Library.GetParameters(chunkDimensions, typeSize, options);

    /// <inheritdoc/>
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
