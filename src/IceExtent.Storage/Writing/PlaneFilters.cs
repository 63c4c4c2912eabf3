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
    /// <summary>The deflate level; the file records it, though no reader needs it.</summary>
    public const int Level = 1;

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
}
