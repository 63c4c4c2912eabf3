using IceExtent.Retrieval;

namespace IceExtent.Statistics;

/// <summary>Whether a day may still change.</summary>
public enum DayStatus
{
    /// <summary>From final input.</summary>
    Final,

    /// <summary>From near-real-time input that will be replaced.</summary>
    Provisional,
}

/// <summary>The totals of one day and one region. Areas in km²; shares from 0 to 1.</summary>
/// <remarks>Columns of the <c>daily</c> table, documented in docs/DATA.md.</remarks>
public sealed record DailyRow
{
    /// <summary>The day, UTC.</summary>
    public required DateOnly Date { get; init; }

    /// <summary>The region's name; <c>hemisphere</c> is every ocean cell of the grid.</summary>
    public required string Region { get; init; }

    /// <summary>Area of cells of at least 15 %, with the polar gap as the rule has it; null where not one cell outside the gap was observed.</summary>
    public required double? ExtentSquareKilometers { get; init; }

    /// <summary>Standard error of the extent.</summary>
    public required double? ExtentStandardErrorSquareKilometers { get; init; }

    /// <summary>Concentration times cell area over cells of at least 15 %; of the polar gap only what was filled.</summary>
    public required double? AreaSquareKilometers { get; init; }

    /// <summary>Standard error of the area.</summary>
    public required double? AreaStandardErrorSquareKilometers { get; init; }

    /// <summary>Area of cells from 15 % to below 80 %.</summary>
    public required double? MarginalZoneSquareKilometers { get; init; }

    /// <summary>Area of cells of 80 % and more; of the polar gap only what was filled.</summary>
    public required double? PackSquareKilometers { get; init; }

    /// <summary>Area of the region's ocean cells, the polar gap included.</summary>
    public required double OceanSquareKilometers { get; init; }

    /// <summary>Share of the ocean outside the polar gap that was observed.</summary>
    public required double ObservedShare { get; init; }

    /// <summary>Share of the ocean outside the polar gap whose value was filled in from neighbours.</summary>
    public required double FilledShare { get; init; }

    /// <summary>Area of the circle round the pole that the sensor does not see.</summary>
    public required double PolarGapSquareKilometers { get; init; }

    /// <summary>The sensor that ruled the day.</summary>
    public required string Sensor { get; init; }

    /// <summary>Whether the day may still change.</summary>
    public required DayStatus Status { get; init; }

    /// <summary>Where the tie points come from.</summary>
    public TiePointState TiePoints { get; init; }
}
