using NetTopologySuite.Geometries;
using NetTopologySuite.Geometries.Utilities;
using NetTopologySuite.Operation.Overlay;
using NetTopologySuite.Operation.OverlayNG;

namespace IceExtent.Grids;

/// <summary>Draws rings on the map plane of one grid.</summary>
internal sealed class MapPlaneRings
{
    private const double CourseShare = 0.001;
    private const double MarginCells = 2.0;

    private readonly IMapProjection map;
    private readonly double toleranceMeters;
    private readonly double limitDegrees;
    private readonly double sign;
    private readonly Lazy<Geometry> disc;

    private static readonly Polygon Nothing = GeometryFactory.Default.CreatePolygon();

    public MapPlaneRings(Grid grid)
    {
        GridFrame frame = grid.Frame;
        map = grid.Projection;
        sign = map.Hemisphere == Hemisphere.North ? 1.0 : -1.0;
        toleranceMeters = CourseShare * frame.CellMeters;
        double x = Math.Max(Math.Abs(frame.LeftMeters), Math.Abs(frame.LeftMeters + (frame.Columns * frame.CellMeters)));
        double y = Math.Max(Math.Abs(frame.TopMeters), Math.Abs(frame.TopMeters - (frame.Rows * frame.CellMeters)));
        double reach = Math.Sqrt((x * x) + (y * y)) + (MarginCells * frame.CellMeters);
        limitDegrees = sign * map.Inverse(new(reach, 0.0)).LatitudeDegrees;
        disc = new(Disc);
    }

    /// <summary>The area inside a ring, or the rest of the neighbourhood for a ring round the other pole.</summary>
    public Geometry AreaOf(LinearRing written)
    {
        GeographicRing ring = GeographicRing.Read(written);
        List<GeoPosition> kept = Kept(ring.Vertices);
        bool otherPole = ring.EnclosedPole is { } pole && pole != map.Hemisphere;
        if (kept.Count == 0)
        {
            return ring.EnclosedPole == map.Hemisphere ? disc.Value : Nothing;
        }

        Geometry inside = Inside(kept);
        return otherPole ? OverlayNGRobust.Overlay(disc.Value, inside, SpatialFunction.Difference) : inside;
    }

    // Leaves out the vertices beyond the limit and puts in the places where edges cross it, so that what lies beyond
    // shrinks to an arc along it. Longitudes still run on, so the arc goes the way the ring went.
    private List<GeoPosition> Kept(IReadOnlyList<GeoPosition> vertices)
    {
        List<GeoPosition> kept = new(vertices.Count);
        for (int index = 0; index < vertices.Count; index++)
        {
            GeoPosition vertex = vertices[index];
            double above = (sign * vertex.LatitudeDegrees) - limitDegrees;
            if (index > 0)
            {
                GeoPosition before = vertices[index - 1];
                double aboveBefore = (sign * before.LatitudeDegrees) - limitDegrees;
                if (above * aboveBefore < 0.0)
                {
                    double share = aboveBefore / (aboveBefore - above);
                    kept.Add(new(
                        sign * limitDegrees,
                        before.LongitudeDegrees + (share * (vertex.LongitudeDegrees - before.LongitudeDegrees))));
                }
            }

            if (above >= 0.0)
            {
                kept.Add(vertex);
            }
        }

        if (kept.Count > 0)
        {
            double turns = vertices[^1].LongitudeDegrees - vertices[0].LongitudeDegrees;
            kept.Add(kept[0] with { LongitudeDegrees = kept[0].LongitudeDegrees + turns });
        }

        return kept;
    }

    private Geometry Inside(List<GeoPosition> vertices)
    {
        CoordinateList course = [];
        for (int index = 1; index < vertices.Count; index++)
        {
            AddEdge(course, vertices[index - 1], vertices[index]);
        }

        course.CloseRing();
        if (course.Count < 4)
        {
            return Nothing;
        }

        Polygon polygon = GeometryFactory.Default.CreatePolygon(course.ToCoordinateArray());
        return polygon.IsValid ? polygon : GeometryFixer.Fix(polygon);
    }

    // Adds the start and the points between, not the end: the next edge starts there.
    private void AddEdge(CoordinateList course, GeoPosition from, GeoPosition to)
    {
        double longitudes = to.LongitudeDegrees - from.LongitudeDegrees;
        double latitudes = to.LatitudeDegrees - from.LatitudeDegrees;
        int pieces = Pieces(from, to);
        for (int piece = 0; piece < pieces; piece++)
        {
            double share = (double)piece / pieces;
            course.Add(Place(from.LatitudeDegrees + (share * latitudes), from.LongitudeDegrees + (share * longitudes)), false);
        }
    }

    // A chord of a smooth curve strays at most an eighth of the second derivative. With r the distance from the pole
    // and a the angle, that is r a'² across and 2 r' a' along; r'' is at most about r times the squared change of
    // latitude, and r' at most about twice the mean, on either map within the reach of a grid.
    private int Pieces(GeoPosition from, GeoPosition to)
    {
        double angle = double.DegreesToRadians(Math.Abs(to.LongitudeDegrees - from.LongitudeDegrees));
        if (angle == 0.0)
        {
            return 1; // A meridian is straight on a polar map.
        }

        double latitude = double.DegreesToRadians(to.LatitudeDegrees - from.LatitudeDegrees);
        double start = DistanceFromPole(from.LatitudeDegrees);
        double end = DistanceFromPole(to.LatitudeDegrees);
        double bend = (Math.Max(start, end) * ((angle * angle) + (latitude * latitude)))
            + (4.0 * Math.Abs(end - start) * angle);
        return Math.Max(1, (int)Math.Ceiling(Math.Sqrt(bend / (8.0 * toleranceMeters))));
    }

    private double DistanceFromPole(double latitudeDegrees) =>
        Math.Abs(map.Forward(new(latitudeDegrees, map.OriginLongitudeDegrees)).YMeters);

    // One turn for every longitude, so that the two sides of a cut fall on the same points.
    private Coordinate Place(double latitudeDegrees, double longitudeDegrees)
    {
        MapPosition position = map.Forward(new(latitudeDegrees, Longitudes.Normalize(longitudeDegrees)));
        return new(position.XMeters, position.YMeters);
    }

    private Geometry Disc() => Inside([new(sign * limitDegrees, -180.0), new(sign * limitDegrees, 180.0)]);
}
