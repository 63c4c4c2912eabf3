using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Utilities;
using NetTopologySuite.Operation.Valid;

namespace IceExtent.Grids.Outlines;

/// <summary>Finds what <see cref="MapPlanePolygons"/> would refuse, or repair in a way that a person may not have meant.</summary>
/// <remarks>
/// A ring is looked at with its longitudes running on from vertex to vertex, so that one across the date line or round a pole
/// is no different from others; a cut from a ring round the Earth down to the pole counts for nothing. Whether holes lie in
/// their shells and parts lie apart is not asked: a hole outside cuts nothing, and parts that overlap count once.
/// </remarks>
public static class OutlineCheck
{
    private const double SamePlaceDegrees = 1e-9;

    /// <summary>The first fault of the rings of some polygons, or null.</summary>
    /// <param name="longitudeLatitude">A polygon or a set of them; x is the longitude, y the latitude, in degrees, −90 to 90.</param>
    public static OutlineFault? FirstFault(Geometry longitudeLatitude)
    {
        ArgumentNullException.ThrowIfNull(longitudeLatitude);
        return PolygonExtracter.GetPolygons(longitudeLatitude)
            .Cast<Polygon>()
            .SelectMany(polygon => polygon.Holes.Prepend(polygon.Shell))
            .Select(FaultOf)
            .FirstOrDefault(fault => fault is not null);
    }

    private static OutlineFault? FaultOf(LinearRing written)
    {
        try
        {
            IReadOnlyList<GeoPosition> vertices = GeographicRing.Read(written).Vertices;
            int start = FirstOffPole(vertices);
            return start < 0
                ? new(OutlineFaultKind.NoArea, "a ring of less than three places", new(written.GetCoordinateN(0)?.Y ?? 0.0, written.GetCoordinateN(0)?.X ?? 0.0))
                : Crossing(Line(vertices, start));
        }
        catch (RingRefusedException refused)
        {
            return refused.Fault;
        }
    }

    private static int FirstOffPole(IReadOnlyList<GeoPosition> vertices)
    {
        for (int index = 0; index < vertices.Count; index++)
        {
            if (!GeographicRing.IsPole(vertices[index]))
            {
                return index;
            }
        }

        return -1;
    }

    private static OutlineFault? Crossing(Coordinate[] line)
    {
        Coordinate? at = new IsSimpleOp(GeometryFactory.Default.CreateLineString(line)).NonSimpleLocation;
        return at is null ? null : new(OutlineFaultKind.CrossesItself, "a ring that crosses or touches itself", new(at.Y, Longitudes.Normalize(at.X)));
    }

    // A ring round the Earth is gone round twice, so that the place where it closes is like any other.
    private static Coordinate[] Line(IReadOnlyList<GeoPosition> vertices, int start)
    {
        int edges = vertices.Count - 1;
        double turn = vertices[^1].LongitudeDegrees - vertices[0].LongitudeDegrees;
        bool roundTheEarth = Math.Abs(turn) > 180.0;
        List<GeoPosition> once = [];
        for (int step = 0; step <= edges; step++)
        {
            int index = start + step;
            GeoPosition vertex = vertices[index % edges];
            AddUnlessSame(once, vertex with { LongitudeDegrees = vertex.LongitudeDegrees + (index >= edges ? turn : 0.0) });
        }

        if (!roundTheEarth)
        {
            once[^1] = once[0]; // A rounding away from it.
            return Coordinates(once);
        }

        List<GeoPosition> whole = WithoutCuts(once);
        return Coordinates([.. whole, .. whole.Skip(1).Select(vertex => vertex with { LongitudeDegrees = vertex.LongitudeDegrees + turn })]);
    }

    // Ways down to a pole and back along the same meridian.
    private static List<GeoPosition> WithoutCuts(List<GeoPosition> vertices)
    {
        List<GeoPosition> kept = [];
        for (int index = 0; index < vertices.Count; index++)
        {
            int end = index;
            while (end < vertices.Count && GeographicRing.IsPole(vertices[end]))
            {
                end++;
            }

            if (end > index && Math.Abs(vertices[end - 1].LongitudeDegrees - vertices[index].LongitudeDegrees) < SamePlaceDegrees)
            {
                index = end; // The first and the last vertex are off the pole.
            }

            AddUnlessSame(kept, vertices[index]);
        }

        return kept;
    }

    private static void AddUnlessSame(List<GeoPosition> line, GeoPosition vertex)
    {
        if (line.Count == 0
            || Math.Abs(line[^1].LongitudeDegrees - vertex.LongitudeDegrees) > SamePlaceDegrees
            || Math.Abs(line[^1].LatitudeDegrees - vertex.LatitudeDegrees) > SamePlaceDegrees)
        {
            line.Add(vertex);
        }
    }

    private static Coordinate[] Coordinates(List<GeoPosition> vertices) =>
        [.. vertices.Select(vertex => new Coordinate(vertex.LongitudeDegrees, vertex.LatitudeDegrees))];
}
