namespace IceExtent.Statistics;

/// <summary>The ice of one day at one place. Shares and concentrations from 0 to 1.</summary>
/// <remarks>Columns of the <c>daily_places</c> table, documented in docs/DATA.md.</remarks>
public sealed record DailyPlaceRow
{
    /// <summary>The day, UTC.</summary>
    public required DateOnly Date { get; init; }

    /// <summary>The place's name.</summary>
    public required string Place { get; init; }

    /// <summary>Mean concentration of the place's cells, weighted by their areas; null where not one was observed or filled.</summary>
    public required double? ConcentrationFraction { get; init; }

    /// <summary>Standard error of that mean.</summary>
    public required double? ConcentrationStandardErrorFraction { get; init; }

    /// <summary>Share of the cells' area that was observed.</summary>
    public required double ObservedShare { get; init; }

    /// <summary>Share of the cells' area whose value was filled in.</summary>
    public required double FilledShare { get; init; }

    /// <summary>The number of cells.</summary>
    public required int Cells { get; init; }

    /// <summary>Distance of the nearest cell's center from the place. Unit: km.</summary>
    public required double NearestKilometers { get; init; }

    /// <summary>Distance of the farthest cell's center. Unit: km.</summary>
    public required double FarthestKilometers { get; init; }

    /// <summary>The sensor that ruled the day.</summary>
    public required string Sensor { get; init; }

    /// <summary>Whether the day may still change.</summary>
    public required DayStatus Status { get; init; }
}
