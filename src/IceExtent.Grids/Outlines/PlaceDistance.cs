namespace IceExtent.Grids.Outlines;

/// <summary>How far positions lie from a point or from the lines of a route.</summary>
/// <remarks>
/// Lines are cut into pieces so short that a chord through the Earth strays from them by less than a meter. The nearest place on a line is
/// looked for with chords, which are never longer than the way on the surface; the distance told is geodesic.
/// </remarks>
internal sealed class PlaceDistance
{
    private const double PieceMeters = 5_000.0;

    private readonly Ellipsoid ellipsoid;
    private readonly List<Piece> pieces = [];
    private readonly BodyPoint middle;
    private readonly double reachOfMiddle; // From the middle to the farthest end of a piece.

    public PlaceDistance(Ellipsoid ellipsoid, PlaceOutline place)
    {
        this.ellipsoid = ellipsoid;
        foreach (IReadOnlyList<GeoPosition> line in place.Lines)
        {
            List<GeoPosition> course = LineCourse.Cut(line, PieceMeters);
            for (int end = 1; end < course.Count; end++)
            {
                pieces.Add(new(course[end - 1], course[end], BodyPoint.Of(ellipsoid, course[end - 1]), BodyPoint.Of(ellipsoid, course[end])));
            }

            if (course.Count == 1)
            {
                pieces.Add(new(course[0], course[0], BodyPoint.Of(ellipsoid, course[0]), BodyPoint.Of(ellipsoid, course[0])));
            }
        }

        middle = pieces.Aggregate(default(BodyPoint), (sum, piece) => sum + piece.Start + piece.End) * (0.5 / pieces.Count);
        reachOfMiddle = pieces.Max(piece => Math.Max((piece.Start - middle).Length, (piece.End - middle).Length));
    }

    /// <summary>The geodesic distance, in m, or null where the chord is longer than a limit.</summary>
    /// <param name="position">The position.</param>
    /// <param name="point">The same in the Earth's body.</param>
    /// <param name="limitMeters">The limit, in m.</param>
    public double? Within(GeoPosition position, BodyPoint point, double limitMeters)
    {
        if ((point - middle).Length > reachOfMiddle + limitMeters)
        {
            return null;
        }

        (double nearest, double share, Piece? on) = (double.PositiveInfinity, 0.0, null);
        foreach (Piece piece in pieces)
        {
            (double distance, double along) = piece.ChordFrom(point);
            if (distance < nearest)
            {
                (nearest, share, on) = (distance, along, piece);
            }
        }

        return nearest > limitMeters ? null : GeodesicDistance.Meters(ellipsoid, position, on!.At(share));
    }

    private sealed record Piece(GeoPosition From, GeoPosition To, BodyPoint Start, BodyPoint End)
    {
        public (double Distance, double Share) ChordFrom(BodyPoint point)
        {
            BodyPoint along = End - Start;
            double squared = along.Times(along);
            double share = squared > 0.0 ? Math.Clamp((point - Start).Times(along) / squared, 0.0, 1.0) : 0.0;
            return ((point - (Start + (along * share))).Length, share);
        }

        public GeoPosition At(double share) => new(
            From.LatitudeDegrees + (share * (To.LatitudeDegrees - From.LatitudeDegrees)),
            From.LongitudeDegrees + (share * (To.LongitudeDegrees - From.LongitudeDegrees)));
    }
}
