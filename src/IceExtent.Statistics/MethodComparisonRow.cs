namespace IceExtent.Statistics;

/// <summary>What one method says of one day beside the first method of the run. Areas in km², fractions from 0 to 1.</summary>
/// <remarks>Columns of the <c>comparison</c> table, documented in docs/DATA.md. Null where the day has no observation.</remarks>
public sealed record MethodComparisonRow
{
    /// <summary>The day, UTC.</summary>
    public required DateOnly Date { get; init; }

    /// <summary>The region's name.</summary>
    public required string Region { get; init; }

    /// <summary>The method.</summary>
    public required string Method { get; init; }

    /// <summary>Its extent.</summary>
    public required double? ExtentSquareKilometers { get; init; }

    /// <summary>Its area.</summary>
    public required double? AreaSquareKilometers { get; init; }

    /// <summary>Its extent less that of the first method.</summary>
    public required double? ExtentDifferenceSquareKilometers { get; init; }

    /// <summary>Its area less that of the first method.</summary>
    public required double? AreaDifferenceSquareKilometers { get; init; }

    /// <summary>Mean over cells that both methods see and that either calls ice of its concentration less the first method's; null without such a cell.</summary>
    public required double? MeanDifferenceFraction { get; init; }

    /// <summary>Root mean square of the same differences.</summary>
    public required double? RootMeanSquareDifferenceFraction { get; init; }
}
