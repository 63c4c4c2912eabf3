using System.Globalization;
using IceExtent.Grids.Outlines;
using NetTopologySuite.Geometries;

namespace IceExtent.Grids;

/// <summary>A closed ring in longitude and latitude, read as <see cref="MapPlanePolygons"/> says.</summary>
internal sealed class GeographicRing
{
    private const double MostEdgeDegrees = 90.0;
    private const double PoleDegrees = 90.0 - 1e-9;

    private GeographicRing(IReadOnlyList<GeoPosition> vertices, Hemisphere? enclosedPole) =>
        (Vertices, EnclosedPole) = (vertices, enclosedPole);

    /// <summary>
    /// The vertices, with the first one again at the end. Longitudes run on from vertex to vertex without a jump, so
    /// that the last is whole turns away from the first; between neighbours longitude and latitude change evenly.
    /// Empty for a ring of less than three places.
    /// </summary>
    public IReadOnlyList<GeoPosition> Vertices { get; }

    /// <summary>The pole inside a ring that goes round the Earth; null for all others.</summary>
    public Hemisphere? EnclosedPole { get; }

    /// <summary>Reads a ring.</summary>
    /// <exception cref="ArgumentException">See <see cref="MapPlanePolygons"/>.</exception>
    public static GeographicRing Read(LinearRing ring)
    {
        List<GeoPosition> written = WithoutRepeats(ring.CoordinateSequence);
        List<GeoPosition> meridional = WithMeridiansToPoles(written);
        if (meridional.Count < 3)
        {
            return new([], null);
        }

        List<GeoPosition> vertices = new(meridional.Count + 1) { meridional[0] };
        bool wholeTurns = false;
        for (int index = 1; index <= meridional.Count; index++)
        {
            GeoPosition from = meridional[index - 1];
            GeoPosition to = meridional[index % meridional.Count];
            double step = ShortWay(from, to);
            wholeTurns |= Math.Abs(to.LongitudeDegrees - from.LongitudeDegrees) - Math.Abs(step) > 359.0;
            vertices.Add(to with { LongitudeDegrees = vertices[^1].LongitudeDegrees + step });
        }

        bool roundTheEarth = Math.Abs(vertices[^1].LongitudeDegrees - vertices[0].LongitudeDegrees) > 180.0;
        if (wholeTurns && !roundTheEarth && PlanarArea(vertices) < 1e-12 && !vertices.TrueForAll(IsPole))
        {
            throw new RingRefusedException(new(OutlineFaultKind.UnclearEdge, "edges that span a whole turn and come back on themselves", vertices[0]));
        }

        return new(vertices, roundTheEarth ? PoleInside(vertices) : null);
    }

    // The change of longitude from one vertex to the next, −180 to 180 degrees.
    private static double ShortWay(GeoPosition from, GeoPosition to)
    {
        double step = Math.IEEERemainder(to.LongitudeDegrees - from.LongitudeDegrees, 360.0);
        return Math.Abs(step) <= MostEdgeDegrees + 1e-9 || (IsPole(from) && IsPole(to))
            ? step
            : throw new RingRefusedException(new(
                OutlineFaultKind.UnclearEdge, string.Create(CultureInfo.InvariantCulture, $"an edge of {Math.Abs(step)} degrees of longitude after it"), from));
    }

    private static Hemisphere PoleInside(List<GeoPosition> vertices)
    {
        int pole = vertices.FindIndex(IsPole);
        double latitude = pole >= 0 ? vertices[pole].LatitudeDegrees : vertices.Skip(1).Average(vertex => vertex.LatitudeDegrees);
        return latitude >= 0.0 ? Hemisphere.North : Hemisphere.South;
    }

    /// <summary>Whether a vertex is at a pole.</summary>
    public static bool IsPole(GeoPosition vertex) => Math.Abs(vertex.LatitudeDegrees) >= PoleDegrees;

    private static List<GeoPosition> WithoutRepeats(CoordinateSequence points)
    {
        List<GeoPosition> vertices = new(points.Count);
        for (int point = 0; point < points.Count; point++)
        {
            GeoPosition vertex = new(points.GetY(point), points.GetX(point));
            if (!double.IsFinite(vertex.LongitudeDegrees) || !(Math.Abs(vertex.LatitudeDegrees) <= 90.0))
            {
                throw NoPosition(vertex);
            }

            if (vertices.Count == 0 || vertices[^1] != vertex)
            {
                vertices.Add(vertex);
            }
        }

        while (vertices.Count > 1 && vertices[^1] == vertices[0])
        {
            vertices.RemoveAt(vertices.Count - 1);
        }

        return vertices;
    }

    // At a pole every longitude is the same place: an edge that ends there keeps the longitude of its other end.
    private static List<GeoPosition> WithMeridiansToPoles(List<GeoPosition> written)
    {
        List<GeoPosition> vertices = new(written.Count + 4);
        for (int index = 0; index < written.Count; index++)
        {
            GeoPosition vertex = written[index];
            if (!IsPole(vertex))
            {
                vertices.Add(vertex);
                continue;
            }

            GeoPosition before = written[(index + written.Count - 1) % written.Count];
            GeoPosition after = written[(index + 1) % written.Count];
            if (!IsPole(before))
            {
                vertices.Add(vertex with { LongitudeDegrees = before.LongitudeDegrees });
            }

            if (IsPole(before) || IsPole(after))
            {
                vertices.Add(vertex); // In a run along the pole the longitudes say which way it goes.
            }

            if (!IsPole(after))
            {
                vertices.Add(vertex with { LongitudeDegrees = after.LongitudeDegrees });
            }
        }

        return vertices;
    }

    private static double PlanarArea(List<GeoPosition> vertices)
    {
        double twice = 0.0;
        for (int index = 1; index < vertices.Count; index++)
        {
            (double fromLatitude, double fromLongitude) = vertices[index - 1];
            (double toLatitude, double toLongitude) = vertices[index];
            twice += (fromLongitude * toLatitude) - (toLongitude * fromLatitude);
        }

        return 0.5 * Math.Abs(twice);
    }

    private static ArgumentException NoPosition(GeoPosition vertex) => new(string.Create(
        CultureInfo.InvariantCulture,
        $"The ring is no ring on the Earth (at longitude {vertex.LongitudeDegrees}, latitude {vertex.LatitudeDegrees})."));
}
