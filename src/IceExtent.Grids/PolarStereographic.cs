namespace IceExtent.Grids;

/// <summary>The polar stereographic projection with true scale on one parallel (variant B), either pole.</summary>
/// <remarks>
/// Formulas: [Snyder1987] ch. 21, with the signs of latitude, longitude, x and y turned for the south pole.
/// The same projection is [EPSG] method 9829.
/// Departure: latitudes are counted from the pole, so that no digits cancel next to it. Accuracy: 1e-6 m against PROJ (see <c>ProjPositionTests</c>).
/// </remarks>
public sealed class PolarStereographic : IMapProjection
{
    private readonly double eccentricity;
    private readonly double sign;
    private readonly double metersPerConformalUnit;
    private readonly double poleScale;

    /// <summary>Sets the projection up.</summary>
    /// <param name="ellipsoid">The figure of the Earth.</param>
    /// <param name="trueScaleLatitudeDegrees">Degrees north; its sign chooses the pole; ±90 and 0 excluded.</param>
    /// <param name="originLongitudeDegrees">The meridian on which x is zero. Degrees east.</param>
    /// <exception cref="ArgumentOutOfRangeException">The latitude of true scale is a pole or the equator.</exception>
    public PolarStereographic(Ellipsoid ellipsoid, double trueScaleLatitudeDegrees, double originLongitudeDegrees)
    {
        ArgumentNullException.ThrowIfNull(ellipsoid);
        if (Math.Abs(trueScaleLatitudeDegrees) is not (> 0.0 and < 90.0))
        {
            throw new ArgumentOutOfRangeException(
                nameof(trueScaleLatitudeDegrees), trueScaleLatitudeDegrees, "The latitude of true scale must lie between the equator and a pole.");
        }

        Ellipsoid = ellipsoid;
        TrueScaleLatitudeDegrees = trueScaleLatitudeDegrees;
        OriginLongitudeDegrees = originLongitudeDegrees;
        eccentricity = ellipsoid.Eccentricity;
        sign = Math.Sign(trueScaleLatitudeDegrees);

        double trueScale = Colatitude(trueScaleLatitudeDegrees);
        double parallel = ParallelRadius(trueScale);
        double conformal = ConformalRadius(trueScale);
        metersPerConformalUnit = ellipsoid.SemiMajorAxisMeters * parallel / conformal; // [Snyder1987] eq. 21-34
        poleScale = 0.5 * parallel * Math.Sqrt(
            Math.Pow(1.0 + eccentricity, 1.0 + eccentricity) * Math.Pow(1.0 - eccentricity, 1.0 - eccentricity))
            / conformal;                                                               // [Snyder1987] eq. 21-35
    }

    /// <inheritdoc/>
    public Ellipsoid Ellipsoid { get; }

    /// <inheritdoc/>
    public Hemisphere Hemisphere => sign > 0 ? Hemisphere.North : Hemisphere.South;

    /// <summary>The parallel on which distances are true. Degrees north.</summary>
    public double TrueScaleLatitudeDegrees { get; }

    /// <inheritdoc/>
    public double OriginLongitudeDegrees { get; }

    /// <inheritdoc/>
    public MapPosition Forward(GeoPosition position)
    {
        double distance = metersPerConformalUnit * ConformalRadius(Colatitude(position.LatitudeDegrees));
        double angle = sign * double.DegreesToRadians(position.LongitudeDegrees - OriginLongitudeDegrees);
        return new(sign * distance * Math.Sin(angle), -sign * distance * Math.Cos(angle)); // [Snyder1987] eqs. 21-30, 21-31
    }

    /// <inheritdoc/>
    public GeoPosition Inverse(MapPosition position)
    {
        double x = sign * position.XMeters;
        double y = sign * position.YMeters;
        double distance = Math.Sqrt((x * x) + (y * y));                // [Snyder1987] eq. 20-18
        double colatitude = ColatitudeOfConformalRadius(distance / metersPerConformalUnit); // [Snyder1987] eq. 21-40
        double longitude = distance == 0.0 ? 0.0 : Math.Atan2(x, -y);  // [Snyder1987] eq. 20-16
        return new(
            sign * (90.0 - double.RadiansToDegrees(colatitude)),
            Longitudes.Normalize(OriginLongitudeDegrees + (sign * double.RadiansToDegrees(longitude))));
    }

    /// <summary>How many times longer a short line is on the map than on the ellipsoid, without unit.</summary>
    /// <param name="latitudeDegrees">Degrees north.</param>
    /// <remarks>[Snyder1987] eqs. 21-32 and, at the pole, 21-35.</remarks>
    public double ScaleFactor(double latitudeDegrees)
    {
        double colatitude = Colatitude(latitudeDegrees);
        return colatitude == 0.0
            ? poleScale
            : metersPerConformalUnit * ConformalRadius(colatitude)
                / (Ellipsoid.SemiMajorAxisMeters * ParallelRadius(colatitude));
    }

    /// <inheritdoc/>
    public double ArealScale(double latitudeDegrees)
    {
        double scale = ScaleFactor(latitudeDegrees);
        return scale * scale; // The map is conformal: both directions are stretched alike.
    }

    // In radians from the pole of the map; in degrees 90 - latitude is exact near the pole, in radians it is not.
    private double Colatitude(double latitudeDegrees) => double.DegreesToRadians(90.0 - (sign * latitudeDegrees));

    // [Snyder1987] eq. 14-15, in units of the equatorial radius.
    private double ParallelRadius(double colatitudeRadians)
    {
        double sine = eccentricity * Math.Cos(colatitudeRadians);
        return Math.Sin(colatitudeRadians) / Math.Sqrt(1.0 - (sine * sine));
    }

    // [Snyder1987] eq. 15-9.
    private double ConformalRadius(double colatitudeRadians)
    {
        double sine = eccentricity * Math.Cos(colatitudeRadians);
        return Math.Tan(0.5 * colatitudeRadians) / Math.Pow((1.0 - sine) / (1.0 + sine), 0.5 * eccentricity);
    }

    // [Snyder1987] eq. 7-9, iterated; it gains more than two digits a round.
    private double ColatitudeOfConformalRadius(double conformal)
    {
        const int MostRounds = 12;
        double colatitude = 2.0 * Math.Atan(conformal);
        for (int round = 0; round < MostRounds; round++)
        {
            double sine = eccentricity * Math.Cos(colatitude);
            double next = 2.0 * Math.Atan(conformal * Math.Pow((1.0 - sine) / (1.0 + sine), 0.5 * eccentricity));
            if (Math.Abs(next - colatitude) <= 4e-16 * next)
            {
                return next;
            }

            colatitude = next;
        }

        return colatitude;
    }
}
