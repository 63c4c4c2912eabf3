using IceExtent.Grids;

namespace IceExtent.Statistics.Tests;

/// <summary>Grids small enough to check by hand.</summary>
internal static class SmallGrid
{
    /// <summary>An equal-area grid of 25 km cells near the north pole: each cell is 625 km².</summary>
    public static Grid EqualArea(int rows, int columns) => new(
        "small",
        null,
        new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0),
        new GridFrame(columns, rows, 25_000.0, -12_500.0 * columns, 12_500.0 * rows));

    public static bool[] AllOcean(Grid grid) => Enumerable.Repeat(true, grid.CellCount).ToArray();
}
