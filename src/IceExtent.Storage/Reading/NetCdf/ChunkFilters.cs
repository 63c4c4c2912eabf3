using PureHDF.Filters;

namespace IceExtent.Storage.Reading.NetCdf;

/// <summary>Puts this reader's filters in the place of the library's.</summary>
internal static class ChunkFilters
{
    private static int registered;

    /// <summary>Registers them once in the process. They read and write the same bytes as the library's own.</summary>
    public static void Register()
    {
        if (Interlocked.Exchange(ref registered, 1) == 0)
        {
            H5Filter.Register(new InflateFilter());
            H5Filter.Register(new UnshuffleFilter());
        }
    }
}
