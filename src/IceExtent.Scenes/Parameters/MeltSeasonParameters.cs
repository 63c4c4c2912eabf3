using IceExtent.Retrieval;

namespace IceExtent.Scenes.Parameters;

/// <summary>A melt season with a day of its own in every cell, in place of one that comes and goes with the weather.</summary>
public sealed record MeltSeasonParameters
{
    /// <summary>Whether the season is imposed. Where it is not, the weather of the day decides, and nothing else here counts.</summary>
    public required bool Imposed { get; init; }

    /// <summary>The usual day of year on which ice turns wet at 60 degrees of latitude, 1 to 365.</summary>
    public required int OnsetDayOfYear { get; init; }

    /// <summary>How much later for each degree towards the pole, in days.</summary>
    public required double OnsetDaysPerDegree { get; init; }

    /// <summary>The usual day of year on which it is dry again at 60 degrees of latitude, 1 to 365; before the onset: in the next year.</summary>
    public required int FreezeDayOfYear { get; init; }

    /// <summary>How much later for each degree towards the pole, in days; below 0 where it is sooner.</summary>
    public required double FreezeDaysPerDegree { get; init; }

    /// <summary>How much either day varies from place to place and year to year: standard deviation, in days.</summary>
    public required double SpreadDays { get; init; }

    /// <summary>The lattice spacing of that variation, in km.</summary>
    public required double NodeKilometers { get; init; }

    /// <summary>How long ice takes from dry to wet and back, in days. The days above are the middle.</summary>
    public required double TurnDays { get; init; }

    /// <summary>How wet mild weather makes dry ice outside the season, 0 to 0.45. Unit: 1.</summary>
    public required double EarlyMeltShare { get; init; }

    /// <summary>How much of the wetness cold weather takes inside the season, 0 to 0.45. Unit: 1.</summary>
    public required double RefreezeShare { get; init; }

    /// <summary>The emissivity of ice under wet snow, by channel, in place of that of the surfaces. Unit: 1.</summary>
    public required IReadOnlyDictionary<Channel, double> WetIceEmissivity { get; init; }
}
