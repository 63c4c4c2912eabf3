namespace IceExtent.Scenes.Parameters;

/// <summary>Sea, air, wind, vapor and cloud.</summary>
public sealed record WeatherParameters
{
    /// <summary>The sea at the ice edge and under ice, in K.</summary>
    public required double FreezingKelvins { get; init; }

    /// <summary>How fast the sea warms away from the edge at the maximum, in K per degree of latitude.</summary>
    public required double WinterSeaWarmingKelvinsPerDegree { get; init; }

    /// <summary>How fast the sea warms away from the edge at the minimum, in K per degree of latitude.</summary>
    public required double SummerSeaWarmingKelvinsPerDegree { get; init; }

    /// <summary>The sea is never warmer, in K.</summary>
    public required double WarmestSeaKelvins { get; init; }

    /// <summary>The yearly mean of the air at the pole, in K.</summary>
    public required double PoleAirKelvins { get; init; }

    /// <summary>Half the yearly swing of the air at the pole, in K.</summary>
    public required double PoleAirSwingKelvins { get; init; }

    /// <summary>The yearly mean of the air at 60 degrees of latitude, in K.</summary>
    public required double SixtyAirKelvins { get; init; }

    /// <summary>Half the yearly swing of the air at 60 degrees of latitude, in K.</summary>
    public required double SixtyAirSwingKelvins { get; init; }

    /// <summary>The day of year on which the air is coldest, 1 to 365.</summary>
    public required int ColdestDayOfYear { get; init; }

    /// <summary>How much the weather moves the air's temperature in winter: standard deviation, in K. Half of it in summer.</summary>
    public required double AirSpreadKelvins { get; init; }

    /// <summary>Mild and cold spells of some weeks: standard deviation of the air's temperature, in K.</summary>
    public required double SpellSpreadKelvins { get; init; }

    /// <summary>The air over ice is never warmer, in K.</summary>
    public required double WarmestAirOverIceKelvins { get; init; }

    /// <summary>The lattice spacing of weather, in km.</summary>
    public required double NodeKilometers { get; init; }

    /// <summary>How long weather lasts, in days.</summary>
    public required double LifeDays { get; init; }

    /// <summary>How far weather travels, in km a day.</summary>
    public required double DriftKilometersPerDay { get; init; }

    /// <summary>Vapor over air at 273.15 K, in mm.</summary>
    public required double VaporMillimetersAtMelting { get; init; }

    /// <summary>How vapor grows with the air's temperature: change of its logarithm, in 1/K.</summary>
    public required double VaporGrowthPerKelvin { get; init; }

    /// <summary>How much weather moves vapor: standard deviation of its logarithm. Unit: 1.</summary>
    public required double VaporLogSpread { get; init; }

    /// <summary>The median wind over water at the coldest time, in m/s.</summary>
    public required double WinterWindMetersPerSecond { get; init; }

    /// <summary>The median wind over water at the warmest time, in m/s.</summary>
    public required double SummerWindMetersPerSecond { get; init; }

    /// <summary>How much weather moves the wind: standard deviation of its logarithm. Unit: 1.</summary>
    public required double WindLogSpread { get; init; }

    /// <summary>Cloud liquid one standard deviation above a clear sky over water, in mm; over full ice half of it.</summary>
    public required double CloudMillimeters { get; init; }

    /// <summary>The weather is clear below this many standard deviations of the cloud field. Unit: 1.</summary>
    public required double CloudThreshold { get; init; }

    /// <summary>Travelling storms.</summary>
    public required StormParameters Storms { get; init; }
}

/// <summary>Travelling storms: where they are born, how they move and what they bring.</summary>
public sealed record StormParameters
{
    /// <summary>How many are born a day round the whole hemisphere, 0 to 20.</summary>
    public required int BirthsPerDay { get; init; }

    /// <summary>Where they are born: the latitude farthest from the pole, in degrees, positive in the south too.</summary>
    public required double OuterLatitudeDegrees { get; init; }

    /// <summary>Where they are born: the latitude nearest the pole, in degrees, positive in the south too.</summary>
    public required double InnerLatitudeDegrees { get; init; }

    /// <summary>The longest life, in days; the shortest is half of it.</summary>
    public required double LongestLifeDays { get; init; }

    /// <summary>How far they travel, eastward and a quarter of it towards the pole, in km a day.</summary>
    public required double TravelKilometersPerDay { get; init; }

    /// <summary>The distance of the strongest wind from the middle, in km.</summary>
    public required double RadiusKilometers { get; init; }

    /// <summary>The strongest wind that the strongest storm adds, in m/s.</summary>
    public required double WindMetersPerSecond { get; init; }

    /// <summary>What the strongest storm adds to the logarithm of vapor in its warm sector. Unit: 1.</summary>
    public required double VaporLogGain { get; init; }

    /// <summary>Cloud liquid in the fronts of the strongest storm, in mm.</summary>
    public required double CloudMillimeters { get; init; }

    /// <summary>How much warmer the air is in the warm sector of the strongest storm, in K.</summary>
    public required double WarmingKelvins { get; init; }
}
