namespace IceExtent.Statistics.Overlaps;

/// <summary>Two sources of a run file that have days in common: the one that stands first, and the other.</summary>
/// <param name="Earlier">The number of the first in the run file, from 1.</param>
/// <param name="EarlierSensor">Its sensor.</param>
/// <param name="Later">The number of the second.</param>
/// <param name="LaterSensor">Its sensor.</param>
public sealed record SensorPair(int Earlier, string EarlierSensor, int Later, string LaterSensor);

/// <summary>How totals of two sensors differ, later less earlier, over the days of one month of the year or over all days. Unit: km².</summary>
/// <remarks>Columns of the <c>sensor_differences</c> table, documented in docs/DATA.md.</remarks>
public sealed record SensorDifferenceRow
{
    /// <summary>The sensors.</summary>
    public required SensorPair Pair { get; init; }

    /// <summary>The method.</summary>
    public required string Method { get; init; }

    /// <summary>The region's name.</summary>
    public required string Region { get; init; }

    /// <summary><c>extent</c> or <c>area</c>.</summary>
    public required string Quantity { get; init; }

    /// <summary><c>common</c>: cells that both sensors observed; <c>own</c>: what each sensor's daily row would hold, unfilled.</summary>
    public required string Cells { get; init; }

    /// <summary>1 to 12, or null for all days together.</summary>
    public required int? Month { get; init; }

    /// <summary>The first day.</summary>
    public required DateOnly FirstDay { get; init; }

    /// <summary>The last day.</summary>
    public required DateOnly LastDay { get; init; }

    /// <summary>The mean difference and how well it is known.</summary>
    public required MeanOfDays Difference { get; init; }
}
