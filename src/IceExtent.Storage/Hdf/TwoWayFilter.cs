using PureHDF.Filters;

namespace IceExtent.Storage.Hdf;

/// <summary>A filter of HDF5 chunks whose two directions are chosen apart.</summary>
/// <remarks>
/// The library keeps one filter a kind for the whole process and both directions. This one stands in that register
/// once for all; whoever writes sets how chunks are packed, whoever reads sets how they are unpacked, and neither
/// undoes the other. Until then each direction is the library's own.
/// </remarks>
internal sealed class TwoWayFilter : IH5Filter
{
    private readonly IH5Filter library;
    private volatile Func<FilterInfo, Memory<byte>> pack;
    private volatile Func<FilterInfo, Memory<byte>> unpack;

    private TwoWayFilter(IH5Filter library)
    {
        this.library = library;
        (pack, unpack) = (library.Filter, library.Filter);
        H5Filter.Register(this);
    }

    /// <summary>The filter that sorts the bytes of numbers by their place.</summary>
    public static TwoWayFilter Shuffle { get; } = new(new ShuffleFilter());

    /// <summary>The filter that compresses as zlib does.</summary>
    public static TwoWayFilter Deflate { get; } = new(new DeflateFilter());

    /// <inheritdoc/>
    public ushort FilterId => library.FilterId;

    /// <inheritdoc/>
    public string Name => library.Name;

    /// <summary>Sets how chunks are packed: the same format, by another way.</summary>
    /// <param name="way">Gives the packed chunk in memory that stays untouched until the same thread calls again.</param>
    public void PackWith(Func<FilterInfo, Memory<byte>> way) => pack = way;

    /// <summary>Sets how chunks are unpacked.</summary>
    /// <param name="way">Gives the chunk; the library may keep the memory.</param>
    public void UnpackWith(Func<FilterInfo, Memory<byte>> way) => unpack = way;

    /// <inheritdoc/>
    public uint[] GetParameters(uint[] chunkDimensions, uint typeSize, Dictionary<string, object>? options) =>
        library.GetParameters(chunkDimensions, typeSize, options);

    /// <inheritdoc/>
    public Memory<byte> Filter(FilterInfo info) =>
        info.Flags.HasFlag(H5FilterFlags.Decompress) ? unpack(info) : pack(info);
}
