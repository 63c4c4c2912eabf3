namespace IceExtent.Statistics.Seasons;

/// <summary>One ice year of one cell, region or place. Columns of the season tables, documented in docs/DATA.md.</summary>
public record SeasonRow
{
    /// <summary>The ice year.</summary>
    public required IceYear Year { get; init; }

    /// <summary>What the year begins with.</summary>
    public required YearBeginning Begins { get; init; }

    /// <summary>Its dates.</summary>
    public required YearDates Dates { get; init; }

    /// <summary>Days of the year with a value; of a region, the mean over its cells.</summary>
    public required double KnownDays { get; init; }

    /// <summary>Days of the year below the level of retreat; of a region, the mean over its cells.</summary>
    public required double OpenWaterDays { get; init; }

    /// <summary>Whether later days can no longer change the row.</summary>
    public required bool IsFinal { get; init; }
}

/// <summary>One ice year of one cell.</summary>
public sealed record CellSeasonRow : SeasonRow
{
    /// <summary>The row of the grid, 0 at the top.</summary>
    public required int GridRow { get; init; }

    /// <summary>The column of the grid, 0 at the left.</summary>
    public required int GridColumn { get; init; }

    /// <summary>Of the cell's center. Unit: degrees north.</summary>
    public required double LatitudeDegrees { get; init; }

    /// <summary>Of the cell's center. Unit: degrees east.</summary>
    public required double LongitudeDegrees { get; init; }

    /// <summary>The cell's area.</summary>
    public required double AreaSquareKilometers { get; init; }
}

/// <summary>One ice year of one region: medians of its cells' dates, and the dates of its ice area.</summary>
public sealed record RegionSeasonRow : SeasonRow
{
    /// <summary>The region.</summary>
    public required string Region { get; init; }

    /// <summary>The area of its ocean cells that held ice in the year.</summary>
    public required double IcyAreaSquareKilometers { get; init; }

    /// <summary>The level that the ice area falls and rises through, or null where the record has no winter or no summer.</summary>
    public required double? AreaLevelSquareKilometers { get; init; }

    /// <summary>When the ice area falls through the level, or null where there is none.</summary>
    public required SeasonDate? AreaFall { get; init; }

    /// <summary>When it rises through the level, or null where there is none.</summary>
    public required SeasonDate? AreaRise { get; init; }
}

/// <summary>One ice year of one place.</summary>
public sealed record PlaceSeasonRow : SeasonRow
{
    /// <summary>The place.</summary>
    public required string Place { get; init; }
}
