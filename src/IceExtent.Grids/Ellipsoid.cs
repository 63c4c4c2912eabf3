namespace IceExtent.Grids;

/// <summary>A reference ellipsoid.</summary>
/// <param name="SemiMajorAxisMeters">The equatorial radius, in m.</param>
/// <param name="InverseFlattening">1/f, without unit.</param>
public sealed record Ellipsoid(double SemiMajorAxisMeters, double InverseFlattening)
{
    /// <summary>WGS 84. Source: [EPSG] ellipsoid 7030.</summary>
    public static Ellipsoid Wgs84 { get; } = new(6_378_137.0, 298.257_223_563);

    /// <summary>Hughes 1980. Source: [EPSG] ellipsoid 7058.</summary>
    public static Ellipsoid Hughes1980 { get; } = new(6_378_273.0, 298.279_411_123_064);

    /// <summary>International 1924. Source: [EPSG] ellipsoid 7022.</summary>
    public static Ellipsoid International1924 { get; } = new(6_378_388.0, 297.0);

    /// <summary>The square of the first eccentricity, without unit: f · (2 − f).</summary>
    public double SquaredEccentricity
    {
        get
        {
            double flattening = 1.0 / InverseFlattening;
            return flattening * (2.0 - flattening);
        }
    }

    /// <summary>The first eccentricity, without unit.</summary>
    public double Eccentricity => Math.Sqrt(SquaredEccentricity);

    /// <summary>The polar radius, in m.</summary>
    public double SemiMinorAxisMeters => SemiMajorAxisMeters * (1.0 - (1.0 / InverseFlattening));
}
