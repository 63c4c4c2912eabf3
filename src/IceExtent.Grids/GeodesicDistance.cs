namespace IceExtent.Grids;

/// <summary>The shortest way between two positions on an ellipsoid.</summary>
/// <remarks>
/// The inverse formula of [Vincenty1975], value from memory (high), checked against GeographicLib to 1 mm (see
/// <c>GeodesicDistanceReferenceTests</c>). It does not settle for places nearly opposite each other on the Earth; those are answered with half
/// the meridian, which is no nearer than 0.2 %.
/// </remarks>
public static class GeodesicDistance
{
    private const int MostSteps = 100;
    private const double Settled = 1e-13; // Radians: less than a micrometer.

    /// <summary>The distance, in m.</summary>
    /// <param name="ellipsoid">The figure of the Earth.</param>
    /// <param name="from">One place.</param>
    /// <param name="to">The other.</param>
    public static double Meters(Ellipsoid ellipsoid, GeoPosition from, GeoPosition to)
    {
        ArgumentNullException.ThrowIfNull(ellipsoid);
        double flattening = 1.0 / ellipsoid.InverseFlattening;
        double apart = double.DegreesToRadians(Math.IEEERemainder(to.LongitudeDegrees - from.LongitudeDegrees, 360.0));
        (double sineFrom, double cosineFrom) = Math.SinCos(Math.Atan((1.0 - flattening) * Math.Tan(double.DegreesToRadians(from.LatitudeDegrees))));
        (double sineTo, double cosineTo) = Math.SinCos(Math.Atan((1.0 - flattening) * Math.Tan(double.DegreesToRadians(to.LatitudeDegrees))));
        double lambda = apart;
        for (int step = 0; step < MostSteps; step++)
        {
            (double sineLambda, double cosineLambda) = Math.SinCos(lambda);
            double sineSigma = Math.Sqrt(
                Square(cosineTo * sineLambda) + Square((cosineFrom * sineTo) - (sineFrom * cosineTo * cosineLambda)));
            if (sineSigma == 0.0)
            {
                return 0.0;
            }

            double cosineSigma = (sineFrom * sineTo) + (cosineFrom * cosineTo * cosineLambda);
            double sigma = Math.Atan2(sineSigma, cosineSigma);
            double sineAlpha = cosineFrom * cosineTo * sineLambda / sineSigma;
            double squaredCosineAlpha = 1.0 - (sineAlpha * sineAlpha);
            double cosineMiddle = squaredCosineAlpha > 1e-15 ? cosineSigma - (2.0 * sineFrom * sineTo / squaredCosineAlpha) : 0.0; // 0 along the equator.
            double c = flattening / 16.0 * squaredCosineAlpha * (4.0 + (flattening * (4.0 - (3.0 * squaredCosineAlpha))));
            double next = apart + ((1.0 - c) * flattening * sineAlpha
                * (sigma + (c * sineSigma * (cosineMiddle + (c * cosineSigma * (-1.0 + (2.0 * cosineMiddle * cosineMiddle)))))));
            if (Math.Abs(next - lambda) < Settled)
            {
                return Length(ellipsoid, squaredCosineAlpha, sigma, sineSigma, cosineSigma, cosineMiddle);
            }

            lambda = next;
        }

        return Math.PI * 0.5 * (ellipsoid.SemiMajorAxisMeters + ellipsoid.SemiMinorAxisMeters);
    }

    private static double Length(Ellipsoid ellipsoid, double squaredCosineAlpha, double sigma, double sineSigma, double cosineSigma, double cosineMiddle)
    {
        double minor = ellipsoid.SemiMinorAxisMeters;
        double squaredU = squaredCosineAlpha * (Square(ellipsoid.SemiMajorAxisMeters) - Square(minor)) / Square(minor);
        double a = 1.0 + (squaredU / 16384.0 * (4096.0 + (squaredU * (-768.0 + (squaredU * (320.0 - (175.0 * squaredU)))))));
        double b = squaredU / 1024.0 * (256.0 + (squaredU * (-128.0 + (squaredU * (74.0 - (47.0 * squaredU))))));
        double twice = Square(cosineMiddle);
        double change = b * sineSigma * (cosineMiddle + (b / 4.0 * ((cosineSigma * (-1.0 + (2.0 * twice)))
            - (b / 6.0 * cosineMiddle * (-3.0 + (4.0 * Square(sineSigma))) * (-3.0 + (4.0 * twice))))));
        return minor * a * (sigma - change);
    }

    private static double Square(double number) => number * number;
}
