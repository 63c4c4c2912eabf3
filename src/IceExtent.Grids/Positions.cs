namespace IceExtent.Grids;

/// <summary>A position on the ellipsoid.</summary>
/// <param name="LatitudeDegrees">Geodetic latitude, degrees north, −90 to 90.</param>
/// <param name="LongitudeDegrees">Longitude, degrees east, any turn.</param>
public readonly record struct GeoPosition(double LatitudeDegrees, double LongitudeDegrees);

/// <summary>A position on a map plane.</summary>
/// <param name="XMeters">To the right of the pole, in m.</param>
/// <param name="YMeters">Up from the pole, in m.</param>
public readonly record struct MapPosition(double XMeters, double YMeters);
