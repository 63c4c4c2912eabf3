namespace IceExtent.Grids.Outlines;

/// <summary>Cuts lines that are straight in longitude and latitude into short pieces.</summary>
internal static class LineCourse
{
    private const double MetersPerRadian = 6_371_000.0; // Only decides how many pieces there are.

    /// <summary>The positions along a line, ends included; longitudes run on from one to the next. A point gives itself.</summary>
    /// <param name="line">The line.</param>
    /// <param name="pieceMeters">About the longest piece, in m.</param>
    public static List<GeoPosition> Cut(IReadOnlyList<GeoPosition> line, double pieceMeters)
    {
        List<GeoPosition> course = [line[0]];
        foreach (GeoPosition next in line.Skip(1))
        {
            GeoPosition from = course[^1];
            double longitudes = Math.IEEERemainder(next.LongitudeDegrees - from.LongitudeDegrees, 360.0);
            double latitudes = next.LatitudeDegrees - from.LatitudeDegrees;
            double widest = Math.Cos(double.DegreesToRadians(Math.Min(Math.Abs(from.LatitudeDegrees), Math.Abs(next.LatitudeDegrees))));
            double meters = MetersPerRadian * double.DegreesToRadians(Math.Sqrt((longitudes * longitudes * widest * widest) + (latitudes * latitudes)));
            int pieces = Math.Max(1, (int)Math.Ceiling(meters / pieceMeters));
            for (int piece = 1; piece <= pieces; piece++)
            {
                double share = (double)piece / pieces;
                course.Add(new(from.LatitudeDegrees + (share * latitudes), from.LongitudeDegrees + (share * longitudes)));
            }
        }

        return course;
    }
}
