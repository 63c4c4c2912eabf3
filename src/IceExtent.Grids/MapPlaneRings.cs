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
    private const double DiscStepDegrees = 90.0;

    private readonly IMapProjection map;
    private readonly double toleranceMeters;
    private readonly double limitDegrees;
    private readonly double sign;
    private readonly Lazy<Geometry> disc;

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
        Geometry inside = Inside(ring.Vertices);
        return ring.EnclosedPole is { } pole && pole != map.Hemisphere
            ? OverlayNGRobust.Overlay(disc.Value, inside, SpatialFunction.Difference)
            : inside;
    }

    private Geometry Inside(IReadOnlyList<GeoPosition> vertices)
    {
        if (vertices.Count < 3)
        {
            return GeometryFactory.Default.CreatePolygon();
        }

        CoordinateList course = [];
        for (int index = 0; index < vertices.Count; index++)
        {
            AddEdge(course, vertices[index], vertices[(index + 1) % vertices.Count]);
        }

        course.CloseRing();
        if (course.Count < 4)
        {
            return GeometryFactory.Default.CreatePolygon();
        }

        Polygon polygon = GeometryFactory.Default.CreatePolygon(course.ToCoordinateArray());
        return polygon.IsValid ? polygon : GeometryFixer.Fix(polygon);
    }

    // Cuts the edge where it crosses the limit, so that its course inside does not bend.
    private void AddEdge(CoordinateList course, GeoPosition from, GeoPosition to)
    {
        to = to with { LongitudeDegrees = from.LongitudeDegrees + GeographicRing.ShortWay(from, to) };
        double fromAbove = (sign * from.LatitudeDegrees) - limitDegrees;
        double toAbove = (sign * to.LatitudeDegrees) - limitDegrees;
        if (fromAbove * toAbove < 0.0)
        {
            double share = fromAbove / (fromAbove - toAbove);
            GeoPosition crossing = new(
                sign * limitDegrees, from.LongitudeDegrees + (share * (to.LongitudeDegrees - from.LongitudeDegrees)));
            AddPiece(course, Inward(from), crossing);
            AddPiece(course, crossing, Inward(to));
        }
        else
        {
            AddPiece(course, Inward(from), Inward(to));
        }
    }

    private GeoPosition Inward(GeoPosition vertex) =>
        sign * vertex.LatitudeDegrees < limitDegrees ? vertex with { LatitudeDegrees = sign * limitDegrees } : vertex;

    // Adds the start and the points between, not the end: the next edge starts there.
    private void AddPiece(CoordinateList course, GeoPosition from, GeoPosition to)
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

    private Geometry Disc()
    {
        List<GeoPosition> circle = [];
        for (double longitude = 0.0; longitude < 360.0; longitude += DiscStepDegrees)
        {
            circle.Add(new(sign * limitDegrees, longitude));
        }

        return Inside(circle);
    }
}
