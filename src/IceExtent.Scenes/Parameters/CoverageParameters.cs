namespace IceExtent.Scenes.Parameters;

/// <summary>What is not observed, beyond the sensor's polar gap.</summary>
public sealed record CoverageParameters
{
    /// <summary>The width of the swath, in km; where swaths do not meet, cells are missing. 0 leaves no gaps.</summary>
    public required double SwathKilometers { get; init; }

    /// <summary>Orbits a day.</summary>
    public required double OrbitsPerDay { get; init; }

    /// <summary>The angle between the orbit and the equator, in degrees.</summary>
    public required double InclinationDegrees { get; init; }

    /// <summary>1 observes every day, 2 every other day, and so on.</summary>
    public required int DayStep { get; init; }

    /// <summary>The share of days that are missing altogether, one to three at a time. Unit: 1, below 0.5.</summary>
    public required double MissingDayShare { get; init; }

    /// <summary>The share of days on which a piece of one pass is lost. Unit: 1.</summary>
    public required double LostPassDayShare { get; init; }

    /// <summary>The length of a lost piece along the track, in km.</summary>
    public required double LostPassKilometers { get; init; }

    /// <summary>The share of cells that are lost one by one. Unit: 1.</summary>
    public required double LostCellShare { get; init; }

    /// <summary>Long gaps. May be empty.</summary>
    public required IReadOnlyList<Outage> Outages { get; init; }
}

/// <summary>A gap of whole days.</summary>
public sealed record Outage
{
    /// <summary>The first missing day.</summary>
    public required DateOnly FirstDay { get; init; }

    /// <summary>The last missing day.</summary>
    public required DateOnly LastDay { get; init; }
}
