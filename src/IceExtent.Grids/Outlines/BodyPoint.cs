namespace IceExtent.Grids.Outlines;

/// <summary>A place in the Earth's body, in m from its middle: x to 0 and y to 90 degrees east, z north.</summary>
internal readonly record struct BodyPoint(double X, double Y, double Z)
{
    /// <summary>The distance from the middle, in m.</summary>
    public double Length => Math.Sqrt(Times(this));

    public static BodyPoint operator +(BodyPoint one, BodyPoint other) => new(one.X + other.X, one.Y + other.Y, one.Z + other.Z);

    public static BodyPoint operator -(BodyPoint one, BodyPoint other) => new(one.X - other.X, one.Y - other.Y, one.Z - other.Z);

    public static BodyPoint operator *(BodyPoint one, double factor) => new(one.X * factor, one.Y * factor, one.Z * factor);

    /// <summary>A position on the surface of an ellipsoid.</summary>
    public static BodyPoint Of(Ellipsoid ellipsoid, GeoPosition position)
    {
        (double sine, double cosine) = Math.SinCos(double.DegreesToRadians(position.LatitudeDegrees));
        (double east, double zero) = Math.SinCos(double.DegreesToRadians(position.LongitudeDegrees));
        double squaredEccentricity = ellipsoid.SquaredEccentricity;
        double normal = ellipsoid.SemiMajorAxisMeters / Math.Sqrt(1.0 - (squaredEccentricity * sine * sine));
        return new(normal * cosine * zero, normal * cosine * east, normal * (1.0 - squaredEccentricity) * sine);
    }

    /// <summary>The scalar product, in m².</summary>
    public double Times(BodyPoint other) => (X * other.X) + (Y * other.Y) + (Z * other.Z);
}
