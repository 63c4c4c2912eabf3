namespace IceExtent.Grids;

/// <summary>The Lambert azimuthal equal-area projection centred on a pole, on the ellipsoid.</summary>
/// <remarks>
/// Formulas: [Snyder1987] ch. 24, polar aspect; the same as [EPSG] method 9820 at a pole. Every area is true.
/// Departure: they are written in the distance from the pole, so that no digits cancel next to it.
/// Accuracy: 1e-6 m against PROJ (see <c>ProjPositionTests</c>).
/// </remarks>
public sealed class PolarEqualArea : IMapProjection
{
    private readonly double eccentricity;
    private readonly double sign;

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
        double halfColatitude = Math.Sin(0.5 * double.DegreesToRadians(90.0 - (sign * position.LatitudeDegrees)));
        double distance = Ellipsoid.SemiMajorAxisMeters
            * Math.Sqrt(AuthalicDrop(2.0 * halfColatitude * halfColatitude));          // [Snyder1987] eq. 24-23
        double angle = double.DegreesToRadians(position.LongitudeDegrees - OriginLongitudeDegrees);
        return new(distance * Math.Sin(angle), -sign * distance * Math.Cos(angle));    // [Snyder1987] eqs. 21-30, 24-24
    }

    /// <inheritdoc/>
    /// <remarks>A position outside the map, which ends at the far pole, is taken to be the far pole.</remarks>
    public GeoPosition Inverse(MapPosition position)
    {
        double distance = Math.Sqrt((position.XMeters * position.XMeters) + (position.YMeters * position.YMeters));
        double ratio = distance / Ellipsoid.SemiMajorAxisMeters;
        double colatitude = 2.0 * Math.Asin(Math.Sqrt(0.5 * VersedSineOfDrop(ratio * ratio)));
        double longitude = distance == 0.0
            ? 0.0
            : Math.Atan2(position.XMeters, -sign * position.YMeters);
        return new(
            sign * (90.0 - double.RadiansToDegrees(colatitude)),
            Longitudes.Normalize(OriginLongitudeDegrees + double.RadiansToDegrees(longitude)));
    }

    /// <inheritdoc/>
    public double ArealScale(double latitudeDegrees) => 1.0;

    // How far q of [Snyder1987] eq. 3-12 lies below its value at the pole, from versed = 1 - sine of the latitude.
    // Both terms of q are subtracted in closed form; taking q(1) - q(sine) would lose all digits near the pole.
    private double AuthalicDrop(double versed)
    {
        double sine = 1.0 - versed;
        double squared = eccentricity * eccentricity;
        double product = squared * sine;
        double angular = eccentricity == 0.0
            ? versed
            : (1.0 - squared) / eccentricity * Math.Atanh(eccentricity * versed / (1.0 - product));
        return (versed * (1.0 + product) / (1.0 - (product * sine))) + angular;
    }

    // [Snyder1987] eq. 3-16 as a Newton step on the versed sine: d(drop)/d(versed) = 2 (1 − e²) / (1 − e² sine²)².
    private double VersedSineOfDrop(double drop)
    {
        const int MostRounds = 20;
        double squared = eccentricity * eccentricity;
        double versed = Math.Clamp(0.5 * drop, 0.0, 2.0);
        for (int round = 0; round < MostRounds; round++)
        {
            double sine = 1.0 - versed;
            double factor = 1.0 - (squared * sine * sine);
            double step = (drop - AuthalicDrop(versed)) * factor * factor / (2.0 * (1.0 - squared));
            versed = Math.Clamp(versed + step, 0.0, 2.0);
            if (Math.Abs(step) <= 1e-16 * versed)
            {
                break;
            }
        }

        return versed;
    }
}
