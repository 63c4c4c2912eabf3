using IceExtent.Grids;

namespace IceExtent.Retrieval.Tests.Tuning;

/// <summary>Grids of 25 km cells round the north pole.</summary>
internal static class SmallGrid
{
    public static Grid Of(int rows, int columns) => new(
        "small", null, new PolarEqualArea(Ellipsoid.Wgs84, Hemisphere.North, 0.0), new GridFrame(columns, rows, 25_000.0, -12_500.0 * columns, 12_500.0 * rows));
}
