using System.Globalization;
using IceExtent.Grids;
using IceExtent.Storage.Faults;

namespace IceExtent.Storage.Reading.Outlines;

/// <summary>What numbers of places may be.</summary>
internal static class PlaceRules
{
    private const double LeastKilometers = 1.0;
    private const double MostKilometers = 500.0;
    private const double MostEdgeDegrees = 90.0;

    /// <summary>The fault of a position, or null.</summary>
    public static Fault? FaultOf(GeoPosition position, string where)
    {
        (double latitude, double longitude) = position;
        return Math.Abs(latitude) <= 90.0 && Math.Abs(longitude) <= 360.0
            ? null
            : new(
                "IE1506",
                where,
                string.Create(CultureInfo.InvariantCulture, $"longitude {longitude}, latitude {latitude}"),
                "longitudes from -360 to 360 and latitudes from -90 to 90 degrees",
                Math.Abs(longitude) <= 90.0 && Math.Abs(latitude) <= 360.0 ? "Latitude and longitude seem to be exchanged." : "Give the position in degrees.");
    }

    /// <summary>The fault of a radius or reach in km, or null.</summary>
    public static Fault? FaultOfReach(double kilometers, string where, string key) => kilometers is >= LeastKilometers and <= MostKilometers
        ? null
        : new(
            "IE1513",
            where,
            string.Create(CultureInfo.InvariantCulture, $"{key} = {kilometers}"),
            string.Create(CultureInfo.InvariantCulture, $"{LeastKilometers} to {MostKilometers} km"),
            "Change the distance.");

    /// <summary>The first edge of a line that leaves open which way it goes, or null.</summary>
    public static Fault? FaultOfEdges(IReadOnlyList<GeoPosition> line, string where)
    {
        for (int end = 1; end < line.Count; end++)
        {
            double degrees = Math.Abs(Math.IEEERemainder(line[end].LongitudeDegrees - line[end - 1].LongitudeDegrees, 360.0));
            if (degrees > MostEdgeDegrees)
            {
                return new(
                    "IE1508",
                    where,
                    string.Create(CultureInfo.InvariantCulture, $"an edge of {degrees} degrees of longitude after it at longitude {line[end - 1].LongitudeDegrees}, latitude {line[end - 1].LatitudeDegrees}"),
                    "edges of at most 90 degrees of longitude",
                    "Put more vertices into the edge: they say which way round the Earth it goes.");
            }
        }

        return null;
    }
}
