using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading;

/// <summary>The fault of a file that is on another grid than it should be.</summary>
public static class GridFaults
{
    /// <summary>IE2201: the file is on another grid.</summary>
    /// <param name="path">The file.</param>
    /// <param name="grid">The grid it should be on.</param>
    /// <param name="different">What <see cref="GridComparison"/> found.</param>
    /// <param name="remedy">What the person can do next: a full sentence.</param>
    public static Fault Mismatch(string path, Grid grid, GridMatch.Different different, string remedy)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(different);
        return new("IE2201", path, string.Join("; ", different.Differences), $"a file on the grid {grid.Name}", remedy);
    }
}
