using IceExtent.Grids;

namespace IceExtent.Scenes.Demo;

/// <summary>Turns lines that are straight on the invented sea's map into lines in longitude and latitude.</summary>
internal static class InventedLines
{
    private const double PieceMeters = 25_000.0; // A straight piece in longitude and latitude then strays less than 200 m, as far from the pole as these lines are.

    /// <summary>The positions along a line, its last corner left out.</summary>
    /// <remarks>An edge gives the same positions whichever way it is gone, so neighbors share their border to the bit.</remarks>
    public static IEnumerable<GeoPosition> Along(IReadOnlyList<MapPosition> corners) =>
        Enumerable.Range(1, corners.Count - 1).SelectMany(end => Edge(corners[end - 1], corners[end]));

    private static IEnumerable<GeoPosition> Edge(MapPosition from, MapPosition to)
    {
        (double x, double y) = (to.XMeters - from.XMeters, to.YMeters - from.YMeters);
        int pieces = (int)Math.Ceiling(Math.Sqrt((x * x) + (y * y)) / PieceMeters);
        bool turned = (from.XMeters, from.YMeters).CompareTo((to.XMeters, to.YMeters)) > 0;
        for (int piece = 0; piece < pieces; piece++)
        {
            yield return turned ? Between(to, from, pieces - piece, pieces) : Between(from, to, piece, pieces);
        }
    }

    private static GeoPosition Between(MapPosition from, MapPosition to, int piece, int pieces) => InventedSea.Grid.Projection.Inverse(new(
        from.XMeters + ((to.XMeters - from.XMeters) * piece / pieces),
        from.YMeters + ((to.YMeters - from.YMeters) * piece / pieces)));
}
