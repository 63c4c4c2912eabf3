namespace IceExtent.Grids;

/// <summary>The Lambert azimuthal equal-area projection centred on a pole, on the ellipsoid.</summary>
/// <remarks>
/// Formulas: [Snyder1987] ch. 24, polar aspect; the same as [EPSG] method 9820 at a pole. Every area is true.
/// Accuracy: 1e-6 m against PROJ (see <c>ProjPositionTests</c>).
/// </remarks>
public sealed class PolarEqualArea : IMapProjection
{
    private readonly double eccentricity;
    private readonly double sign;
    private readonly double poleAuthalic;

    /// <summary>Sets the projection up.</summary>
    /// <param name="ellipsoid">The figure of the Earth.</param>
    /// <param name="hemisphere">The pole at the origin.</param>
    /// <param name="originLongitudeDegrees">The meridian on which x is zero. Degrees east.</param>
    public PolarEqualArea(Ellipsoid ellipsoid, Hemisphere hemisphere, double originLongitudeDegrees)
    {
        ArgumentNullException.ThrowIfNull(ellipsoid);
        Ellipsoid = ellipsoid;
        Hemisphere = hemisphere;
        OriginLongitudeDegrees = originLongitudeDegrees;
        eccentricity = ellipsoid.Eccentricity;
        sign = hemisphere == Hemisphere.North ? 1.0 : -1.0;
        poleAuthalic = Authalic(1.0);
    }

    /// <inheritdoc/>
    public Ellipsoid Ellipsoid { get; }

    /// <inheritdoc/>
    public Hemisphere Hemisphere { get; }

    /// <inheritdoc/>
    public double OriginLongitudeDegrees { get; }

    /// <inheritdoc/>
    public MapPosition Forward(GeoPosition position)
    {
        double sine = sign * Math.Sin(double.DegreesToRadians(position.LatitudeDegrees));
        double distance = Ellipsoid.SemiMajorAxisMeters
            * Math.Sqrt(Math.Max(0.0, poleAuthalic - Authalic(sine)));                 // [Snyder1987] eq. 24-23
        double angle = double.DegreesToRadians(position.LongitudeDegrees - OriginLongitudeDegrees);
        return new(distance * Math.Sin(angle), -sign * distance * Math.Cos(angle));    // [Snyder1987] eqs. 21-30, 24-24
    }

    /// <inheritdoc/>
    public GeoPosition Inverse(MapPosition position)
    {
        double distance = Math.Sqrt((position.XMeters * position.XMeters) + (position.YMeters * position.YMeters));
        double ratio = distance / Ellipsoid.SemiMajorAxisMeters;
        double latitude = LatitudeOfAuthalic(poleAuthalic - (ratio * ratio));
        double longitude = distance == 0.0
            ? 0.0
            : Math.Atan2(position.XMeters, -sign * position.YMeters);
        return new(
            sign * double.RadiansToDegrees(latitude),
            Longitudes.Normalize(OriginLongitudeDegrees + double.RadiansToDegrees(longitude)));
    }

    /// <inheritdoc/>
    public double ArealScale(double latitudeDegrees) => 1.0;

    // q of [Snyder1987] eq. 3-12, as a function of the sine of the latitude.
    private double Authalic(double sine)
    {
        double product = eccentricity * sine;
        return (1.0 - (eccentricity * eccentricity)) * (
            (sine / (1.0 - (product * product)))
            - (Math.Log((1.0 - product) / (1.0 + product)) / (2.0 * eccentricity)));
    }

    // [Snyder1987] eq. 3-16, iterated on the sine, where it stays regular at the pole:
    // dq/d(sine) = 2 (1 − e²) / (1 − e² sine²)².
    private double LatitudeOfAuthalic(double authalic)
    {
        const int MostRounds = 20;
        double sine = Math.Clamp(authalic / 2.0, -1.0, 1.0);
        double squared = eccentricity * eccentricity;
        for (int round = 0; round < MostRounds; round++)
        {
            double factor = 1.0 - (squared * sine * sine);
            double step = (authalic - Authalic(sine)) * factor * factor / (2.0 * (1.0 - squared));
            sine = Math.Clamp(sine + step, -1.0, 1.0);
            if (Math.Abs(step) < 1e-16)
            {
                break;
            }
        }

        return Math.Asin(sine);
    }
}
