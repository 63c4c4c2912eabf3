namespace IceExtent.Scenes.Emission;

/// <summary>All that decides what a cell emits.</summary>
/// <remarks>The shares of first-year and multiyear ice refer to the sea part of the cell; what they leave is open water.</remarks>
public readonly record struct CellState
{
    /// <summary>The share of the cell that is land. Range: 0 to 1.</summary>
    public double LandShare { get; init; }

    /// <summary>First-year ice (type A). Range: 0 to 1.</summary>
    public double FirstYear { get; init; }

    /// <summary>Multiyear ice (type B). Range: 0 to 1, and at most 1 with first-year ice.</summary>
    public double Multiyear { get; init; }

    /// <summary>The share of the ice that is under melt ponds. Range: 0 to 1.</summary>
    public double PondShare { get; init; }

    /// <summary>How wet the snow is. Range: 0 (dry) to 1.</summary>
    public double Wetness { get; init; }

    /// <summary>The sea, in K.</summary>
    public double SeaKelvins { get; init; }

    /// <summary>The temperature at which ice emits, in K.</summary>
    public double IceKelvins { get; init; }

    /// <summary>The temperature at which land emits, in K.</summary>
    public double LandKelvins { get; init; }

    /// <summary>The wind, in m/s.</summary>
    public double WindMetersPerSecond { get; init; }

    /// <summary>Vapor, in mm.</summary>
    public double VaporMillimeters { get; init; }

    /// <summary>Cloud liquid, in mm.</summary>
    public double CloudMillimeters { get; init; }
}
