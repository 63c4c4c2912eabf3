using IceExtent.Retrieval;

namespace IceExtent.Scenes.Parameters;

/// <summary>How the surfaces emit.</summary>
public sealed record SurfaceParameters
{
    /// <summary>The state at which the pure surfaces give exactly the sensor's tie points.</summary>
    public required ReferenceState Reference { get; init; }

    /// <summary>Salt in the sea, in parts per thousand.</summary>
    public required double SalinityPerMille { get; init; }

    /// <summary>The share of the air in the temperature at which ice emits; the rest is the freezing water below. Unit: 1.</summary>
    public required double AirShareInIce { get; init; }

    /// <summary>Open water in the channels that tie points do not give.</summary>
    public required SurfaceDifferences OpenWater { get; init; }

    /// <summary>First-year ice (type A) in the channels that tie points do not give.</summary>
    public required SurfaceDifferences FirstYear { get; init; }

    /// <summary>Multiyear ice (type B) in the channels that tie points do not give.</summary>
    public required SurfaceDifferences Multiyear { get; init; }

    /// <summary>The emissivity of ice under wet snow, by channel. Unit: 1.</summary>
    public required IReadOnlyDictionary<Channel, double> WetIceEmissivity { get; init; }

    /// <summary>Snow is dry below this air temperature, in K.</summary>
    public required double WetFromKelvins { get; init; }

    /// <summary>Snow is wet above this air temperature, in K.</summary>
    public required double WetToKelvins { get; init; }

    /// <summary>The largest share of the ice under melt ponds, which emit like open water. Unit: 1.</summary>
    public required double HighestPondShare { get; init; }

    /// <summary>The emissivity of land, by channel. Unit: 1.</summary>
    public required IReadOnlyDictionary<Channel, double> LandEmissivity { get; init; }
}

/// <summary>The state at which the pure surfaces give exactly the sensor's tie points.</summary>
public sealed record ReferenceState
{
    /// <summary>The sea, in K.</summary>
    public required double SeaKelvins { get; init; }

    /// <summary>The temperature at which ice emits, in K.</summary>
    public required double IceKelvins { get; init; }

    /// <summary>The wind, in m/s.</summary>
    public required double WindMetersPerSecond { get; init; }

    /// <summary>Vapor, in mm.</summary>
    public required double VaporMillimeters { get; init; }

    /// <summary>Cloud liquid, in mm.</summary>
    public required double CloudMillimeters { get; init; }
}

/// <summary>A pure surface in the channels that tie points do not give, as differences from those they do give.</summary>
/// <remarks>Differences, so that one table serves sensors whose tie points are shifted against each other.</remarks>
public sealed record SurfaceDifferences
{
    /// <summary>22 GHz vertical less 19 GHz vertical, in K.</summary>
    public required double V22AboveV19Kelvins { get; init; }

    /// <summary>37 GHz horizontal less 37 GHz vertical, in K.</summary>
    public required double H37AboveV37Kelvins { get; init; }
}
