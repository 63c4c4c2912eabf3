using IceExtent.Grids;

namespace IceExtent.Storage.Writing;

/// <summary>The [CF] grid-mapping attributes of a map projection.</summary>
internal static class GridMapping
{
    /// <summary>The attributes in the order they are written; a value is a text or a double.</summary>
    /// <param name="grid">The grid whose map is described.</param>
    /// <remarks>Source: [CF] appendix F. Angles in degrees, lengths in m.</remarks>
    /// <exception cref="ArgumentException">The projection has no grid mapping here.</exception>
    public static IReadOnlyList<KeyValuePair<string, object>> AttributesOf(Grid grid)
    {
        ArgumentNullException.ThrowIfNull(grid);
        List<KeyValuePair<string, object>> attributes = grid.Projection switch
        {
            PolarStereographic map =>
            [
                new("grid_mapping_name", "polar_stereographic"),
                new("straight_vertical_longitude_from_pole", map.OriginLongitudeDegrees),
                new("latitude_of_projection_origin", Pole(map)),
                new("standard_parallel", map.TrueScaleLatitudeDegrees),
            ],
            PolarEqualArea map =>
            [
                new("grid_mapping_name", "lambert_azimuthal_equal_area"),
                new("longitude_of_projection_origin", map.OriginLongitudeDegrees),
                new("latitude_of_projection_origin", Pole(map)),
            ],
            _ => throw new ArgumentException($"A {grid.Projection.GetType().Name} has no grid mapping.", nameof(grid)),
        };
        attributes.Add(new("false_easting", 0.0));
        attributes.Add(new("false_northing", 0.0));
        attributes.Add(new("semi_major_axis", grid.Projection.Ellipsoid.SemiMajorAxisMeters));
        attributes.Add(new("inverse_flattening", grid.Projection.Ellipsoid.InverseFlattening));
        attributes.Add(new("longitude_of_prime_meridian", 0.0));
        return attributes;
    }

    private static double Pole(IMapProjection map) => map.Hemisphere == Hemisphere.North ? 90.0 : -90.0;
}
