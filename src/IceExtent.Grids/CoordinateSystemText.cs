using System.Globalization;
using System.Text;

namespace IceExtent.Grids;

/// <summary>Writes the coordinate reference system of a grid the way files carry it.</summary>
/// <remarks>Checked against PROJ, which takes the text of every built-in grid for the system of its code (see <c>CoordinateSystemTextTests</c>).</remarks>
public static class CoordinateSystemText
{
    /// <summary>The attributes of a [CF] grid-mapping variable.</summary>
    /// <exception cref="ArgumentException">The grid's projection is of a kind that has no text here.</exception>
    public static GridMapping Mapping(Grid grid)
    {
        ArgumentNullException.ThrowIfNull(grid);
        IMapProjection map = grid.Projection;
        OrderedDictionary<string, double> numbers = new()
        {
            [GridMapping.OriginLatitude] = PoleLatitude(map),
        };
        string name;
        switch (map)
        {
            case PolarStereographic stereographic:
                name = GridMapping.PolarStereographicName;
                numbers[GridMapping.VerticalLongitude] = map.OriginLongitudeDegrees;
                numbers[GridMapping.StandardParallel] = stereographic.TrueScaleLatitudeDegrees;
                break;
            case PolarEqualArea:
                name = GridMapping.PolarEqualAreaName;
                numbers[GridMapping.OriginLongitude] = map.OriginLongitudeDegrees;
                break;
            default:
                throw UnknownProjection(grid);
        }

        numbers[GridMapping.FalseEasting] = 0.0;
        numbers[GridMapping.FalseNorthing] = 0.0;
        numbers[GridMapping.SemiMajorAxis] = map.Ellipsoid.SemiMajorAxisMeters;
        numbers[GridMapping.InverseFlattening] = map.Ellipsoid.InverseFlattening;
        return new(name, numbers);
    }

    /// <summary>The text of the system in WKT2:2019 [ISO19162], on one line, with its [EPSG] code where it has one.</summary>
    /// <remarks>The names inside are our own; only numbers and codes carry meaning.</remarks>
    /// <exception cref="ArgumentException">The grid's projection is of a kind that has no text here.</exception>
    public static string WellKnownText(Grid grid)
    {
        ArgumentNullException.ThrowIfNull(grid);
        IMapProjection map = grid.Projection;
        bool north = map.Hemisphere == Hemisphere.North;
        string pole = north ? "north" : "south";
        (string kind, string conversion) = map switch
        {
            PolarStereographic stereographic => ("polar stereographic", Stereographic(stereographic)),
            PolarEqualArea => ("polar equal area", EqualArea(map)),
            _ => throw UnknownProjection(grid),
        };
        (string geographicName, string geographic) = Geographic(map.Ellipsoid);

        // The axes point from the pole of a north map to the south, and the other way round; CF and EPSG agree on that.
        string direction = north ? "south" : "north";
        double right = Longitudes.Normalize(map.OriginLongitudeDegrees + 90.0);
        double up = Longitudes.Normalize(map.OriginLongitudeDegrees + (north ? 180.0 : 0.0));

        StringBuilder text = new();
        text.Append(CultureInfo.InvariantCulture, $"PROJCRS[\"{geographicName} / {kind} {pole}\",{geographic},");
        text.Append(CultureInfo.InvariantCulture, $"CONVERSION[\"{kind} {pole}\",{conversion},{Length("False easting", 8806)},{Length("False northing", 8807)}],");
        text.Append(CultureInfo.InvariantCulture, $"CS[Cartesian,2],{Axis("x", direction, right, 1)},{Axis("y", direction, up, 2)}");
        if (grid.Epsg is { } code)
        {
            text.Append(CultureInfo.InvariantCulture, $",{Identifier(code)}");
        }

        return text.Append(']').ToString();
    }

    private static string Stereographic(PolarStereographic map) =>
        $"METHOD[\"Polar Stereographic (variant B)\",{Identifier(9829)}]"
        + $",{Angle("Latitude of standard parallel", map.TrueScaleLatitudeDegrees, 8832)}"
        + $",{Angle("Longitude of origin", map.OriginLongitudeDegrees, 8833)}";

    private static string EqualArea(IMapProjection map) =>
        $"METHOD[\"Lambert Azimuthal Equal Area\",{Identifier(9820)}]"
        + $",{Angle("Latitude of natural origin", PoleLatitude(map), 8801)}"
        + $",{Angle("Longitude of natural origin", map.OriginLongitudeDegrees, 8802)}";

    // The base system: WGS 84 is [EPSG] 4326; 4054 is the one [EPSG] has for Hughes 1980, whose datum is not known.
    private static (string Name, string Text) Geographic(Ellipsoid ellipsoid)
    {
        (string name, string datum, string figure, int? code) =
            ellipsoid == Ellipsoid.Wgs84 ? ("WGS 84", "World Geodetic System 1984", "WGS 84", 4326)
            : ellipsoid == Ellipsoid.Hughes1980 ? ("Hughes 1980", "Not specified (based on Hughes 1980 ellipsoid)", "Hughes 1980", 4054)
            : ("Own ellipsoid", "Not specified", "Own ellipsoid", (int?)null);
        string identifier = code is { } known ? $",{Identifier(known)}" : string.Empty;
        return (name, string.Create(
            CultureInfo.InvariantCulture,
            $"BASEGEOGCRS[\"{name}\",DATUM[\"{datum}\",ELLIPSOID[\"{figure}\",{ellipsoid.SemiMajorAxisMeters},{ellipsoid.InverseFlattening},{Meter}]],PRIMEM[\"Greenwich\",0,{Degree}]{identifier}]"));
    }

    private const string Meter = "LENGTHUNIT[\"metre\",1]";

    private const string Degree = "ANGLEUNIT[\"degree\",0.0174532925199433]";

    private static string Identifier(int code) => string.Create(CultureInfo.InvariantCulture, $"ID[\"EPSG\",{code}]");

    private static string Angle(string name, double degrees, int code) =>
        string.Create(CultureInfo.InvariantCulture, $"PARAMETER[\"{name}\",{degrees},{Degree},{Identifier(code)}]");

    private static string Length(string name, int code) => $"PARAMETER[\"{name}\",0,{Meter},{Identifier(code)}]";

    private static string Axis(string letter, string direction, double meridian, int order) =>
        string.Create(
            CultureInfo.InvariantCulture,
            $"AXIS[\"({letter})\",{direction},MERIDIAN[{meridian},{Degree}],ORDER[{order}],{Meter}]");

    private static double PoleLatitude(IMapProjection map) => map.Hemisphere == Hemisphere.North ? 90.0 : -90.0;

    private static ArgumentException UnknownProjection(Grid grid) =>
        new($"The projection of grid {grid.Name}, {grid.Projection.GetType().Name}, has no text.", nameof(grid));
}
