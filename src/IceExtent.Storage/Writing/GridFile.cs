using IceExtent.Grids;

namespace IceExtent.Storage.Writing;

/// <summary>Writes CF NetCDF-4 files of one day on one grid.</summary>
public static class GridFile
{
    /// <summary>Writes one file beside its place, flushes it and renames it.</summary>
    /// <param name="path">The file; its folder is made when it is missing.</param>
    /// <param name="grid">The grid of every variable.</param>
    /// <param name="day">The day, UTC.</param>
    /// <param name="variables">The variables, in the order they are written.</param>
    /// <param name="attributes">Global text attributes, in the order they are written.</param>
    public static void Write(
        string path,
        Grid grid,
        DateOnly day,
        IReadOnlyList<GridVariable> variables,
        IReadOnlyList<KeyValuePair<string, string>> attributes) =>
        throw new InvalidOperationException("Not written yet.");
}
