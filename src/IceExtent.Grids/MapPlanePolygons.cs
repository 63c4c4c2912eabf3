using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Utilities;
using NetTopologySuite.Operation.OverlayNG;

namespace IceExtent.Grids;

/// <summary>Turns polygons given in longitude and latitude into valid polygons on the map plane of a grid.</summary>
/// <remarks>
/// <para>How a ring is read: its edges are straight in longitude and latitude, as in [RFC7946], and take the short
/// way round, so that an edge from 170 to −170 degrees crosses the date line; longitudes may be given in any turn.
/// A ring that goes round the Earth takes in a pole: the one it has a vertex at, otherwise the one of the hemisphere
/// in which the mean of its vertices lies. An edge to a pole follows a meridian. Cuts along the date line or down to
/// a pole leave no trace. A ring may run either way.</para>
/// <para>What is repaired: a ring that crosses itself keeps every area it goes round; a hole outside its shell cuts
/// nothing; a ring without area is dropped.</para>
/// <para>What is refused: an edge of more than 90 degrees of longitude (but at a pole), since it leaves open which
/// way it goes, and a ring of edges that span a whole turn and come back on themselves, such as a band round the Earth
/// given by its four corners. Both need more vertices.</para>
/// <para>What is kept: the neighbourhood of the grid. Whatever lies beyond the parallel that encloses its corners is
/// moved onto that parallel, where no cell is.</para>
/// </remarks>
public static class MapPlanePolygons
{
    /// <summary>Projects polygons.</summary>
    /// <param name="grid">The grid that gives the map and the neighbourhood to keep.</param>
    /// <param name="longitudeLatitude">A polygon or a set of them; x is the longitude, y the latitude, in degrees. Need not be valid.</param>
    /// <returns>Their union on the map plane, in m; empty where nothing lies near the grid. Edges are within a thousandth of a cell of their course.</returns>
    /// <exception cref="ArgumentException">A coordinate is no number, a latitude is outside −90 to 90, or a ring is refused (see the remarks).</exception>
    public static Geometry Project(Grid grid, Geometry longitudeLatitude)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(longitudeLatitude);
        MapPlaneRings rings = new(grid);
        GridFrame frame = grid.Frame;
        Envelope extent = new(
            frame.LeftMeters,
            frame.LeftMeters + (frame.Columns * frame.CellMeters),
            frame.TopMeters - (frame.Rows * frame.CellMeters),
            frame.TopMeters);

        // Repairs may leave pieces along the limit; only those that reach the grid are kept.
        List<Geometry> parts = [.. PolygonExtracter.GetPolygons(longitudeLatitude)
            .SelectMany(part => PolygonExtracter.GetPolygons(ProjectOne(rings, (Polygon)part)))
            .Where(part => part.EnvelopeInternal.Intersects(extent))];
        return parts.Count switch
        {
            0 => GeometryFactory.Default.CreatePolygon(),
            1 => parts[0],
            _ => OverlayNGRobust.Union(parts),
        };
    }

    private static Geometry ProjectOne(MapPlaneRings rings, Polygon polygon)
    {
        Geometry area = rings.AreaOf(polygon.Shell);
        foreach (LinearRing hole in polygon.Holes)
        {
            area = OverlayNGRobust.Overlay(area, rings.AreaOf(hole), NetTopologySuite.Operation.Overlay.SpatialFunction.Difference);
        }

        return area;
    }
}
