namespace IceExtent.Grids;

/// <summary>The map of a grid as [CF] writes it on a grid-mapping variable: its name and its numbers.</summary>
/// <param name="Name">The <c>grid_mapping_name</c>, such as <c>polar_stereographic</c>.</param>
/// <param name="Numbers">
/// Every other numeric attribute by its [CF] name, in the units of [CF] (degrees, m); the first number of one that
/// has several.
/// </param>
public sealed record GridMapping(string Name, IReadOnlyDictionary<string, double> Numbers)
{
    /// <summary>The <c>grid_mapping_name</c> of <see cref="PolarStereographic"/>.</summary>
    public const string PolarStereographicName = "polar_stereographic";

    /// <summary>The <c>grid_mapping_name</c> of <see cref="PolarEqualArea"/>.</summary>
    public const string PolarEqualAreaName = "lambert_azimuthal_equal_area";

    /// <summary>The latitude of the pole in the middle of the map, degrees north.</summary>
    public const string OriginLatitude = "latitude_of_projection_origin";

    /// <summary>The meridian on which x is zero, degrees east.</summary>
    public const string OriginLongitude = "longitude_of_projection_origin";

    /// <summary>The same as <see cref="OriginLongitude"/>, under the name [CF] has for the polar stereographic map.</summary>
    public const string VerticalLongitude = "straight_vertical_longitude_from_pole";

    /// <summary>The parallel of true scale, degrees north.</summary>
    public const string StandardParallel = "standard_parallel";

    /// <summary>The scale at the pole, without unit; says the same as <see cref="StandardParallel"/>.</summary>
    public const string OriginScale = "scale_factor_at_projection_origin";

    /// <summary>x of the pole, m.</summary>
    public const string FalseEasting = "false_easting";

    /// <summary>y of the pole, m.</summary>
    public const string FalseNorthing = "false_northing";

    /// <summary>The equatorial radius, m.</summary>
    public const string SemiMajorAxis = "semi_major_axis";

    /// <summary>The polar radius, m.</summary>
    public const string SemiMinorAxis = "semi_minor_axis";

    /// <summary>1/f, without unit; 0 for a sphere.</summary>
    public const string InverseFlattening = "inverse_flattening";

    /// <summary>The radius of a sphere, m.</summary>
    public const string EarthRadius = "earth_radius";
}
